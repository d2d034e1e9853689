/*
 * The three characters a scanner may put before what it read, saying which symbol it was: "]", a letter, a modifier
 * (ISO/IEC 15424). GS1 uses the modifier to say that the content is an element string: GS1 Syntax Engine tests for ]C1,
 * ]d2, ]Q3, ]C0, ]d1, ]E0; the others from memory.
 */
const contents = {
  ']C1': 'gs1', // GS1-128
  ']d2': 'gs1', // GS1 DataMatrix
  ']Q3': 'gs1', // GS1 QR Code
  ']e0': 'gs1', // GS1 DataBar
  ']J1': 'gs1', // GS1 DotCode
  ']E0': 'retail', // EAN-13, UPC-A
  ']E4': 'retail', // EAN-8
  ']I1': 'retail', // ITF with its check digit
} as const;

export type SymbolContent = 'gs1' | 'retail' | 'plain' | 'unknown';

export type SplitScan = {
  /** What the scanner says about the content; 'unknown' where it says nothing. */
  readonly content: SymbolContent;
  readonly data: string;
};

/** Takes the symbology identifier, if there is one, off the front of a scan. */
export function splitSymbology(scan: string): SplitScan {
  const prefix = /^\][A-Za-z][0-9A-Za-z]/.exec(scan)?.[0];
  if (prefix === undefined) return { content: 'unknown', data: scan };
  const content = Object.entries(contents).find(([key]) => key === prefix)?.[1];
  return { content: content ?? 'plain', data: scan.slice(prefix.length) };
}
