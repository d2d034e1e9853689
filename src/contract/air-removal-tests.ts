import { z } from 'zod';
import { lineSchema, yesNoSchema } from './catalogue-common';
import { dateSchema, idSchema, instantSchema, requestIdSchema, textSchema } from './common';

export const airRemovalResultSchema = z.enum(['passed', 'failed'], { error: 'Passed or failed.' });

export const recordAirRemovalTestRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  sterilizerId: idSchema,
  testedAt: instantSchema,
  result: airRemovalResultSchema,
  packLot: textSchema(60),
  packExpiresOn: dateSchema,
  /** Whether no load had run in it yet that day. */
  isBeforeFirstLoad: yesNoSchema,
  /** Who read the sheet too, where the reading was in doubt. */
  secondReaderId: idSchema.nullable().default(null),
  note: lineSchema.default(''),
  /** Of a failed test: take the sterilizer out of service with it. */
  isTakenOutOfService: yesNoSchema.default(false),
});
export type RecordAirRemovalTestRequest = z.input<typeof recordAirRemovalTestRequestSchema>;

export const airRemovalTestSchema = z.object({
  id: idSchema,
  sterilizer: z.object({ id: idSchema, code: z.string(), name: z.string() }),
  testedAt: instantSchema,
  testDay: dateSchema,
  result: z.enum(['passed', 'failed']),
  packLot: z.string(),
  packExpiresOn: dateSchema,
  isBeforeFirstLoad: z.boolean(),
  readBy: z.string(),
  secondReader: z.string().nullable(),
  note: z.string(),
});
export type AirRemovalTest = z.output<typeof airRemovalTestSchema>;

export const recordAirRemovalTestResponseSchema = z.object({
  test: airRemovalTestSchema,
  /** The sterilizer's service state after it. */
  serviceState: z.enum(['in-service', 'out-of-service', 'awaiting-requalification']),
});

export const airRemovalTestListQuerySchema = z.strictObject({
  sterilizerId: idSchema.optional(),
  day: dateSchema.optional(),
  page: z.coerce.number().int().min(1).max(10_000).default(1),
});

export const airRemovalTestListResponseSchema = z.object({
  tests: z.array(airRemovalTestSchema),
  total: z.number().int(),
  page: z.number().int(),
  pageSize: z.number().int(),
  /** The facility's calendar day now. */
  today: dateSchema,
  /** People who may be named as a second reader. */
  readers: z.array(z.object({ id: idSchema, name: z.string() })),
});
