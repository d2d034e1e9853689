import { kg } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, aProgram, nowhere, onLower } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

/** 8.9 + 9.3 kg, one of them not scanned yet, and a rack of 1 kg. */
const load = aLoad()
  .withHolder('RS-1', 'RS', { x: 0, y: 0 })
  .withPackage('C-01', onLower(0, 0))
  .withPackage('C-02', nowhere, { isScanned: false });

const limited = (sterilizerKg: number, programKg: number | null) =>
  load
    .withSterilizer({ greatestLoadMassKg: kg(sterilizerKg) })
    .with({ program: aProgram('W4-30', { greatestLoadMassKg: programKg === null ? null : kg(programKg) }) });

describe('the load is not too heavy', () => {
  it('weighs everything on the list against the smaller of the two limits', () => {
    expect(titlesOf('load-mass', limited(19.2, null))).toEqual([]);
    expect(titlesOf('load-mass', limited(19.2, 19.2))).toEqual([]);
    expect(findingsOf('load-mass', limited(19, null))).toMatchObject([
      { severity: 'stop', title: 'The load weighs 19.2 kg, want at most 19 kg', places: [{ on: 'load' }] },
    ]);
    expect(findingsOf('load-mass', limited(100, 15))[0]?.figure?.limit).toBe(15);
  });

  it('counts a mass that makes no sense as nothing, which is its own finding', () => {
    const wild = limited(19, null).withItemChanged('C-02', { massKg: kg(NaN) });
    expect(titlesOf('load-mass', wild)).toEqual([]);
    expect(titlesOf('size-makes-no-sense', wild)).toEqual([
      'General container set B has a mass of NaN kg, which cannot be',
    ]);
  });
});
