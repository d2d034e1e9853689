import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, onLower, onTopOf, onUpper } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rule = 'lid-filter-covered';
/** One filter of 100 × 100 mm, 100 mm from its near end and in the middle of its width of 280 mm. */
const oneFilter = aLoad().withItemChanged('C-01', {
  filterZones: [{ face: 'lid', xMm: mm(100), yMm: mm(90), lengthMm: mm(100), widthMm: mm(100) }],
});
const container = oneFilter.withPackage('C-01', onLower(0, 0));

describe('lid filters stay open', () => {
  it('finds what stands on one, wholly or partly, and says how much of it is covered', () => {
    // W-08 is 230 wide and 350 deep: from y = 150 on it covers half of the filter, which reaches from 100 to 200.
    const load = container.withPackage('W-08', onTopOf('C-01', 20, 150));
    expect(findingsOf(rule, load)).toMatchObject([
      {
        severity: 'stop',
        title: 'Laceration tray covers 50 % of the lid filter of General container set A',
        figure: { measured: 50, limit: 0, unit: '%', want: 'at-most' },
        places: [
          { on: 'package', packageId: 'C-01' },
          { on: 'package', packageId: 'W-08' },
        ],
      },
    ]);
    expect(titlesOf(rule, container.withPackage('W-08', onTopOf('C-01', 20, 200)))).toEqual([]);
  });

  it('finds what hangs over it from a neighbour', () => {
    const load = container
      .withPackage('C-15', onLower(305, 0))
      .withItemChanged('C-15', { heightMm: mm(150) })
      .withPackage('W-08', onTopOf('C-15', 180, 0));
    expect(titlesOf(rule, load)).toEqual(['Laceration tray covers 10 % of the lid filter of General container set A']);
  });

  it('counts what several things cover together once, in one finding', () => {
    const load = container
      .withPackage('P-16', onTopOf('C-01', 100, 0, { pose: 'flat' }))
      .withPackage('P-16', onTopOf('C-01', 120, 0, { pose: 'flat' }));
    expect(titlesOf(rule, load)).toEqual([
      'Suture removal scissors label P-16 and Suture removal scissors label P-16 no. 2 cover 90 % of the lid filter of General container set A',
    ]);
  });

  it('says nothing about another shelf, a base filter, a container without filters or what is lower', () => {
    expect(titlesOf(rule, container.withPackage('W-03', onUpper(0, 0)))).toEqual([]);
    const base = container.withItemChanged('C-01', {
      filterZones: [{ face: 'base', xMm: mm(0), yMm: mm(0), lengthMm: mm(500), widthMm: mm(200) }],
    });
    expect(titlesOf(rule, base.withPackage('W-08', onTopOf('C-01', 20, 150)))).toEqual([]);
    const closed = aLoad()
      .withPackage('C-15', onLower(0, 0))
      .withPackage('W-08', onTopOf('C-15', 0, 0));
    expect(titlesOf(rule, closed)).toEqual([]);
    expect(titlesOf(rule, container.withPackage('W-08', onLower(20, 150)))).toEqual([]);
  });

  it('moves what covers it to a place of its own', () => {
    expect(fixesOf(rule, container.withPackage('W-08', onTopOf('C-01', 20, 150)))).toEqual([
      'Move Laceration tray to Lower shelf, right, at the door',
    ]);
    const pouches = container
      .withHolder('RS-1', 'RS', { x: 20, y: 40 })
      .withPackage('P-16', onTopOf('C-01', 100, 0, { pose: 'flat' }))
      .withPackage('P-01', onTopOf('C-01', 180, 0, { pose: 'flat' }));
    expect(fixesOf(rule, pouches)).toEqual(['Give all 2 a place of their own']);
  });
});
