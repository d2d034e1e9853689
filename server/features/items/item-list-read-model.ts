import type { Item, ItemList } from '#contract/items';
import type { ItemKind } from '#domain/load/model';
import type { Db, Transaction } from '../../platform/db';
import { NotFound } from '../../platform/errors';
import { pageOf, whereFound, type ListFilters } from '../../platform/paged-list';
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

/** One page of the facility's items by code. */
export async function listItems(
  db: Db,
  facilityId: string,
  { search, kind, retired, page, pageSize }: ListFilters & { readonly kind?: ItemKind | undefined },
): Promise<ItemList> {
  const wanted = db('items').where('items.facility_id', facilityId);
  if (retired === 'hidden') void wanted.where('items.is_retired', false);
  if (kind !== undefined) void wanted.where('items.kind', kind);
  whereFound(wanted, search, ['items.code', 'items.name', 'items.device_identifier', 'items.service', 'items.note']);
  const { rows, ...paging } = await pageOf<WholeItemRow>(wanted, {
    page,
    pageSize,
    orderBy: ['items.code'],
    select: ['items.*'],
  });
  return { items: rows.map(itemOf), ...paging };
}
