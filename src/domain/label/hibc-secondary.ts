import { dayFromMmddyy, dayFromMmyy, dayFromYyjjj, dayFromYymmdd, dayFromYyyymmdd } from './label-date';

/*
 * What follows the identification in a health industry bar code. Forms from the description of the HIBC data structures
 * in the BWIPP documentation:
 *   YYJJJ lot · $ lot · $+ serial · $$ date lot · $$+ date serial
 * where "date" is MMYY, or 2 MMDDYY, 3 YYMMDD, 4 YYMMDDHH, 5 YYJJJ, 6 YYJJJHH, 7 none; 8 and 9 put a quantity of two or five
 * digits before it. After a "/": S serial, 14D expiry, 16D day made (YYYYMMDD), Q quantity.
 */

export type HibcSecondary = {
  readonly lot: string | null;
  readonly serial: string | null;
  /** YYYY-MM-DD. An hour, where the label has one, is left off. */
  readonly expires: string | null;
  readonly made: string | null;
  readonly quantity: number | null;
};

const lotPattern = /^[A-Z0-9\-. ]{0,18}$/;

type DateForm = {
  readonly length: number;
  readonly hours: number;
  readonly read: (text: string, year: number) => string | null;
};

const dateForms: Readonly<Record<string, DateForm>> = {
  '2': { length: 6, hours: 0, read: dayFromMmddyy },
  '3': { length: 6, hours: 0, read: (text, year) => dayFromYymmdd(text, year, false) },
  '4': { length: 6, hours: 2, read: (text, year) => dayFromYymmdd(text, year, false) },
  '5': { length: 5, hours: 0, read: dayFromYyjjj },
  '6': { length: 5, hours: 2, read: dayFromYyjjj },
};

/** The date at the start of a text and what follows it; null for a date that is none. */
function takeDate(text: string, currentYear: number): { expires: string | null; rest: string } | null {
  const flag = text.charAt(0);
  if (flag === '7') return { expires: null, rest: text.slice(1) };
  if (flag === '0' || flag === '1') {
    const expires = dayFromMmyy(text.slice(0, 4), currentYear);
    return expires === null ? null : { expires, rest: text.slice(4) };
  }
  const form = dateForms[flag];
  if (form === undefined) return { expires: null, rest: text };
  const end = 1 + form.length + form.hours;
  const expires = form.read(text.slice(1, 1 + form.length), currentYear);
  const hour = text.slice(1 + form.length, end);
  if (expires === null || (form.hours > 0 && !/^([01]\d|2[0-4])$/.test(hour))) return null;
  return { expires, rest: text.slice(end) };
}

function takeQuantity(text: string): { quantity: number | null; rest: string } | null {
  const width = text.startsWith('8') ? 2 : text.startsWith('9') ? 5 : 0;
  if (width === 0) return { quantity: null, rest: text };
  const digits = text.slice(1, 1 + width);
  return /^\d+$/.test(digits) && digits.length === width
    ? { quantity: Number(digits), rest: text.slice(1 + width) }
    : null;
}

function readMain(text: string, currentYear: number): Partial<HibcSecondary> | null {
  const lead = /^(\$\$\+|\$\$|\$\+|\$|)/.exec(text)?.[0] ?? '';
  const rest = text.slice(lead.length);
  if (lead === '') {
    const expires = dayFromYyjjj(rest.slice(0, 5), currentYear);
    return expires === null ? null : { expires, lot: rest.slice(5) };
  }
  if (lead === '$') return { lot: rest };
  if (lead === '$+') return { serial: rest };
  const quantity = takeQuantity(rest);
  const date = quantity === null ? null : takeDate(quantity.rest, currentYear);
  if (quantity === null || date === null) return null;
  const name = lead === '$$' ? { lot: date.rest } : { serial: date.rest };
  return { quantity: quantity.quantity, expires: date.expires, ...name };
}

function readSupplement(text: string): Partial<HibcSecondary> | null {
  if (text.startsWith('14D')) return { expires: dayFromYyyymmdd(text.slice(3)) };
  if (text.startsWith('16D')) return { made: dayFromYyyymmdd(text.slice(3)) };
  if (text.startsWith('S')) return { serial: text.slice(1) };
  if (/^Q\d{1,5}$/.test(text)) return { quantity: Number(text.slice(1)) };
  return null;
}

/** Reads the secondary data, without "+", link and check; null where any part of it makes no sense. */
export function readHibcSecondary(text: string, currentYear: number): HibcSecondary | null {
  let read: HibcSecondary = { lot: null, serial: null, expires: null, made: null, quantity: null };
  for (const [place, piece] of text.split('/').entries()) {
    const isMain = place === 0 && /^(\$|\d{5})/.test(piece) && !/^1[46]D/.test(piece);
    const more = isMain ? readMain(piece, currentYear) : readSupplement(piece);
    if (more === null) return null;
    if (/^1[46]D/.test(piece) && (more.expires ?? more.made ?? null) === null) return null;
    read = { ...read, ...more };
  }
  if (!lotPattern.test(read.lot ?? '') || !lotPattern.test(read.serial ?? '')) return null;
  return { ...read, lot: read.lot === '' ? null : read.lot, serial: read.serial === '' ? null : read.serial };
}
