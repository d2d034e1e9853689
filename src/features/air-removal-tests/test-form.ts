import { airRemovalResultSchema } from '#contract/air-removal-tests';
import { lineSchema } from '#contract/catalogue-common';
import { idSchema, textSchema } from '#contract/common';
import { instantAt } from '#domain/time/instant-at';
import { wallClock } from '#domain/time/wall-clock';
import { z } from 'zod';

/* What people fill in of an air-removal test. The time is written as the wall clock of the facility shows it. */

function testedAtSchema(timeZone: string) {
  return z.string().transform((text, context): string => {
    const [day = '', time = ''] = text.split('T');
    try {
      return instantAt({ day, time }, timeZone);
    } catch {
      context.addIssue({ code: 'custom', message: 'Write a day and a time.' });
      return z.NEVER;
    }
  });
}

export function airRemovalTestFormSchema(timeZone: string) {
  return z.object({
    sterilizerId: z.uuid({ error: 'Choose a sterilizer.' }),
    testedAt: testedAtSchema(timeZone),
    result: airRemovalResultSchema,
    packLot: textSchema(60),
    packExpiresOn: z.iso.date({ error: 'Write the day it expires on.' }),
    isBeforeFirstLoad: z.boolean(),
    secondReaderId: z.union([z.literal('').transform((): null => null), idSchema]),
    note: lineSchema,
    isTakenOutOfService: z.boolean(),
  });
}

export type AirRemovalTestInput = z.input<ReturnType<typeof airRemovalTestFormSchema>>;
export type AirRemovalTestOutput = z.output<ReturnType<typeof airRemovalTestFormSchema>>;

/** As a field for day and time writes it: "2026-03-14T05:40". */
export function wallTextOf(at: Date, timeZone: string): string {
  const { day, time } = wallClock(at.toISOString(), timeZone);
  return `${day}T${time.slice(0, 5)}`;
}
