import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  checkLoadNumberPattern,
  defaultLoadNumberPattern,
  formatLoadNumber,
  greatestLoadNumberLength,
} from '#domain/label/load-number';
import { productionDay } from '#domain/time/production-day';
import { oneCharacterOf } from '../../support/one-character-of';

const usable = [
  defaultLoadNumberPattern,
  '{sterilizer}-{yy}{mm}{dd}-{nn}',
  '{yyyy}{ddd}-{nnn}-{sterilizer}',
  '{nn}-{sterilizer}-{dd}{mm}{yy}',
];

const load = fc.record({
  sterilizer: fc.string({ unit: oneCharacterOf('0123456789ABXYZ'), minLength: 1, maxLength: 6 }),
  day: fc
    .date({ min: new Date('2000-01-01T00:00:00Z'), max: new Date('2099-12-31T00:00:00Z'), noInvalidDate: true })
    .map((date) => date.toISOString().slice(0, 10)),
  count: fc.integer({ min: 1, max: 9999 }),
});

describe('load numbers', () => {
  test('have sterilizer, year and day of the year, and the count of the day', () => {
    // 17 March is day 76 of a common year: 31 + 28 + 17.
    expect(formatLoadNumber({ sterilizer: '2', day: '2026-03-17', count: 3 })).toBe('2-26076-03');
    expect(formatLoadNumber({ sterilizer: 'ST4', day: '2024-12-31', count: 100 })).toBe('ST4-24366-100');
  });

  test('follow the pattern a facility chose', () => {
    const third = { sterilizer: '2', day: '2026-03-17', count: 3 };
    expect(usable.map((pattern) => formatLoadNumber(third, pattern))).toEqual([
      '2-26076-03',
      '2-260317-03',
      '2026076-003-2',
      '03-2-170326',
    ]);
  });

  test('fit on a label in every pattern that is allowed', () => {
    fc.assert(
      fc.property(load, fc.constantFrom(...usable), (one, pattern) => {
        expect(checkLoadNumberPattern(pattern).ok).toBe(true);
        expect(formatLoadNumber(one, pattern).length).toBeLessThanOrEqual(greatestLoadNumberLength);
      }),
    );
  });

  test('differ where sterilizer, day or count differ', () => {
    fc.assert(
      fc.property(load, load, fc.constantFrom(...usable), (one, other, pattern) => {
        fc.pre(JSON.stringify(one) !== JSON.stringify(other));
        expect(formatLoadNumber(one, pattern)).not.toBe(formatLoadNumber(other, pattern));
      }),
    );
  });

  test('are not made of a sterilizer, day or count that cannot be in one', () => {
    const good = { sterilizer: '2', day: '2026-03-17', count: 3 };
    for (const wrong of [
      { ...good, sterilizer: 'ST-1' },
      { ...good, sterilizer: '' },
      { ...good, day: '2026-02-30' },
      { ...good, day: '17.3.2026' },
      { ...good, count: 0 },
      { ...good, count: 1.5 },
      { ...good, count: 10_000 },
    ]) {
      expect(() => formatLoadNumber(wrong)).toThrow(RangeError);
    }
  });

  test.each([
    '{yy}{ddd}-{nn}',
    '{sterilizer}-{yy}{ddd}',
    '{sterilizer}-{ddd}-{nn}',
    '{sterilizer}-{yy}{mm}-{nn}',
    '{sterilizer}-{yy}{ddd}{dd}{mm}-{nn}',
    '{sterilizer}-{sterilizer}-{yy}{ddd}-{nn}',
    '{sterilizer}{yy}{ddd}-{nn}',
    '{sterilizer}-{yy}{ddd}{nn}',
    '{sterilizer}/{yy}{ddd}/{nn}',
    '{sterilizer}--{yy}{ddd}-{nn}',
    '{sterilizer}-{yy}{ddd}-{nn}-',
    '{sterilizer}-{yy}{ddd}-{nn}-{shift}',
    '{sterilizer}-{yy}{ddd}-{nn',
    '{sterilizer}-{yyyy}{mm}{dd}-{nnn}-LONG',
    `{sterilizer}-{yy}{ddd}-{nn}${'X'.repeat(10_000)}`,
    '',
  ])('%s is no pattern, and a sentence says why', (pattern) => {
    const checked = checkLoadNumberPattern(pattern);
    expect(checked.ok).toBe(false);
    expect(checked.ok ? '' : checked.refusal.sentence).toMatch(/^[A-Z{].+\.$/);
  });

  test('go by the production day where a facility counts from the morning shift', () => {
    const startedAt = '2026-03-17T02:30:00Z';
    const numberWith = (startsAt: string) =>
      formatLoadNumber({ sterilizer: '2', day: productionDay(startedAt, 'Europe/Berlin', startsAt), count: 1 });
    expect(numberWith('00:00')).toBe('2-26076-01');
    expect(numberWith('06:00')).toBe('2-26075-01');
  });
});
