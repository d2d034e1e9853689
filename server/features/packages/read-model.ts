import type { PackageState } from '#domain/load/model';
import type { Db, Transaction } from '../../platform/db';

/* What other features may ask about packages and runs. */

export type PackageFacts = {
  readonly id: string;
  readonly code: string;
  readonly facilityId: string;
  readonly itemId: string;
  readonly itemCode: string;
  readonly itemName: string;
  readonly isImplant: boolean;
  /** 1 for the first time it is packed; counts up with each reprocessing. */
  readonly life: number;
  readonly state: PackageState;
  /** Why nobody may use or load it, whatever its state; null when nothing is against it. */
  readonly heldReason: string | null;
  readonly runId: string | null;
  readonly run: { readonly id: string; readonly name: string; readonly state: RunFacts['state'] } | null;
  /** Calendar day, YYYY-MM-DD; null where expiry is event-related. */
  readonly expiresOn: string | null;
  readonly hasExternalIndicator: boolean;
  readonly hasInternalIndicator: boolean;
  /** The load that has it listed and is not finished with it. */
  readonly openLoad: { readonly id: string; readonly number: string } | null;
  readonly version: number;
};

export type WaitingRun = {
  readonly id: string;
  readonly name: string;
  readonly sterilizerId: string | null;
  readonly programId: string | null;
  readonly wantedAt: Date | null;
  readonly packages: number;
  readonly implants: number;
};

export type RunFacts = {
  readonly id: string;
  readonly facilityId: string;
  readonly name: string;
  readonly sterilizerId: string | null;
  readonly programId: string | null;
  readonly wantedAt: Date | null;
  readonly state: 'waiting' | 'taken' | 'dropped';
  readonly version: number;
};

type PackageRow = {
  readonly id: string;
  readonly code: string;
  readonly facility_id: string;
  readonly item_id: string;
  readonly item_code: string;
  readonly item_name: string;
  readonly is_implant: boolean;
  readonly life: number;
  readonly state: PackageState;
  readonly held_reason: string | null;
  readonly run_id: string | null;
  readonly run_name: string | null;
  readonly run_state: RunFacts['state'] | null;
  readonly expires_on: string | null;
  readonly has_external_indicator: boolean;
  readonly has_internal_indicator: boolean;
  readonly open_load_id: string | null;
  readonly open_load_number: string | null;
  readonly version: number;
};

function fromRow(row: PackageRow): PackageFacts {
  return {
    id: row.id,
    code: row.code,
    facilityId: row.facility_id,
    itemId: row.item_id,
    itemCode: row.item_code,
    itemName: row.item_name,
    isImplant: row.is_implant,
    life: row.life,
    state: row.state,
    heldReason: row.held_reason,
    runId: row.run_id,
    run:
      row.run_id === null || row.run_name === null || row.run_state === null
        ? null
        : { id: row.run_id, name: row.run_name, state: row.run_state },
    expiresOn: row.expires_on,
    hasExternalIndicator: row.has_external_indicator,
    hasInternalIndicator: row.has_internal_indicator,
    openLoad:
      row.open_load_id === null || row.open_load_number === null
        ? null
        : { id: row.open_load_id, number: row.open_load_number },
    version: row.version,
  };
}

function packageFacts(trx: Transaction | Db) {
  return trx('packages')
    .join('items', 'items.id', 'packages.item_id')
    .leftJoin('runs', 'runs.id', 'packages.run_id')
    .leftJoin('load_packages', (join) => {
      join.on('load_packages.package_id', 'packages.id').andOnVal('load_packages.is_open', true);
    })
    .leftJoin('loads', 'loads.id', 'load_packages.load_id')
    .select<PackageRow[]>(
      'packages.id',
      'packages.code',
      'packages.facility_id',
      'packages.item_id',
      'items.code as item_code',
      'items.name as item_name',
      'items.is_implant',
      'packages.life',
      'packages.state',
      'packages.held_reason',
      'packages.run_id',
      'runs.name as run_name',
      'runs.state as run_state',
      'packages.expires_on',
      'packages.has_external_indicator',
      'packages.has_internal_indicator',
      'loads.id as open_load_id',
      'loads.number as open_load_number',
      'packages.version',
    );
}

