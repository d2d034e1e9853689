import type { HolderOnFile } from '#contract/equipment';
import type { HolderFields } from '#domain/catalogue/equipment-fields';
import type { Db, Transaction } from '../../platform/db';
import { NotFound } from '../../platform/errors';
import { pageOf, whereFound, type ListFilters } from '../../platform/paged-list';
import type { HolderRow } from './equipment-rows';

export type HolderWithKindRow = HolderRow & { readonly kind_code: string; readonly kind_name: string };

const columns = ['holders.*', 'holder_kinds.code as kind_code', 'holder_kinds.name as kind_name'] as const;

export function holdersWithKind(trx: Transaction | Db, facilityId: string) {
  return trx('holders')
    .join('holder_kinds', 'holder_kinds.id', 'holders.holder_kind_id')
    .where('holders.facility_id', facilityId);
}

export function listHolderRows(trx: Transaction | Db, facilityId: string): Promise<HolderWithKindRow[]> {
  return holdersWithKind(trx, facilityId).select<HolderWithKindRow[]>([...columns]);
}

export function holderFieldsFromRow(row: HolderWithKindRow): HolderFields {
  return { name: row.name, kind: row.kind_code, condition: row.condition, placeCode: row.place_code };
}

function onFile(row: HolderWithKindRow): HolderOnFile {
  return {
    ...holderFieldsFromRow(row),
    placeCode: row.place_code,
    id: row.id,
    version: row.version,
    kindName: row.kind_name,
    holderKindId: row.holder_kind_id,
  };
}

export async function getHolder(trx: Transaction | Db, facilityId: string, holderId: string): Promise<HolderOnFile> {
  const row = await holdersWithKind(trx, facilityId)
    .where('holders.id', holderId)
    .first<HolderWithKindRow | undefined>([...columns]);
  if (!row) throw new NotFound('holder.none', 'There is no such holder here.');
  return onFile(row);
}

/** One page of the facility's holders by kind and name. Missing ones are shown last only when all are asked for. */
export async function listHolders(
  db: Db,
  facilityId: string,
  { search, kind, retired, page, pageSize }: ListFilters & { readonly kind?: string | undefined },
) {
  const wanted = holdersWithKind(db, facilityId);
  if (retired === 'hidden') void wanted.whereNot('holders.condition', 'missing');
  if (kind !== undefined) void wanted.where('holder_kinds.code', kind);
  whereFound(wanted, search, ['holders.name', 'holders.place_code', 'holder_kinds.code', 'holder_kinds.name']);
  const { rows, ...paging } = await pageOf<HolderWithKindRow>(wanted, {
    page,
    pageSize,
    orderBy: ['holder_kinds.code', 'holders.place_code'],
    select: columns,
  });
  return { holders: rows.map(onFile), ...paging };
}
