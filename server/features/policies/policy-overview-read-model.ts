import type { PolicyOverview, PolicyProposal, PolicyVersion } from '#contract/policies';
import { readSettings } from '#domain/policy/settings';
import { standingOf } from '#domain/policy/versions';
import { calendarDay } from '#domain/time/calendar-day';
import type { Db, Transaction } from '../../platform/db';
import { facilityDay } from '../../platform/facility-day';
import { sterilizersOf } from '../equipment/read-model';
import type { ProposalRow, VersionRow } from './policy-store';

type NamedVersion = VersionRow & { readonly author: string | null; readonly second_person: string | null };
type NamedProposal = ProposalRow & { readonly proposer: string; readonly settler: string | null };

function namedProposals(db: Db | Transaction, facilityId: string) {
  return db('policy_proposals as proposal')
    .join('people as proposer', 'proposer.id', 'proposal.proposed_by')
    .leftJoin('people as settler', 'settler.id', 'proposal.settled_by')
    .where('proposal.facility_id', facilityId)
    .orderBy([
      { column: 'proposal.proposed_at', order: 'desc' },
      { column: 'proposal.id', order: 'desc' },
    ])
    .select<NamedProposal[]>('proposal.*', 'proposer.display_name as proposer', 'settler.display_name as settler');
}

function proposalOf(row: NamedProposal): PolicyProposal {
  return {
    id: row.id,
    state: row.state,
    changes: [...row.changes],
    reason: row.reason,
    effectiveOn: row.effective_on,
    proposedBy: { id: row.proposed_by, name: row.proposer },
    proposedAt: row.proposed_at.toISOString(),
    settledBy: row.settler,
    settledAt: row.settled_at?.toISOString() ?? null,
    settledReason: row.settled_reason,
  };
}

export async function getProposalView(
  db: Db | Transaction,
  facilityId: string,
  proposalId: string,
): Promise<PolicyProposal> {
  const [row] = await namedProposals(db, facilityId).where('proposal.id', proposalId);
  if (!row) throw new Error('a proposal that was just written is not there');
  return proposalOf(row);
}

function versionsOf(rows: readonly NamedVersion[], today: string, timeZone: string): PolicyVersion[] {
  const dated = rows.map((row) => ({
    number: row.number,
    effectiveOn: row.effective_on,
    confirmedOn: calendarDay(row.created_at.toISOString(), timeZone),
  }));
  return rows.map((row, index) => {
    const own = dated[index];
    const { settings, defaulted } = readSettings(row.settings);
    return {
      number: row.number,
      effectiveOn: row.effective_on,
      standing: own ? standingOf(own, dated, today) : 'past',
      confirmedAt: row.created_at.toISOString(),
      author: row.author,
      secondPerson: row.second_person,
      reason: row.reason,
      settings,
      defaulted: [...defaulted],
      changes: [...row.changes],
    };
  });
}

/** The policy as it stands, how it came about, and what is proposed: all from one moment. */
export async function getPolicyOverview(db: Db, facilityId: string, at: Date): Promise<PolicyOverview> {
  return db.transaction(
    async (trx) => {
      const [facility, versions, proposals, sterilizers] = await Promise.all([
        facilityDay(trx, facilityId, at),
        trx('policies as version')
          .leftJoin('people as author', 'author.id', 'version.author_id')
          .leftJoin('people as second', 'second.id', 'version.second_person_id')
          .where('version.facility_id', facilityId)
          .orderBy('version.number', 'desc')
          .select<NamedVersion[]>('version.*', 'author.display_name as author', 'second.display_name as second_person'),
        namedProposals(trx, facilityId),
        sterilizersOf(trx, facilityId),
      ]);
      const open = proposals.find((row) => row.state === 'open');
      return {
        today: facility.day,
        versions: versionsOf(versions, facility.day, facility.timeZone),
        proposal: open ? proposalOf(open) : null,
        notMade: proposals.filter((row) => row.state === 'withdrawn' || row.state === 'refused').map(proposalOf),
        sterilizers: sterilizers.map(({ id, code, name }) => ({ id, code, name })),
      };
    },
    { isolationLevel: 'repeatable read', readOnly: true },
  );
}
