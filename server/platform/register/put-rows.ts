import type { Transaction } from '../db';

// PostgreSQL takes at most 65,535 values in one statement; no register's row has more than 40.
const rowsPerStatement = 1_000;

/** Puts rows in, or in the place of what they were by `id`. */
export async function putRows(
  trx: Transaction,
  table: string,
  rows: readonly ({ readonly id: string } & Readonly<Record<string, unknown>>)[],
): Promise<void> {
  for (let from = 0; from < rows.length; from += rowsPerStatement) {
    await trx(table)
      .insert(rows.slice(from, from + rowsPerStatement))
      .onConflict('id')
      .merge();
  }
}
