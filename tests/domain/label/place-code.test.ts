import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { formatPlaceCode, greatestPlaceNumber, parsePlaceCode } from '#domain/label/place-code';
import { formatPackageCode } from '#domain/label/package-code';

describe('place codes', () => {
  test('have H for a holder or S for a shelf, five digits and two check digits', () => {
    // 17 (H) 00012 00 modulo 97 is 67, 98 - 67 is 31; 28 (S) 00007 00 modulo 97 is 15: worked out apart from the program.
    expect(formatPlaceCode('holder', 12)).toBe('H-00012-31');
    expect(formatPlaceCode('shelf', 7)).toBe('S-00007-83');
  });

  test('are read back as what they were made from, however typed', () => {
    fc.assert(
      fc.property(
        fc.constantFrom('holder', 'shelf'),
        fc.integer({ min: 0, max: greatestPlaceNumber }),
        (place, number) => {
          const code = formatPlaceCode(place, number);
          for (const text of [code, code.toLowerCase(), code.replaceAll('-', ''), code.replaceAll('-', ' ')]) {
            expect(parsePlaceCode(text)).toEqual({ ok: true, value: { code, place, number } });
          }
        },
      ),
    );
  });

  test('are not made for a number that does not fit', () => {
    for (const wrong of [-1, 1.5, greatestPlaceNumber + 1])
      expect(() => formatPlaceCode('shelf', wrong)).toThrow(RangeError);
  });

  test.each([
    ['H-00012-13', 'check-character'],
    ['S-00012-31', 'check-character'],
    ['H-0001', 'truncated'],
    ['H-000121-31', 'foreign'],
    ['Holder 12', 'foreign'],
    [formatPackageCode('pouch', 20431784), 'other-kind'],
  ])('are not found in %j', (text, reason) => {
    expect(parsePlaceCode(text)).toMatchObject({ ok: false, refusal: { code: reason } });
  });
});
