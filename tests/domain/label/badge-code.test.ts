import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { formatBadgeCode, greatestBadgeNumber, parseBadgeCode } from '#domain/label/badge-code';

describe('badge codes', () => {
  test('have N, eight digits and two check digits, and no name', () => {
    // 23 (N) 48120937 00 modulo 97 is 2, 98 - 2 is 96: worked out apart from the program.
    expect(formatBadgeCode(48_120_937)).toBe('N-48120937-96');
  });

  test('are read back as what they were made from, however typed', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: greatestBadgeNumber }), (number) => {
        const code = formatBadgeCode(number);
        for (const text of [code, code.toLowerCase(), code.replaceAll('-', '')]) {
          expect(parseBadgeCode(text)).toEqual({ ok: true, value: { code, number } });
        }
      }),
    );
  });

  test.each([
    ['N-48120937-69', 'check-character'],
    ['N-4812093', 'truncated'],
    ['N-48129037-96', 'check-character'],
    ['H-00012-31', 'other-kind'],
    ['Nadia', 'foreign'],
  ])('are not found in %j', (text, reason) => {
    expect(parseBadgeCode(text)).toMatchObject({ ok: false, refusal: { code: reason } });
  });

  test('are not made for a number that does not fit', () => {
    expect(() => formatBadgeCode(greatestBadgeNumber + 1)).toThrow(RangeError);
  });
});
