import { greatestStaffNumberLength, normalizeStaffNumber, staffNumberPattern } from '#domain/people/staff-number';
import { z } from 'zod';
import { idSchema, instantSchema, requestIdSchema, textSchema } from './common';
import { roleSchema } from './session';

export const staffNumberSchema = textSchema(greatestStaffNumberLength)
  .transform(normalizeStaffNumber)
  .refine((text) => staffNumberPattern.test(text), 'Letters, digits, and . - _ / between them.');

export const displayNameSchema = textSchema(80);

/** As they stand on labels and sheets. */
export const initialsSchema = textSchema(4);

export const usualShiftSchema = textSchema(40);

export const personSchema = z.object({
  id: idSchema,
  staffNumber: z.string(),
  displayName: z.string(),
  initials: z.string(),
  /** In this facility. */
  role: roleSchema,
  usualShift: z.string().nullable(),
  /** When this person's place in this facility ends; null: it does not. */
  expiresAt: instantSchema.nullable(),
  isDisabled: z.boolean(),
  hasBadge: z.boolean(),
  /** Half of a key: only for those who give badges out. */
  badgeCode: z.string().nullable(),
  hasPin: z.boolean(),
  /** A one-time password was given out and has not been changed yet. */
  mustChangePassword: z.boolean(),
  oneTimePasswordExpiresAt: instantSchema.nullable(),
  /** Also works at another facility: then this one's administrator alone does not change the sign-in. */
  worksElsewhere: z.boolean(),
  version: z.number().int(),
});
export type Person = z.infer<typeof personSchema>;

export const peopleQuerySchema = z.strictObject({
  /** Part of a name, of initials or of a staff number. */
  search: z.string().trim().max(80, 'At most 80 characters.').default(''),
  role: roleSchema.optional(),
});
export type PeopleQuery = z.infer<typeof peopleQuerySchema>;

export const peopleResponseSchema = z.object({ people: z.array(personSchema) });
export const personResponseSchema = z.object({ person: personSchema });

export const addPersonRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  staffNumber: staffNumberSchema,
  displayName: displayNameSchema,
  initials: initialsSchema,
  role: roleSchema,
  usualShift: usualShiftSchema.nullable(),
  expiresAt: instantSchema.nullable(),
});
export type AddPersonRequest = z.infer<typeof addPersonRequestSchema>;

/** For somebody who already works at another facility of the same administrator. */
export const joinPersonRequestSchema = addPersonRequestSchema.omit({ displayName: true, initials: true });
export type JoinPersonRequest = z.infer<typeof joinPersonRequestSchema>;

/** Shown once: a repeat of the request answers with null here, since nobody keeps it in clear. */
const shownOnceSchema = z.string().nullable();

export const addPersonResponseSchema = z.object({
  person: personSchema,
  oneTimePassword: shownOnceSchema,
  oneTimePasswordExpiresAt: instantSchema,
});
export type AddPersonResponse = z.infer<typeof addPersonResponseSchema>;

/** What is absent stays as it is; null takes it away. */
export const changePersonRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  /** Of the person as they were when the change was decided on. */
  version: z.number().int(),
  displayName: displayNameSchema.optional(),
  initials: initialsSchema.optional(),
  role: roleSchema.optional(),
  usualShift: usualShiftSchema.nullable().optional(),
  expiresAt: instantSchema.nullable().optional(),
  isDisabled: z.boolean().optional(),
  /** `new` draws a badge code; the former one opens nothing any more. */
  badge: z.literal('new').nullable().optional(),
});
export type ChangePersonRequest = z.infer<typeof changePersonRequestSchema>;

export const personActRequestSchema = z.strictObject({ requestId: requestIdSchema });
export type PersonActRequest = z.infer<typeof personActRequestSchema>;

export const oneTimePasswordResponseSchema = z.object({
  oneTimePassword: shownOnceSchema,
  expiresAt: instantSchema,
});
export type OneTimePasswordResponse = z.infer<typeof oneTimePasswordResponseSchema>;

export const pinResponseSchema = z.object({ pin: shownOnceSchema });
export type PinResponse = z.infer<typeof pinResponseSchema>;
