import { addDays } from '../time/calendar-day';

/*
 * Dates as makers' labels write them. They have two-digit years, so reading one needs to know what year it is about now.
 */

/**
 * The year to assume where nobody says which year it is now. With it 77 to 99 are 1977 to 1999 and 00 to 76 are 2000 to
 * 2076: right for every label that can be on a shelf until the middle of the century.
 */
export const defaultCurrentYear = 2026;

/**
 * The four-digit year of a two-digit one. GS1 General Specifications 7.12 as the GS1 reference linter codes it: 51 or more
 * years ahead is the last century, 50 or more years behind is the next.
 */
export function fullYear(twoDigits: number, currentYear: number): number {
  const century = Math.floor(currentYear / 100) * 100;
  const ahead = twoDigits - (currentYear % 100);
  if (ahead >= 51) return century - 100 + twoDigits;
  if (ahead <= -50) return century + 100 + twoDigits;
  return century + twoDigits;
}

function isLeapYear(year: number): boolean {
  return (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0;
}

/** Days in a month, 1 to 12; 0 for any other month. */
function daysInMonth(year: number, month: number): number {
  if (month === 2) return isLeapYear(year) ? 29 : 28;
  if ([4, 6, 9, 11].includes(month)) return 30;
  return month >= 1 && month <= 12 ? 31 : 0;
}

/** YYYY-MM-DD, or null where there is no such day. */
export function dayFromParts(year: number, month: number, day: number): string | null {
  if (day < 1 || day > daysInMonth(year, month)) return null;
  return [String(year).padStart(4, '0'), String(month).padStart(2, '0'), String(day).padStart(2, '0')].join('-');
}

/** The calendar day of an ordinal date, 1 being 1 January, as YYYY-MM-DD; null where the year has no such day. */
export function dayFromOrdinal(year: number, ordinal: number): string | null {
  if (ordinal < 1 || ordinal > (isLeapYear(year) ? 366 : 365)) return null;
  return addDays(`${String(year).padStart(4, '0')}-01-01`, ordinal - 1);
}

/**
 * YYMMDD to YYYY-MM-DD; null where there is no such day. Day 00 is the last day of the month (GS1: data-quality rule
 * restating General Specifications), where `monthOnly` allows it.
 */
export function dayFromYymmdd(text: string, currentYear: number, monthOnly: boolean): string | null {
  const match = /^(\d{2})(\d{2})(\d{2})$/.exec(text);
  if (match === null) return null;
  const [year, month, day] = [fullYear(Number(match[1]), currentYear), Number(match[2]), Number(match[3])];
  return dayFromParts(year, month, day === 0 && monthOnly ? daysInMonth(year, month) : day);
}

/** MMDDYY to YYYY-MM-DD. */
export function dayFromMmddyy(text: string, currentYear: number): string | null {
  return dayFromYymmdd(text.slice(4) + text.slice(0, 4), currentYear, false);
}

/** MMYY to the last day of that month (a date without a day runs out with its month: common practice, no source). */
export function dayFromMmyy(text: string, currentYear: number): string | null {
  return dayFromYymmdd(`${text.slice(2)}${text.slice(0, 2)}00`, currentYear, true);
}

/** YYJJJ, year and day of the year, to YYYY-MM-DD. */
export function dayFromYyjjj(text: string, currentYear: number): string | null {
  const match = /^(\d{2})(\d{3})$/.exec(text);
  if (match === null) return null;
  return dayFromOrdinal(fullYear(Number(match[1]), currentYear), Number(match[2]));
}

/** YYYYMMDD to YYYY-MM-DD. */
export function dayFromYyyymmdd(text: string): string | null {
  const match = /^(\d{4})(\d{2})(\d{2})$/.exec(text);
  return match === null ? null : dayFromParts(Number(match[1]), Number(match[2]), Number(match[3]));
}
