import { describe, expect, it } from 'vitest';
import { aLoad, onLower, onTopOf } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rule = 'stack-not-permitted';
const base = aLoad().withItemChanged('C-01', { filterZones: [] }).withPackage('C-01', onLower(0, 0));

describe('stacks only where instructions permit them', () => {
  it('says nothing where the upper one is permitted on the lower one', () => {
    expect(findingsOf(rule, base.withPackage('C-02', onTopOf('C-01', 0, 0)))).toEqual([]);
  });

  it('finds one that is not, and puts it on a shelf', () => {
    const load = base.withPackage('W-08', onTopOf('C-01', 0, 0));
    expect(findingsOf(rule, load)).toMatchObject([
      {
        severity: 'stop',
        title: 'Laceration tray stands on General container set A, which its instructions do not permit',
        places: [
          { on: 'package', packageId: 'W-08' },
          { on: 'package', packageId: 'C-01' },
        ],
      },
    ]);
    expect(fixesOf(rule, load)).toEqual(['Move it to Lower shelf, right, at the door']);
  });

  it('asks about the one directly below, not about what is under that', () => {
    const load = base.withPackage('C-02', onTopOf('C-01', 0, 0)).withPackage('C-14', onTopOf('C-02', 0, 0));
    expect(titlesOf(rule, load)).toEqual([
      'Eye micro set stands on General container set B, which its instructions do not permit',
    ]);
  });

  it('finds a permitted one that hangs over so far that it would tip', () => {
    expect(titlesOf(rule, base.withPackage('C-02', onTopOf('C-01', 139, 0)))).toEqual([]);
    const tipping = 'General container set B hangs so far over General container set A that it would tip';
    expect(titlesOf(rule, base.withPackage('C-02', onTopOf('C-01', 140, 0)))).toEqual([tipping]);
    expect(titlesOf(rule, base.withPackage('C-02', onTopOf('C-01', 0, 290)))).toEqual([tipping]);
    expect(titlesOf(rule, base.withPackage('C-02', onTopOf('C-01', 300, 600)))).toEqual([tipping]);
  });

  it('leaves pouches to the rules about pouches', () => {
    expect(titlesOf(rule, base.withPackage('P-01', onTopOf('C-01', 0, 0, { pose: 'flat' })))).toEqual([]);
  });

  it('finds a set on a pouch', () => {
    const load = aLoad().withPackage('P-05', onLower(0, 0, { pose: 'flat' }));
    expect(titlesOf(rule, load.withPackage('C-14', onTopOf('P-05', 0, 0)))).toHaveLength(1);
  });
});
