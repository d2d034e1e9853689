import { withChanges } from '#domain/policy/setting-change';
import { readSettings, storedSettings } from '#domain/policy/settings';
import { dayOfEffect, decideSettling, type SettlingAct } from '#domain/policy/settle-proposal';
import { instantAt } from '#domain/time/instant-at';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import type { Transaction } from '../../platform/db';
import { Conflict, RuleRefused } from '../../platform/errors';
import { facilityDay } from '../../platform/facility-day';
import { once } from '../../platform/once';
import { getProposal, insertVersion, lockPolicy, settleProposal, type ProposalRow } from './policy-store';
import { newestPolicy } from './read-model';

/** The second person agrees: the proposal becomes the next version, which never changes afterwards. */
export async function confirmChange(
  { db, clock, ids }: Services,
  actor: Actor,
  proposalId: string,
  requestId: string,
): Promise<{ number: number; effectiveOn: string }> {
  const { facilityId, personId } = actor;
  return once({ db, clock, actor }, { requestId, act: 'policy.confirm', body: { proposalId } }, async (trx) => {
    const now = clock.now();
    const proposal = await lockForSettling(trx, actor, proposalId, 'confirm');
    const newest = await newestPolicy(trx, facilityId);
    const facility = await facilityDay(trx, facilityId, now);
    const effectiveOn = dayOfEffect(proposal.effective_on, facility.day);
    const number = (newest?.number ?? 0) + 1;
    const id = ids.next();
    await insertVersion(trx, {
      id,
      facility_id: facilityId,
      number,
      settings: storedSettings(withChanges(newest?.settings ?? readSettings({}).settings, proposal.changes)),
      changes: proposal.changes,
      author_id: proposal.proposed_by,
      second_person_id: personId,
      reason: proposal.reason,
      effective_on: effectiveOn,
      // Beside the day, for the release before this one, which read the instant.
      effective_at: instantAt({ day: effectiveOn, time: '00:00' }, facility.timeZone),
      created_at: now,
      proposal_id: proposal.id,
    });
    await settleProposal(trx, proposal.id, {
      state: 'confirmed',
      settled_by: personId,
      settled_at: now,
      settled_reason: null,
    });
    await appendEvent(trx, {
      kind: 'policy.change-confirmed',
      at: now,
      facilityId,
      actorId: personId,
      subjectKind: 'policy',
      subjectId: id,
      requestId,
      payload: { number, effectiveOn },
    });
    return { number, effectiveOn };
  });
}

type TurningDown = {
  readonly proposalId: string;
  readonly act: Exclude<SettlingAct, 'confirm'>;
  readonly requestId: string;
  readonly reason: string;
};

/** The proposer thinks better of it, or another person says no: nothing changes, and both say why. */
export async function turnDownChange(
  { db, clock }: Services,
  actor: Actor,
  { proposalId, act, requestId, reason }: TurningDown,
): Promise<undefined> {
  await once(
    { db, clock, actor },
    { requestId, act: `policy.${act}`, body: { proposalId, reason } },
    async (trx): Promise<null> => {
      const now = clock.now();
      const proposal = await lockForSettling(trx, actor, proposalId, act);
      await settleProposal(trx, proposal.id, {
        state: act === 'withdraw' ? 'withdrawn' : 'refused',
        settled_by: actor.personId,
        settled_at: now,
        settled_reason: reason,
      });
      await appendEvent(trx, {
        kind: act === 'withdraw' ? 'policy.change-withdrawn' : 'policy.change-refused',
        at: now,
        facilityId: actor.facilityId,
        actorId: actor.personId,
        subjectKind: 'policy-proposal',
        subjectId: proposal.id,
        requestId,
        payload: { reason },
      });
      return null;
    },
  );
  return undefined;
}

async function lockForSettling(
  trx: Transaction,
  actor: Actor,
  proposalId: string,
  act: SettlingAct,
): Promise<ProposalRow> {
  await lockPolicy(trx, actor.facilityId);
  const proposal = await getProposal(trx, actor.facilityId, proposalId);
  const decided = decideSettling({
    act,
    state: proposal.state,
    proposedBy: proposal.proposed_by,
    personId: actor.personId,
  });
  if (decided.ok) return proposal;
  const { code, sentence } = decided.refusal;
  throw code === 'policy.proposal-settled' ? new Conflict(code, sentence) : new RuleRefused(code, sentence);
}
