import { z } from 'zod';
import { timeOfText } from './wanted-at';

export const runNameSchema = z
  .string()
  .trim()
  .min(1, 'Give it a name that people say, such as a room or a list.')
  .max(80);

/** HH:MM on the wall, or empty. */
export const wantedTimeSchema = z
  .string()
  .trim()
  .refine((text) => text === '' || timeOfText(text) !== null, 'A time such as 14:30.');

export const changeRunFormSchema = z.object({
  name: runNameSchema,
  /** YYYY-MM-DD on the wall calendar; says nothing while there is no time. */
  day: z.iso.date(),
  time: wantedTimeSchema,
});
export type ChangeRunForm = z.infer<typeof changeRunFormSchema>;
