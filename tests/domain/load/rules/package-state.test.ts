import { describe, expect, it } from 'vitest';
import { aLoad, nowhere } from '../../../support/load-builder';
import { findingsOf } from '../../../support/findings';

describe('packages are ready for the sterilizer', () => {
  it.each([
    ['packed', []],
    ['staged', []],
    ['in-load', []],
    ['processed', ['Minor set has already been through a sterilizer']],
    ['sterile', ['Minor set is already sterile']],
    ['quarantined', ['Minor set is held']],
    ['stored', ['Minor set is in storage']],
    ['on-case-cart', ['Minor set is on a case cart']],
    ['used', ['Minor set has been used']],
    ['returned', ['Minor set has come back and was not packed again']],
    ['discarded', ['Minor set was thrown away']],
  ] as const)('%s', (state, titles) => {
    const found = findingsOf('package-state', aLoad().withPackage('W-01', nowhere, { state }));
    expect(found.map((finding) => finding.title)).toEqual(titles);
    expect(found.every((finding) => finding.severity === 'stop')).toBe(true);
  });

  it('finds one that somebody holds, with the reason', () => {
    const load = aLoad().withPackage('W-01', nowhere, { heldReason: 'Torn wrap' });
    expect(findingsOf('package-state', load)[0]?.title).toBe('Minor set is held: Torn wrap');
  });
});
