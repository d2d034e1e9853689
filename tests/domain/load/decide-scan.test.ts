import { decideScan, withScanned, type KnownLabel, type ScanQuestion } from '#domain/load/decide-scan';
import type { CatalogueItem, LoadPackage, LoadView } from '#domain/load/model';
import { defaultPolicy } from '#domain/load/policy';
import type { NotReadyReason } from '#domain/load/scan-answer';
import { mm } from '#domain/units/quantity';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { aLoad } from '../../support/arbitrary-load';
import {
  aHolder,
  aPackage,
  aView,
  container,
  forceps,
  inSlot,
  items,
  lowerShelf,
  onShelf,
  smallRack,
  speculum,
  tray,
  upperShelf,
} from '../../support/building-load';

const listed = aPackage('p9', forceps, { isScanned: false, state: 'staged' });

const load = aView({
  holders: [aHolder('rs-1', smallRack)],
  packages: [
    listed,
    aPackage('t9', tray, { isScanned: false, state: 'staged' }),
    aPackage('p1', forceps, { placement: inSlot('rs-1', 1) }),
    aPackage('t1', tray),
  ],
});

function knownAs(
  one: LoadPackage,
  item: CatalogueItem,
  openLoad: { readonly number: string } | null = null,
): KnownLabel {
  return { kind: 'package', package: one, item, openLoad };
}

function scan(known: KnownLabel, changes: Partial<ScanQuestion> = {}) {
  return decideScan({ view: load, known, place: null, policy: defaultPolicy, ...changes });
}

const inHolder = { kind: 'holder', holderId: 'rs-1' } as const;
const onLower = { kind: 'shelf', shelfId: lowerShelf.id } as const;

describe('decideScan takes a package', () => {
  it('into the next free slot of the holder that was scanned, facing like the others', () => {
    expect(scan(knownAs(listed, forceps), { place: inHolder })).toEqual({
      answer: { answer: 'taken', look: null },
      sentence: 'Adson forceps pair: Holder RS-1, slot 2, paper side left.',
      placement: inSlot('rs-1', 2),
    });
  });

  it('to the place it suggests when no place was scanned', () => {
    const reply = scan(knownAs(listed, forceps));
    expect(reply.placement).toEqual(inSlot('rs-1', 2));
  });

  it('onto a free spot of the shelf that was scanned', () => {
    const one = load.packages[1];
    if (!one) throw new Error('the example is too small');
    const reply = scan(knownAs(one, tray), { place: onLower });
    expect(reply.answer).toEqual({ answer: 'taken', look: null });
    expect(reply.placement).toMatchObject({ at: 'shelf', shelfId: lowerShelf.id, pose: 'flat', paper: null });
    expect(reply.sentence).toMatch(/^D&C set: Lower shelf, .+\.$/);
  });

  it('that was not on the list, and says so', () => {
    const stray = aPackage('p7', forceps, { isScanned: false, state: 'staged' });
    const reply = scan(knownAs(stray, forceps), { place: inHolder });
    expect(reply.answer).toEqual({ answer: 'taken', look: 'not-on-the-list' });
    expect(reply.sentence).toBe(
      'Adson forceps pair: Holder RS-1, slot 2, paper side left. It was not on the list and is now.',
    );
  });

  it('whose item the load has not met before', () => {
    const strange = { ...forceps, id: 'item-new', code: 'P-77', name: 'Skin hook' };
    const stray = aPackage('p7', strange, { isScanned: false, state: 'packed' });
    expect(scan(knownAs(stray, strange)).placement).toEqual(inSlot('rs-1', 2));
  });

  it('and leaves it without a place when the holder is full, saying where there is room', () => {
    const inside = Array.from({ length: 8 }, (_, index) =>
      aPackage(`in${index}`, forceps, { placement: inSlot('rs-1', index + 1) }),
    );
    const full = { ...load, packages: [listed, ...inside] };
    const reply = scan(knownAs(listed, forceps), { view: full, place: inHolder });
    expect(reply).toEqual({
      answer: { answer: 'taken', look: 'no-slot-left' },
      sentence: 'Holder RS-1 has no slot left for Adson forceps pair. Leave it on the table.',
      placement: null,
    });
    const withSecond = { ...full, holders: [...full.holders, aHolder('rs-2', smallRack, { yMm: mm(450) })] };
    expect(scan(knownAs(listed, forceps), { view: withSecond, place: inHolder }).sentence).toBe(
      'Holder RS-1 has no slot left for Adson forceps pair. There is room: Holder RS-2, slot 1, paper side left.',
    );
  });

  it('and says when it does not fit the holder at all', () => {
    const big = aPackage('p8', speculum, { isScanned: false, state: 'staged' });
    const reply = scan(knownAs(big, speculum), { place: inHolder });
    expect(reply.answer).toEqual({ answer: 'taken', look: 'no-place-found' });
    expect(reply.sentence).toBe(
      'Speculum medium does not fit Holder RS-1. Leave it on the table. It was not on the list and is now.',
    );
    expect(reply.placement).toBeNull();
  });

  it('and leaves it without a place when the shelf has none', () => {
    const packed = {
      ...load,
      packages: [
        listed,
        aPackage(
          'c1',
          { ...container, lengthMm: mm(1140), widthMm: mm(550) },
          { placement: onShelf(lowerShelf, 0, 0) },
        ),
      ],
      items: items.map((item) => (item === container ? { ...container, lengthMm: mm(1140), widthMm: mm(550) } : item)),
    };
    const one = aPackage('t7', tray, { isScanned: false, state: 'staged' });
    const reply = scan(knownAs(one, tray), { view: packed, place: onLower });
    expect(reply.answer).toEqual({ answer: 'taken', look: 'no-place-found' });
    expect(reply.sentence).toMatch(/^No free place for D&C set on lower shelf\. There is room: Upper shelf, /);
  });

  it('and forgets a scanned place that is not on this cart', () => {
    const reply = scan(knownAs(listed, forceps), { place: { kind: 'holder', holderId: 'rs-9' } });
    expect(reply.placement).toEqual(inSlot('rs-1', 2));
  });
});

