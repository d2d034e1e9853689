import { describe, expect, it } from 'vitest';
import { aLoad, nowhere } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

describe('labels are known', () => {
  it('finds a package whose item is not in the catalogue, and takes it off', () => {
    const load = aLoad().withPackage('W-01', nowhere, { itemId: 'of another facility', code: 'X-1' });
    expect(findingsOf('label-known', load)).toMatchObject([
      {
        severity: 'stop',
        title: 'X-1 is of an item that is not in the catalogue',
        fix: { label: 'Take it off the load' },
      },
    ]);
  });

  it('finds a package without a code', () => {
    expect(titlesOf('label-known', aLoad().withPackage('W-01', nowhere, { code: ' ' }))).toEqual([
      'Minor set has no label code',
    ]);
  });

  it('says nothing of the others', () => {
    expect(titlesOf('label-known', aLoad().withPackage('W-01', nowhere))).toEqual([]);
  });
});
