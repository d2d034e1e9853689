import { z } from 'zod';
import { requestIdSchema } from './common';

/** The whole file or nothing; or the good lines without the others. */
export const importModeSchema = z.enum(['all-or-nothing', 'good-rows']);
export type ImportMode = z.infer<typeof importModeSchema>;

export const greatestImportBytes = 10 * 1024 * 1024;
export const greatestImportRows = 10_000;

export const importProblemSchema = z.object({
  /** Line of the file, counted from 1, where the row begins. */
  line: z.number().int(),
  /** The header's word; null where the row as a whole is meant. */
  column: z.string().nullable(),
  sentence: z.string(),
});
export type ImportProblem = z.infer<typeof importProblemSchema>;

export const importedRowSchema = z.object({
  line: z.number().int(),
  name: z.string(),
  what: z.enum(['added', 'changed']),
  /** Of a changed row: the columns that change, with the cell as it was and as it will be. */
  changes: z.array(z.object({ column: z.string(), before: z.string(), after: z.string() })),
});
export type ImportedRow = z.infer<typeof importedRowSchema>;

const importCounts = {
  rows: z.number().int(),
  added: z.number().int(),
  changed: z.number().int(),
  unchanged: z.number().int(),
  refused: z.number().int(),
};

/** What a file would do. Long lists are cut, and say by how much. */
export const importPreviewSchema = z.object({
  ...importCounts,
  /** Names exactly this file against exactly what is there now: an import says which preview it goes by. */
  digest: z.string(),
  problems: z.array(importProblemSchema),
  problemsLeftOut: z.number().int(),
  changes: z.array(importedRowSchema),
  changesLeftOut: z.number().int(),
});
export type ImportPreview = z.infer<typeof importPreviewSchema>;

/** The text fields beside the file in the form. */
export const importRequestSchema = z.strictObject({
  requestId: requestIdSchema,
  mode: importModeSchema,
  digest: z.string().regex(/^[0-9a-f]{64}$/, 'Look at the preview first.'),
});

export const importResultSchema = z.object(importCounts);
export type ImportResult = z.infer<typeof importResultSchema>;
