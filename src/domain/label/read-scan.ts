import type { ItemKind } from '../load/model';
import { readGs1Scan, readHibcScan, type DeviceScan } from './device-scan';
import { groupSeparator } from './gs1';
import { defaultCurrentYear } from './label-date';
import { parseLoadStickerCode } from './load-sticker-code';
import { asciiUpperCase, readOwnCode, type OwnCode } from './own-code';
import { itemKindOf } from './package-code';
import type { Place } from './place-code';
import { splitSymbology } from './symbology';
import { unreadable, type UnreadableScan } from './unreadable-scan';

/*
 * The one door for everything that comes out of a scanner, a camera or a keyboard. It says what was scanned, or why it
 * cannot be used; it never throws, and it looks at no more than a label can hold.
 */

export type Scan =
  | {
      readonly kind: 'package';
      /** As printed and as kept: P-20431784-52. */
      readonly code: string;
      readonly itemKind: ItemKind;
      readonly number: number;
      /** The item's GTIN, where the symbol holds it too: to be compared with the package's item, which must have it. */
      readonly gtin: string | null;
    }
  | { readonly kind: 'place'; readonly place: Place; readonly code: string; readonly number: number }
  | { readonly kind: 'badge'; readonly code: string; readonly number: number }
  | {
      readonly kind: 'load-sticker';
      readonly code: string;
      readonly packageCode: string;
      readonly loadNumber: string;
      /** Which printing of the sticker; a lower one than the latest is void. */
      readonly copy: number;
    }
  | DeviceScan
  | UnreadableScan;

/**
 * Longer than anything a device label holds in practice: the plain text of a full device identification is at most 76
 * characters (FDA UDI formats v1.3). Beyond it a scan is refused without being read.
 */
export const greatestScanLength = 256;

/** What an unshifted AZERTY keyboard writes for the digit keys 1 to 9 and 0 (from memory). */
const azertyDigits = '&é"\'(-è_çà';

function ownScan(own: OwnCode, gtin: string | null): Scan {
  const { letter, code, number } = own;
  const itemKind = itemKindOf(letter);
  if (itemKind !== null) return { kind: 'package', code, itemKind, number, gtin };
  return letter === 'N'
    ? { kind: 'badge', code, number }
    : { kind: 'place', place: letter === 'H' ? 'holder' : 'shelf', code, number };
}

/** Two or more of our codes in one burst: a scanner that does not end its scans with Enter. */
function isSeveralCodes(text: string): boolean {
  return /^(?:[PTKXBCN][0-9]{10}|[HS][0-9]{7}){2,}$/.test(asciiUpperCase(text.replace(/[\s-]/g, '')));
}

/** The same scan as a keyboard set right would have typed it; null where nothing in it tells of a wrong one. */
function fromAzerty(text: string): string | null {
  if (!/[&é"'(\-è_çà]{4}/.test(text)) return null;
  return text.replace(/[&é"'(\-è_çà]/g, (sign) => String((azertyDigits.indexOf(sign) + 1) % 10));
}

function readPrintable(text: string, currentYear: number): Scan {
  const split = splitSymbology(text);
  const sticker = parseLoadStickerCode(split.data);
  if (sticker.ok) return { kind: 'load-sticker', ...sticker.value };
  if (sticker.refusal.code !== 'foreign') return unreadable(sticker.refusal.code);

  const own = readOwnCode(split.data);
  if (own.ok) return ownScan(own.value, null);
  if (own.refusal.code !== 'foreign') return unreadable(own.refusal.code);
  if (isSeveralCodes(split.data)) return unreadable('two-codes');

  const gs1 = readGs1Scan({ content: split.content, data: split.data.trim() }, currentYear);
  if (gs1 !== null) {
    if ('kind' in gs1) return gs1;
    return { kind: 'package', ...gs1.own, gtin: gs1.gtin };
  }
  return readHibcScan(split.data, currentYear) ?? unreadable('foreign');
}

/**
 * Says what a raw scan is. Hand it over as it came: with or without symbology identifier, with the separators a GS1 symbol
 * has inside, and untrimmed, because a space at the end can be a check character. `currentYear` is the facility's year, for
 * the century of two-digit years on makers' labels; without it 2026 is assumed, which is right for decades.
 */
export function readScan(raw: string, options: { readonly currentYear?: number } = {}): Scan {
  if (raw.length > greatestScanLength) return unreadable('too-long');
  const text = raw.replace(/^[\r\n\t ]+|[\r\n\t]+$/g, '');
  if (text.replaceAll(groupSeparator, '').trim().length === 0) return unreadable('empty');
  for (const character of text) {
    const point = character.codePointAt(0) ?? 0;
    const isControl = point < 0x20 || (point >= 0x7f && point < 0xa0);
    const isHalfACharacter = point >= 0xd800 && point <= 0xdfff;
    if ((isControl && character !== groupSeparator) || isHalfACharacter) return unreadable('control-characters');
  }
  const currentYear = options.currentYear ?? defaultCurrentYear;
  const scan = readPrintable(text, currentYear);
  if (scan.kind !== 'unreadable') return scan;
  const typed = fromAzerty(text);
  return typed !== null && readPrintable(typed, currentYear).kind !== 'unreadable'
    ? unreadable('keyboard-layout')
    : scan;
}
