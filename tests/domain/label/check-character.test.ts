import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { checkCharactersOf, checkedAlphabet, hasItsCheckCharacters } from '#domain/label/check-character';
import { oneCharacterOf } from '../../support/one-character-of';

const digits = '0123456789';
/** Letter, eight digits, two check digits; the load sticker's 24 and more characters are the longest. */
const longestCode = 36;

/** What a change of the character at a place from the right adds to the sum, modulo 97: an independent calculation. */
function weight(place: number): number {
  let power = 1;
  for (let step = 0; step < place; step += 1) power = (power * 10) % 97;
  return power;
}

const body = fc.string({ unit: oneCharacterOf(checkedAlphabet), minLength: 1, maxLength: longestCode - 2 });

describe('check characters, ISO/IEC 7064 MOD 97-10', () => {
  // The standard's own example in 8.4, "Simplified procedure for ISO/IEC 7064, MOD 97-10", as an open-source
  // implementation's test names it.
  test('gives 44 for 794', () => {
    expect(checkCharactersOf('794')).toBe('44');
    expect(hasItsCheckCharacters('79444')).toBe(true);
  });

  // A specimen bank account number, its letters written as two digits: asserted by tests of two open-source implementations.
  test('agrees with a published string of digits', () => {
    expect(checkCharactersOf('32142829123456987654321611')).toBe('82');
  });

  test('takes a letter in front for its two digits, as bank account numbers and legal entity identifiers do', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 10, max: 35 }),
        fc.string({ unit: oneCharacterOf(digits), minLength: 1, maxLength: 14 }),
        (value, rest) => {
          const letter = checkedAlphabet.charAt(value);
          const asNumber = BigInt(`${value}${rest}00`);
          expect(checkCharactersOf(letter + rest)).toBe(String(98n - (asNumber % 97n)).padStart(2, '0'));
        },
      ),
    );
  });

  test('refuses to make check characters for anything but digits, capital letters and hyphens', () => {
    for (const text of ['p1', 'P 1', 'Ä1', 'P1\u0000', 'P*']) expect(() => checkCharactersOf(text)).toThrow(RangeError);
    for (const text of ['', '1', '44', 'p144', '7 9444']) expect(hasItsCheckCharacters(text)).toBe(false);
  });

  /*
   * The proof, exhaustive over every place, every pair of values and every pair of neighbours. The sum is linear, so what a
   * change does to it depends on the place and on the two values only, not on the rest of the code: that is checked first.
   */
  test('changes its remainder by the difference of the values times the weight of the place, whatever else is written', () => {
    fc.assert(
      fc.property(body, fc.nat(), fc.nat({ max: checkedAlphabet.length - 1 }), (text, at, value) => {
        const place = at % text.length;
        const before = checkedAlphabet.indexOf(text.charAt(place));
        const changed = text.slice(0, place) + checkedAlphabet.charAt(value) + text.slice(place + 1);
        const expected = (((value - before) * weight(text.length - place + 1)) % 97) + 97;
        const rest = (one: string) => 98 - Number(checkCharactersOf(one));
        expect((((rest(changed) - rest(text)) % 97) + 97) % 97).toBe(expected % 97);
      }),
    );
  });

  test('no wrong character leaves the remainder as it was, at any place', () => {
    let checked = 0;
    for (let place = 0; place < longestCode; place += 1) {
      for (let difference = 1; difference < checkedAlphabet.length; difference += 1) {
        expect((difference * weight(place)) % 97).not.toBe(0);
        checked += 1;
      }
    }
    expect(checked).toBe(longestCode * (checkedAlphabet.length - 1));
  });

  test('no swap of two different characters leaves the remainder as it was, be they neighbours or further apart', () => {
    for (let place = 0; place < longestCode; place += 1) {
      for (let other = place + 1; other < longestCode; other += 1) {
        for (let difference = 1; difference < checkedAlphabet.length; difference += 1) {
          expect((difference * (weight(other) - weight(place) + 97)) % 97).not.toBe(0);
        }
      }
    }
  });

  test('refuses every single wrong character and every swap of neighbours in random codes of every length', () => {
    fc.assert(
      fc.property(body, (text) => {
        const code = text + checkCharactersOf(text);
        expect(hasItsCheckCharacters(code)).toBe(true);
        for (let place = 0; place < code.length; place += 1) {
          for (const character of checkedAlphabet) {
            if (character === code.charAt(place)) continue;
            const wrong = code.slice(0, place) + character + code.slice(place + 1);
            if (hasItsCheckCharacters(wrong)) throw new Error(`${wrong} passes for ${code}`);
          }
          const [one, two] = [code.charAt(place), code.charAt(place + 1)];
          if (two === '' || one === two) continue;
          const swapped = code.slice(0, place) + two + one + code.slice(place + 2);
          if (hasItsCheckCharacters(swapped)) throw new Error(`${swapped} passes for ${code}`);
        }
      }),
      { numRuns: 60 },
    );
  });
});

/*
 * Why not one of the others: the systems of the standard written down once more, only to be measured. Their recursions are
 * from memory; the strings they are checked against are asserted by tests of open-source implementations.
 */
describe('the systems that were not taken', () => {
  /** MOD 37,36: the state after each character is a number from 1 to 36, doubled modulo 37. */
  function hybridStep(state: number, value: number): number {
    const sum = (state + value) % 36;
    return ((sum === 0 ? 36 : sum) * 2) % 37;
  }

  test('MOD 37,36 lets swaps of neighbours pass', () => {
    const missed: string[] = [];
    for (let state = 1; state <= 36; state += 1) {
      for (let one = 0; one < 36; one += 1) {
        for (let two = one + 1; two < 36; two += 1) {
          const straight = hybridStep(hybridStep(state, one), two);
          const swapped = hybridStep(hybridStep(state, two), one);
          if (straight === swapped) missed.push(`${checkedAlphabet.charAt(one)}${checkedAlphabet.charAt(two)}`);
        }
      }
    }
    expect(missed.length).toBeGreaterThan(0);
  });

  /** MOD 37-2: 36 is written "*". */
  function check37(text: string): number {
    let sum = 0;
    for (const character of text) sum = ((sum + checkedAlphabet.indexOf(character)) * 2) % 37;
    return (37 + 1 - sum) % 37;
  }

  test('MOD 37-2 needs a 37th check character for one number in 37, and letters that look like digits for two more', () => {
    // '1234ABCD' gives V: test of an open-source implementation.
    expect(checkedAlphabet.charAt(check37('1234ABCD'))).toBe('V');
    const checks = Array.from({ length: 37_000 }, (_, number) => check37(`P${String(number).padStart(8, '0')}`));
    const share = (value: number) => checks.filter((check) => check === value).length / checks.length;
    for (const value of [36, checkedAlphabet.indexOf('O'), checkedAlphabet.indexOf('I')]) {
      expect(share(value)).toBeCloseTo(1 / 37, 2);
    }
  });
});
