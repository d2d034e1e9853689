import { accept, refuse, type Result } from '../result';
import type { ItemKind } from '../load/model';
import { formatOwnCode, readOwnCode, type CodeLetter, type OwnCodeRefusal } from './own-code';

/*
 * A package's code: P-20431784-52. Eight digits, because the number is counted over the whole installation and over all
 * kinds: if each facility counted for itself, a tray lent by the hospital across the road would be taken for one of ours.
 * 100 million last 20 years for ten departments of 1,200 packages a day.
 */

const letters = {
  pouch: 'P',
  'wrapped-tray': 'T',
  'rigid-container': 'K',
  'textile-pack': 'X',
  basin: 'B',
  'challenge-device': 'C',
} as const satisfies Record<ItemKind, CodeLetter>;

/** Where to begin counting, so that no printed code begins with a row of zeros. */
export const firstPackageNumber = 10_000_001;
export const greatestPackageNumber = 99_999_999;

export type PackageCode = {
  /** As printed and as kept: P-20431784-52. */
  readonly code: string;
  readonly itemKind: ItemKind;
  readonly number: number;
};

export type PackageCodeRefusal = OwnCodeRefusal | 'other-kind';

/** The item kind a letter stands for; null for the letters of places and badges. */
export function itemKindOf(letter: CodeLetter): ItemKind | null {
  switch (letter) {
    case 'P':
      return 'pouch';
    case 'T':
      return 'wrapped-tray';
    case 'K':
      return 'rigid-container';
    case 'X':
      return 'textile-pack';
    case 'B':
      return 'basin';
    case 'C':
      return 'challenge-device';
    case 'H':
    case 'S':
    case 'N':
      return null;
  }
}

/** The code to print and keep. `number` is whole, from 0 to 99,999,999; anything else is a RangeError. */
export function formatPackageCode(itemKind: ItemKind, number: number): string {
  return formatOwnCode(letters[itemKind], number);
}

/** Reads a package's code as scanned or typed: any case, with or without spaces and hyphens; O counts as 0, I and L as 1. */
export function parsePackageCode(text: string): Result<PackageCode, PackageCodeRefusal> {
  const read = readOwnCode(text);
  if (!read.ok) return read;
  const itemKind = itemKindOf(read.value.letter);
  if (itemKind === null) return refuse('other-kind', 'This is the code of a place or a badge, not of a package.');
  return accept({ code: read.value.code, itemKind, number: read.value.number });
}
