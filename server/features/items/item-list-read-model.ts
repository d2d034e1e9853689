import type { Item, ItemList } from '#contract/items';
import type { ItemKind } from '#domain/load/model';
import type { Db, Transaction } from '../../platform/db';
import { NotFound } from '../../platform/errors';
import { containing } from '../../platform/search-text';
import { itemFieldsFromRow, type WholeItemRow } from './item-row';

function itemOf(row: WholeItemRow): Item {
  const fields = itemFieldsFromRow(row);
  return {
    ...fields,
    standsOn: [...fields.standsOn],
    filterZones: [...fields.filterZones],
    cycleNeeds: [...fields.cycleNeeds],
    id: row.id,
    version: row.version,
  };
}

export async function getItem(trx: Transaction | Db, facilityId: string, itemId: string): Promise<Item> {
  const row = await trx('items')
    .where({ 'items.facility_id': facilityId, 'items.id': itemId })
    .first<WholeItemRow | undefined>('items.*');
  if (!row) throw new NotFound('item.none', 'There is no such item here.');
  return itemOf(row);
}

export type ItemListFilters = {
  readonly search: string;
  readonly kind?: ItemKind | undefined;
  readonly retired: 'hidden' | 'shown';
  readonly page: number;
  readonly pageSize: number;
};

/** One page of the facility's items by code; every word of the search is found in code, name, identifier or service. */
export async function listItems(db: Db, facilityId: string, filters: ItemListFilters): Promise<ItemList> {
  const { search, kind, retired, page, pageSize } = filters;
  const wanted = db('items').where('items.facility_id', facilityId);
  if (retired === 'hidden') void wanted.where('items.is_retired', false);
  if (kind !== undefined) void wanted.where('items.kind', kind);
  for (const word of search.split(/\s+/).filter((one) => one !== '')) {
    void wanted.where((either) => {
      for (const column of ['code', 'name', 'device_identifier', 'service', 'note']) {
        void either.orWhereILike(`items.${column}`, containing(word));
      }
    });
  }
  const [counted] = await wanted.clone().count<{ count: number }[]>({ count: '*' });
  const rows = await wanted
    .orderBy('items.code')
    .limit(pageSize)
    .offset((page - 1) * pageSize)
    .select<WholeItemRow[]>('items.*');
  return { items: rows.map(itemOf), total: counted?.count ?? 0, page, pageSize };
}
