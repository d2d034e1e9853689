import type { PackageState } from '#domain/load/model';
import type { Transaction } from '../../platform/db';

export type NewPackage = {
  readonly id: string;
  readonly facilityId: string;
  readonly code: string;
  readonly itemId: string;
  readonly packedBy: string;
  readonly packedAt: Date;
  readonly hasInternalIndicator: boolean;
  readonly hasExternalIndicator: boolean;
  readonly expiresOn: string | null;
  readonly destination: string;
};

/** PostgreSQL takes at most 65,535 values in one statement (protocol, message flow: a count of 16 bits). */
const packagesPerStatement = 1_000;

function rowOf(one: NewPackage) {
  return {
    id: one.id,
    facility_id: one.facilityId,
    code: one.code,
    item_id: one.itemId,
    state: 'packed' satisfies PackageState,
    packed_by: one.packedBy,
    packed_at: one.packedAt,
    is_contents_confirmed: true,
    has_internal_indicator: one.hasInternalIndicator,
    has_external_indicator: one.hasExternalIndicator,
    expires_on: one.expiresOn,
    destination: one.destination,
  };
}

export async function insertPackages(trx: Transaction, made: readonly NewPackage[]): Promise<void> {
  for (let from = 0; from < made.length; from += packagesPerStatement) {
    await trx('packages').insert(made.slice(from, from + packagesPerStatement).map(rowOf));
  }
}

/** Into a run, or with `runId` null out of it. */
export async function setRun(trx: Transaction, packageIds: readonly string[], runId: string | null): Promise<void> {
  if (packageIds.length === 0) return;
  await trx('packages')
    .whereIn('packages.id', [...packageIds])
    .update({
      state: (runId === null ? 'packed' : 'staged') satisfies PackageState,
      run_id: runId,
      version: trx.raw('version + 1'),
    });
}
