import { calendarDay } from '#domain/time/calendar-day';
import { productionDay } from '#domain/time/production-day';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

const chicago = 'America/Chicago';

describe('productionDay', () => {
  it('keeps a load after midnight in the production day that began the morning before', () => {
    // 01:20 on Sunday 8 March 2026 in Chicago.
    expect(productionDay('2026-03-08T07:20:00Z', chicago, '06:30')).toBe('2026-03-07');
    expect(productionDay('2026-03-08T11:29:59Z', chicago, '06:30')).toBe('2026-03-07');
    expect(productionDay('2026-03-08T11:30:00Z', chicago, '06:30')).toBe('2026-03-08');
  });

  it('is the calendar day when it starts at midnight', () => {
    fc.assert(
      fc.property(
        fc.date({ min: new Date('2020-01-01T00:00:00Z'), max: new Date('2040-01-01T00:00:00Z'), noInvalidDate: true }),
        fc.constantFrom(chicago, 'Europe/Berlin', 'Asia/Kathmandu', 'Pacific/Auckland', 'UTC'),
        (date, zone) => {
          expect(productionDay(date.toISOString(), zone, '00:00')).toBe(calendarDay(date.toISOString(), zone));
        },
      ),
    );
  });

  it('starts at the first of two 01:30s when the clocks are set back', () => {
    // 1 November 2026: 01:30 comes at 06:30Z and, one hour later, at 07:30Z.
    expect(productionDay('2026-11-01T06:29:59Z', chicago, '01:30')).toBe('2026-10-31');
    expect(productionDay('2026-11-01T06:30:00Z', chicago, '01:30')).toBe('2026-11-01');
    // 01:00 for the second time: the new day has begun and does not end again.
    expect(productionDay('2026-11-01T07:00:00Z', chicago, '01:30')).toBe('2026-11-01');
  });

  it('starts after the gap when the clocks skip its start', () => {
    // 8 March 2026: 02:00 to 03:00 does not exist.
    expect(productionDay('2026-03-08T07:59:59Z', chicago, '02:30')).toBe('2026-03-07');
    expect(productionDay('2026-03-08T08:00:00Z', chicago, '02:30')).toBe('2026-03-08');
  });

  it('never goes back as time goes on', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(
          ['America/Chicago', '2026-11-01T00:00:00Z'],
          ['America/Chicago', '2026-03-08T00:00:00Z'],
          ['Europe/Berlin', '2026-10-24T20:00:00Z'],
          ['Australia/Lord_Howe', '2026-04-04T08:00:00Z'],
        ),
        fc.integer({ min: 0, max: 23 }),
        fc.integer({ min: 0, max: 59 }),
        fc.integer({ min: 0, max: 36 * 60 }),
        fc.integer({ min: 1, max: 12 * 60 }),
        ([zone = '', from = ''], hour, minute, later, step) => {
          const startsAt = `${String(hour).padStart(2, '0')}:${String(minute).padStart(2, '0')}`;
          const at = (minutes: number) => new Date(Date.parse(from) + minutes * 60_000).toISOString();
          const first = productionDay(at(later), zone, startsAt);
          const second = productionDay(at(later + step), zone, startsAt);
          expect(second >= first).toBe(true);
        },
      ),
      { numRuns: 500 },
    );
  });
});
