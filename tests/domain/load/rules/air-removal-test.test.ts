import { describe, expect, it } from 'vitest';
import { aLoad } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

describe('the air-removal test of the day has passed', () => {
  it('says nothing where it has, or where the sterilizer needs none', () => {
    expect(titlesOf('air-removal-test', aLoad())).toEqual([]);
    const small = aLoad().withSterilizer({ needsAirRemovalTest: false }).with({ airRemoval: null });
    expect(titlesOf('air-removal-test', small)).toEqual([]);
  });

  it('finds that there was none, or that it failed', () => {
    expect(findingsOf('air-removal-test', aLoad().with({ airRemoval: null }))).toMatchObject([
      { severity: 'stop', title: 'No air-removal test of Sterilizer 2 today', places: [{ on: 'load' }] },
    ]);
    const failed = aLoad().with({ airRemoval: { result: 'failed', testedAt: '2026-03-10T05:40:00Z' } });
    expect(titlesOf('air-removal-test', failed)).toEqual(['The air-removal test of Sterilizer 2 failed today']);
  });
});
