import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, inBasket, inSlot, onUpper } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

const rule = 'label-hidden';

describe('labels can be read', () => {
  it('finds the one whose film side has something close in front of it', () => {
    const load = aLoad()
      .withPackage('P-02', onUpper(100, 0, { paper: 'left' }))
      .withPackage('P-03', onUpper(141, 0, { paper: 'left' }));
    expect(findingsOf(rule, load)).toMatchObject([
      {
        severity: 'accept',
        title: 'The label of Metzenbaum scissors is hidden by Mayo scissors curved, 29 mm in front of it',
        figure: { measured: 29, limit: 30, limitFrom: 'default' },
      },
    ]);
    const apart = aLoad()
      .withPackage('P-02', onUpper(100, 0, { paper: 'left' }))
      .withPackage('P-03', onUpper(142, 0, { paper: 'left' }));
    expect(titlesOf(rule, apart)).toEqual([]);
  });

  // Paper left means film right; turned by a quarter, left is towards the door.
  it.each([
    ['left', 0, 127, 100],
    ['right', 0, 73, 100],
    ['left', 90, 100, 127],
    ['right', 90, 100, 73],
  ] as const)('looks where the film looks: paper %s, turned by %d', (paper, turn, x, y) => {
    const withNeighbour = (side: 'left' | 'right') =>
      aLoad()
        .withPackage('P-02', onUpper(100, 100, { paper: side, turn }))
        .withPackage('P-03', onUpper(x, y, { turn }));
    expect(findingsOf(rule, withNeighbour(paper)).map((one) => one.figure?.measured)).toEqual([15]);
    expect(titlesOf(rule, withNeighbour(paper === 'left' ? 'right' : 'left'))).toEqual([]);
  });

  it('says nothing where less than half of it is covered, or nobody knows where the film is', () => {
    const beside = (y: number) =>
      aLoad()
        .withPackage('P-02', onUpper(100, 0, { paper: 'left' }))
        .withPackage('P-03', onUpper(115, y, { paper: null }));
    expect(titlesOf(rule, beside(160))).toHaveLength(1);
    expect(titlesOf(rule, beside(170))).toEqual([]);
    const unknown = aLoad().withPackage('P-02', onUpper(100, 0)).withPackage('P-03', onUpper(115, 0));
    expect(titlesOf(rule, unknown)).toEqual([]);
  });

  it('says nothing in a rack, where each pouch can be tipped by itself, but looks into a basket', () => {
    const load = aLoad()
      .withHolder('RS-1', 'RS', { x: 20, y: 40 })
      .withHolder('TB-1', 'TB', { x: 20, y: 600 })
      .withPackage('P-01', inSlot('RS-1', 1))
      .withPackage('P-02', inSlot('RS-1', 2))
      .withPackage('P-03', inBasket('TB-1', 0, 10, { turn: 90, paper: 'left' }))
      .withPackage('P-04', inBasket('TB-1', 0, 30, { turn: 90, paper: 'left' }));
    // P-03 is 12 mm thick: from 10 to 22, and P-04 begins at 30.
    expect(titlesOf(rule, load, { labelReadingGapMm: mm(100) })).toEqual([
      'The label of Mayo scissors curved is hidden by Single curette set of 2, 8 mm in front of it',
    ]);
    expect(titlesOf(rule, load, { labelReadingGapMm: mm(8) })).toEqual([]);
  });
});
