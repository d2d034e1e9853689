import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { asciiUpperCase, formatOwnCode, readOwnCode, symbolTextOf, type CodeLetter } from '#domain/label/own-code';

const letters = ['P', 'T', 'K', 'X', 'B', 'C', 'H', 'S', 'N'] as const satisfies readonly CodeLetter[];

describe('the grammar of our codes', () => {
  test('keeps every kind apart: a code with another letter in front is never a code', () => {
    fc.assert(
      fc.property(fc.constantFrom(...letters), fc.nat({ max: 99_999 }), (letter, number) => {
        const code = formatOwnCode(letter, number);
        for (const other of letters) {
          if (other !== letter) expect(readOwnCode(other + code.slice(1)).ok).toBe(false);
        }
      }),
    );
  });

  test('puts no hyphen into the symbol', () => {
    expect(symbolTextOf('P-20431784-52')).toBe('P2043178452');
  });

  test('uses no letter that moves between keyboards or looks like a digit', () => {
    for (const letter of letters) expect('AQZWMYOIL').not.toContain(letter);
  });

  test('changes nothing but a to z into capitals', () => {
    expect(asciiUpperCase('abcxyz-ıſßéÅ')).toBe('ABCXYZ-ıſßéÅ');
  });

  test('throws for no text whatever', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 80 }), (text) => {
        expect(typeof readOwnCode(text).ok).toBe('boolean');
      }),
    );
  });
});
