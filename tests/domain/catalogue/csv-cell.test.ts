import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { guardCell, readNumberCell, readYesNoCell, unguardCell } from '../../../src/domain/catalogue/csv-cell';

describe('a figure in a file', () => {
  it.each([
    ['7.5', 7.5],
    ['7,5', 7.5],
    ['0,125', 0.125],
    ['0.125', 0.125],
    ['560', 560],
    ['-40', -40],
    ['1.250', 1.25],
    ['1,2500', 1.25],
  ])('reads %s', (cell, expected) => {
    expect(readNumberCell(cell, 'point')).toEqual({ ok: true, value: expected });
  });

  it.each(['', 'about 5', '1 200', '1.234,5', '1e3', '0x10', 'NaN', '.5', '5.', '٥', '--5'])('refuses “%s”', (cell) => {
    expect(readNumberCell(cell, 'point')).toMatchObject({ ok: false, refusal: { code: 'not-a-number' } });
  });

  it('asks which is meant where a comma may part thousands', () => {
    expect(readNumberCell('1,250', 'point')).toEqual({
      ok: false,
      refusal: {
        code: 'ambiguous',
        sentence: '“1,250” can be read in two ways. Write 1250, or 1.2500 for the smaller.',
      },
    });
  });

  it('asks the same of a point in a file that is written with decimal commas', () => {
    expect(readNumberCell('1.250', 'comma')).toMatchObject({ ok: false, refusal: { code: 'ambiguous' } });
    expect(readNumberCell('0.250', 'comma')).toEqual({ ok: true, value: 0.25 });
    expect(readNumberCell('12.5', 'comma')).toEqual({ ok: true, value: 12.5 });
  });

  it('quotes no more than the beginning of a very long cell', () => {
    const read = readNumberCell('x'.repeat(10_000), 'point');
    expect(read.ok || read.refusal.sentence.length).toBeLessThan(80);
  });
});

describe('yes and no', () => {
  it.each([
    ['yes', true],
    ['YES', true],
    ['true', true],
    ['no', false],
    ['False', false],
  ])('reads %s', (cell, expected) => {
    expect(readYesNoCell(cell)).toEqual({ ok: true, value: expected });
  });

  it.each(['y', '1', 'maybe', 'yes!'])('refuses %s', (cell) => {
    expect(readYesNoCell(cell)).toMatchObject({ ok: false });
  });
});

describe('cells that a spreadsheet would run', () => {
  it.each(['=1+1', '+cmd', '-2+3+cmd', '@SUM(A1)', '\tx', '＝1', "'=1"])('puts an apostrophe before %s', (text) => {
    expect(guardCell(text)).toBe(`'${text}`);
  });

  it.each(['C-01', '-40', '+1.5', '', "it's", "'quoted'"])('leaves %s alone', (text) => {
    expect(guardCell(text)).toBe(text);
  });

  it('gives every text back as it was', () => {
    const nasty = fc.string({ unit: fc.constantFrom('=', '+', '-', '@', "'", '\t', 'a', '1', '.', ' ', '＝') });
    fc.assert(
      fc.property(fc.oneof(nasty, fc.string()), (text) => {
        expect(unguardCell(guardCell(text))).toBe(text);
      }),
      { numRuns: 2_000 },
    );
  });
});
