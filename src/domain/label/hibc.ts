import { accept, refuse, type Result } from '../result';
import { readHibcSecondary, type HibcSecondary } from './hibc-secondary';

/*
 * Health Industry Bar Codes, as suppliers put them on devices (ANSI/HIBC 2, supplier labelling; here by way of HIBCC's page
 * on the check character and of the description of the data structures in the BWIPP documentation).
 *   primary    + labeler (a letter and three characters) + product (1 to 18) + unit of measure (a digit) + check
 *   secondary  + date, quantity, lot, serial + link (the primary's check) + check
 *   both       + primary without check + "/" + secondary without "+" and link + check
 */

export type Hibc = HibcSecondary & {
  readonly part: 'primary' | 'secondary' | 'both';
  /** Labeler, product and unit of measure, without "+" and check (FDA UDI formats v1.3: 6 to 23 characters). */
  readonly deviceIdentifier: string | null;
  readonly labeler: string | null;
  readonly product: string | null;
  readonly unitOfMeasure: string | null;
  /** On a secondary symbol: the check character of the primary symbol it belongs to. */
  readonly link: string | null;
};

export type HibcRefusal = 'foreign' | 'check-character' | 'damaged';

/** The place in this string is the value (ANSI/HIBC 2, modulo 43, the values of Code 39). */
const checkAlphabet = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ-. $/+%';

/** The modulo-43 check character of a text that begins with "+"; null where a character has no value. */
export function hibcCheckCharacter(text: string): string | null {
  let sum = 0;
  for (const character of text) {
    const value = checkAlphabet.indexOf(character);
    if (value < 0) return null;
    sum += value;
  }
  return checkAlphabet.charAt(sum % checkAlphabet.length);
}

/** Without its check character; null where that does not fit. A space as check character may be printed "_" (HIBCC). */
function withoutCheck(text: string): string | null {
  const body = text.slice(0, -1);
  const check = text.slice(-1) === '_' ? ' ' : text.slice(-1);
  return body.length > 0 && hibcCheckCharacter(body) === check ? body : null;
}

/**
 * Undoes what a reader set to full-ASCII Code 39 makes of a primary symbol: it takes "+A" for a small "a". Only the first
 * letter can be meant, because a product has no "+".
 */
function undoFullAscii(text: string): string {
  return /^[a-z][0-9A-Z]/.test(text) ? `+${text.charAt(0).toUpperCase()}${text.slice(1)}` : text;
}

const nothing: HibcSecondary = { lot: null, serial: null, expires: null, made: null, quantity: null };

/**
 * Reads a HIBC supplier symbol without its symbology identifier, with or without the asterisks printed around it.
 * Do not trim the text first: the check character may be a space.
 */
export function parseHibc(scanned: string, currentYear: number): Result<Hibc, HibcRefusal> {
  const bare = /^\*(.+)\*$/.exec(scanned)?.[1] ?? scanned;
  const text = undoFullAscii(bare);
  if (!/^\+[A-Z0-9$].{3,}$/.test(text)) return refuse('foreign', 'This is not a code of the health industry.');
  const body = withoutCheck(text);
  if (body === null) {
    return refuse('check-character', 'The check character of this label does not fit. Scan again.');
  }
  const damaged = refuse('damaged', 'Part of this label makes no sense. Scan again, or scan its other symbol.');

  if (/^\+[0-9$]/.test(body)) {
    const secondary = readHibcSecondary(body.slice(1, -1), currentYear);
    if (secondary === null) return damaged;
    const primary = { deviceIdentifier: null, labeler: null, product: null, unitOfMeasure: null };
    return accept({ ...secondary, ...primary, part: 'secondary', link: body.slice(-1) });
  }

  const slash = body.indexOf('/');
  const identifier = body.slice(1, slash < 0 ? undefined : slash);
  const match = /^([A-Z][A-Z0-9]{3})([A-Z0-9]{1,18})([0-9])$/.exec(identifier);
  if (match === null) return damaged;
  const secondary = slash < 0 ? nothing : readHibcSecondary(body.slice(slash + 1), currentYear);
  if (secondary === null) return damaged;
  return accept({
    ...secondary,
    part: slash < 0 ? 'primary' : 'both',
    deviceIdentifier: identifier,
    labeler: match[1] ?? null,
    product: match[2] ?? null,
    unitOfMeasure: match[3] ?? null,
    link: null,
  });
}
