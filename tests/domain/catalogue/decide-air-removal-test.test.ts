import { describe, expect, it } from 'vitest';
import { decideAirRemovalTest } from '../../../src/domain/catalogue/decide-air-removal-test';

const good = {
  testedAt: '2026-03-03T11:40:00.000Z',
  testDay: '2026-03-03',
  now: '2026-03-03T12:00:00.000Z',
  result: 'passed',
  packExpiresOn: '2027-06-30',
  isTakenOutOfService: false,
} as const;

function refusalOf(changes: Partial<Parameters<typeof decideAirRemovalTest>[0]>): string | null {
  const decided = decideAirRemovalTest({ ...good, ...changes });
  return decided.ok ? null : decided.refusal.code;
}

describe('an air-removal test', () => {
  it('is taken', () => {
    expect(refusalOf({})).toBeNull();
    expect(refusalOf({ result: 'failed', isTakenOutOfService: true })).toBeNull();
  });

  it('of the future is refused, but for the two minutes a tablet’s clock may be ahead', () => {
    expect(refusalOf({ testedAt: '2026-03-03T12:02:00.000Z' })).toBeNull();
    expect(refusalOf({ testedAt: '2026-03-03T12:02:00.001Z' })).toBe('air-removal-test.in-the-future');
  });

  it('of more than a year ago is refused', () => {
    expect(refusalOf({ testedAt: '2025-03-03T11:40:00.000Z', testDay: '2025-03-03' })).toBeNull();
    expect(refusalOf({ testedAt: '2016-03-03T11:40:00.000Z', testDay: '2016-03-03' })).toBe(
      'air-removal-test.too-long-ago',
    );
  });

  it('with a pack that expired the day before is refused, on its last day it counts', () => {
    expect(refusalOf({ packExpiresOn: '2026-03-03' })).toBeNull();
    expect(refusalOf({ packExpiresOn: '2026-03-02' })).toBe('air-removal-test.pack-expired');
  });

  it('that passed takes nothing out of service', () => {
    expect(refusalOf({ isTakenOutOfService: true })).toBe('air-removal-test.passed-stays-in-service');
  });
});
