import type { ChangePersonRequest, Person } from '#contract/people';
import { displayNameSchema, initialsSchema, staffNumberSchema, usualShiftSchema } from '#contract/people';
import { roleSchema } from '#contract/session';
import { instantAt } from '#domain/time/instant-at';
import { wallClock } from '#domain/time/wall-clock';
import { z } from 'zod';

/* What people fill in, and what it becomes. The end is written as the wall clock of the facility shows it. */

function endSchema(timeZone: string) {
  return z.string().transform((text, context): string | null => {
    if (text === '') return null;
    const [day = '', time = ''] = text.split('T');
    try {
      return instantAt({ day, time }, timeZone);
    } catch {
      context.addIssue({ code: 'custom', message: 'Write a day and a time.' });
      return z.NEVER;
    }
  });
}

const shiftSchema = z.union([z.literal('').transform((): null => null), usualShiftSchema]);

function placeFields(timeZone: string) {
  return { role: roleSchema, usualShift: shiftSchema, expiresAt: endSchema(timeZone) };
}

const nameFields = { displayName: displayNameSchema, initials: initialsSchema };

type Place = { readonly role: string; readonly expiresAt: string | null };

const surveyorHasEnd = ({ role, expiresAt }: Place) => role !== 'surveyor' || expiresAt !== null;

const endIsMissing = {
  path: ['expiresAt'],
  message: 'A surveyor sees this place for a time only. Write when it ends.',
};

/** Somebody new. */
export function newPersonSchema(timeZone: string) {
  return z
    .object({ staffNumber: staffNumberSchema, ...nameFields, ...placeFields(timeZone) })
    .refine(surveyorHasEnd, endIsMissing);
}

/** Somebody of another facility, who has a name already. */
export function joiningPersonSchema(timeZone: string) {
  return z.object({ staffNumber: staffNumberSchema, ...placeFields(timeZone) }).refine(surveyorHasEnd, endIsMissing);
}

/** Somebody who is here. */
export function changedPersonSchema(timeZone: string) {
  return z.object({ ...nameFields, ...placeFields(timeZone) }).refine(surveyorHasEnd, endIsMissing);
}

export type ChangedPerson = z.output<ReturnType<typeof changedPersonSchema>>;

/** As a field for day and time writes it: "2026-03-14T22:00"; empty when there is no end. */
export function endTextOf(expiresAt: string | null, timeZone: string): string {
  if (expiresAt === null) return '';
  const { day, time } = wallClock(expiresAt, timeZone);
  return `${day}T${time.slice(0, 5)}`;
}

/** Only what differs: who leaves the end alone does not cut its seconds off. */
export function changesBetween(person: Person, changed: ChangedPerson, timeZone: string): Partial<ChangePersonRequest> {
  const hasSameEnd = endTextOf(person.expiresAt, timeZone) === endTextOf(changed.expiresAt, timeZone);
  return {
    ...(changed.displayName === person.displayName ? {} : { displayName: changed.displayName }),
    ...(changed.initials === person.initials ? {} : { initials: changed.initials }),
    ...(changed.role === person.role ? {} : { role: changed.role }),
    ...(changed.usualShift === person.usualShift ? {} : { usualShift: changed.usualShift }),
    ...(hasSameEnd ? {} : { expiresAt: changed.expiresAt }),
  };
}
