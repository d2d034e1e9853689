import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, inSlot, onLower, onTopOf, onUpper } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

describe('everything fits under the shelf above', () => {
  const high = (heightMm: number) => aLoad().withItemChanged('C-01', { heightMm: mm(heightMm) });

  it('says nothing up to the clear height of the shelf', () => {
    expect(titlesOf('headroom', high(270).withPackage('C-01', onUpper(0, 0)))).toEqual([]);
  });

  it('finds what is higher, and puts it on a shelf that has the height', () => {
    const load = high(271).withPackage('C-01', onUpper(0, 0));
    expect(findingsOf('headroom', load)).toMatchObject([
      {
        severity: 'stop',
        title: 'General container set A is 271 mm high, Upper shelf takes 270 mm',
        figure: { measured: 271, limit: 270, limitFrom: 'equipment' },
      },
    ]);
    expect(fixesOf('headroom', load)).toEqual(['Move it to Lower shelf, left, at the door']);
  });

  it('keeps the free height that the house asks for', () => {
    expect(titlesOf('headroom', high(261).withPackage('C-01', onUpper(0, 0)), { headroomMm: mm(10) })).toHaveLength(1);
    expect(titlesOf('headroom', high(260).withPackage('C-01', onUpper(0, 0)), { headroomMm: mm(10) })).toEqual([]);
  });

  it('in a stack is told of the first that is too high', () => {
    const load = aLoad()
      .withPackage('C-01', onLower(0, 0))
      .withPackage('C-02', onTopOf('C-01', 0, 0))
      .withPackage('C-08', onTopOf('C-02', 0, 0))
      .withPackage('C-14', onTopOf('C-08', 0, 0));
    expect(titlesOf('headroom', load)).toEqual([
      'Total knee tray 1 reaches up to 450 mm high, Lower shelf takes 340 mm',
    ]);
  });

  it('is one finding for a holder, at its highest pouch', () => {
    const load = aLoad()
      .withShelf('upper', { clearHeightMm: mm(80) })
      .withHolder('RS-1', 'RS', { x: 20, y: 40 })
      .withPackage('P-01', inSlot('RS-1', 1))
      .withPackage('P-02', inSlot('RS-1', 2))
      .withPackage('P-04', inSlot('RS-1', 3));
    expect(findingsOf('headroom', load).map((one) => one.figure?.measured)).toEqual([130]);
  });
});
