import { z } from 'zod';

/** RFC 9457 problem details, with a stable `code` and a reference that is also in the log. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string(),
  instance: z.string(),
  code: z.string(),
  reference: z.string(),
  fields: z.array(z.object({ pointer: z.string(), detail: z.string() })).optional(),
});

export type ProblemDetails = z.infer<typeof problemSchema>;

/** The media type of RFC 9457, section 3. */
export const problemMediaType = 'application/problem+json';
