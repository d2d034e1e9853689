import type { ItemFields } from '#domain/catalogue/item-fields';
import type { Db, Transaction } from '../../platform/db';
import { putRows } from '../../platform/register/put-rows';
import type { Kept } from '../../platform/register/register';
import { itemFieldsFromRow, itemRowFrom, type WholeItemRow } from './item-row';

export async function listKeptItems(trx: Transaction | Db, facilityId: string): Promise<Kept<ItemFields>[]> {
  const rows = await trx('items').where('items.facility_id', facilityId).select<WholeItemRow[]>('items.*');
  return rows.map((row) => ({ id: row.id, version: row.version, fields: itemFieldsFromRow(row) }));
}

export async function putItems(
  trx: Transaction,
  facilityId: string,
  items: readonly Kept<ItemFields>[],
): Promise<void> {
  const rows = items.map(({ id, version, fields }) => ({
    id,
    facility_id: facilityId,
    version,
    ...itemRowFrom(fields),
  }));
  // Two items may swap their identifiers in one go, and the unique key is looked at row by row.
  const identified = rows.filter((row) => row.device_identifier !== null && row.version > 1).map((row) => row.id);
  if (identified.length > 0) await trx('items').whereIn('id', identified).update({ device_identifier: null });
  await putRows(trx, 'items', rows);
}
