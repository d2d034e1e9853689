import type { LoadChange } from '#contract/loads';
import { differenceOf } from '#domain/load/difference';
import { evaluateLoad } from '#domain/load/evaluate-load';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import { Conflict, RuleRefused } from '../../platform/errors';
import { once } from '../../platform/once';
import { changeFrom, requireAct } from './load-change';
import { lockLoad, stepVersion } from './load-store';
import { readLoadView } from './load-view-read-model';

/** A lead lets a finding stay, with a written reason. It holds for exactly this finding: a worse figure is another one. */
export async function acceptFinding(
  services: Services,
  actor: Actor,
  loadId: string,
  request: { readonly requestId: string; readonly findingKey: string; readonly reason: string },
): Promise<{ change: LoadChange }> {
  const { db, clock, ids } = services;
  return once(
    { db, clock, actor },
    { requestId: request.requestId, act: 'load.accept-finding', body: { loadId, ...request } },
    async (trx) => {
      const at = clock.now();
      const load = await lockLoad(trx, actor.facilityId, loadId);
      requireAct(load, 'accept-finding');
      const { view, policy } = await readLoadView(trx, load, at);
      const finding = evaluateLoad(view, policy).find((entry) => entry.key === request.findingKey);
      if (!finding) throw new Conflict('load.finding-gone', 'This finding is not there any more. Look again.');
      if (finding.severity !== 'accept') {
        throw new RuleRefused(
          'load.finding-not-acceptable',
          'This finding cannot be accepted. It has to be put right.',
        );
      }
      if (view.acceptances.some((entry) => entry.findingKey === finding.key)) {
        throw new Conflict('load.finding-accepted-already', 'Somebody has already accepted this finding.');
      }
      await trx('load_acceptances').insert({
        id: ids.next(),
        load_id: load.id,
        finding_key: finding.key,
        rule_id: finding.ruleId,
        reason: request.reason,
        accepted_by: actor.personId,
        accepted_at: at,
      });
      await appendEvent(trx, {
        kind: 'load.finding-accepted',
        at,
        facilityId: load.facility_id,
        actorId: actor.personId,
        subjectKind: 'load',
        subjectId: load.id,
        loadId: load.id,
        requestId: request.requestId,
        payload: { findingKey: finding.key, ruleId: finding.ruleId, reason: request.reason },
      });
      return { change: await changeFrom(trx, load, await stepVersion(trx, load), view, differenceOf(view, view)) };
    },
  );
}
