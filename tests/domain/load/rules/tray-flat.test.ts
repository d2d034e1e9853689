import { describe, expect, it } from 'vitest';
import { aLoad, onLower } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

describe('trays and containers lie flat', () => {
  it('says nothing about those that do', () => {
    const load = aLoad().withPackage('C-01', onLower(0, 0)).withPackage('W-03', onLower(290, 0));
    expect(titlesOf('tray-flat', load)).toEqual([]);
  });

  it('finds one on its side or tilted, and lays it flat', () => {
    const load = aLoad().withPackage('C-15', onLower(0, 0, { pose: 'on-edge' }));
    expect(findingsOf('tray-flat', load)).toMatchObject([
      { severity: 'stop', title: 'Cystoscopy set stands on edge, want it flat' },
    ]);
    expect(fixesOf('tray-flat', load)).toEqual(['Lay it flat']);
    expect(titlesOf('tray-flat', aLoad().withPackage('W-03', onLower(0, 0, { pose: 'tilted' })))).toEqual([
      'D&C set is tilted, want it flat',
    ]);
  });

  it('finds it another place where it has no room to lie down', () => {
    const load = aLoad()
      .withPackage('W-04', onLower(130, 0))
      .withPackage('W-03', onLower(0, 0, { pose: 'on-edge' }));
    expect(fixesOf('tray-flat', load)[0]).toMatch(/^Lay it flat: (Lower|Upper) shelf/);
  });

  it('leaves what has to drain to the rule about draining', () => {
    const solid = aLoad().withItemChanged('W-03', { isPerforated: false });
    expect(titlesOf('tray-flat', solid.withPackage('W-03', onLower(0, 0, { pose: 'tilted' })))).toEqual([]);
  });
});
