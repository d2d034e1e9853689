import type { ItemKind } from '#domain/load/model';
import { wallClock } from '#domain/time/wall-clock';

/* The words of a label, apart from names. */

const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

export const kindWords = {
  pouch: 'pouch',
  'wrapped-tray': 'wrapped tray',
  'rigid-container': 'rigid container',
  'textile-pack': 'textile pack',
  basin: 'basin',
  'challenge-device': 'challenge device',
} as const satisfies Record<ItemKind, string>;

/** YYYY-MM-DD as "17 Mar 2026": no reader can take the day for the month. */
export function dayWords(day: string): string {
  const [year = '', month = '', date = ''] = day.split('-');
  return `${Number(date)} ${months[Number(month) - 1] ?? month} ${year}`;
}

/** An instant as "17 Mar 2026 07:31" on the clock of a time zone. */
export function momentWords(instant: string, timeZone: string): string {
  const clock = wallClock(instant, timeZone);
  return `${dayWords(clock.day)} ${clock.time.slice(0, 5)}`;
}

export type LabelExpiry =
  /** Sterile until something happens to it. */
  | { readonly rule: 'event-related' }
  /** `on` is the last day it may be used, YYYY-MM-DD. */
  | { readonly rule: 'dated'; readonly on: string };

/** A date of use stands as YYYY-MM-DD with hyphens: 21 CFR 801.18(a) asks for that on device labels. */
export function expiryWords(expiry: LabelExpiry): readonly [string, string] {
  return expiry.rule === 'dated' ? ['Use by', expiry.on] : ['Use while whole', 'and dry'];
}

/** "Reprint 2" on the second printing; nothing on the first. */
export function reprintWords(copy: number): string | null {
  return copy > 1 ? `Reprint ${copy}` : null;
}

/** One line of text: without line breaks, control characters and halves of characters, which have no shape on paper. */
export function oneLine(text: string): string {
  return text
    .normalize('NFC')
    .replace(/[\p{Cc}\p{Cs}\p{Zl}\p{Zp}]+/gu, ' ')
    .replace(/\s+/g, ' ')
    .trim();
}
