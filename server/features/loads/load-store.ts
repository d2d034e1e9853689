import type { Acceptance, LoadHolder, LoadPackage, PackageState, Turn } from '#domain/load/model';
import type { LoadDifference } from '#domain/load/difference';
import { mm } from '#domain/units/quantity';
import type { LoadState } from '#contract/loads';
import type { Db, Transaction } from '../../platform/db';
import { NotFound } from '../../platform/errors';
import { placementFromRow, placementToRow, type PlacementRow } from './placement-row';

export type LoadRow = {
  readonly id: string;
  readonly facility_id: string;
  readonly number: string;
  readonly day: string;
  readonly sterilizer_id: string;
  readonly program_id: string;
  readonly cart_id: string;
  readonly run_id: string | null;
  readonly state: LoadState;
  readonly opened_by: string;
  readonly opened_at: Date;
  readonly closed_at: Date | null;
  readonly policy_id: string;
  readonly rule_set: string | null;
  readonly contents_digest: string | null;
  readonly version: number;
};

/** Finds a load of this facility, or says that there is none: also to people of other facilities. */
export async function getLoad(db: Db | Transaction, facilityId: string, loadId: string): Promise<LoadRow> {
  const row = await db<LoadRow>('loads').where({ id: loadId, facility_id: facilityId }).first();
  if (!row) throw new NotFound('load.none', 'There is no such load here.');
  return row;
}

/** The same, and nobody else can change the load until this transaction ends. */
export async function lockLoad(trx: Transaction, facilityId: string, loadId: string): Promise<LoadRow> {
  const row = await trx<LoadRow>('loads').where({ id: loadId, facility_id: facilityId }).forUpdate().first();
  if (!row) throw new NotFound('load.none', 'There is no such load here.');
  return row;
}

type LoadPackageRow = PlacementRow & {
  readonly package_id: string;
  readonly code: string;
  readonly item_id: string;
  readonly scanned_at: Date | null;
  readonly state: PackageState;
  readonly held_reason: string | null;
  readonly expires_on: string | null;
  readonly has_external_indicator: boolean;
  readonly has_internal_indicator: boolean;
};

export async function listLoadPackages(db: Db | Transaction, loadId: string): Promise<LoadPackage[]> {
  const rows = await db('load_packages as listed')
    .join('packages as package', 'package.id', 'listed.package_id')
    .where('listed.load_id', loadId)
    .orderBy(['listed.listed_at', 'package.code'])
    .select<LoadPackageRow[]>(
      'listed.package_id',
      'listed.scanned_at',
      'listed.place_kind',
      'listed.shelf_id',
      'listed.holder_id',
      'listed.slot',
      'listed.below_package_id',
      'listed.x_mm',
      'listed.y_mm',
      'listed.turn',
      'listed.pose',
      'listed.paper',
      'package.code',
      'package.item_id',
      'package.state',
      'package.held_reason',
      'package.expires_on',
      'package.has_external_indicator',
      'package.has_internal_indicator',
    );
  return rows.map((row) => ({
    packageId: row.package_id,
    code: row.code,
    itemId: row.item_id,
    isScanned: row.scanned_at !== null,
    placement: placementFromRow(row),
    state: row.state,
    heldReason: row.held_reason,
    expiresOn: row.expires_on,
    hasExternalIndicator: row.has_external_indicator,
    hasInternalIndicator: row.has_internal_indicator,
  }));
}

type LoadHolderRow = {
  readonly holder_id: string;
  readonly name: string;
  readonly place_code: string;
  readonly holder_kind_id: string;
  readonly shelf_id: string;
  readonly x_mm: number;
  readonly y_mm: number;
  readonly turn: number;
};

export async function listLoadHolders(db: Db | Transaction, loadId: string): Promise<LoadHolder[]> {
  const rows = await db('load_holders as placed')
    .join('holders as holder', 'holder.id', 'placed.holder_id')
    .where('placed.load_id', loadId)
    .orderBy('holder.name')
    .select<LoadHolderRow[]>(
      'placed.holder_id',
      'placed.shelf_id',
      'placed.x_mm',
      'placed.y_mm',
      'placed.turn',
      'holder.name',
      'holder.place_code',
      'holder.holder_kind_id',
    );
  return rows.map((row) => ({
    holderId: row.holder_id,
    name: row.name,
    placeCode: row.place_code,
    kindId: row.holder_kind_id,
    shelfId: row.shelf_id,
    xMm: mm(row.x_mm),
    yMm: mm(row.y_mm),
    turn: (row.turn === 90 ? 90 : 0) satisfies Turn,
  }));
}

export type CountRow = {
  readonly shelfId: string;
  readonly counted: number;
  readonly countedBy: string;
  readonly countedAt: string;
};

export async function listCounts(db: Db | Transaction, loadId: string): Promise<CountRow[]> {
  const rows = await db('load_counts as count')
    .join('people as person', 'person.id', 'count.counted_by')
    .where('count.load_id', loadId)
    .select<{ shelf_id: string; counted: number; display_name: string; counted_at: Date }[]>(
      'count.shelf_id',
      'count.counted',
      'count.counted_at',
      'person.display_name',
    );
  return rows.map((row) => ({
    shelfId: row.shelf_id,
    counted: row.counted,
    countedBy: row.display_name,
    countedAt: row.counted_at.toISOString(),
  }));
}

