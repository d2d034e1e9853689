import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  greatestPasswordLength,
  judgePassword,
  leastPasswordLength,
  type PasswordSurroundings,
} from '../../../src/domain/people/password-policy';

const surroundings: PasswordSurroundings = {
  isCommon: (text) => ['password', 'football', 'correcthorsebatterystaple', 'sunshine'].includes(text),
  words: ['T1042', 'Hana Strudwick', 'Tarnquill Regional Hospital'],
};

function refusalOf(password: string): string | null {
  const judged = judgePassword(password, surroundings);
  return judged.ok ? null : judged.refusal.code;
}

describe('the length', () => {
  test('is 15 characters or more, as NIST SP 800-63B-4 asks of a password that is the only factor', () => {
    expect(leastPasswordLength).toBe(15);
    expect(refusalOf('otters dig tar')).toBe('too-short');
    expect(refusalOf('otters dig tarn')).toBeNull();
  });

  test('may be 64 characters and more, as NIST SP 800-63B-4 asks', () => {
    expect(greatestPasswordLength).toBeGreaterThanOrEqual(64);
    const phrase = 'a lantern in the gravel tells thirty otters where supper will be';
    expect(phrase).toHaveLength(64);
    expect(refusalOf(phrase)).toBeNull();
    expect(refusalOf('lantern gravel '.repeat(8) + 'otters sing')).toBe('too-long');
  });

  test('counts code points: a sign outside of the basic plane is one character', () => {
    const fourteen = 'otters dig ta\u{1D11E}';
    expect(fourteen).toHaveLength(15);
    expect(refusalOf(fourteen)).toBe('too-short');
    expect(refusalOf(`${fourteen}n`)).toBeNull();
  });

  test('is taken after normalization: a letter and its accent are one character', () => {
    const decomposed = 'cafe\u0301 gravel six';
    expect(Array.from(decomposed)).toHaveLength(16);
    expect(refusalOf(decomposed)).toBeNull();
    expect(refusalOf(decomposed.slice(0, -1))).toBe('too-short');
  });
});

test('gives back the normalized password, so that another keyboard types the same one', () => {
  const composed = judgePassword('café gravel thirty', surroundings);
  const decomposed = judgePassword('cafe\u0301 gravel thirty', surroundings);
  const wide = judgePassword('ｃafé gravel thirty', surroundings);
  expect(composed).toMatchObject({ ok: true, value: 'café gravel thirty' });
  expect(decomposed).toEqual(composed);
  expect(wide).toEqual(composed);
});

test('asks for no kinds of characters', () => {
  for (const password of [
    'lanterngravelotters',
    'LANTERN GRAVEL OTTERS',
    '918273 604857 1122',
    'žluťoučký kůň úpěl',
    '提灯と砂利と三十匹のカワウソが',
  ]) {
    expect(refusalOf(password), password).toBeNull();
  }
});

test('has no place for a digit-only run, a row of keys or a repetition', () => {
  for (const password of [
    'aaaaaaaaaaaaaaaa',
    '123456789012345',
    '987654321098765',
    'abcdefghijklmnopq',
    'qwertyuiopasdfghjkl',
    'lkjhgfdsapoiuytrewq',
    'abcabcabcabcabcabc',
    '1212 1212 1212 1212',
    'a b a b a b a b a b',
  ]) {
    expect(refusalOf(password), password).toBe('repetitive');
  }
});

test('refuses a common password, also spaced out, repeated, in capitals or with digits at its ends', () => {
  for (const password of [
    'correcthorsebatterystaple',
    'Correct Horse Battery Staple',
    'passwordpassword',
    'PASSWORD1234567890',
    '2026!!football!!2026',
    'sunshinesunshines',
  ]) {
    expect(refusalOf(password), password).toBe('common');
  }
});

test('compares the whole password, not words within it', () => {
  expect(refusalOf('the football hid my sunshine again')).toBeNull();
  expect(refusalOf('our sterile otters wear lanterns')).toBeNull();
});

test('refuses what is made of the names and words of this place', () => {
  for (const password of [
    'Tarnquill Hospital 2026',
    'hana.strudwick.1042',
    'paperside-T1042-2026',
    'SterileSteamHospital!',
    'Welcome to Tarnquill',
  ]) {
    expect(refusalOf(password), password).toBe('of-this-place');
  }
});

test('refuses control characters and half characters, which no keyboard types again', () => {
  expect(refusalOf('lantern\u0000gravel otters')).toBe('not-typable');
  expect(refusalOf('lantern\tgravel otters')).toBe('not-typable');
  expect(refusalOf('lantern gravel otters \ud83d')).toBe('not-typable');
});

test('says how to do better whenever it refuses for what could be guessed', () => {
  for (const password of ['short', 'passwordpassword', 'aaaaaaaaaaaaaaaa', 'Tarnquill Hospital 2026']) {
    const judged = judgePassword(password, surroundings);
    expect(judged.ok ? '' : judged.refusal.sentence).toMatch(/unrelated words/);
  }
});

test('takes every phrase of four words of its own', () => {
  const word = fc.stringMatching(/^[b-df-hj-np-tv-z][aeiou][b-df-hj-np-tv-z][aeiou][b-df-hj-np-tv-z]$/);
  fc.assert(
    fc.property(fc.uniqueArray(word, { minLength: 4, maxLength: 6 }), (words) => {
      expect(refusalOf(words.join(' '))).toBeNull();
    }),
  );
});

test('never takes fewer than 15 or more than 128 characters, whatever they are', () => {
  fc.assert(
    fc.property(fc.string({ unit: 'binary', maxLength: 300 }), (password) => {
      const length = Array.from(password.normalize('NFKC')).length;
      const refusal = refusalOf(password);
      if (length < 15) expect(refusal).toBe('too-short');
      else if (length > 128) expect(refusal).toBe('too-long');
    }),
  );
});
