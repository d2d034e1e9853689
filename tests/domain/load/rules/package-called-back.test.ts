import { describe, expect, it } from 'vitest';
import { aLoad, nowhere } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

describe('nothing called back', () => {
  it('finds a package that was, once and not as held too', () => {
    const load = aLoad().withPackage('W-01', nowhere, { state: 'recalled', heldReason: 'Recall 7' });
    expect(findingsOf('package-called-back', load)).toMatchObject([
      { severity: 'stop', title: 'Minor set has been called back', fix: { label: 'Take it off the load' } },
    ]);
    expect(titlesOf('package-state', load)).toEqual([]);
  });

  it('says nothing of the others', () => {
    expect(titlesOf('package-called-back', aLoad().withPackage('W-01', nowhere))).toEqual([]);
  });
});
