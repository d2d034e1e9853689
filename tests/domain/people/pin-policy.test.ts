import fc from 'fast-check';
import { expect, test } from 'vitest';
import { judgePin, type PinSurroundings } from '../../../src/domain/people/pin-policy';

const surroundings: PinSurroundings = {
  isCommon: (text) => text === '159753',
  numbers: ['T1042', 'N-48120937-25'],
};

function refusalOf(pin: string): string | null {
  const judged = judgePin(pin, surroundings);
  return judged.ok ? null : judged.refusal.code;
}

test('takes six to twelve digits that nobody tries first', () => {
  for (const pin of ['730418', '604193', '0385271', '928471063518']) expect(refusalOf(pin), pin).toBeNull();
});

test('refuses fewer than six digits, more than twelve, and anything that is no digit', () => {
  expect(refusalOf('73041')).toBe('too-short');
  expect(refusalOf('')).toBe('too-short');
  expect(refusalOf('9284710635182')).toBe('too-long');
  expect(refusalOf('73041a')).toBe('not-digits');
  expect(refusalOf('730 418')).toBe('not-digits');
  expect(refusalOf('٧٣٠٤١٨')).toBe('not-digits');
});

test('refuses runs up and down, repetitions, mirrors, doubled runs and listed ones', () => {
  for (const pin of [
    '000000',
    '123456',
    '654321',
    '890123',
    '210987',
    '121212',
    '123123',
    '696969',
    '112233',
    '332211',
    '123321',
    '1234321',
    '159753',
  ]) {
    expect(refusalOf(pin), pin).toBe('guessable');
  }
});

test('does not forbid birthdays: they are not more than a tenth of all PINs a guesser would have to try', () => {
  expect(refusalOf('140987')).toBeNull();
});

test('refuses what can be read from the badge or is the staff number', () => {
  expect(refusalOf('481209')).toBe('own-number');
  expect(refusalOf('209372')).toBe('own-number');
  expect(refusalOf('104281')).toBe('own-number');
});

test('refuses every run of six digits, wherever it begins', () => {
  const digits = '01234567890123456789';
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 9 }), fc.boolean(), (start, isDown) => {
      const run = digits.slice(start, start + 6);
      expect(refusalOf(isDown ? Array.from(run).reverse().join('') : run)).toBe('guessable');
    }),
  );
});

test('leaves more than nine in ten of all six-digit PINs to choose from', () => {
  let taken = 0;
  for (let number = 0; number < 1_000_000; number += 97) {
    if (refusalOf(String(number).padStart(6, '0')) === null) taken += 1;
  }
  expect(taken / Math.ceil(1_000_000 / 97)).toBeGreaterThan(0.9);
});
