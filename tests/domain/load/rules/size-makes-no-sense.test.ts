import type { CycleNeed, FilterZone } from '#domain/load/model';
import type { LoadPolicy } from '#domain/load/policy';
import { celsius, kg, mm, percent, seconds } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, nowhere, onLower, onShelf } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

const rule = 'size-makes-no-sense';

function zone(xMm: number, yMm: number, lengthMm: number, widthMm: number): FilterZone {
  return { face: 'lid', xMm: mm(xMm), yMm: mm(yMm), lengthMm: mm(lengthMm), widthMm: mm(widthMm) };
}

function need(changes: Partial<CycleNeed>): CycleNeed {
  const type = 'dynamic-air-removal' as const;
  const exposure = { leastExposureS: seconds(240), greatestExposureS: null, leastDryS: seconds(1_200) };
  return { type, temperatureC: celsius(132), ...exposure, ...changes };
}

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
    ['clearance', { clearanceMm: mm(-1) }, 'a free space around it of -1 mm'],
    ['stack height', { greatestStackHeightMm: mm(0) }, 'a greatest height of the stack of 0 mm'],
    ['mass limit', { massLimitKg: kg(NaN) }, 'a mass limit of NaN kg'],
    ['filter', { filterZones: [zone(0, 0, 0, 10)] }, 'a lid filter with a length of 0 mm'],
    ['filter', { filterZones: [zone(0, 0, 10, NaN)] }, 'a lid filter with a width of NaN mm'],
    ['filter', { filterZones: [zone(-1, 0, 10, 10)] }, 'a lid filter at a distance of -1 mm'],
    ['filter', { filterZones: [zone(0, -2, 10, 10)] }, 'a lid filter at a distance of -2 mm'],
    ['filter', { filterZones: [zone(0, 0, 9_999, 10)] }, 'a lid filter with a length of 9999 mm'],
    ['filter', { filterZones: [zone(4_000, 0, 10, 10)] }, 'a lid filter that reaches beyond its edge'],
    ['filter', { filterZones: [zone(0, 4_000, 10, 10)] }, 'a lid filter that reaches beyond its edge'],
    ['cycle', { cycleNeeds: [need({ temperatureC: celsius(99) })] }, 'a cycle with a temperature of 99 °C'],
    ['cycle', { cycleNeeds: [need({ leastExposureS: seconds(-1) })] }, 'a cycle with an exposure of -1 s'],
    ['cycle', { cycleNeeds: [need({ greatestExposureS: seconds(NaN) })] }, 'a cycle with an exposure of NaN s'],
    ['cycle', { cycleNeeds: [need({ leastDryS: seconds(86_401) })] }, 'a cycle with a drying time of 86401 s'],
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
    [{ chamberHeightMm: mm(0) }, 'a chamber height of 0 mm'],
    [{ drainXMm: mm(NaN) }, 'a drain at a distance of NaN mm'],
    [{ drainYMm: mm(10_001) }, 'a drain at a distance of 10001 mm'],
  ])('finds a sterilizer with %j', (changes, says) => {
    expect(titlesOf(rule, aLoad().withSterilizer(changes))).toEqual([`Sterilizer 2 has ${says}, which cannot be`]);
  });

  it.each([
    [{ temperatureC: celsius(151) }, 'a temperature of 151 °C'],
    [{ exposureS: seconds(NaN) }, 'an exposure of NaN s'],
    [{ dryS: seconds(-1) }, 'a drying time of -1 s'],
    [{ greatestLoadMassKg: kg(NaN) }, 'a load limit of NaN kg'],
  ])('finds a program with %j', (changes, says) => {
    const load = aLoad().with({ program: { ...aLoad().build().program, ...changes } });
    expect(titlesOf(rule, load)).toEqual([`W4-30 has ${says}, which cannot be`]);
  });

  it.each([
    [{ acrossMm: mm(NaN) }, 'a width of NaN mm'],
    [{ alongMm: mm(0) }, 'a depth of 0 mm'],
    [{ massKg: kg(-1) }, 'a mass of -1 kg'],
    [{ pitchMm: mm(0) }, 'a pitch of 0 mm'],
    [{ greatestHeightMm: mm(-1) }, 'a greatest height of -1 mm'],
    [{ greatestLengthMm: mm(NaN) }, 'a greatest length of NaN mm'],
    [{ greatestThicknessMm: mm(5_001) }, 'a greatest thickness of 5001 mm'],
  ])('finds a holder with %j', (changes, says) => {
    const rack = aLoad().withHolder('RS-1', 'RS', { x: 20, y: 40 });
    const load = rack.with({
      holderKinds: rack.build().holderKinds.map((kind) => (kind.code === 'RS' ? { ...kind, ...changes } : kind)),
    });
    expect(titlesOf(rule, load)).toEqual([`Holder RS-1 has ${says}, which cannot be`]);
  });

  it('finds house rules that are set to something they cannot be', () => {
    const policy = {
      pouchGapMm: mm(NaN),
      massMarginPercent: percent(51),
      facing: 'sideways',
    } as unknown as Partial<LoadPolicy>;
    expect(titlesOf(rule, aLoad(), policy)).toEqual([
      'The house rule “Least gap between pouches on edge, where their instructions are silent” is set to something that cannot be',
      'The house rule “Share of a shelf’s or a load’s mass limit held back” is set to something that cannot be',
      'The house rule “Which way pouches on edge face” is set to something that cannot be',
    ]);
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
