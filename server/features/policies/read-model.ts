import type { PolicySettings } from '#domain/policy/settings';
import { readSettings } from '#domain/policy/settings';
import { versionInForce } from '#domain/policy/versions';
import type { Db, Transaction } from '../../platform/db';

/* What loads ask about the policy. */

export type PolicyFacts = {
  readonly id: string;
  readonly number: number;
  readonly effectiveOn: string;
  readonly settings: PolicySettings;
};

type Row = {
  readonly id: string;
  readonly number: number;
  readonly effective_on: string;
  readonly settings: unknown;
};

const columns = ['id', 'number', 'effective_on', 'settings'] as const;

function fromRow(row: Row): PolicyFacts {
  return {
    id: row.id,
    number: row.number,
    effectiveOn: row.effective_on,
    settings: readSettings(row.settings).settings,
  };
}

export async function policyById(db: Db | Transaction, policyId: string): Promise<PolicyFacts | undefined> {
  const row = await db('policies')
    .where({ id: policyId })
    .first<Row | undefined>(...columns);
  return row && fromRow(row);
}

/** The version that holds in a facility on a day of its calendar; undefined where none does yet. */
export async function policyInForce(
  db: Db | Transaction,
  facilityId: string,
  day: string,
): Promise<PolicyFacts | undefined> {
  const rows = await db('policies')
    .where({ facility_id: facilityId })
    .select<Row[]>(...columns);
  const inForce = versionInForce(
    rows.map((row) => ({ ...row, effectiveOn: row.effective_on })),
    day,
  );
  return inForce && fromRow(inForce);
}

/** The version that was agreed last, whether or not its day has come. */
export async function newestPolicy(db: Db | Transaction, facilityId: string): Promise<PolicyFacts | undefined> {
  const row = await db('policies')
    .where({ facility_id: facilityId })
    .orderBy('number', 'desc')
    .first<Row | undefined>(...columns);
  return row && fromRow(row);
}
