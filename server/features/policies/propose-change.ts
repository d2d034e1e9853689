import type { PolicyProposal, ProposePolicyChangeRequest } from '#contract/policies';
import { decideProposal, type ProposalRefusal } from '#domain/policy/decide-proposal';
import type { PolicySettings } from '#domain/policy/settings';
import { readSettings } from '#domain/policy/settings';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import type { Transaction } from '../../platform/db';
import { Conflict, NotFound, RuleRefused } from '../../platform/errors';
import { facilityDay } from '../../platform/facility-day';
import { once } from '../../platform/once';
import { sterilizersOf } from '../equipment/read-model';
import { canOthersConfirm } from './confirmers-read-model';
import { getProposalView } from './policy-overview-read-model';
import { hasOpenProposal, insertProposal, lockPolicy } from './policy-store';
import { newestPolicy } from './read-model';

/** The part of the request that a refusal is about. */
const pointers: Readonly<Partial<Record<ProposalRefusal, string>>> = {
  'policy.day-past': '/body/effectiveOn',
  'policy.day-too-far': '/body/effectiveOn',
  'policy.nothing-changed': '/body/changes',
};

/** Puts a change of the policy to another person. */
export async function proposeChange(
  { db, clock, ids }: Services,
  actor: Actor,
  request: ProposePolicyChangeRequest,
): Promise<{ proposal: PolicyProposal }> {
  const { facilityId, personId } = actor;
  return once(
    { db, clock, actor },
    { requestId: request.requestId, act: 'policy.propose', body: request },
    async (trx) => {
      const now = clock.now();
      await lockPolicy(trx, facilityId);
      const newest = await newestPolicy(trx, facilityId);
      const baseNumber = newest?.number ?? 0;
      if (baseNumber !== request.baseNumber) {
        throw new Conflict(
          'policy.changed-meanwhile',
          `Version ${baseNumber} was confirmed meanwhile. Look at it before you propose a change.`,
        );
      }
      await requireOwnSterilizers(trx, facilityId, Object.keys(request.facingBySterilizer ?? {}));
      const decided = decideProposal({
        newest: newest?.settings ?? beginning(),
        stated: { changes: request.changes, facingBySterilizer: request.facingBySterilizer },
        effectiveOn: request.effectiveOn,
        today: (await facilityDay(trx, facilityId, now)).day,
        hasOpenProposal: await hasOpenProposal(trx, facilityId),
        canOthersConfirm: await canOthersConfirm(trx, { facilityId, personId, now }),
      });
      if (!decided.ok) throw refusalOf(decided.refusal);
      const id = ids.next();
      await insertProposal(trx, {
        id,
        facility_id: facilityId,
        base_number: baseNumber,
        changes: decided.value,
        reason: request.reason,
        effective_on: request.effectiveOn,
        proposed_by: personId,
        proposed_at: now,
      });
      await appendEvent(trx, {
        kind: 'policy.change-proposed',
        at: now,
        facilityId,
        actorId: personId,
        subjectKind: 'policy-proposal',
        subjectId: id,
        requestId: request.requestId,
        payload: { changes: decided.value, effectiveOn: request.effectiveOn, reason: request.reason },
      });
      return { proposal: await getProposalView(trx, facilityId, id) };
    },
  );
}

/** A facility that has no version yet begins from the defaults. */
function beginning(): PolicySettings {
  return readSettings({}).settings;
}

async function requireOwnSterilizers(trx: Transaction, facilityId: string, wanted: readonly string[]): Promise<void> {
  if (wanted.length === 0) return;
  const own = new Set((await sterilizersOf(trx, facilityId)).map(({ id }) => id));
  const foreign = wanted.find((id) => !own.has(id));
  if (foreign === undefined) return;
  const sentence = 'There is no such sterilizer here.';
  throw new NotFound('sterilizer.none', sentence, {
    fields: [{ pointer: `/body/facingBySterilizer/${foreign}`, detail: sentence }],
  });
}

function refusalOf({ code, sentence }: { readonly code: ProposalRefusal; readonly sentence: string }) {
  if (code === 'policy.proposal-open') return new Conflict(code, sentence);
  const pointer = pointers[code];
  return new RuleRefused(code, sentence, pointer === undefined ? {} : { fields: [{ pointer, detail: sentence }] });
}
