import type { JudgedAgain } from '#contract/judged-again';
import { decideClose } from '#domain/load/decide-close';
import { evaluateLoad } from '#domain/load/evaluate-load';
import { ruleSetVersion } from '#domain/load/policy';
import { compareFindings } from '#domain/policy/compare-findings';
import { policyFor } from '#domain/policy/settings';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { NotFound, RuleRefused } from '../../platform/errors';
import { facilityDay } from '../../platform/facility-day';
import { policyById, policyInForce } from '../policies/read-model';
import { findLoadSummary } from './load-list-read-model';
import { getLoad } from './load-store';
import { findVerdictAtClose } from './verdict-at-close';

const viewNotKept =
  'This load was closed before Paperside kept everything that its rules look at. It cannot be judged again as it was.';

const viewTooOld =
  'Today’s rules look at something that was not kept yet when this load was closed. It cannot be judged again as it was.';

/** A closed load as it was closed, beside what the rules and the policy of today say of the same contents. Nothing is written. */
export async function judgeAgain({ db, clock }: Services, actor: Actor, loadId: string): Promise<JudgedAgain> {
  return db.transaction(
    async (trx) => {
      const load = await getLoad(trx, actor.facilityId, loadId);
      const closed = await findVerdictAtClose(trx, load.id);
      const summary = await findLoadSummary(trx, actor.facilityId, load.id);
      if (!closed || load.rule_set === null || !summary || summary.closedAt === null) {
        throw new RuleRefused('load.not-closed', 'Only a closed load can be judged again.');
      }
      const { day } = await facilityDay(trx, actor.facilityId, clock.now());
      const [policyThen, policyNow] = await Promise.all([
        policyById(trx, load.policy_id),
        policyInForce(trx, actor.facilityId, day),
      ]);
      if (!policyThen || !policyNow) throw new NotFound('policy.none', 'No policy is in force here.');
      const { findings, acceptances, view, isViewKept } = closed;
      const then = {
        ruleSet: load.rule_set,
        policyNumber: policyThen.number,
        policyEffectiveOn: policyThen.effectiveOn,
        findings: [...findings],
        acceptances: [...acceptances],
      };
      const about = {
        load: {
          id: load.id,
          number: load.number,
          closedAt: summary.closedAt,
          closedBy: summary.closedBy ?? '',
        },
        then,
      };
      if (view === null) {
        return { ...about, now: null, comparison: null, whyNot: isViewKept ? viewTooOld : viewNotKept };
      }
      const policy = policyFor(policyNow.settings, load.sterilizer_id);
      const judged = evaluateLoad(view, policy);
      const holding = decideClose(view, policy, judged).blocks.length;
      // The fixes are for building.
      const findingsNow = judged.map(({ fix: _fix, ...finding }) => finding);
      return {
        ...about,
        now: {
          ruleSet: ruleSetVersion,
          policyNumber: policyNow.number,
          policyEffectiveOn: policyNow.effectiveOn,
          findings: findingsNow.map((finding) => ({ ...finding, places: [...finding.places] })),
          holding,
        },
        comparison: compareFindings(findings, findingsNow),
        whyNot: null,
      };
    },
    { isolationLevel: 'repeatable read', readOnly: true },
  );
}
