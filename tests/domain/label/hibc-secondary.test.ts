import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { readHibcSecondary } from '#domain/label/hibc-secondary';
import { oneCharacterOf } from '../../support/one-character-of';

describe('secondary data of a health industry bar code', () => {
  test('with a two-digit quantity and a month', () => {
    // From the test of an open-source reader of these codes: $$8, quantity 02, month 04 of year 23, lot 286539.
    expect(readHibcSecondary('$$8020423286539', 2026)).toEqual({
      quantity: 2,
      expires: '2023-04-30',
      lot: '286539',
      serial: null,
      made: null,
    });
  });

  test('takes an empty lot or serial number for none', () => {
    expect(readHibcSecondary('$$3260930', 2026)).toMatchObject({ expires: '2026-09-30', lot: null });
    expect(readHibcSecondary('$$+3260930', 2026)).toMatchObject({ expires: '2026-09-30', serial: null });
  });

  test.each([
    '$$81',
    '$$8',
    '$$2',
    '$$5',
    '$$42609309',
    '$$426093025LOT',
    'LOT',
    '1',
    '$LOT//',
    '$LOT/14D2026',
    '$LöT',
  ])('is refused as a whole where any part makes no sense: %s', (text) => {
    expect(readHibcSecondary(text, 2026)).toBe(null);
  });

  test('is read or refused, and never throws, whatever it is', () => {
    fc.assert(
      fc.property(fc.string({ unit: oneCharacterOf('$+/0123456789SQD14AZ. -'), maxLength: 60 }), (text) => {
        const read = readHibcSecondary(text, 2026);
        if (typeof read?.expires === 'string') expect(read.expires).toMatch(/^\d{4}-\d{2}-\d{2}$/);
      }),
    );
  });
});
