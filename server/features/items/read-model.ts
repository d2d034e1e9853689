import type { CatalogueItem } from '#domain/load/model';
import type { Db, Transaction } from '../../platform/db';
import { catalogueItemFromRow, type ItemRow } from './item-row';

/**
 * The facility's items with these ids, in no particular order; ids of elsewhere are left out.
 * A retired item is among them, since packages of it may still be about.
 */
export async function catalogueItems(
  trx: Transaction | Db,
  facilityId: string,
  ids: readonly string[],
): Promise<CatalogueItem[]> {
  if (ids.length === 0) return [];
  const rows = await trx('items')
    .where('items.facility_id', facilityId)
    .whereIn('items.id', [...new Set(ids)])
    .select<ItemRow[]>('items.*');
  return rows.map(catalogueItemFromRow);
}

/** The facility's item that carries this device identifier (a GTIN of 14 digits, or a HIBC primary code). */
export async function findItemByDeviceIdentifier(
  trx: Transaction | Db,
  facilityId: string,
  deviceIdentifier: string,
): Promise<CatalogueItem | undefined> {
  const row = await trx('items')
    .where({ 'items.facility_id': facilityId, 'items.device_identifier': deviceIdentifier })
    .first<ItemRow | undefined>('items.*');
  return row && catalogueItemFromRow(row);
}
