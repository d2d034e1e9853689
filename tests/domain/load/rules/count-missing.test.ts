import { describe, expect, it } from 'vitest';
import { aLoad, onLower, onUpper } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

describe('every shelf is counted', () => {
  it('finds each shelf that nobody has counted, also an empty one', () => {
    const load = aLoad().withPackage('W-03', onLower(0, 0)).uncounted();
    expect(findingsOf('count-missing', load)).toMatchObject([
      { severity: 'stop', title: 'Lower shelf has not been counted', places: [{ on: 'shelf', shelfId: 'lower' }] },
      { title: 'Upper shelf has not been counted' },
    ]);
    expect(titlesOf('count-missing', load.with({ counts: [{ shelfId: 'upper', counted: 0 }] }))).toEqual([
      'Lower shelf has not been counted',
    ]);
  });

  it('says nothing where all were counted', () => {
    expect(titlesOf('count-missing', aLoad().withPackage('W-01', onUpper(0, 0)))).toEqual([]);
  });
});
