import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, inSlot, onLower } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

describe('everything is on its shelf', () => {
  it.each([
    ['flush with the left and the door', 0, 0],
    ['flush with the right and the far end', 300, 650],
  ])('says nothing about what is %s', (_name, x, y) => {
    expect(titlesOf('shelf-edge', aLoad().withPackage('W-03', onLower(x, y)))).toEqual([]);
  });

  it.each([
    ['left', -7, 0],
    ['right', 307, 0],
    ['door', 0, -7],
    ['far end', 0, 657],
  ])('finds what hangs over at the %s, and moves it onto the shelf', (_name, x, y) => {
    const load = aLoad().withPackage('W-03', onLower(x, y));
    expect(findingsOf('shelf-edge', load)).toMatchObject([
      { severity: 'stop', title: 'D&C set hangs 7 mm over the edge of Lower shelf', figure: { measured: 7, limit: 0 } },
    ]);
    expect(fixesOf('shelf-edge', load)).toEqual(['Move it onto the shelf']);
  });

  it('finds a holder that hangs over, and not the pouches in it as well', () => {
    const load = aLoad().withHolder('RS-1', 'RS', { x: -30, y: 40 }).withPackage('P-01', inSlot('RS-1', 1));
    expect(findingsOf('shelf-edge', load)).toMatchObject([
      {
        title: 'Holder RS-1 hangs 30 mm over the edge of Upper shelf',
        places: [{ on: 'holder', holderId: 'RS-1', slot: null }],
        fix: { edits: [{ edit: 'place-holder', holderId: 'RS-1', shelfId: 'upper', xMm: 0, yMm: 40, turn: 0 }] },
      },
    ]);
  });

  it('has no fix for what is larger than every shelf', () => {
    const load = aLoad()
      .withItemChanged('W-03', { lengthMm: mm(1200) })
      .withPackage('W-03', onLower(0, 0));
    expect(fixesOf('shelf-edge', load)).toEqual([null]);
  });
});
