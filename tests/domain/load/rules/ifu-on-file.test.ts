import { describe, expect, it } from 'vitest';
import { aLoad, nowhere } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

describe('instructions for use are on file', () => {
  it.each([null, '', '  '])('finds where they are not: %j', (ifuReference) => {
    const load = aLoad().withItemChanged('W-01', { ifuReference }).withPackage('W-01', nowhere);
    expect(findingsOf('ifu-on-file', load)).toMatchObject([
      { severity: 'accept', title: 'No instructions for use on file for Minor set' },
    ]);
  });

  it('finds where they name no cycle', () => {
    const load = aLoad().withItemChanged('W-01', { cycleNeeds: [] }).withPackage('W-01', nowhere);
    expect(titlesOf('ifu-on-file', load)).toEqual(['The instructions for use of Minor set name no cycle']);
  });

  it('says nothing where they are, nor of a challenge device', () => {
    expect(titlesOf('ifu-on-file', aLoad().withPackage('W-01', nowhere).withPackage('PCD', nowhere))).toEqual([]);
  });
});
