import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, inSlot, onLower } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rule = 'wall-clearance';
/** A chamber 10 mm wider on either side than the shelf, and 20 mm longer at either end. */
const tight = aLoad().withSterilizer({ chamberWidthMm: mm(580), chamberDepthMm: mm(1190) });

describe('clear of the chamber walls', () => {
  it('says nothing about what is flush with a shelf that stands 30 mm from each wall', () => {
    expect(titlesOf(rule, aLoad().withPackage('W-03', onLower(0, 0)))).toEqual([]);
  });

  it.each([
    ['left wall', 12, 100, 22],
    ['right wall', 288, 100, 22],
    ['door', 100, 2, 22],
    ['far end', 100, 648, 22],
  ])('measures to the %s', (wall, x, y, measured) => {
    const load = tight.withPackage('W-03', onLower(x, y));
    expect(findingsOf(rule, load)).toMatchObject([
      {
        severity: 'accept',
        title: `D&C set is ${measured} mm from the ${wall}, want 25 mm`,
        figure: { measured, limit: 25, want: 'at-least', limitFrom: 'default' },
      },
    ]);
    expect(fixesOf(rule, load)).toEqual([`Move it away from the ${wall}`]);
  });

  it('says nothing at the distance wanted', () => {
    expect(titlesOf(rule, tight.withPackage('W-03', onLower(15, 5)))).toEqual([]);
    expect(titlesOf(rule, tight.withPackage('W-03', onLower(15, 5)), { wallClearanceMm: mm(26) })).toHaveLength(1);
  });

  it('finds a holder that touches a wall, although its pouches keep away from it, but not one that is only near it', () => {
    const at = (x: number) => tight.withHolder('RS-1', 'RS', { x, y: 40 }).withPackage('P-01', inSlot('RS-1', 4));
    expect(findingsOf(rule, at(-10))).toMatchObject([
      {
        title: 'Holder RS-1 is 0 mm from the left wall, want 25 mm',
        places: [{ on: 'holder', holderId: 'RS-1', slot: null }],
      },
    ]);
    expect(titlesOf(rule, at(-9))).toEqual([]);
  });

  it('is one finding for a holder, at its nearest pouch', () => {
    const load = tight
      .withHolder('RS-1', 'RS', { x: -3, y: 40 })
      .withPackage('P-01', inSlot('RS-1', 1))
      .withPackage('P-02', inSlot('RS-1', 2));
    // 10 mm to the shelf, slot 1 is centred 22 mm from the frame and the pouch is 10 mm thick: 10 - 3 + 17.
    expect(findingsOf(rule, load)).toMatchObject([
      {
        title: 'A pouch in Holder RS-1 is 24 mm from the left wall, want 25 mm',
        places: [{ on: 'holder', holderId: 'RS-1', slot: 1 }],
        fix: { label: 'Move the holder away from the left wall' },
      },
    ]);
  });
});
