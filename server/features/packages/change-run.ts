import type { ChangeRunRequest, RunSummary } from '#contract/runs';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { Conflict } from '../../platform/errors';
import { once } from '../../platform/once';
import { lockWaitingRun, recordRun } from './run-acts';
import { findRunSummary } from './run-read-model';

/** Another name or another hour for a run that waits. */
export async function changeRun(
  { db, clock }: Services,
  actor: Actor,
  runId: string,
  request: ChangeRunRequest,
): Promise<{ run: RunSummary }> {
  const { requestId, version } = request;
  return once({ db, clock, actor }, { requestId, act: 'run.change', body: { runId, ...request } }, async (trx) => {
    const run = await lockWaitingRun(trx, actor, runId);
    if (run.version !== version) {
      throw new Conflict('run.changed-meanwhile', 'Somebody else changed this run meanwhile. Look again.');
    }
    const before = { name: run.name, wantedAt: run.wantedAt?.toISOString() ?? null };
    const after = {
      name: request.name ?? before.name,
      wantedAt: request.wantedAt === undefined ? before.wantedAt : instantOrNull(request.wantedAt),
    };
    if (after.name !== before.name || after.wantedAt !== before.wantedAt) {
      await trx('runs')
        .where({ id: run.id })
        .update({ name: after.name, wanted_at: after.wantedAt, version: version + 1 });
      await recordRun(trx, { actor, at: clock.now(), requestId }, 'run.changed', run.id, { before, after });
    }
    const summary = await findRunSummary(trx, actor.facilityId, run.id);
    if (!summary) throw new Error('the run that was just changed is not there');
    return { run: summary };
  });
}

/** As it is kept, so that the same hour written in another way is no change. */
function instantOrNull(text: string | null): string | null {
  return text === null ? null : new Date(text).toISOString();
}
