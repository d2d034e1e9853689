import { z } from 'zod';
import { textSchema } from './common';

/**
 * A code people give to a thing: kept in capitals, without spaces, and never beginning with a sign that a spreadsheet
 * would take for a formula.
 */
export const codeSchema = z
  .string({ error: 'Please fill this in.' })
  .trim()
  .min(1, 'Please fill this in.')
  .max(40, 'At most 40 characters.')
  .regex(/^[A-Za-z0-9][A-Za-z0-9._/-]*$/, 'Letters A to Z, digits and - . _ / only, beginning with a letter or digit.')
  .transform((code) => code.toUpperCase());

export const nameSchema = textSchema(120);

/** One line that may stay empty. */
export const lineSchema = z
  .string()
  .trim()
  .max(300, 'At most 300 characters.')
  .regex(/^[^\u0000-\u001f\u007f]*$/, 'This has a character that cannot be kept.');

/** An answer to a yes-or-no question. */
export const yesNoSchema = z.boolean({ error: 'Please say yes or no.' });

/** One of a closed list, refused in words. */
export function oneOf<const Choices extends readonly [string, ...string[]]>(choices: Choices) {
  return z.enum(choices, { error: `One of ${choices.join(', ')}.` });
}

/** For lists: what people search, which page, and whether what is no longer used is shown too. */
export const listQuery = {
  search: z.string().trim().max(100).default(''),
  retired: z.enum(['hidden', 'shown']).default('hidden'),
  page: z.coerce.number().int().min(1).max(10_000).default(1),
  pageSize: z.coerce.number().int().min(1).max(200).default(50),
};

export const versionSchema = z.number().int().min(1);

/** What a page of a list says about the whole. */
export const pageOfList = {
  total: z.number().int(),
  page: z.number().int(),
  pageSize: z.number().int(),
};