export type AcceptanceRow = Acceptance & { readonly acceptedBy: string; readonly acceptedAt: string };

export async function listAcceptances(db: Db | Transaction, loadId: string): Promise<AcceptanceRow[]> {
  const rows = await db('load_acceptances as acceptance')
    .join('people as person', 'person.id', 'acceptance.accepted_by')
    .where('acceptance.load_id', loadId)
    .orderBy('acceptance.accepted_at')
    .select<{ finding_key: string; rule_id: string; reason: string; display_name: string; accepted_at: Date }[]>(
      'acceptance.finding_key',
      'acceptance.rule_id',
      'acceptance.reason',
      'acceptance.accepted_at',
      'person.display_name',
    );
  return rows.map((row) => ({
    findingKey: row.finding_key,
    ruleId: row.rule_id,
    reason: row.reason,
    acceptedBy: row.display_name,
    acceptedAt: row.accepted_at.toISOString(),
  }));
}

type Scanning = { readonly personId: string; readonly entry: string; readonly at: Date };

async function addPackage(trx: Transaction, loadId: string, after: LoadPackage, scanning: Scanning): Promise<void> {
  const origin = await trx('packages')
    .where({ id: after.packageId })
    .first<{ run_id: string | null } | undefined>('run_id');
  await trx('load_packages').insert({
    load_id: loadId,
    package_id: after.packageId,
    is_open: true,
    was_staged: (origin?.run_id ?? null) !== null,
    listed_at: scanning.at,
    scanned_at: after.isScanned ? scanning.at : null,
    scanned_by: after.isScanned ? scanning.personId : null,
    entry: after.isScanned ? scanning.entry : null,
    ...placementToRow(after.placement),
  });
}

/** Off the list: back to where it waited before, and its sticker counts no more. */
async function removePackage(trx: Transaction, loadId: string, packageId: string, scanning: Scanning): Promise<void> {
  await trx('load_packages').where({ load_id: loadId, package_id: packageId }).delete();
  await trx('packages')
    .where({ id: packageId })
    .whereIn('state', ['in-load', 'staged'])
    .update({
      state: trx.raw("case when run_id is null then 'packed' else 'staged' end"),
      version: trx.raw('version + 1'),
    });
  await trx('load_stickers')
    .where({ load_id: loadId, package_id: packageId })
    .whereNull('voided_at')
    .update({ voided_at: scanning.at, voided_by: scanning.personId, void_reason: 'Taken off the load' });
}

async function writePackage(
  trx: Transaction,
  loadId: string,
  { id, before, after }: LoadDifference['packages'][number],
  scanning: Scanning,
): Promise<void> {
  if (after === null) {
    await removePackage(trx, loadId, id, scanning);
    return;
  }
  const becomesScanned = after.isScanned && before?.isScanned !== true;
  const becomesUnscanned = !after.isScanned && before?.isScanned === true;
  await Promise.all([
    before === null
      ? addPackage(trx, loadId, after, scanning)
      : trx('load_packages')
          .where({ load_id: loadId, package_id: id })
          .update({
            ...placementToRow(after.placement),
            ...(becomesScanned
              ? { scanned_at: scanning.at, scanned_by: scanning.personId, entry: scanning.entry }
              : {}),
            ...(becomesUnscanned ? { scanned_at: null, scanned_by: null, entry: null } : {}),
          }),
    before?.state === after.state
      ? null
      : trx('packages')
          .where({ id })
          .update({ state: after.state, version: trx.raw('version + 1') }),
  ]);
}

async function writeHolder(
  trx: Transaction,
  loadId: string,
  { id, after }: LoadDifference['holders'][number],
): Promise<void> {
  if (after === null) {
    await trx('load_holders').where({ load_id: loadId, holder_id: id }).delete();
    return;
  }
  const place = { shelf_id: after.shelfId, x_mm: after.xMm, y_mm: after.yMm, turn: after.turn };
  await trx('load_holders')
    .insert({ load_id: loadId, holder_id: id, ...place })
    .onConflict(['load_id', 'holder_id'])
    .merge(place);
}

/** Writes what an act changed of a load's packages, holders and program. */
export async function writeDifference(
  trx: Transaction,
  loadId: string,
  difference: LoadDifference,
  scanning: Scanning,
): Promise<void> {
  await Promise.all([
    ...difference.packages.map((change) => writePackage(trx, loadId, change, scanning)),
    ...difference.holders.map((change) => writeHolder(trx, loadId, change)),
    difference.program && trx('loads').where({ id: loadId }).update({ program_id: difference.program.after.id }),
  ]);
}

/** One step on: everybody who holds an older version fetches anew. */
export async function stepVersion(trx: Transaction, load: LoadRow): Promise<number> {
  const version = load.version + 1;
  await trx('loads').where({ id: load.id }).update({ version });
  return version;
}

export async function voidCounts(trx: Transaction, loadId: string, shelfIds: readonly string[]): Promise<void> {
  if (shelfIds.length === 0) return;
  await trx('load_counts')
    .where({ load_id: loadId })
    .whereIn('shelf_id', [...shelfIds])
    .delete();
}
