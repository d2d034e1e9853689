import type { Person } from '#contract/people';
import { formatDate, formatMoment } from '../../lib/format';

type Clock = { readonly now: Date; readonly timeZone: string };

/** Whether a person can come in just now, and if not, why. Kept in one place so that list and panel say the same. */
export function signInWords(person: Person, { now, timeZone }: Clock): string {
  if (person.isDisabled) return 'Switched off';
  if (person.expiresAt !== null && new Date(person.expiresAt) <= now) {
    return `Ended ${formatDate(person.expiresAt, timeZone)}`;
  }
  if (person.mustChangePassword) {
    const until = person.oneTimePasswordExpiresAt;
    return until !== null && new Date(until) > now
      ? `One-time password until ${formatMoment(until, now, timeZone)}`
      : 'One-time password ran out';
  }
  return person.expiresAt === null ? 'Open' : `Open until ${formatMoment(person.expiresAt, now, timeZone)}`;
}

/** Whether a person can be signed in with now. */
export function isOpen(person: Person, now: Date): boolean {
  const hasEnded = person.expiresAt !== null && new Date(person.expiresAt) <= now;
  return !person.isDisabled && !hasEnded;
}

export function badgeWords({ hasBadge, hasPin }: Pick<Person, 'hasBadge' | 'hasPin'>): string {
  if (!hasBadge) return 'None';
  return hasPin ? 'Badge and PIN' : 'Badge, no PIN yet';
}

/** "Hana Strudwick" gives "HS"; of four names and more the first three and the last. */
export function initialsFor(displayName: string): string {
  const letters = displayName
    .trim()
    .split(/[\s-]+/)
    .map((word) => Array.from(word)[0] ?? '')
    .filter((letter) => /\p{L}/u.test(letter));
  const chosen = letters.length > 4 ? [...letters.slice(0, 3), ...letters.slice(-1)] : letters;
  return chosen.join('').toUpperCase();
}

/** Whether a search means this person: part of the name, the initials or the staff number, in any capitals. */
export function isMeant(person: Person, search: string): boolean {
  const wanted = search.trim().toLowerCase();
  return [person.displayName, person.initials, person.staffNumber].some((text) => text.toLowerCase().includes(wanted));
}
