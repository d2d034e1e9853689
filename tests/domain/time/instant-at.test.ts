import fc from 'fast-check';
import { expect, test } from 'vitest';
import { instantAt } from '../../../src/domain/time/instant-at';
import { wallClock } from '../../../src/domain/time/wall-clock';

const chicago = 'America/Chicago';

test('is the instant at which the wall clock shows it', () => {
  expect(instantAt({ day: '2026-03-03', time: '07:30' }, chicago)).toBe('2026-03-03T13:30:00.000Z');
  expect(instantAt({ day: '2026-07-03', time: '07:30' }, chicago)).toBe('2026-07-03T12:30:00.000Z');
  expect(instantAt({ day: '2026-03-03', time: '00:00' }, 'Asia/Kathmandu')).toBe('2026-03-02T18:15:00.000Z');
});

test('takes the first of two where the clock is put back, and goes past the gap where it is put forward', () => {
  // United States: back at 02:00 on 1 November 2026, forward at 02:00 on 8 March 2026 (time zone database).
  expect(instantAt({ day: '2026-11-01', time: '01:30' }, chicago)).toBe('2026-11-01T06:30:00.000Z');
  expect(instantAt({ day: '2026-03-08', time: '02:30' }, chicago)).toBe('2026-03-08T08:30:00.000Z');
  expect(instantAt({ day: '2026-03-08', time: '01:59' }, chicago)).toBe('2026-03-08T07:59:00.000Z');
  expect(instantAt({ day: '2026-03-08', time: '03:00' }, chicago)).toBe('2026-03-08T08:00:00.000Z');
});

test('undoes what the wall clock shows, at every instant outside of an hour shown twice', () => {
  const zone = fc.constantFrom(
    chicago,
    'Europe/Vienna',
    'Asia/Kathmandu',
    'Australia/Lord_Howe',
    'Pacific/Apia',
    'UTC',
  );
  const second = fc.integer({ min: Date.UTC(2015, 0) / 1000, max: Date.UTC(2040, 0) / 1000 });
  fc.assert(
    fc.property(zone, second, (timeZone, atS) => {
      const shown = wallClock(new Date(atS * 1000).toISOString(), timeZone);
      const back = instantAt(shown, timeZone);
      expect(wallClock(back, timeZone)).toEqual(shown);
      expect(Date.parse(back)).toBeLessThanOrEqual(atS * 1000);
    }),
  );
});

test('refuses what is no day or time', () => {
  for (const wall of [
    { day: '2026-13-01', time: '07:30' },
    { day: '2026-03-03', time: '25:00' },
    { day: '', time: '' },
  ]) {
    expect(() => instantAt(wall, chicago)).toThrow(RangeError);
  }
});
