import { describe, expect, it } from 'vitest';
import { aLoad } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

describe('the air-removal test of the day has passed', () => {
  it('says nothing where it has, or where the sterilizer needs none', () => {
    expect(titlesOf('air-removal-test', aLoad())).toEqual([]);
    const small = aLoad().withSterilizer({ needsAirRemovalTest: false }).with({ airRemoval: null });
    expect(titlesOf('air-removal-test', small)).toEqual([]);
  });

  it.each([
    // The day of 2026-03-10 begins at UTC+14 at 10:00 of the day before and ends at UTC-12 at 12:00 of the day after.
    ['2026-03-09T09:59:59Z', 1],
    ['2026-03-09T10:00:00Z', 0],
    ['2026-03-11T11:59:59Z', 0],
    ['2026-03-11T12:00:00Z', 1],
    ['some time', 1],
  ])('a test of %s is of another day %d times, whatever the time zone', (testedAt, found) => {
    const load = aLoad().with({ airRemoval: { result: 'passed', testedAt } });
    expect(titlesOf('air-removal-test', load)).toHaveLength(found);
  });

  it('finds that there was none, or that it failed', () => {
    expect(findingsOf('air-removal-test', aLoad().with({ airRemoval: null }))).toMatchObject([
      { severity: 'stop', title: 'No air-removal test of Sterilizer 2 today', places: [{ on: 'load' }] },
    ]);
    const failed = aLoad().with({ airRemoval: { result: 'failed', testedAt: '2026-03-10T05:40:00Z' } });
    expect(titlesOf('air-removal-test', failed)).toEqual(['The air-removal test of Sterilizer 2 failed today']);
  });
});
