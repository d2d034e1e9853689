import { percent } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, onLower, onTopOf } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

/** Half of a shelf of 560 × 1150 mm is 322,000 mm²; a container covers 162,400 of the 644,000, 25.2 %. */
const two = aLoad().withPackage('C-01', onLower(0, 0)).withPackage('C-08', onLower(280, 0));

describe('steam has a way through each shelf', () => {
  it('says nothing up to the share that may be covered', () => {
    expect(titlesOf('steam-path', two)).toEqual([]);
    expect(titlesOf('steam-path', two, { greatestShelfCoverPercent: percent(51) })).toEqual([]);
  });

  it('is worth a note beyond that', () => {
    expect(findingsOf('steam-path', two, { greatestShelfCoverPercent: percent(50) })).toMatchObject([
      {
        severity: 'advice',
        title: '50.4 % of Lower shelf is covered, want at most 50 %',
        places: [{ on: 'shelf', shelfId: 'lower' }],
        figure: { limitFrom: 'house-rule' },
      },
    ]);
  });

  it('counts a stack once', () => {
    const stacked = two.withPackage('C-02', onTopOf('C-01', 0, 0));
    expect(titlesOf('steam-path', stacked, { greatestShelfCoverPercent: percent(51) })).toEqual([]);
  });
});
