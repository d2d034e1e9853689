import { checkCharactersOf, hasItsCheckCharacters } from './check-character';
import { accept, refuse, type Result } from '../result';

/*
 * The grammar all our codes share: a letter for what it is, a number of fixed width, two check digits.
 *   as printed and as kept   P-20431784-52
 *   as in the symbol         P2043178452    no hyphen: a scanner set for another keyboard types another sign for it
 *
 * No letter is one of A, Q, Z, W, M, Y, which move between the QWERTY, AZERTY and QWERTZ keyboards (from memory), nor one
 * of O, I, L, which look like digits. After the first letter there are digits only, so a typed O is a 0, an I or L is a 1.
 * The width is fixed so that a code that lost a digit on the way can never be another code.
 */

/** Letter to the width of its number. */
const widths = {
  P: 8, // pouch
  T: 8, // wrapped tray
  K: 8, // rigid container
  X: 8, // textile pack
  B: 8, // basin
  C: 8, // challenge device
  H: 5, // holder
  S: 5, // shelf
  N: 8, // badge
} as const;

export type CodeLetter = keyof typeof widths;

export type OwnCode = {
  readonly letter: CodeLetter;
  readonly number: number;
  /** As printed and as kept. */
  readonly code: string;
};

export type OwnCodeRefusal = 'truncated' | 'check-character' | 'foreign';

const checkWidth = 2;
/** Fewer digits than this after a letter is no trace of one of our codes: catalogue codes look like that. */
const leastTrace = 4;

function isCodeLetter(letter: string): letter is CodeLetter {
  return Object.hasOwn(widths, letter);
}

/** Only a to z: other alphabets have letters that would change into ours (the Turkish dotless i, the long s). */
export function asciiUpperCase(text: string): string {
  return text.replace(/[a-z]/g, (letter) => letter.toUpperCase());
}

/** The code as a symbol carries it: without hyphens. */
export function symbolTextOf(code: string): string {
  return code.replaceAll('-', '');
}

/** Throws a RangeError for a number that is not whole or does not fit: numbers are given out by us, never typed. */
export function formatOwnCode(letter: CodeLetter, number: number): string {
  const width = widths[letter];
  if (!Number.isSafeInteger(number) || number < 0 || number >= 10 ** width) {
    throw new RangeError(`A number behind ${letter} has at most ${width} digits.`);
  }
  const digits = String(number).padStart(width, '0');
  return `${letter}-${digits}-${checkCharactersOf(letter + digits)}`;
}

/** Reads one of our codes as scanned or typed: small or capital letters, with or without spaces and hyphens. */
export function readOwnCode(text: string): Result<OwnCode, OwnCodeRefusal> {
  const foreign = refuse('foreign', 'This is not a code of ours.');
  if (text.length > 64) return foreign;
  const compact = asciiUpperCase(text.replace(/[\s-]/g, ''));
  const letter = compact.charAt(0);
  const rest = compact.slice(1);
  if (!isCodeLetter(letter) || !/^[0-9OIL]+$/.test(rest) || rest.length < leastTrace) return foreign;

  const digits = rest.replaceAll('O', '0').replace(/[IL]/g, '1');
  const width = widths[letter];
  if (digits.length > width + checkWidth) return foreign;
  if (digits.length < width + checkWidth) {
    return refuse('truncated', 'Part of the code is missing. Scan again, or type it as printed.');
  }
  if (!hasItsCheckCharacters(letter + digits)) {
    return refuse(
      'check-character',
      'The check digits do not fit: a digit is wrong, or two are swapped. Scan again, or type it as printed.',
    );
  }
  const number = Number(digits.slice(0, width));
  return accept({ letter, number, code: formatOwnCode(letter, number) });
}
