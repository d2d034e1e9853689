import { describe, expect, it } from 'vitest';
import { aLoad, inSlot, onLower, onTopOf, onUpper } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

const counting = (lower: number, upper: number) => [
  { shelfId: 'lower', counted: lower },
  { shelfId: 'upper', counted: upper },
];

/** Two below, one on the other; two above, one of them in a slot that its holder does not have, and one not scanned. */
const load = aLoad()
  .withHolder('RS-1', 'RS', { x: 0, y: 0 })
  .withPackage('C-01', onLower(0, 0))
  .withPackage('C-02', onTopOf('C-01', 0, 0))
  .withPackage('P-01', inSlot('RS-1', 1))
  .withPackage('P-02', inSlot('RS-1', 9))
  .withPackage('W-08', onUpper(300, 0), { isScanned: false })
  .uncounted();

describe('counted as many as scanned', () => {
  it('says nothing where the numbers agree', () => {
    expect(titlesOf('count-differs', load.with({ counts: counting(2, 2) }))).toEqual([]);
  });

  it('finds a shelf with more than was scanned, and one with less', () => {
    expect(findingsOf('count-differs', load.with({ counts: counting(1, 3) }))).toMatchObject([
      {
        severity: 'stop',
        title: 'Lower shelf: counted 1, scanned 2, so 1 not there',
        places: [{ on: 'shelf', shelfId: 'lower' }],
        figure: { measured: 1, limit: 2, want: 'exactly' },
      },
      { title: 'Upper shelf: counted 3, scanned 2, so 1 not scanned' },
    ]);
  });

  it('finds something on a shelf that should be empty', () => {
    expect(
      titlesOf(
        'count-differs',
        aLoad()
          .uncounted()
          .with({ counts: counting(0, 1) }),
      ),
    ).toEqual(['Upper shelf: counted 1, scanned 0, so 1 not scanned']);
  });
});
