import type { HolderKindOnFile } from '#contract/equipment';
import type { HolderKindFields } from '#domain/catalogue/equipment-fields';
import type { Db, Transaction } from '../../platform/db';
import { NotFound } from '../../platform/errors';
import { pageOf, whereFound, type ListFilters } from '../../platform/paged-list';
import { holderKindFromRow, type HolderKindRow } from './equipment-rows';

export function holderKindFieldsFromRow(row: HolderKindRow): HolderKindFields {
  const { id: _id, ...kind } = holderKindFromRow(row);
  return { ...kind, owned: row.owned };
}

async function onFile(trx: Transaction | Db, rows: readonly HolderKindRow[]): Promise<HolderKindOnFile[]> {
  const counted = await trx('holders')
    .whereIn(
      'holders.holder_kind_id',
      rows.map((row) => row.id),
    )
    .groupBy('holders.holder_kind_id')
    .select<{ readonly holder_kind_id: string; readonly coded: number; readonly in_good_order: number }[]>(
      'holders.holder_kind_id',
      trx.raw('count(*)::int as coded'),
      trx.raw(`count(*) filter (where holders.condition = 'good')::int as in_good_order`),
    );
  const byKind = new Map(counted.map((one) => [one.holder_kind_id, one]));
  return rows.map((row) => ({
    ...holderKindFieldsFromRow(row),
    id: row.id,
    version: row.version,
    coded: byKind.get(row.id)?.coded ?? 0,
    inGoodOrder: byKind.get(row.id)?.in_good_order ?? 0,
  }));
}

export async function getHolderKind(
  trx: Transaction | Db,
  facilityId: string,
  holderKindId: string,
): Promise<HolderKindOnFile> {
  const row = await trx('holder_kinds')
    .where({ 'holder_kinds.facility_id': facilityId, 'holder_kinds.id': holderKindId })
    .first<HolderKindRow | undefined>('holder_kinds.*');
  const [kind] = row ? await onFile(trx, [row]) : [];
  if (!kind) throw new NotFound('holder-kind.none', 'There is no such kind of holder here.');
  return kind;
}

/** One page of the facility's kinds of holders by code. */
export async function listHolderKinds(db: Db, facilityId: string, { search, page, pageSize }: ListFilters) {
  const wanted = db('holder_kinds').where('holder_kinds.facility_id', facilityId);
  whereFound(wanted, search, ['holder_kinds.code', 'holder_kinds.name', 'holder_kinds.form']);
  const { rows, ...paging } = await pageOf<HolderKindRow>(wanted, {
    page,
    pageSize,
    orderBy: ['holder_kinds.code'],
    select: ['holder_kinds.*'],
  });
  return { holderKinds: await onFile(db, rows), ...paging };
}
