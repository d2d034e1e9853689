import { describe, expect, test } from 'vitest';
import {
  dayFromMmddyy,
  dayFromMmyy,
  dayFromOrdinal,
  dayFromParts,
  dayFromYyjjj,
  dayFromYymmdd,
  dayFromYyyymmdd,
  fullYear,
} from '#domain/label/label-date';
import vectors from '../../support/vectors/codes.json';

describe('dates on labels', () => {
  test.each(vectors.gs1Date.filter((row) => row.expected.valid !== undefined))(
    '$input.yymmdd is a day $expected.valid: $source',
    ({ input, expected }) => {
      expect(dayFromYymmdd(input.yymmdd, 2026, input.ddZeroAllowed ?? false) !== null).toBe(expected.valid);
    },
  );

  test.each(vectors.gs1Date.filter((row) => row.expected.date !== undefined))(
    '$input.yymmdd is $expected.date: $source',
    ({ input, expected }) => {
      expect(dayFromYymmdd(input.yymmdd, 2026, true)).toBe(expected.date);
    },
  );

  test.each(vectors.gs1Century)(
    'year $input.yy in $input.currentYear is $expected.year: $source',
    ({ input, expected }) => {
      expect(fullYear(Number(input.yy), input.currentYear)).toBe(expected.year);
    },
  );

  test.each(vectors.ordinalDate)('$input.ordinal is $expected.date: $source', ({ input, expected }) => {
    const [year, ordinal] = input.ordinal.split('-').map(Number);
    expect(dayFromOrdinal(year ?? 0, ordinal ?? 0)).toBe(expected.date);
    expect(dayFromYyjjj(input.ordinal.replace('-', '').slice(2), year ?? 0)).toBe(expected.date);
  });

  test('end in the last day their year has', () => {
    expect(dayFromOrdinal(2023, 366)).toBe(null);
    expect(dayFromOrdinal(2024, 0)).toBe(null);
    expect(dayFromYyjjj('23366', 2026)).toBe(null);
    expect(dayFromYyjjj('23000', 2026)).toBe(null);
  });

  test('know the leap years of the Gregorian calendar', () => {
    expect(dayFromParts(1900, 2, 29)).toBe(null);
    expect(dayFromParts(2000, 2, 29)).toBe('2000-02-29');
    expect(dayFromParts(2100, 2, 29)).toBe(null);
  });

  test('with a month only run to its end', () => {
    expect(dayFromMmyy('0228', 2026)).toBe('2028-02-29');
    expect(dayFromMmyy('1300', 2026)).toBe(null);
    expect(dayFromMmyy('0000', 2026)).toBe(null);
  });

  test('are nothing where there are other characters than digits', () => {
    for (const text of ['', '26031', '2603170', '26O317', '２６0317'])
      expect(dayFromYymmdd(text, 2026, true)).toBe(null);
    expect(dayFromMmddyy('031726', 2026)).toBe('2026-03-17');
    expect(dayFromMmddyy('173126', 2026)).toBe(null);
    expect(dayFromYyyymmdd('20260317')).toBe('2026-03-17');
    expect(dayFromYyyymmdd('20261317')).toBe(null);
  });
});
