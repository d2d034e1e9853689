import type { PackageSummary } from '#contract/packages';
import type { ItemKind, PackageState } from '#domain/load/model';
import { isExpired } from '#domain/package/expiry';
import type { Knex } from 'knex';
import type { Db, Transaction } from '../../platform/db';

type SummaryRow = {
  readonly id: string;
  readonly code: string;
  readonly item_id: string;
  readonly item_code: string;
  readonly item_name: string;
  readonly item_kind: ItemKind;
  readonly is_implant: boolean;
  readonly state: PackageState;
  readonly held_reason: string | null;
  readonly expires_on: string | null;
  readonly packed_at: Date;
  readonly packed_by: string;
  readonly destination: string;
  readonly run_id: string | null;
  readonly run_name: string | null;
  readonly load_id: string | null;
  readonly load_number: string | null;
  readonly labels: number;
};

function fromRow(row: SummaryRow, today: string): PackageSummary {
  return {
    id: row.id,
    code: row.code,
    item: { id: row.item_id, code: row.item_code, name: row.item_name, kind: row.item_kind, isImplant: row.is_implant },
    state: row.state,
    heldReason: row.held_reason,
    expiresOn: row.expires_on,
    isExpired: isExpired(row.expires_on, today),
    packedAt: row.packed_at.toISOString(),
    packedBy: row.packed_by,
    destination: row.destination,
    run: row.run_id === null || row.run_name === null ? null : { id: row.run_id, name: row.run_name },
    openLoad: row.load_id === null || row.load_number === null ? null : { id: row.load_id, number: row.load_number },
    labels: row.labels,
  };
}

export type PackageFilters = {
  readonly search?: string | undefined;
  /** A whole code as kept, when that is what the search is. */
  readonly code?: string | undefined;
  readonly itemId?: string | undefined;
  readonly state?: PackageState | undefined;
  readonly runId?: string | undefined;
};

function containing(text: string): string {
  return `%${text.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%`;
}

function narrow(query: Knex.QueryBuilder, facilityId: string, filters: PackageFilters): Knex.QueryBuilder {
  query.where('packages.facility_id', facilityId);
  if (filters.state !== undefined) query.andWhere('packages.state', filters.state);
  if (filters.itemId !== undefined) query.andWhere('packages.item_id', filters.itemId);
  if (filters.runId !== undefined) query.andWhere('packages.run_id', filters.runId);
  if (filters.code !== undefined) query.andWhere('packages.code', filters.code);
  else if (filters.search !== undefined && filters.search !== '') {
    const pattern = containing(filters.search);
    query.andWhere((either) => {
      either
        .whereILike('packages.code', pattern)
        .orWhereILike('items.code', pattern)
        .orWhereILike('items.name', pattern)
        .orWhereILike('packages.destination', pattern);
    });
  }
  return query;
}

function summaries(trx: Transaction | Db): Knex.QueryBuilder {
  return trx('packages')
    .join('items', 'items.id', 'packages.item_id')
    .join('people', 'people.id', 'packages.packed_by')
    .leftJoin('runs', 'runs.id', 'packages.run_id')
    .leftJoin('load_packages', (join) => {
      join.on('load_packages.package_id', 'packages.id').andOnVal('load_packages.is_open', true);
    })
    .leftJoin('loads', 'loads.id', 'load_packages.load_id')
    .select(
      'packages.id',
      'packages.code',
      'packages.item_id',
      'items.code as item_code',
      'items.name as item_name',
      'items.kind as item_kind',
      'items.is_implant',
      'packages.state',
      'packages.held_reason',
      'packages.expires_on',
      'packages.packed_at',
      'people.display_name as packed_by',
      'packages.destination',
      'packages.run_id',
      'runs.name as run_name',
      'loads.id as load_id',
      'loads.number as load_number',
      trx.raw('(select count(*) from label_prints where label_prints.package_id = packages.id) as labels'),
    );
}

export type PackagePage = { readonly page: number; readonly perPage: number; readonly today: string };

/** One page of the facility's packages, the latest packed first, and how many there are in all. */
export async function listPackages(
  db: Db,
  facilityId: string,
  filters: PackageFilters,
  { page, perPage, today }: PackagePage,
): Promise<{ readonly packages: PackageSummary[]; readonly total: number }> {
  const [rows, counted] = await Promise.all([
    narrow(summaries(db), facilityId, filters)
      .orderBy([
        { column: 'packages.packed_at', order: 'desc' },
        { column: 'packages.code', order: 'asc' },
      ])
      .limit(perPage)
      .offset((page - 1) * perPage) as unknown as Promise<SummaryRow[]>,
    narrow(db('packages').join('items', 'items.id', 'packages.item_id'), facilityId, filters).count<
      { total: number }[]
    >('packages.id as total'),
  ]);
  return { packages: rows.map((row) => fromRow(row, today)), total: counted[0]?.total ?? 0 };
}

/** The packages that wait in a run, by item and code. */
export async function listStagedPackages(db: Db, runId: string, today: string): Promise<PackageSummary[]> {
  const rows = (await summaries(db)
    .where({ 'packages.run_id': runId, 'packages.state': 'staged' })
    .orderBy(['items.code', 'packages.code'])) as SummaryRow[];
  return rows.map((row) => fromRow(row, today));
}

export async function findPackageSummary(
  trx: Transaction | Db,
  facilityId: string,
  by: { readonly id: string } | { readonly code: string },
  today: string,
): Promise<PackageSummary | undefined> {
  const query = summaries(trx).where('packages.facility_id', facilityId);
  if ('id' in by) query.andWhere('packages.id', by.id);
  else query.andWhere('packages.code', by.code);
  const rows = (await query) as SummaryRow[];
  return rows[0] && fromRow(rows[0], today);
}
