import { accept, refuse, type Result } from '../result';
import { formatOwnCode, readOwnCode, type OwnCodeRefusal } from './own-code';

/* A place on the cart: H-00012-31 on a holder, S-00007-83 on a shelf. Counted over the whole installation. */

export type Place = 'holder' | 'shelf';

export type PlaceCode = {
  /** As printed and as kept. */
  readonly code: string;
  readonly place: Place;
  readonly number: number;
};

export type PlaceCodeRefusal = OwnCodeRefusal | 'other-kind';

export const greatestPlaceNumber = 99_999;

/** The code to print and keep. `number` is whole, from 0 to 99,999; anything else is a RangeError. */
export function formatPlaceCode(place: Place, number: number): string {
  return formatOwnCode(place === 'holder' ? 'H' : 'S', number);
}

/** Reads the code of a holder or shelf as scanned or typed. */
export function parsePlaceCode(text: string): Result<PlaceCode, PlaceCodeRefusal> {
  const read = readOwnCode(text);
  if (!read.ok) return read;
  const { letter, number, code } = read.value;
  if (letter === 'H') return accept({ code, place: 'holder', number });
  if (letter === 'S') return accept({ code, place: 'shelf', number });
  return refuse('other-kind', 'This is the code of a package or a badge, not of a place.');
}
