import type { SettingChange } from '#domain/policy/setting-change';
import type { ProposalState } from '#domain/policy/settle-proposal';
import type { Transaction } from '../../platform/db';
import { NotFound } from '../../platform/errors';

/** Nobody else proposes or settles a change in this facility until the transaction ends. */
export async function lockPolicy(trx: Transaction, facilityId: string): Promise<void> {
  await trx.raw('select facilities.id from facilities where facilities.id = ? for no key update', [facilityId]);
}

export type VersionRow = {
  readonly id: string;
  readonly facility_id: string;
  readonly number: number;
  readonly settings: unknown;
  readonly changes: readonly SettingChange[];
  readonly author_id: string | null;
  readonly second_person_id: string | null;
  readonly reason: string;
  readonly effective_on: string;
  readonly created_at: Date;
};

export type ProposalRow = {
  readonly id: string;
  readonly facility_id: string;
  readonly base_number: number;
  readonly changes: readonly SettingChange[];
  readonly reason: string;
  readonly effective_on: string;
  readonly proposed_by: string;
  readonly proposed_at: Date;
  readonly state: ProposalState;
  readonly settled_by: string | null;
  readonly settled_at: Date | null;
  readonly settled_reason: string | null;
};

export async function hasOpenProposal(trx: Transaction, facilityId: string): Promise<boolean> {
  const row = await trx('policy_proposals')
    .where({ facility_id: facilityId, state: 'open' })
    .first<{ id: string } | undefined>('id');
  return row !== undefined;
}

/** Finds a proposal of this facility, or says that there is none: also to people of other facilities. */
export async function getProposal(trx: Transaction, facilityId: string, proposalId: string): Promise<ProposalRow> {
  const row = await trx<ProposalRow>('policy_proposals').where({ id: proposalId, facility_id: facilityId }).first();
  if (!row) throw new NotFound('policy.no-proposal', 'There is no such proposal here.');
  return row;
}

export async function insertProposal(
  trx: Transaction,
  proposal: Pick<
    ProposalRow,
    'id' | 'facility_id' | 'base_number' | 'changes' | 'reason' | 'effective_on' | 'proposed_by' | 'proposed_at'
  >,
): Promise<void> {
  await trx('policy_proposals').insert({ ...proposal, changes: JSON.stringify(proposal.changes) });
}

export async function settleProposal(
  trx: Transaction,
  proposalId: string,
  settled: {
    readonly state: ProposalState;
    readonly settled_by: string;
    readonly settled_at: Date;
    readonly settled_reason: string | null;
  },
): Promise<void> {
  await trx('policy_proposals').where({ id: proposalId }).update(settled);
}

export async function insertVersion(
  trx: Transaction,
  version: VersionRow & { readonly proposal_id: string; readonly effective_at: string },
): Promise<void> {
  await trx('policies').insert({
    ...version,
    settings: JSON.stringify(version.settings),
    changes: JSON.stringify(version.changes),
  });
}
