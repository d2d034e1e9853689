import { defaultPolicy } from '#domain/load/policy';
import { changesBetween, withChanges, withStated } from '#domain/policy/setting-change';
import type { PolicySettings } from '#domain/policy/settings';
import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';

const before: PolicySettings = { policy: defaultPolicy, facingBySterilizer: { s1: 'alternating', s2: 'not-set' } };

const after: PolicySettings = {
  policy: { ...defaultPolicy, packageClearanceMm: mm(40), challengeDeviceMissing: 'accept', facing: 'not-set' },
  facingBySterilizer: { s2: 'one-way', s3: 'alternating' },
};

describe('what differs between two versions', () => {
  it('is each quantity, severity and choice in the order of the settings, then each sterilizer', () => {
    expect(changesBetween(before, after)).toEqual([
      { of: 'parameter', id: 'facing', before: 'one-way', after: 'not-set' },
      { of: 'parameter', id: 'challengeDeviceMissing', before: 'stop', after: 'accept' },
      { of: 'parameter', id: 'packageClearanceMm', before: 25, after: 40 },
      { of: 'facing-at-sterilizer', sterilizerId: 's1', before: 'alternating', after: null },
      { of: 'facing-at-sterilizer', sterilizerId: 's2', before: 'not-set', after: 'one-way' },
      { of: 'facing-at-sterilizer', sterilizerId: 's3', before: null, after: 'alternating' },
    ]);
  });

  it('is nothing between a version and itself', () => {
    expect(changesBetween(after, after)).toEqual([]);
  });

  it('leads from the one to the other', () => {
    expect(withChanges(before, changesBetween(before, after))).toEqual(after);
    expect(withChanges(after, changesBetween(after, before))).toEqual(before);
  });

  it('of something nobody knows any more changes nothing', () => {
    expect(withChanges(before, [{ of: 'parameter', id: 'fumesPerFortnight', before: 1, after: 2 }])).toEqual(before);
  });
});

describe('what a person states', () => {
  it('replaces what it names and leaves the rest', () => {
    const stated = withStated(before, { changes: { packageClearanceMm: mm(40) }, facingBySterilizer: undefined });
    expect(stated).toEqual({ ...before, policy: { ...defaultPolicy, packageClearanceMm: mm(40) } });
  });

  it('of the sterilizers is all of them', () => {
    const stated = withStated(before, { changes: {}, facingBySterilizer: { s2: 'not-set' } });
    expect(stated.facingBySterilizer).toEqual({ s2: 'not-set' });
  });
});
