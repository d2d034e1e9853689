import type { StagePackagesRequest } from '#contract/runs';
import type { Refusal } from '#domain/result';
import { decideRemoval, decideStaging } from '#domain/package/decide-staging';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import type { FieldProblem } from '../../platform/errors';
import { once } from '../../platform/once';
import { facilityDay } from '../../platform/facility-day';
import { setRun } from './package-store';
import { lockOwnPackages, lockOwnRun, lockWaitingRun, recordRun, recordStaging, type RunAct } from './run-acts';
import { refusalError } from './refusal';

/** All or nothing: the first refusal speaks, and each is pointed at. */
function refuseIfAny(refusals: readonly { readonly index: number; readonly refusal: Refusal }[]): void {
  const first = refusals[0];
  if (!first) return;
  const fields = refusals
    .slice(0, 20)
    .map(({ index, refusal }): FieldProblem => ({ pointer: `/body/packageIds/${index}`, detail: refusal.sentence }));
  throw refusalError(first.refusal, fields);
}

/** Packed packages into a run that waits. */
export async function stagePackages(
  services: Services,
  actor: Actor,
  runId: string,
  request: StagePackagesRequest,
): Promise<{ staged: number }> {
  const { db, clock } = services;
  const body = { runId, ...request };
  return once({ db, clock, actor }, { requestId: request.requestId, act: 'run.stage-packages', body }, async (trx) => {
    const at = clock.now();
    const act: RunAct = { actor, at, requestId: request.requestId };
    const run = await lockWaitingRun(trx, actor, runId);
    const packages = await lockOwnPackages(trx, actor, request.packageIds);
    const { day } = await facilityDay(trx, actor.facilityId, at);
    const staged: string[] = [];
    const refusals = packages.flatMap((one, index) => {
      const decision = decideStaging(one, run, day);
      if (!decision.ok) return [{ index, refusal: decision.refusal }];
      if (decision.value === 'stage') staged.push(one.id);
      return [];
    });
    refuseIfAny(refusals);
    await setRun(trx, staged, run.id);
    await recordStaging(trx, act, 'package.staged', staged, run.id);
    return { staged: staged.length };
  });
}

/** Packages out of a run, back among the packed ones. */
export async function removePackages(
  services: Services,
  actor: Actor,
  runId: string,
  request: StagePackagesRequest,
): Promise<{ removed: number }> {
  const { db, clock } = services;
  const body = { runId, ...request };
  return once({ db, clock, actor }, { requestId: request.requestId, act: 'run.remove-packages', body }, async (trx) => {
    const act: RunAct = { actor, at: clock.now(), requestId: request.requestId };
    const run = await lockOwnRun(trx, actor, runId);
    const packages = await lockOwnPackages(trx, actor, request.packageIds);
    const refusals = packages.flatMap((one, index) => {
      const decision = decideRemoval(one, run);
      return decision.ok ? [] : [{ index, refusal: decision.refusal }];
    });
    refuseIfAny(refusals);
    const removed = packages.map((one) => one.id);
    await setRun(trx, removed, null);
    await recordStaging(trx, act, 'package.unstaged', removed, run.id);
    return { removed: removed.length };
  });
}

/** Gives a run up. What waited in it is packed and free again. */
export async function dropRun(
  services: Services,
  actor: Actor,
  runId: string,
  request: { readonly requestId: string },
): Promise<{ returned: number }> {
  const { db, clock } = services;
  const body = { runId, ...request };
  return once({ db, clock, actor }, { requestId: request.requestId, act: 'run.drop', body }, async (trx) => {
    const act: RunAct = { actor, at: clock.now(), requestId: request.requestId };
    const run = await lockWaitingRun(trx, actor, runId);
    const rows = await trx('packages')
      .where({ run_id: run.id, state: 'staged' })
      .orderBy('id')
      .forUpdate()
      .select<{ id: string }[]>('id');
    const returned = rows.map((row) => row.id);
    await setRun(trx, returned, null);
    await trx('runs')
      .where({ id: run.id })
      .update({ state: 'dropped', version: run.version + 1 });
    await recordStaging(trx, act, 'package.unstaged', returned, run.id);
    await recordRun(trx, act, 'run.changed', run.id, { before: { state: run.state }, after: { state: 'dropped' } });
    return { returned: returned.length };
  });
}
