import bwipjs from 'bwip-js/node';
import { z } from 'zod';
import { symbolTextOf } from '#domain/label/own-code';

/*
 * The bars and squares of a symbol, as rectangles in modules. What is drawn is exactly these rectangles, so a test that
 * reads them back reads what is on the paper.
 */

export type LabelSymbol =
  /** Code 128, for laser scanners. `text` is what it reads as. */
  | { readonly form: 'code-128'; readonly text: string }
  /** Data Matrix, for cameras and imagers. */
  | { readonly form: 'data-matrix'; readonly text: string }
  /** GS1 DataMatrix: `elements` in brackets, "(01)09501101530003(91)P2043178452". */
  | { readonly form: 'gs1-data-matrix'; readonly elements: string };

export type ModuleRect = { readonly x: number; readonly y: number; readonly width: number; readonly height: number };

export type SymbolModules = {
  /** Columns and rows without any quiet zone; a row of bars has one row. */
  readonly columns: number;
  readonly rows: number;
  /** The dark parts; none overlap. */
  readonly dark: readonly ModuleRect[];
};

/** Which GTIN a label may carry, and who gave it out. */
export type LabelGtin = { readonly gtin: string; readonly allocatedBy: 'facility' | 'maker' };

const barsSchema = z.tuple([z.object({ sbs: z.array(z.number()) })]);
const matrixSchema = z.tuple([z.object({ pixs: z.array(z.number()), pixx: z.number(), pixy: z.number() })]);

function barModules(text: string): SymbolModules {
  const [{ sbs }] = barsSchema.parse(bwipjs.raw({ bcid: 'code128', text }));
  const dark: ModuleRect[] = [];
  let x = 0;
  for (const [place, width] of sbs.entries()) {
    if (place % 2 === 0) dark.push({ x, y: 0, width, height: 1 });
    x += width;
  }
  return { columns: x, rows: 1, dark };
}

/** Dark runs of each row, and runs of the same place below one another as one rectangle: fewer seams on screen. */
function matrixModules(bcid: 'datamatrix' | 'gs1datamatrix', text: string): SymbolModules {
  const [{ pixs, pixx: columns, pixy: rows }] = matrixSchema.parse(bwipjs.raw({ bcid, text }));
  const dark: ModuleRect[] = [];
  let above = new Map<string, ModuleRect>();
  for (let y = 0; y < rows; y += 1) {
    const here = new Map<string, ModuleRect>();
    for (let x = 0; x < columns; x += 1) {
      const start = x;
      while (x < columns && pixs[y * columns + x] === 1) x += 1;
      if (x === start) continue;
      const key = `${start} ${x}`;
      const upper = above.get(key);
      here.set(key, { x: start, y: upper?.y ?? y, width: x - start, height: (upper?.height ?? 0) + 1 });
      above.delete(key);
    }
    dark.push(...above.values());
    above = here;
  }
  return { columns, rows, dark: [...dark, ...above.values()] };
}

/**
 * The modules of a symbol. Throws for a text the symbol cannot hold and for element strings that GS1 does not allow, a
 * wrong check digit for one: the encoder checks them.
 */
export function symbolModules(symbol: LabelSymbol): SymbolModules {
  switch (symbol.form) {
    case 'code-128':
      if (!/^[ -~]{1,40}$/.test(symbol.text)) throw new RangeError('Code 128 is written for plain characters only.');
      return barModules(symbol.text);
    case 'data-matrix':
      if (!/^[ -~]{1,100}$/.test(symbol.text))
        throw new RangeError('Data Matrix is written for plain characters only.');
      return matrixModules('datamatrix', symbol.text);
    case 'gs1-data-matrix':
      return matrixModules('gs1datamatrix', symbol.elements);
  }
}

/** The bars of one of our codes: without hyphens, so that digits go two to a character. */
export function barsOf(code: string): LabelSymbol {
  return { form: 'code-128', text: symbolTextOf(code) };
}

/**
 * The matrix symbol of one of our codes.
 *
 * With a GTIN it is a GS1 DataMatrix. Our code stands behind the GTIN as serial number (21) only where the facility gave the
 * GTIN out itself: serial numbers under a GTIN are its owner's to give (GS1 General Specifications; from memory). Behind a
 * maker's GTIN it stands as company internal information (91); as a serial number it would make, with the maker's GTIN, a
 * device identification that no maker ever gave, and a patient's record that scans it would keep it.
 *
 * Without a GTIN, and without a GS1 company prefix to make one, it is a plain Data Matrix of the code.
 */
export function matrixOf(code: string, item: LabelGtin | null = null): LabelSymbol {
  const text = symbolTextOf(code);
  if (item === null) return { form: 'data-matrix', text };
  const identifier = item.allocatedBy === 'facility' ? '21' : '91';
  return { form: 'gs1-data-matrix', elements: `(01)${item.gtin}(${identifier})${text}` };
}
