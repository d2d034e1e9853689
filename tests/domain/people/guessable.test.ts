import fc from 'fast-check';
import { expect, test } from 'vitest';
import { isRun, repeatedPiece } from '../../../src/domain/people/guessable';

test('finds runs along keys and digits, both ways and round the end', () => {
  for (const text of ['123456', '901234', 'zyxwvu', 'xyzabc', 'azertyuiop', 'qwertzuiop', '1qaz2wsx3edc']) {
    expect(isRun(text), text).toBe(true);
  }
  for (const text of ['730418', 'lantern', '123465', 'qwertya']) expect(isRun(text), text).toBe(false);
});

test('finds the piece that is repeated, with a cut-off end too', () => {
  expect(repeatedPiece('abcabcabc')).toBe('abc');
  expect(repeatedPiece('abcabcab')).toBe('abc');
  expect(repeatedPiece('aaaa')).toBe('a');
  expect(repeatedPiece('lantern')).toBe('lantern');
});

test('gives back a piece that makes the text again, whatever the text', () => {
  fc.assert(
    fc.property(fc.string({ minLength: 1, maxLength: 40 }), (text) => {
      const piece = repeatedPiece(text);
      expect(piece.repeat(text.length).slice(0, text.length)).toBe(text);
    }),
  );
});
