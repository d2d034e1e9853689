import { describe, expect, it } from 'vitest';
import { aLoad, onUpper } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

describe('textile packs stand on edge', () => {
  it('says nothing about one that does, or whose instructions ask for something else', () => {
    expect(titlesOf('textile-on-edge', aLoad().withPackage('W-12', onUpper(0, 0)))).toEqual([]);
    const flat = aLoad().withItemChanged('W-12', { pose: 'flat' }).withPackage('W-12', onUpper(0, 0));
    expect(titlesOf('textile-on-edge', flat)).toEqual([]);
  });

  it('finds one lying flat, and stands it up', () => {
    const load = aLoad().withPackage('W-12', onUpper(0, 0, { pose: 'flat' }));
    expect(findingsOf('textile-on-edge', load)).toMatchObject([
      { severity: 'stop', title: 'Drape pack reusable lies flat, want it on edge' },
    ]);
    expect(fixesOf('textile-on-edge', load)).toEqual(['Stand it on edge']);
  });
});
