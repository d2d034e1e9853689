import { accept, refuse, type Result } from '../result';

/** Which sign may separate thousands in a file: where cells are separated by semicolons, the point may. */
export type NumberStyle = 'point' | 'comma';

const plainNumber = /^[+-]?\d+(?:[.,]\d+)?$/;
const pointOrCommaBeforeThree = /^[+-]?[1-9]\d{0,2}[.,]\d{3}$/;
const commaBeforeThree = /^[+-]?[1-9]\d{0,2},\d{3}$/;

/**
 * Reads a figure with a decimal point or a decimal comma. "1,250" may be one and a quarter or twelve hundred and fifty,
 * so it is refused; so is "1.250" in a file with semicolons, which is written where the comma is decimal.
 */
export function readNumberCell(cell: string, style: NumberStyle): Result<number, 'not-a-number' | 'ambiguous'> {
  if (!plainNumber.test(cell)) return refuse('not-a-number', `“${shorten(cell)}” is not a number.`);
  const mayBeThousands = style === 'comma' ? pointOrCommaBeforeThree : commaBeforeThree;
  if (mayBeThousands.test(cell)) {
    const digits = cell.replace(/[.,]/, '');
    const decimal = `${cell.replace(/[.,].*$/, '')}.${cell.slice(-3)}0`;
    return refuse('ambiguous', `“${cell}” can be read in two ways. Write ${digits}, or ${decimal} for the smaller.`);
  }
  return accept(Number(cell.replace(',', '.')));
}

/** Reads yes or no, in capitals or not. */
export function readYesNoCell(cell: string): Result<boolean, 'not-yes-or-no'> {
  switch (cell.toLowerCase()) {
    case 'yes':
    case 'true':
      return accept(true);
    case 'no':
    case 'false':
      return accept(false);
    default:
      return refuse('not-yes-or-no', `“${shorten(cell)}” is neither yes nor no.`);
  }
}

/** A cell as it is quoted in a sentence: no longer than 40 characters. */
export function shorten(cell: string): string {
  return cell.length > 40 ? `${cell.slice(0, 40)}…` : cell;
}

/*
 * A spreadsheet takes a cell that begins with one of these for a formula and runs it (OWASP, "CSV Injection").
 * Such a cell is written with an apostrophe in front, and the apostrophe is taken off again when it is read; one that
 * already has apostrophes gets one more, so that every text comes back as it was.
 */
const formulaStart = /^'*[=+\-@\t\r＝＋－＠]/;
const guardedStart = /^'+[=+\-@\t\r＝＋－＠]/;

/** A text made harmless for spreadsheets. A figure stays as it is, also when it is below zero. */
export function guardCell(text: string): string {
  return formulaStart.test(text) && !plainNumber.test(text) ? `'${text}` : text;
}

/** Undoes {@link guardCell}. */
export function unguardCell(text: string): string {
  return guardedStart.test(text) ? text.slice(1) : text;
}