describe('decideScan takes nothing', () => {
  it('of a label that nobody knows', () => {
    expect(scan({ kind: 'not-known' })).toEqual({
      answer: { answer: 'not-known' },
      sentence: 'Nobody here knows this label. Keep it off the cart and show it to a lead.',
      placement: null,
    });
  });

  it('the second time, and says where the package is', () => {
    const one = load.packages[2];
    if (!one) throw new Error('the example is too small');
    expect(scan(knownAs(one, forceps, { number: '2-26076-03' }), { place: onLower })).toEqual({
      answer: { answer: 'already-here' },
      sentence: 'Adson forceps pair is already on this cart: Holder RS-1, slot 1, paper side left.',
      placement: inSlot('rs-1', 1),
    });
  });

  it('the second time, and says where there is room when it has no place yet', () => {
    const one = load.packages[3];
    if (!one) throw new Error('the example is too small');
    const reply = scan(knownAs(one, tray));
    expect(reply.answer).toEqual({ answer: 'already-here' });
    expect(reply.placement).toBeNull();
    expect(reply.sentence).toMatch(/^D&C set is already scanned and has no place yet\. There is room: .+ shelf, /);
  });

  it('that another load has, and names that load', () => {
    const elsewhere = aPackage('p7', forceps, { isScanned: false });
    expect(scan(knownAs(elsewhere, forceps, { number: '2-26076-02' }))).toEqual({
      answer: { answer: 'not-ready', because: 'in-another-load' },
      sentence: 'Adson forceps pair is on load 2-26076-02. Put it with that load.',
      placement: null,
    });
  });

  const states: readonly [LoadPackage['state'], NotReadyReason, string][] = [
    ['processed', 'already-processed', 'has been through a cycle already. Put it back with the processed goods.'],
    ['sterile', 'already-processed', 'has been through a cycle already. Put it back with the processed goods.'],
    ['stored', 'already-processed', 'has been through a cycle already. Put it back with the processed goods.'],
    ['on-case-cart', 'already-processed', 'has been through a cycle already. Put it back with the processed goods.'],
    ['used', 'used', 'has been used. Send it to be washed.'],
    ['returned', 'not-packed', 'came back and is not packed again. Send it to be washed and packed.'],
    ['discarded', 'discarded', 'was discarded. Keep it off the cart and show it to a lead.'],
    ['in-load', 'in-another-load', 'is on another load. Keep it off this cart and show it to a lead.'],
  ];

  it.each(states)('that is %s, and says where to put it', (state, because, words) => {
    const one = aPackage('p7', forceps, { isScanned: false, state });
    expect(scan(knownAs(one, forceps))).toEqual({
      answer: { answer: 'not-ready', because },
      sentence: `Adson forceps pair ${words}`,
      placement: null,
    });
  });

  it('that has expired; its last day is still good', () => {
    const expiring = (expiresOn: string) =>
      scan(knownAs(aPackage('p7', forceps, { isScanned: false, state: 'staged', expiresOn }), forceps));
    expect(expiring('2026-03-16')).toEqual({
      answer: { answer: 'not-ready', because: 'expired' },
      sentence: 'Adson forceps pair expired on 16 March 2026. Send it to be packed again.',
      placement: null,
    });
    expect(expiring('2026-03-17').answer.answer).toBe('taken');
  });

  it('that is held, saying why and where to put it, even when it is on this load already', () => {
    const held = aPackage('p1', forceps, { placement: inSlot('rs-1', 1), heldReason: 'Seal looked at twice.' });
    const view = { ...load, packages: [held] };
    expect(scan(knownAs(held, forceps), { view })).toEqual({
      answer: { answer: 'held' },
      sentence: 'Adson forceps pair is held: Seal looked at twice. Put it on the hold shelf.',
      placement: null,
    });
    const quarantined = aPackage('p7', forceps, { isScanned: false, state: 'quarantined' });
    expect(scan(knownAs(quarantined, forceps)).sentence).toBe('Adson forceps pair is held. Put it on the hold shelf.');
  });

  it('that is called back, even when it is on this load already', () => {
    const recalled = aPackage('p1', forceps, {
      placement: inSlot('rs-1', 1),
      state: 'recalled',
      heldReason: 'BI of 10 March.',
    });
    const view = { ...load, packages: [recalled] };
    expect(scan(knownAs(recalled, forceps), { view })).toEqual({
      answer: { answer: 'called-back' },
      sentence: 'Adson forceps pair is called back. Do not load it: put it on the hold shelf.',
      placement: null,
    });
  });
});

