import { z } from 'zod';
import { dateSchema, idSchema, instantSchema } from './common';
import { loadStateSchema } from './loads';
import { runSummarySchema } from './runs';

export const todayLoadSchema = z.object({
  id: idSchema,
  number: z.string(),
  countOfDay: z.number().int(),
  state: loadStateSchema,
  programCode: z.string(),
  cartName: z.string(),
  openedBy: z.string(),
  openedAt: instantSchema,
  closedBy: z.string().nullable(),
  closedAt: instantSchema.nullable(),
  listed: z.number().int(),
  scanned: z.number().int(),
  implants: z.number().int(),
});
export type TodayLoad = z.infer<typeof todayLoadSchema>;

export const todayTestSchema = z.object({
  id: idSchema,
  result: z.enum(['passed', 'failed']),
  testedAt: instantSchema,
  readBy: z.string(),
});

export const todaySterilizerSchema = z.object({
  id: idSchema,
  code: z.string(),
  number: z.string(),
  name: z.string(),
  serviceState: z.enum(['in-service', 'out-of-service', 'awaiting-requalification']),
  needsAirRemovalTest: z.boolean(),
  /** Air-removal tests of the day, oldest first: the last one counts. */
  tests: z.array(todayTestSchema),
  /** Loads of the day and those still open from another day, oldest first. */
  loads: z.array(todayLoadSchema),
});
export type TodaySterilizer = z.infer<typeof todaySterilizerSchema>;

export const todayCartSchema = z.object({
  id: idSchema,
  code: z.string(),
  name: z.string(),
  isUsable: z.boolean(),
  note: z.string(),
  load: z
    .object({
      id: idSchema,
      number: z.string(),
      state: loadStateSchema,
      openedBy: z.string(),
      listed: z.number().int(),
      scanned: z.number().int(),
    })
    .nullable(),
});
export type TodayCart = z.infer<typeof todayCartSchema>;

export const waitSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('air-removal-missing'), sterilizerId: idSchema, title: z.string(), detail: z.string() }),
  z.object({ kind: z.literal('air-removal-failed'), sterilizerId: idSchema, title: z.string(), detail: z.string() }),
  z.object({ kind: z.literal('load-building'), loadId: idSchema, title: z.string(), detail: z.string() }),
  z.object({ kind: z.literal('load-closed'), loadId: idSchema, title: z.string(), detail: z.string() }),
  z.object({
    kind: z.literal('run-waiting'),
    runId: idSchema,
    title: z.string(),
    detail: z.string(),
    wantedAt: instantSchema.nullable(),
  }),
  z.object({ kind: z.literal('packed-not-staged'), title: z.string(), detail: z.string() }),
]);
export type Wait = z.infer<typeof waitSchema>;

export const todaySchema = z.object({
  now: instantSchema,
  /** The facility's day: what "today" means for tests and loads. */
  day: dateSchema,
  shift: z.object({ name: z.string(), endsAt: z.string() }).nullable(),
  sterilizers: z.array(todaySterilizerSchema),
  carts: z.array(todayCartSchema),
  runs: z.array(runSummarySchema),
  /** Packages that are packed and in no run. */
  packed: z.number().int(),
  waits: z.array(waitSchema),
});
export type Today = z.infer<typeof todaySchema>;
