import { addDays } from '../time/calendar-day';

/*
 * How long a package may wait on the shelf. Event-related: until something happens to it (wet, torn, opened), whatever the
 * day; dated: so many days, where the packaging maker or the house asks for it. Source: CDC, Guideline for Disinfection and
 * Sterilization in Healthcare Facilities (2008), recommendations on storage of sterile items (read as excerpt).
 * That the days count from the day of packing, and that the last day still counts, is common practice, no source.
 */

export type ExpiryRule = { readonly rule: 'event-related' } | { readonly rule: 'dated'; readonly days: number };

/**
 * The last calendar day on which the package may be used, YYYY-MM-DD; null where expiry is event-related.
 * @param packedOn the facility's calendar day of packing, YYYY-MM-DD
 */
export function expiresOn(rule: ExpiryRule, packedOn: string): string | null {
  return rule.rule === 'dated' ? addDays(packedOn, rule.days) : null;
}

/** Whether the last day is over. Both days are the facility's calendar days, YYYY-MM-DD. */
export function isExpired(lastDay: string | null, today: string): boolean {
  return lastDay !== null && lastDay < today;
}
