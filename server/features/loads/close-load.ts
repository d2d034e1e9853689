import { createHash } from 'node:crypto';
import { canonicalJson, contentsOf } from '#domain/load/contents';
import { decideClose } from '#domain/load/decide-close';
import { evaluateLoad } from '#domain/load/evaluate-load';
import { ruleSetVersion } from '#domain/load/policy';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import { RuleRefused } from '../../platform/errors';
import { once } from '../../platform/once';
import { requireAct } from './load-change';
import { lockLoad, stepVersion } from './load-store';
import { readLoadView } from './load-view-read-model';

export type Closing = {
  readonly number: string;
  readonly digest: string;
  readonly ruleSet: string;
  readonly closedAt: string;
};

/** The rules held the load open: told outside, and kept in the history although the transaction is rolled back. */
class CloseRefused extends RuleRefused {
  constructor(
    sentence: string,
    readonly blocks: readonly string[],
  ) {
    super('load.close-refused', sentence, { fields: blocks.map((detail) => ({ pointer: '/load', detail })) });
  }
}

/** Closes a load: only when nothing holds it open, judged here and not on any screen. */
export async function closeLoad(services: Services, actor: Actor, loadId: string, requestId: string): Promise<Closing> {
  try {
    return await close(services, actor, loadId, requestId);
  } catch (error) {
    if (error instanceof CloseRefused) await tellRefused(services, actor, { loadId, requestId, blocks: error.blocks });
    throw error;
  }
}

/** Once for each request, however often it is repeated, also when two repeats come at one moment. */
function tellRefused(
  { db, clock }: Services,
  actor: Actor,
  {
    loadId,
    requestId,
    blocks,
  }: { readonly loadId: string; readonly requestId: string; readonly blocks: readonly string[] },
): Promise<void> {
  return db.transaction(async (trx) => {
    await trx.raw('select pg_advisory_xact_lock(hashtextextended(?, 3))', [requestId]);
    const told = await trx('audit_events')
      .where({ load_id: loadId, request_id: requestId, kind: 'load.close-refused' })
      .first<{ id: number } | undefined>('id');
    if (told) return;
    await appendEvent(trx, {
      kind: 'load.close-refused',
      at: clock.now(),
      facilityId: actor.facilityId,
      actorId: actor.personId,
      subjectKind: 'load',
      subjectId: loadId,
      loadId,
      requestId,
      payload: { blocks },
    });
  });
}

async function close(services: Services, actor: Actor, loadId: string, requestId: string): Promise<Closing> {
  const { db, clock } = services;
  return once({ db, clock, actor }, { requestId, act: 'load.close', body: { loadId } }, async (trx) => {
    const at = clock.now();
    const load = await lockLoad(trx, actor.facilityId, loadId);
    const { to } = requireAct(load, 'close');
    const { view, policy, policyNumber, counts, acceptances } = await readLoadView(trx, load, at);
    const findings = evaluateLoad(view, policy);
    const { mayClose, blocks } = decideClose(view, policy, findings);
    if (!mayClose) {
      const labels = blocks.map((block) => block.label);
      throw new CloseRefused(
        `${blocks.length === 1 ? '1 thing holds' : `${blocks.length} things hold`} load ${load.number} open.`,
        labels,
      );
    }
    const contents = canonicalJson(contentsOf(view));
    const digest = createHash('sha256').update(contents, 'utf8').digest('hex');
    await trx('loads')
      .where({ id: load.id })
      .update({
        state: to,
        closed_by: actor.personId,
        closed_at: at,
        rule_set: ruleSetVersion,
        // The fixes are for building; a closed load keeps what was found and how it was settled.
        verdict: JSON.stringify({
          findings: findings.map(({ fix: _fix, ...kept }) => kept),
          acceptances,
          counts,
          policyNumber,
        }),
        contents,
        contents_digest: digest,
        // All of what the rules looked at, so that later rules can look at it again.
        view_at_close: JSON.stringify(view),
      });
    await stepVersion(trx, load);
    // Until unloading is recorded, a closed load's holders count as free for the next cart.
    await trx('load_holders').where({ load_id: load.id }).update({ is_open: false });
    await appendEvent(trx, {
      kind: 'load.closed',
      at,
      facilityId: load.facility_id,
      actorId: actor.personId,
      subjectKind: 'load',
      subjectId: load.id,
      loadId: load.id,
      requestId,
      payload: { digest, ruleSet: ruleSetVersion },
    });
    return { number: load.number, digest, ruleSet: ruleSetVersion, closedAt: at.toISOString() };
  });
}
