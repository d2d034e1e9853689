import { canonicalJson, contentsOf, type Json } from '#domain/load/contents';
import { mm } from '#domain/units/quantity';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  aHolder,
  aPackage,
  aView,
  cable,
  forceps,
  inSlot,
  longDrying,
  lowerShelf,
  mediumRack,
  onShelf,
  smallRack,
  tray,
  upperShelf,
} from '../../support/building-load';

describe('canonicalJson', () => {
  it('writes the published example of numbers, text and literals as it is published', () => {
    // RFC 8785, 3.2.2 (input) and 3.2.3 (result), as restated in several public test suites.
    const value: unknown = JSON.parse(
      String.raw`{"numbers":[333333333.33333329,1E30,4.50,2e-3,0.000000000000000000000000001],"string":"\u20ac$\u000F\u000aA'\u0042\u0022\u005c\\\"\/","literals":[null,true,false]}`,
    );
    expect(canonicalJson(value as Json)).toBe(
      String.raw`{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\u000f\nA'B\"\\\\\"/"}`,
    );
  });

  it('sorts names by UTF-16 code units, so that the emoji comes before U+FB33', () => {
    // RFC 8785, 3.2.3, the sorting example.
    const value = {
      '\u20ac': 'Euro Sign',
      '\r': 'Carriage Return',
      '\ufb33': 'Hebrew Letter Dalet With Dagesh',
      '1': 'One',
      '\ud83d\ude00': 'Emoji: Grinning Face',
      '\u0080': 'Control',
      '\u00f6': 'Latin Small Letter O With Diaeresis',
    };
    const names = Object.keys(JSON.parse(canonicalJson(value)) as object);
    // Parsing moves '1' to the front, because whole-number names come first in an object; the text itself does not.
    expect(names.slice(1)).toEqual(['\r', '\u0080', '\u00f6', '\u20ac', '\ud83d\ude00', '\ufb33']);
    expect(canonicalJson(value).startsWith('{"\\r":"Carriage Return","1":"One",')).toBe(true);
  });

  it('writes minus zero as zero', () => {
    // RFC 8785, appendix B.
    expect(canonicalJson([-0, 0])).toBe('[0,0]');
  });

  it('refuses what has no canonical form', () => {
    for (const value of [Number.NaN, Number.POSITIVE_INFINITY, 'lone \ud800 surrogate', { 'a\udc00': 1 }]) {
      expect(() => canonicalJson(value)).toThrow(RangeError);
    }
  });

  it('keeps the value and does not care about the order of names', () => {
    const shuffled = (value: Json): Json => {
      if (typeof value !== 'object' || value === null || Array.isArray(value)) return value;
      return Object.fromEntries(Object.entries(value).reverse());
    };
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        const text = canonicalJson(value as Json);
        expect(JSON.parse(text)).toEqual(JSON.parse(JSON.stringify(value)));
        expect(canonicalJson(shuffled(value as Json))).toBe(text);
      }),
    );
  });
});

describe('contentsOf', () => {
  const view = aView({
    holders: [aHolder('rs-1', smallRack), aHolder('rm-1', mediumRack, { shelfId: lowerShelf.id })],
    packages: [
      aPackage('p1', forceps, { placement: inSlot('rs-1', 1) }),
      aPackage('p2', cable, { placement: inSlot('rm-1', 2) }),
      aPackage('p3', tray, { placement: onShelf(lowerShelf, 30, 500) }),
    ],
    counts: [
      { shelfId: lowerShelf.id, counted: 2 },
      { shelfId: upperShelf.id, counted: 1 },
    ],
    acceptances: [
      { findingKey: 'shelf-edge|p3|12', ruleId: 'shelf-edge', reason: 'Only today.' },
      { findingKey: 'gap|p1', ruleId: 'gap', reason: 'Looked at.' },
    ],
  });
  const textOf = (changes: Partial<typeof view>) => canonicalJson(contentsOf({ ...view, ...changes }));

  it('gives the same text whatever the order in which things came onto the load', () => {
    fc.assert(
      fc.property(
        fc.shuffledSubarray([...view.packages], { minLength: 3 }),
        fc.shuffledSubarray([...view.holders], { minLength: 2 }),
        fc.shuffledSubarray([...view.counts], { minLength: 2 }),
        fc.shuffledSubarray([...view.acceptances], { minLength: 2 }),
        (packages, holders, counts, acceptances) => {
          expect(textOf({ packages, holders, counts, acceptances })).toBe(textOf({}));
        },
      ),
    );
  });

  it('changes with everything that a signature stands for', () => {
    const [first, ...others] = view.packages;
    const [holder, ...otherHolders] = view.holders;
    const [count, ...otherCounts] = view.counts;
    const [acceptance, ...otherAcceptances] = view.acceptances;
    if (!first || !holder || !count || !acceptance) throw new Error('the example is too small');
    const changed = [
      textOf({ packages: others }),
      textOf({ packages: [{ ...first, isScanned: false }, ...others] }),
      textOf({ packages: [{ ...first, placement: inSlot('rs-1', 2) }, ...others] }),
      textOf({ packages: [{ ...first, placement: inSlot('rs-1', 1, 'right') }, ...others] }),
      textOf({ packages: [{ ...first, itemId: cable.id }, ...others] }),
      textOf({ packages: [{ ...first, hasExternalIndicator: false }, ...others] }),
      textOf({ holders: [{ ...holder, xMm: mm(41) }, ...otherHolders] }),
      textOf({ counts: [{ ...count, counted: 3 }, ...otherCounts] }),
      textOf({ acceptances: [{ ...acceptance, reason: 'Every day.' }, ...otherAcceptances] }),
      textOf({ program: longDrying }),
      textOf({ loadId: 'load-2' }),
    ];
    expect(new Set([textOf({}), ...changed]).size).toBe(changed.length + 1);
  });

  it('does not change when the catalogue corrects a spelling', () => {
    const items = view.items.map((item) => (item.id === forceps.id ? { ...item, name: 'Adson forceps, pair' } : item));
    expect(textOf({ items })).toBe(textOf({}));
  });
});
