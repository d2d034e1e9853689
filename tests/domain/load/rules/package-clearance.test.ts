import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, inSlot, onLower, onTopOf, onUpper } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rule = 'package-clearance';

describe('packages stand clear of each other', () => {
  const apart = (x: number, y = 0) => aLoad().withPackage('W-03', onLower(0, 0)).withPackage('W-04', onLower(x, y));

  it('says nothing at the distance asked for', () => {
    expect(titlesOf(rule, apart(285))).toEqual([]);
  });

  it('finds a smaller one, with whose word it is', () => {
    expect(findingsOf(rule, apart(272))).toMatchObject([
      {
        severity: 'accept',
        title: 'D&C set is 12 mm from Vaginal delivery set, want 25 mm',
        figure: { measured: 12, limit: 25, limitFrom: 'ifu' },
        source: { text: 'Instructions for use of D&C set: IFU W-03.' },
      },
    ]);
    expect(titlesOf(rule, apart(260))).toEqual(['D&C set touches Vaginal delivery set, want 25 mm between']);
  });

  it('past a corner measures the straight way', () => {
    expect(titlesOf(rule, apart(275, 520))).toEqual([]);
    expect(titlesOf(rule, apart(275, 519))).toHaveLength(1);
  });

  it('takes the greater of what the two ask for, and the house’s word where both are silent', () => {
    const silent = apart(280)
      .withItemChanged('W-03', { clearanceMm: null })
      .withItemChanged('W-04', { clearanceMm: null });
    expect(findingsOf(rule, silent)[0]?.figure).toMatchObject({ measured: 20, limit: 25, limitFrom: 'default' });
    expect(findingsOf(rule, silent, { packageClearanceMm: mm(15) })).toEqual([]);
    const one = apart(290).withItemChanged('W-04', { clearanceMm: mm(40) });
    expect(findingsOf(rule, one)[0]?.source.text).toBe('Instructions for use of Vaginal delivery set: IFU W-04.');
  });

  it('is one finding for a rack that is too near, at its nearest pouch', () => {
    // The pouch in slot 8 is 12 mm thick and 22 mm from the frame at its middle: 16 mm from the frame, 20 from the set.
    const load = aLoad()
      .withHolder('RS-1', 'RS', { x: 0, y: 0 })
      .withPackage('P-02', inSlot('RS-1', 7))
      .withPackage('P-03', inSlot('RS-1', 8))
      .withPackage('W-08', onUpper(244, 0));
    expect(findingsOf(rule, load)).toMatchObject([
      {
        title: 'Holder RS-1 is 20 mm from Laceration tray, want 25 mm',
        places: [
          { on: 'holder', holderId: 'RS-1', slot: 8 },
          { on: 'package', packageId: 'W-08' },
          { on: 'package', packageId: 'P-03' },
        ],
      },
    ]);
  });

  it('says nothing about what stands above or below, or on another shelf, or of two pouches', () => {
    const load = aLoad()
      .withPackage('C-01', onLower(0, 0))
      .withPackage('C-02', onTopOf('C-01', 0, 0))
      .withPackage('C-03', onUpper(0, 0))
      .withPackage('P-01', onUpper(400, 0))
      .withPackage('P-02', onUpper(412, 0));
    expect(titlesOf(rule, load)).toEqual([]);
  });

  it('moves one of them away', () => {
    expect(fixesOf(rule, apart(272))).toEqual([expect.stringMatching(/^Move Vaginal delivery set to Lower shelf/)]);
  });
});
