import { addDays, calendarDay, ordinalDay } from '#domain/time/calendar-day';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

describe('calendarDay', () => {
  it('turns over at local midnight, not at midnight UTC', () => {
    expect(calendarDay('2026-03-10T04:59:59Z', 'America/Chicago')).toBe('2026-03-09');
    expect(calendarDay('2026-03-10T05:00:00Z', 'America/Chicago')).toBe('2026-03-10');
    expect(calendarDay('2026-03-10T05:00:00Z', 'Pacific/Auckland')).toBe('2026-03-10');
    expect(calendarDay('2026-03-10T11:00:00Z', 'Pacific/Auckland')).toBe('2026-03-11');
  });

  it('gives the clock-change day 23 hours in spring and 25 in autumn', () => {
    const hoursOf = (day: string, from: string) =>
      Array.from({ length: 60 }, (_, hour) => new Date(Date.parse(from) + hour * 3_600_000).toISOString()).filter(
        (instant) => calendarDay(instant, 'America/Chicago') === day,
      ).length;
    expect(hoursOf('2026-03-08', '2026-03-07T00:00:00Z')).toBe(23);
    expect(hoursOf('2026-11-01', '2026-10-31T00:00:00Z')).toBe(25);
    expect(hoursOf('2026-03-10', '2026-03-09T00:00:00Z')).toBe(24);
  });
});

describe('ordinalDay', () => {
  it('agrees with the published ordinal dates', () => {
    // ISO 8601:2000, 5.2.2: 12 April 1985 is 1985-102; 2 August 1953 is 1953-214; 7 February 2021 is 2021-038.
    expect(ordinalDay('1985-04-12')).toBe(102);
    expect(ordinalDay('1953-08-02')).toBe(214);
    expect(ordinalDay('2021-02-07')).toBe(38);
  });

  it('gives 17 March 2026 the 76 of load numbers such as 2-26076-03', () => {
    expect(ordinalDay('2026-03-17')).toBe(76);
  });

  it('counts 366 days in a leap year and 365 in a century year that is none', () => {
    expect(ordinalDay('2024-12-31')).toBe(366);
    expect(ordinalDay('2025-12-31')).toBe(365);
    expect(ordinalDay('2100-12-31')).toBe(365);
    expect(ordinalDay('2000-12-31')).toBe(366);
  });

  it('throws for a day that no calendar has', () => {
    for (const day of ['2026-02-30', '2026-13-01', '17 March 2026', '']) {
      expect(() => ordinalDay(day), day).toThrow(RangeError);
    }
  });
});

describe('addDays', () => {
  it('crosses months, years and leap days', () => {
    expect(addDays('2026-03-01', -1)).toBe('2026-02-28');
    expect(addDays('2024-02-28', 1)).toBe('2024-02-29');
    expect(addDays('2025-12-31', 1)).toBe('2026-01-01');
  });

  it('comes back to the same day, whichever way it went', () => {
    fc.assert(
      fc.property(fc.integer({ min: -20_000, max: 20_000 }), fc.integer({ min: -20_000, max: 20_000 }), (a, b) => {
        const day = addDays('2026-03-17', a);
        expect(addDays(addDays(day, b), -b)).toBe(day);
      }),
    );
  });
});