describe('decideScan', () => {
  const question: fc.Arbitrary<ScanQuestion> = fc
    .record({
      view: aLoad,
      item: fc.constantFrom(...items),
      packageId: fc.constantFrom('one0', 'one3', 'one7', 'stray'),
      state: fc.constantFrom('packed', 'staged', 'in-load', 'sterile', 'recalled', 'quarantined', 'used'),
      heldReason: fc.constantFrom(null, 'Wet.'),
      openLoad: fc.constantFrom(null, { number: '2-26076-02' }),
      place: fc.constantFrom(
        null,
        inHolder,
        onLower,
        { kind: 'shelf', shelfId: upperShelf.id },
        { kind: 'holder', holderId: 'tb-1' },
        { kind: 'holder', holderId: 'rs-9' },
      ),
      facing: fc.constantFrom('one-way', 'alternating', 'not-set'),
    })
    .map(({ view, item, packageId, state, heldReason, openLoad, place, facing }) => {
      const here = view.packages.find((one) => one.packageId === packageId);
      const one = here ?? aPackage(packageId, item, { isScanned: false, state, heldReason });
      const known = view.items.find((each) => each.id === one.itemId) ?? item;
      return {
        view,
        known: knownAs(one, known, openLoad),
        place,
        policy: { ...defaultPolicy, facing },
      } as ScanQuestion;
    });

  it('never changes what it was given, and always says something', () => {
    fc.assert(
      fc.property(question, (asked) => {
        const before = structuredClone(asked);
        const reply = decideScan(asked);
        expect(asked).toEqual(before);
        expect(reply.sentence).toMatch(/^[A-Z].+\.$/);
        if (reply.answer.answer !== 'taken' && reply.answer.answer !== 'already-here')
          expect(reply.placement).toBeNull();
      }),
    );
  });

  it('gives the same answer to the same question, whoever asks', () => {
    fc.assert(
      fc.property(question, (asked) => {
        expect(decideScan(structuredClone(asked))).toEqual(decideScan(asked));
      }),
      { numRuns: 30 },
    );
  });

  it('answers a second scan with "already here", once the first was taken', () => {
    fc.assert(
      fc.property(question, (asked) => {
        const first = decideScan(asked);
        if (asked.known.kind !== 'package' || first.answer.answer !== 'taken') return;
        const { package: one, item } = asked.known;
        const view: LoadView = withScanned(asked.view, one, item, first.placement);
        const second = decideScan({ ...asked, view });
        expect(second.answer).toEqual({ answer: 'already-here' });
        expect(second.placement).toEqual(first.placement);
      }),
      { numRuns: 60 },
    );
  });
});
