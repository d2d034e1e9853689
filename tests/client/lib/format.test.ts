import { describe, expect, it } from 'vitest';
import {
  countOf,
  dayOf,
  formatDate,
  formatDay,
  formatDuration,
  formatLength,
  formatMass,
  formatMoment,
  formatShortDateTime,
  formatSize,
  formatTemperature,
  formatTime,
  formatTimeWithSeconds,
  formatWeekdayDate,
  listInWords,
  readNumber,
} from '../../../src/lib/format';

describe('times in the zone of the facility', () => {
  it('are 24 hours, with seconds where asked for', () => {
    expect(formatTime('2026-03-17T09:41:08Z', 'Europe/London')).toBe('09:41');
    expect(formatTimeWithSeconds('2026-03-17T09:41:08Z', 'Europe/London')).toBe('09:41:08');
    expect(formatTime('2026-03-17T00:05:00Z', 'Europe/London')).toBe('00:05');
  });

  it('follow the clock change: 29 March 2026 at 01:00 UTC in London (IANA time zone database)', () => {
    expect(formatTime('2026-03-29T00:59:00Z', 'Europe/London')).toBe('00:59');
    expect(formatTime('2026-03-29T01:00:00Z', 'Europe/London')).toBe('02:00');
  });

  it('fall on the day of the facility, not of the tablet', () => {
    expect(dayOf('2026-03-17T03:30:00Z', 'America/New_York')).toBe('2026-03-16');
    expect(formatWeekdayDate('2026-03-17T03:30:00Z', 'America/New_York')).toBe('Monday 16 March');
    expect(formatDate('2026-03-17T09:41:08Z', 'Europe/London')).toBe('17 March');
    expect(formatShortDateTime('2026-03-17T06:02:00Z', 'Europe/London')).toBe('Tue 17 Mar, 06:02');
  });

  it('carry their date only when it was another day, and their year only when it was another year', () => {
    const now = '2026-03-17T10:00:00Z';
    expect(formatMoment('2026-03-17T09:41:00Z', now, 'Europe/London')).toBe('09:41');
    expect(formatMoment('2026-03-16T21:10:00Z', now, 'Europe/London')).toBe('16 March, 21:10');
    expect(formatMoment('2025-12-30T21:10:00Z', now, 'Europe/London')).toBe('30 December 2025, 21:10');
  });

  it('leave a calendar day as it is', () => {
    expect(formatDay('2026-03-17')).toBe('17 March 2026');
  });
});

describe('durations', () => {
  it.each([
    [18, '18 s'],
    [90, '90 s'],
    [60, '1 min'],
    [240, '4 min'],
    [252, '4 min 12 s'],
    [1800, '30 min'],
    [3900, '1 h 05 min'],
  ])('%i s is %s', (seconds, words) => {
    expect(formatDuration(seconds)).toBe(words);
  });
});

describe('quantities in the units of the facility', () => {
  // Inch 25.4 mm and pound 0.45359237 kg exactly, psi 6.894757 kPa: NIST SP 811 (2008), appendix B.8.
  it('are metric', () => {
    expect(formatLength(12.4, 'metric')).toBe('12 mm');
    expect(formatSize([90, 230], 'metric')).toBe('90 × 230 mm');
    expect(formatMass(7.42, 'metric')).toBe('7.4 kg');
    expect(formatMass(0.125, 'metric')).toBe('0.13 kg');
    expect(formatTemperature(132, 'metric')).toBe('132 °C');
  });

  it('are US customary', () => {
    expect(formatLength(25.4, 'us-customary')).toBe('1 in');
    expect(formatLength(12, 'us-customary')).toBe('0.47 in');
    expect(formatSize([90, 230], 'us-customary')).toBe('3.5 × 9.1 in');
    expect(formatMass(11.3398, 'us-customary')).toBe('25 lb');
    expect(formatTemperature(132, 'us-customary')).toBe('270 °F');
    expect(formatTemperature(121.1, 'us-customary')).toBe('250 °F');
  });
});

describe('words', () => {
  it('count one and many', () => {
    expect(countOf(1, 'package')).toBe('1 package');
    expect(countOf(31, 'package')).toBe('31 packages');
    expect(countOf(0, 'pouch', 'pouches')).toBe('0 pouches');
  });

  it('list with "and" before the last', () => {
    expect(listInWords([])).toBe('');
    expect(listInWords(['A'])).toBe('A');
    expect(listInWords(['A', 'B', 'C'])).toBe('A, B and C');
  });
});

describe('figures as people write them', () => {
  it.each([
    ['12', 12],
    [' 12.5 ', 12.5],
    ['12,5', 12.5],
    ['-3', -3],
    ['.5', 0.5],
    ['12.', 12],
  ])('%j is read', (text, value) => {
    expect(readNumber(text)).toBe(value);
  });

  it.each(['', ' ', 'twelve', '1,2,3', '1.2.3', '0x10', '1e3', 'Infinity', '12 mm', '--1'])(
    '%j is no figure',
    (text) => {
      expect(readNumber(text)).toBeUndefined();
    },
  );
});
