import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, onLower, onTopOf } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rule = 'base-filter-shut';
/** One base filter of 100 × 100 mm, 100 mm from its near end and in the middle of its width of 280 mm. */
const container = aLoad().withItemChanged('C-01', {
  filterZones: [{ face: 'base', xMm: mm(100), yMm: mm(90), lengthMm: mm(100), widthMm: mm(100) }],
});

describe('base filters stay open', () => {
  it('notes one that lies on a solid shelf, and offers a shelf of wire', () => {
    const load = container.withShelf('lower', { surface: 'solid' }).withPackage('C-01', onLower(0, 0));
    expect(findingsOf(rule, load)).toMatchObject([
      {
        severity: 'advice',
        title: '100 % of the base filter of General container set A lies on Lower shelf',
        figure: { measured: 100, limit: 0, unit: '%', want: 'at-most' },
        places: [{ on: 'package', packageId: 'C-01' }],
      },
    ]);
    expect(fixesOf(rule, load)).toEqual([expect.stringContaining('Upper shelf')]);
  });

  it('says nothing on wire, of a lid filter, or of a container without any', () => {
    expect(titlesOf(rule, container.withPackage('C-01', onLower(0, 0)))).toEqual([]);
    const solid = aLoad().withShelf('lower', { surface: 'solid' });
    expect(titlesOf(rule, solid.withPackage('C-15', onLower(0, 0)))).toEqual([]);
    const lid = solid.withItemChanged('C-01', {
      filterZones: [{ face: 'lid', xMm: mm(100), yMm: mm(90), lengthMm: mm(100), widthMm: mm(100) }],
    });
    expect(titlesOf(rule, lid.withPackage('C-01', onLower(0, 0)))).toEqual([]);
  });

  it('says how much of it lies on what the container stands on, and nothing where it hangs free', () => {
    // C-15 is 250 wide and 500 deep. Set back by 150 mm, the filter from 250 to 350 lies on it; by 450 half of it does.
    const stacked = (y: number) =>
      container.withPackage('C-15', onLower(0, 0)).withPackage('C-01', onTopOf('C-15', 0, y));
    expect(titlesOf(rule, stacked(150))).toEqual([
      '100 % of the base filter of General container set A lies on Cystoscopy set',
    ]);
    expect(titlesOf(rule, stacked(350))).toEqual([
      '50 % of the base filter of General container set A lies on Cystoscopy set',
    ]);
    expect(titlesOf(rule, stacked(400))).toEqual([]);
  });
});
