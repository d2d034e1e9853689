import type { ItemFields } from '#domain/catalogue/item-fields';
import type { Db, Transaction } from '../../platform/db';
import type { Kept } from '../../platform/register/register';
import { itemFieldsFromRow, itemRowFrom, type WholeItemRow } from './item-row';

// PostgreSQL takes at most 65,535 values in one statement; a row has 33.
const rowsPerStatement = 1_000;

export async function listKeptItems(trx: Transaction | Db, facilityId: string): Promise<Kept<ItemFields>[]> {
  const rows = await trx('items').where('items.facility_id', facilityId).select<WholeItemRow[]>('items.*');
  return rows.map((row) => ({ id: row.id, version: row.version, fields: itemFieldsFromRow(row) }));
}

/** Puts items in, or in the place of what they were. */
export async function putItems(
  trx: Transaction,
  facilityId: string,
  items: readonly Kept<ItemFields>[],
): Promise<void> {
  for (let from = 0; from < items.length; from += rowsPerStatement) {
    const rows = items.slice(from, from + rowsPerStatement).map(({ id, version, fields }) => ({
      id,
      facility_id: facilityId,
      version,
      ...itemRowFrom(fields),
    }));
    await trx('items').insert(rows).onConflict('id').merge();
  }
}
