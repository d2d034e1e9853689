import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { gs1CheckDigit, hasGs1CheckDigit } from '#domain/label/gs1-check-digit';
import vectors from '../../support/vectors/codes.json';
import { oneCharacterOf } from '../../support/one-character-of';

describe('GS1 check digits', () => {
  test.each(vectors.gs1CheckDigit)('$input.digits: $source', ({ input, expected }) => {
    expect(gs1CheckDigit(input.digits)).toBe(expected.check);
    expect(hasGs1CheckDigit(input.digits + expected.check)).toBe(true);
  });

  test.each(vectors.gs1WrongCheckDigit)('refuses $input.full: $source', ({ input }) => {
    expect(hasGs1CheckDigit(input.full)).toBe(false);
  });

  test('catch every single wrong digit', () => {
    fc.assert(
      fc.property(fc.string({ unit: oneCharacterOf('0123456789'), minLength: 7, maxLength: 17 }), (digits) => {
        const full = digits + gs1CheckDigit(digits);
        for (let place = 0; place < full.length; place += 1) {
          const other = String((Number(full.charAt(place)) + 3) % 10);
          expect(hasGs1CheckDigit(full.slice(0, place) + other + full.slice(place + 1))).toBe(false);
        }
      }),
    );
  });

  test('are not found where there is anything but digits', () => {
    for (const text of ['', '0', '5901234123457 ', '590123412345٧', '59O1234123457']) {
      expect(hasGs1CheckDigit(text)).toBe(false);
    }
  });
});
