import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { fitText } from '../../../../server/features/labels/draw/fit-text';

/** Every character half as wide as the size. */
const measure = (text: string, size: number) => Array.from(text).length * size * 0.5;
const steps = [
  [1, 5, 4],
  [2, 4, 3],
] as const;

describe('text in a box', () => {
  test('stays as large as it can', () => {
    expect(fitText('1234567890', { width: 25, steps }, measure)).toEqual({ size: 5, lines: ['1234567890'] });
    expect(fitText('1234567890', { width: 21, steps }, measure).size).toBeCloseTo(4.2);
  });

  test('takes a second line before it gets too small, at a space', () => {
    expect(fitText('12345 67890', { width: 20, steps }, measure)).toEqual({ size: 4, lines: ['12345', '67890'] });
  });

  test('breaks inside a word only when the word alone is too wide', () => {
    expect(fitText('1234567890123', { width: 20, steps }, measure)).toEqual({ size: 4, lines: ['1234567890', '123'] });
  });

  test('is cut with an ellipsis when nothing else helps', () => {
    expect(fitText('1234567890'.repeat(4), { width: 15, steps }, measure)).toEqual({
      size: 3,
      lines: ['1234567890', '123456789…'],
    });
  });

  test('is never cut through a character people see as one', () => {
    const family = '👩‍👩‍👧';
    const { lines } = fitText(family.repeat(10), { width: 9, steps: [[1, 2, 2]] }, measure);
    expect(lines.join('').replaceAll(family, '')).toBe('…');
  });

  test('always fits its width and its number of lines, and loses no letter unless it says so', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', maxLength: 80 }), fc.integer({ min: 12, max: 60 }), (text, width) => {
        const tidy = text.replace(/\s+/g, ' ').trim();
        const fit = fitText(tidy, { width, steps }, measure);
        expect(fit.lines.length).toBeLessThanOrEqual(2);
        const isCut = fit.lines.at(-1)?.endsWith('…') === true;
        if (!isCut) expect(fit.lines.join('').replaceAll(' ', '')).toBe(tidy.replaceAll(' ', ''));
        const widest = Math.max(...fit.lines.map((line) => measure(line, fit.size)));
        const oneCharacter = Math.max(
          0,
          ...Array.from(new Intl.Segmenter().segment(tidy), ({ segment }) => measure(segment, 5)),
        );
        expect(widest).toBeLessThanOrEqual(Math.max(width, oneCharacter + measure('…', 5)) + 1e-9);
      }),
    );
  });
});