/**
 * Locks the packages with these ids, always in the same order, so that two who want the same ones wait for each other
 * instead of blocking each other for good. To be called before anything about them is decided.
 */
export async function lockPackages(trx: Transaction, packageIds: readonly string[]): Promise<void> {
  await trx('packages')
    .whereIn('packages.id', [...packageIds])
    .orderBy('packages.id')
    .select('packages.id')
    .forUpdate();
}

/**
 * Locks the facility's package with this code. To be called before anything about it is decided.
 * @returns whether there is one; another facility's is not locked, and not known here
 */
export async function lockPackageByCode(trx: Transaction, facilityId: string, code: string): Promise<boolean> {
  const rows = await trx('packages')
    .where({ 'packages.facility_id': facilityId, 'packages.code': code })
    .select<{ id: string }[]>('packages.id')
    .forUpdate();
  return rows.length > 0;
}

/** The package with this code, of whichever facility; undefined where no label was ever printed with it. `code` as kept, with its hyphens. */
export async function findPackageByCode(trx: Transaction | Db, code: string): Promise<PackageFacts | undefined> {
  const rows = await packageFacts(trx).where('packages.code', code);
  return rows[0] && fromRow(rows[0]);
}

/** Facts of these packages, in order of their codes; ids that are unknown are left out. */
export async function findPackages(trx: Transaction | Db, packageIds: readonly string[]): Promise<PackageFacts[]> {
  const rows = await packageFacts(trx)
    .whereIn('packages.id', [...packageIds])
    .orderBy('packages.code');
  return rows.map(fromRow);
}

/** The packages staged into a run, in the order of their codes. */
export async function packagesOfRun(trx: Transaction | Db, runId: string): Promise<PackageFacts[]> {
  const rows = await packageFacts(trx)
    .where('packages.run_id', runId)
    .andWhere('packages.state', 'staged')
    .orderBy('packages.code');
  return rows.map(fromRow);
}

/** Runs that no load has taken yet, the soonest wanted first. */
export async function waitingRuns(trx: Transaction | Db, facilityId: string): Promise<WaitingRun[]> {
  const rows = await trx('runs')
    .leftJoin('packages', (join) => {
      join.on('packages.run_id', 'runs.id').andOnVal('packages.state', 'staged');
    })
    .leftJoin('items', 'items.id', 'packages.item_id')
    .where({ 'runs.facility_id': facilityId, 'runs.state': 'waiting' })
    .groupBy('runs.id')
    .orderByRaw('runs.wanted_at nulls last, runs.created_at')
    .select<
      {
        id: string;
        name: string;
        sterilizer_id: string | null;
        program_id: string | null;
        wanted_at: Date | null;
        packages: number;
        implants: number;
      }[]
    >(
      'runs.id',
      'runs.name',
      'runs.sterilizer_id',
      'runs.program_id',
      'runs.wanted_at',
      trx.raw('count(packages.id) as packages'),
      trx.raw('count(packages.id) filter (where items.is_implant) as implants'),
    );
  return rows.map((row) => ({
    id: row.id,
    name: row.name,
    sterilizerId: row.sterilizer_id,
    programId: row.program_id,
    wantedAt: row.wanted_at,
    packages: row.packages,
    implants: row.implants,
  }));
}

/** The run, locked until the transaction ends: whoever takes, fills or drops it does so alone. */
export async function lockRun(trx: Transaction, runId: string): Promise<RunFacts | undefined> {
  const row = await trx('runs').where({ id: runId }).forUpdate().first<
    | {
        id: string;
        facility_id: string;
        name: string;
        sterilizer_id: string | null;
        program_id: string | null;
        wanted_at: Date | null;
        state: RunFacts['state'];
        version: number;
      }
    | undefined
  >('id', 'facility_id', 'name', 'sterilizer_id', 'program_id', 'wanted_at', 'state', 'version');
  return (
    row && {
      id: row.id,
      facilityId: row.facility_id,
      name: row.name,
      sterilizerId: row.sterilizer_id,
      programId: row.program_id,
      wantedAt: row.wanted_at,
      state: row.state,
      version: row.version,
    }
  );
}
