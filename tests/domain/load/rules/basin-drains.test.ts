import { describe, expect, it } from 'vitest';
import { aLoad, onUpper } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

describe('basins drain', () => {
  it('says nothing about one that is tilted or on edge', () => {
    expect(titlesOf('basin-drains', aLoad().withPackage('W-10', onUpper(0, 0)))).toEqual([]);
    expect(titlesOf('basin-drains', aLoad().withPackage('W-11', onUpper(0, 0, { pose: 'on-edge' })))).toEqual([]);
  });

  it('finds one that stands level, and tilts it', () => {
    const load = aLoad().withPackage('W-10', onUpper(0, 0, { pose: 'flat' }));
    expect(findingsOf('basin-drains', load)).toMatchObject([
      { severity: 'stop', title: 'Basin set nested stands level, want it tilted to drain' },
    ]);
    expect(fixesOf('basin-drains', load)).toEqual(['Set it tilted to drain']);
  });

  it('holds for a tray without holes, and not for one with holes', () => {
    const level = onUpper(0, 0, { pose: 'flat' });
    expect(titlesOf('basin-drains', aLoad().withPackage('W-03', level))).toEqual([]);
    const solid = aLoad().withItemChanged('W-03', { isPerforated: false });
    expect(titlesOf('basin-drains', solid.withPackage('W-03', level))).toHaveLength(1);
  });
});
