import { describe, expect, it } from 'vitest';
import { expiresOn, isExpired } from '../../../src/domain/package/expiry';

describe('the last day of a package', () => {
  it('is never when expiry is event-related', () => {
    expect(expiresOn({ rule: 'event-related' }, '2026-03-03')).toBeNull();
  });

  // Counted on a paper calendar: March has 31 days, February 2028 has 29.
  it.each([
    { packedOn: '2026-03-03', days: 30, last: '2026-04-02' },
    { packedOn: '2028-02-28', days: 2, last: '2028-03-01' },
    { packedOn: '2026-12-31', days: 1, last: '2027-01-01' },
  ])('is $days days after $packedOn, $last', ({ packedOn, days, last }) => {
    expect(expiresOn({ rule: 'dated', days }, packedOn)).toBe(last);
  });

  it('does not move when the clocks change in between', () => {
    // Clocks in America/Chicago went forward on 8 March 2026.
    expect(expiresOn({ rule: 'dated', days: 7 }, '2026-03-05')).toBe('2026-03-12');
  });
});

describe('an expired package', () => {
  it('may still be used on its last day, and not on the day after', () => {
    expect(isExpired('2026-03-03', '2026-03-03')).toBe(false);
    expect(isExpired('2026-03-03', '2026-03-04')).toBe(true);
    expect(isExpired('2026-03-03', '2026-03-02')).toBe(false);
  });

  it('does not exist where expiry is event-related', () => {
    expect(isExpired(null, '2099-01-01')).toBe(false);
  });
});
