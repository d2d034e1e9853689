import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  firstPackageNumber,
  formatPackageCode,
  greatestPackageNumber,
  parsePackageCode,
} from '#domain/label/package-code';

const itemKinds = ['pouch', 'wrapped-tray', 'rigid-container', 'textile-pack', 'basin', 'challenge-device'] as const;
const itemKind = fc.constantFrom(...itemKinds);
const number = fc.integer({ min: 0, max: greatestPackageNumber });

function refusalOf(text: string): string | null {
  const parsed = parsePackageCode(text);
  return parsed.ok ? null : parsed.refusal.code;
}

describe('package codes', () => {
  test('have a letter for the kind, eight digits and two check digits', () => {
    // 25 (P) 20431784 00 modulo 97 is 46, 98 - 46 is 52: worked out apart from the program.
    expect(formatPackageCode('pouch', 20431784)).toBe('P-20431784-52');
    expect(itemKinds.map((kind) => formatPackageCode(kind, firstPackageNumber).slice(0, 10))).toEqual([
      'P-10000001',
      'T-10000001',
      'K-10000001',
      'X-10000001',
      'B-10000001',
      'C-10000001',
    ]);
  });

  test('have room for ten million packages and more without a code beginning with zero', () => {
    expect(greatestPackageNumber - firstPackageNumber).toBeGreaterThan(10_000_000);
    expect(formatPackageCode('basin', greatestPackageNumber)).toMatch(/^B-99999999-\d\d$/);
    expect(formatPackageCode('basin', 7)).toMatch(/^B-00000007-\d\d$/);
  });

  test('are not made for a number that is not whole or does not fit', () => {
    for (const wrong of [-1, 0.5, greatestPackageNumber + 1, Number.NaN, Number.POSITIVE_INFINITY]) {
      expect(() => formatPackageCode('pouch', wrong)).toThrow(RangeError);
    }
  });

  test('are read back as what they were made from', () => {
    fc.assert(
      fc.property(itemKind, number, (kind, value) => {
        const code = formatPackageCode(kind, value);
        expect(parsePackageCode(code)).toEqual({ ok: true, value: { code, itemKind: kind, number: value } });
      }),
    );
  });

  test.each([
    'P-20431784-52',
    'P2043178452',
    'p2043178452',
    '  P-20431784-52\t',
    'P 2043 1784 52',
    'P-20431784--52',
    'p-2043l784-52',
    'P-2043I784-52',
  ])('are read as typed: %j', (text) => {
    expect(parsePackageCode(text)).toMatchObject({ ok: true, value: { code: 'P-20431784-52' } });
  });

  test('take a typed O for a zero and a typed I or L for a one', () => {
    const code = formatPackageCode('wrapped-tray', 10_010_101);
    const typed = code.slice(0, 2) + code.slice(2).replaceAll('0', 'o').replaceAll('1', 'l');
    expect(parsePackageCode(typed)).toMatchObject({ ok: true, value: { code } });
    expect(parsePackageCode(typed.replaceAll('l', 'I'))).toMatchObject({ ok: true, value: { code } });
  });

  test('are refused when any part of them is missing, at whichever end', () => {
    fc.assert(
      fc.property(itemKind, number, (kind, value) => {
        const symbol = formatPackageCode(kind, value).replaceAll('-', '');
        for (let length = 0; length < symbol.length; length += 1) {
          expect(parsePackageCode(symbol.slice(0, length)).ok).toBe(false);
          expect(parsePackageCode(symbol.slice(symbol.length - length)).ok).toBe(false);
        }
        expect(refusalOf(symbol.slice(0, -1))).toBe('truncated');
      }),
      { numRuns: 50 },
    );
  });

  test('are refused when one character is wrong or two neighbours are swapped, letter and check digits included', () => {
    fc.assert(
      fc.property(itemKind, number, (kind, value) => {
        const symbol = formatPackageCode(kind, value).replaceAll('-', '');
        for (let place = 0; place < symbol.length; place += 1) {
          for (const character of '0123456789PTKXBCHSN') {
            if (character === symbol.charAt(place)) continue;
            const wrong = symbol.slice(0, place) + character + symbol.slice(place + 1);
            expect(parsePackageCode(wrong).ok).toBe(false);
          }
          const [one, two] = [symbol.charAt(place), symbol.charAt(place + 1)];
          if (two === '' || one === two) continue;
          expect(parsePackageCode(symbol.slice(0, place) + two + one + symbol.slice(place + 2)).ok).toBe(false);
        }
      }),
      { numRuns: 50 },
    );
  });

  test.each([
    ['', 'foreign'],
    ['P', 'foreign'],
    ['P-01', 'foreign'],
    ['Q-20431784-52', 'foreign'],
    ['P-20431784-521', 'foreign'],
    ['P-2043178٤-52', 'foreign'],
    ['ſ-20431784-52', 'foreign'],
    ['P-20431784-53', 'check-character'],
    ['P-20431748-52', 'check-character'],
    ['P-204317', 'truncated'],
    ['H-00012-31', 'other-kind'],
    ['N-48120937-96', 'other-kind'],
    ['P'.repeat(10_000), 'foreign'],
  ])('are not found in %j', (text, reason) => {
    expect(refusalOf(text)).toBe(reason);
  });
});
