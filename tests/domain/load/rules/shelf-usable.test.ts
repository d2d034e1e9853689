import { describe, expect, it } from 'vitest';
import { aLoad, inSlot, onLower } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

const bent = aLoad().withShelf('upper', { isUsable: false });

describe('shelves are fit for use', () => {
  it('says nothing of one that is out of use and empty', () => {
    expect(titlesOf('shelf-usable', bent.withPackage('W-01', onLower(0, 0)))).toEqual([]);
  });

  it('finds what is on it, holders and what is in them', () => {
    const load = bent.withHolder('RS-1', 'RS', { x: 0, y: 0 });
    expect(findingsOf('shelf-usable', load)).toMatchObject([
      {
        severity: 'stop',
        title: 'Upper shelf is out of use and has 1 thing on it',
        places: [{ on: 'shelf', shelfId: 'upper' }],
      },
    ]);
    expect(titlesOf('shelf-usable', load.withPackage('P-01', inSlot('RS-1', 1)))).toEqual([
      'Upper shelf is out of use and has 2 things on it',
    ]);
  });
});
