import { describe, expect, it } from 'vitest';
import { aLoad, inBasket, inSlot, nowhere, onLower, onShelf, onTopOf } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

describe('everything scanned has a place', () => {
  it('says nothing of what has one, and of what is not scanned yet', () => {
    const load = aLoad().withPackage('W-01', onLower(0, 0)).withPackage('W-03', nowhere, { isScanned: false });
    expect(titlesOf('unplaced', load)).toEqual([]);
  });

  it('finds one, and gives it a place', () => {
    const load = aLoad().withPackage('W-03', nowhere);
    expect(findingsOf('unplaced', load)).toMatchObject([
      { severity: 'stop', title: 'D&C set is scanned and has no place', figure: { measured: 1, limit: 0 } },
    ]);
    expect(fixesOf('unplaced', load)).toEqual(['Move it to Lower shelf, middle, at the door']);
  });

  it('finds several in one finding, whatever the reason they have none', () => {
    const load = aLoad()
      .withHolder('RS-1', 'RS', { x: 0, y: 0 })
      .withPackage('W-01', nowhere)
      .withPackage('W-03', onShelf('of another cart', 0, 0))
      .withPackage('P-01', inSlot('no such', 1))
      .withPackage('P-02', inBasket('RS-1', 0, 0))
      .withPackage('W-08', onTopOf('no such', 0, 0))
      .withPackage('W-04', onTopOf('W-08', 0, 0));
    expect(titlesOf('unplaced', load)).toEqual([
      '6 packages are scanned and have no place: Adson forceps pair, Metzenbaum scissors, Minor set and 3 more',
    ]);
  });

  it('leaves what has no slot, no sense or a circle to the rules about that', () => {
    const load = aLoad()
      .withHolder('RS-1', 'RS', { x: 0, y: 0 })
      .withPackage('P-01', inSlot('RS-1', 9))
      .withPackage('W-03', onLower(NaN, 0))
      .withPackage('C-14', onTopOf('C-14', 0, 0));
    expect(titlesOf('unplaced', load)).toEqual([]);
  });
});
