import { describe, expect, it } from 'vitest';
import { aLoad, nowhere } from '../../../support/load-builder';
import { findingsOf, titlesOf } from '../../../support/findings';

const none = { hasExternalIndicator: false, hasInternalIndicator: false };

describe('external CI on each package', () => {
  it('finds a set without one', () => {
    expect(
      findingsOf('external-indicator', aLoad().withPackage('W-01', nowhere, { hasExternalIndicator: false })),
    ).toMatchObject([{ severity: 'stop', title: 'Minor set has no external CI' }]);
  });

  it('lets a pouch go without, whose internal CI is seen through the film', () => {
    expect(
      titlesOf('external-indicator', aLoad().withPackage('P-01', nowhere, { hasExternalIndicator: false })),
    ).toEqual([]);
    expect(titlesOf('external-indicator', aLoad().withPackage('P-01', nowhere, none))).toHaveLength(1);
  });

  it('says nothing where it is there, nor of a challenge device', () => {
    const load = aLoad().withPackage('W-01', nowhere).withPackage('PCD', nowhere, none);
    expect(titlesOf('external-indicator', load)).toEqual([]);
  });
});
