import { permissions, roles } from '#domain/access/permissions';
import { z } from 'zod';
import { idSchema, instantSchema } from './common';

export const roleSchema = z.enum(roles);

/** Longer than any staff number, badge code or password there is; what is longer was not typed by a person. */
const secretSchema = z.string().min(1, 'Please fill this in.').max(1_000, 'This is too long.');

export const signInRequestSchema = z.strictObject({
  staffNumber: z.string().trim().min(1, 'Please fill this in.').max(200, 'This is too long.'),
  password: secretSchema,
});
export type SignInRequest = z.infer<typeof signInRequestSchema>;

export const badgeSignInRequestSchema = z.strictObject({
  /** As scanned or typed. */
  badge: z.string().min(1, 'Scan your badge.').max(20_000, 'This is not a badge.'),
  pin: secretSchema,
});
export type BadgeSignInRequest = z.infer<typeof badgeSignInRequestSchema>;

export const changePasswordRequestSchema = z.strictObject({ current: secretSchema, next: secretSchema });
export type ChangePasswordRequest = z.infer<typeof changePasswordRequestSchema>;

export const changePinRequestSchema = z.strictObject({ password: secretSchema, pin: secretSchema });
export type ChangePinRequest = z.infer<typeof changePinRequestSchema>;

export const chooseFacilityRequestSchema = z.strictObject({ facilityId: idSchema });
export type ChooseFacilityRequest = z.infer<typeof chooseFacilityRequestSchema>;

export const sessionResponseSchema = z.object({
  person: z.object({
    id: idSchema,
    displayName: z.string(),
    initials: z.string(),
    staffNumber: z.string(),
    role: roleSchema,
    /** Until then nothing else can be done. */
    mustChangePassword: z.boolean(),
    /** Whether a badge and a PIN are there for a change of person. */
    hasBadge: z.boolean(),
    hasPin: z.boolean(),
  }),
  facility: z.object({
    id: idSchema,
    name: z.string(),
    /** IANA name. */
    timeZone: z.string(),
    unitSystem: z.enum(['metric', 'us-customary']),
  }),
  /** Where this person may work, this place included, by name. */
  facilities: z.array(z.object({ id: idSchema, name: z.string() })),
  permissions: z.array(z.enum(permissions)),
  /** Without an act for this long, the sign-in ends. */
  idleTimeoutSeconds: z.number().int(),
  /** The sign-in ends then at the latest. */
  expiresAt: instantSchema,
});
export type SessionResponse = z.infer<typeof sessionResponseSchema>;
