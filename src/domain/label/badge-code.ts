import { accept, refuse, type Result } from '../result';
import { formatOwnCode, readOwnCode, type OwnCodeRefusal } from './own-code';

/*
 * What a staff badge carries: N-48120937-96. A number and nothing of the person: a lost badge tells no name to a scanner.
 * Draw the number at random where it is given out; a badge is always used with a PIN, never alone.
 */

export type BadgeCode = {
  /** As kept. */
  readonly code: string;
  readonly number: number;
};

export type BadgeCodeRefusal = OwnCodeRefusal | 'other-kind';

export const greatestBadgeNumber = 99_999_999;

/** The code to print and keep. `number` is whole, from 0 to 99,999,999; anything else is a RangeError. */
export function formatBadgeCode(number: number): string {
  return formatOwnCode('N', number);
}

/** Reads a badge's code as scanned or typed. */
export function parseBadgeCode(text: string): Result<BadgeCode, BadgeCodeRefusal> {
  const read = readOwnCode(text);
  if (!read.ok) return read;
  const { letter, number, code } = read.value;
  if (letter !== 'N') return refuse('other-kind', 'This is the code of a package or a place, not of a badge.');
  return accept({ code, number });
}
