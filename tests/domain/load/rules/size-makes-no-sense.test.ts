import { celsius, kg, mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, nowhere, onLower, onShelf } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

const rule = 'size-makes-no-sense';

describe('sizes make sense', () => {
  it.each([NaN, Infinity, 0, -5, 5_001])('finds a length of %d mm', (lengthMm) => {
    const load = aLoad()
      .withItemChanged('W-01', { lengthMm: mm(lengthMm) })
      .withPackage('W-01', nowhere);
    expect(findingsOf(rule, load)).toMatchObject([
      { severity: 'stop', title: `Minor set has a length of ${lengthMm} mm, which cannot be` },
    ]);
  });

  it.each([
    ['width', { widthMm: mm(0) }, 'a width of 0 mm'],
    ['height', { heightMm: mm(-1) }, 'a height of -1 mm'],
    ['mass', { massKg: kg(-1) }, 'a mass of -1 kg'],
    ['metal mass', { metalMassKg: kg(NaN) }, 'a metal mass of NaN kg'],
    ['textile mass', { textileMassKg: kg(1_001) }, 'a textile mass of 1001 kg'],
  ])('finds the %s of an item', (_name, changes, says) => {
    const load = aLoad().withItemChanged('W-01', changes).withPackage('W-01', nowhere);
    expect(titlesOf(rule, load)).toEqual([`Minor set has ${says}, which cannot be`]);
  });

  it('finds a place that is nowhere near the cart', () => {
    expect(titlesOf(rule, aLoad().withPackage('W-01', onLower(1e9, 0)))).toEqual([
      'Minor set has a place that is nowhere near the cart, which cannot be',
    ]);
  });

  it.each([
    [{ widthMm: mm(NaN) }, 'a width of NaN mm'],
    [{ depthMm: mm(0) }, 'a depth of 0 mm'],
    [{ clearHeightMm: mm(-1) }, 'a clear height of -1 mm'],
    [{ greatestMassKg: kg(-1) }, 'a greatest mass of -1 kg'],
    [{ widthMm: mm(621) }, 'a size of 621 × 1150 mm, more than the chamber of Sterilizer 2'],
  ])('finds a shelf with %j', (changes, says) => {
    expect(titlesOf(rule, aLoad().withShelf('lower', changes))).toEqual([`Lower shelf has ${says}, which cannot be`]);
  });

  it.each([
    [{ chamberWidthMm: mm(NaN) }, 'a chamber width of NaN mm'],
    [{ chamberDepthMm: mm(9_999) }, 'a chamber depth of 9999 mm'],
    [{ greatestLoadMassKg: kg(-1) }, 'a load limit of -1 kg'],
  ])('finds a sterilizer with %j', (changes, says) => {
    expect(titlesOf(rule, aLoad().withSterilizer(changes))).toEqual([`Sterilizer 2 has ${says}, which cannot be`]);
  });

  it('says nothing of sizes that are only unusual, nor of items that are not in the load', () => {
    const load = aLoad()
      .withItemChanged('W-01', { lengthMm: mm(5_000), massKg: kg(0) })
      .withItemChanged('W-03', { lengthMm: mm(NaN) })
      .withPackage('W-01', onShelf('lower', -200, -200))
      .with({ program: { ...aLoad().build().program, temperatureC: celsius(132) } });
    expect(titlesOf(rule, load)).toEqual([]);
  });
});
