import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { groupSeparator } from '#domain/label/gs1';
import { formatLoadStickerCode } from '#domain/label/load-sticker-code';
import { formatPackageCode, greatestPackageNumber } from '#domain/label/package-code';
import { formatPlaceCode } from '#domain/label/place-code';
import { readScan } from '#domain/label/read-scan';
import {
  barsOf,
  matrixOf,
  symbolModules,
  type SymbolModules,
} from '../../../../server/features/labels/draw/symbol-modules';
import { decodeModules } from './decode-symbol';

const code = 'P-20431784-52';
const gtin = '09501101530003';

function darkCells({ dark }: SymbolModules): string[] {
  return dark.flatMap((one) =>
    Array.from(
      { length: one.width * one.height },
      (_, cell) => `${one.x + (cell % one.width)} ${one.y + Math.floor(cell / one.width)}`,
    ),
  );
}

describe('the modules of a symbol', () => {
  test('of a package code are 112 bars and gaps wide, because its digits go two to a character', () => {
    // Code 128: start, P, code C, five pairs, check of 11 modules each, and a stop of 13.
    const bars = symbolModules(barsOf(code));
    expect(bars).toMatchObject({ columns: 9 * 11 + 13, rows: 1 });
    // One check letter in place of the two check digits would need two characters more and one fewer pair.
    expect(symbolModules({ form: 'code-128', text: 'P20431784K' }).columns).toBe(10 * 11 + 13);
  });

  test('of bars read back as the code', () => {
    for (const one of [code, formatPlaceCode('holder', 12), formatPackageCode('textile-pack', greatestPackageNumber)]) {
      expect(decodeModules(symbolModules(barsOf(one)), 'code-128')).toBe(one.replaceAll('-', ''));
      expect(readScan(decodeModules(symbolModules(barsOf(one)), 'code-128') ?? '')).toMatchObject({ code: one });
    }
  });

  test('of a plain Data Matrix read back as the code', () => {
    const text = decodeModules(symbolModules(matrixOf(code)), 'data-matrix');
    expect(text).toBe('P2043178452');
    expect(readScan(text ?? '')).toMatchObject({ kind: 'package', code, gtin: null });
  });

  test.each([
    ['facility', '21'],
    ['maker', '91'],
  ] as const)(
    'of a GS1 DataMatrix, GTIN given out by the %s, read back as (01) and (%s)',
    (allocatedBy, identifier) => {
      const text = decodeModules(symbolModules(matrixOf(code, { gtin, allocatedBy })), 'data-matrix');
      // The decoder gives a separator for the FNC1 that makes the symbol a GS1 one.
      expect(text).toBe(`${groupSeparator}01${gtin}${identifier}P2043178452`);
      expect(readScan(text ?? '')).toMatchObject({ kind: 'package', code, gtin });
    },
  );

  test('of a load sticker read back as package, load and printing', () => {
    const sticker = { packageCode: code, loadNumber: '2-26076-03', copy: 2 };
    const symbol = symbolModules({ form: 'data-matrix', text: formatLoadStickerCode(sticker) });
    expect(symbol).toMatchObject({ columns: 18, rows: 18 });
    expect(readScan(decodeModules(symbol, 'data-matrix') ?? '')).toMatchObject({ kind: 'load-sticker', ...sticker });
  });

  test('read back for every package number', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: greatestPackageNumber }), (number) => {
        const one = formatPackageCode('wrapped-tray', number);
        const scanned = [
          decodeModules(symbolModules(barsOf(one)), 'code-128'),
          decodeModules(symbolModules(matrixOf(one, { gtin, allocatedBy: 'maker' })), 'data-matrix'),
        ];
        expect(scanned.map((text) => readScan(text ?? ''))).toMatchObject([{ code: one }, { code: one, gtin }]);
      }),
      { numRuns: 40 },
    );
  });

  test('lie inside the symbol, none on another', () => {
    for (const symbol of [barsOf(code), matrixOf(code), matrixOf(code, { gtin, allocatedBy: 'maker' })].map(
      symbolModules,
    )) {
      const cells = darkCells(symbol);
      expect(new Set(cells).size).toBe(cells.length);
      for (const one of symbol.dark) {
        expect(one.x + one.width).toBeLessThanOrEqual(symbol.columns);
        expect(one.y + one.height).toBeLessThanOrEqual(symbol.rows);
      }
    }
  });

  test('are not made for what no scanner could read back', () => {
    expect(() => symbolModules({ form: 'code-128', text: '' })).toThrow(RangeError);
    expect(() => symbolModules({ form: 'code-128', text: 'Ağ' })).toThrow(RangeError);
    expect(() => symbolModules({ form: 'data-matrix', text: 'P\u0000' })).toThrow(RangeError);
    expect(() => symbolModules(matrixOf(code, { gtin: '09501101530004', allocatedBy: 'maker' }))).toThrow();
    expect(() => symbolModules(matrixOf(code, { gtin: '950110153000', allocatedBy: 'facility' }))).toThrow();
  });
});
