import type { AuditPayloads } from '#domain/audit/event-kinds';
import { decideRunOpen } from '#domain/package/decide-staging';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import type { Transaction } from '../../platform/db';
import { NotFound } from '../../platform/errors';
import { findPackages, lockPackages, lockRun, type PackageFacts, type RunFacts } from './read-model';
import { refusalError } from './refusal';

/** What every act on a run hands down: who, when, and the request it came with. */
export type RunAct = { readonly actor: Actor; readonly at: Date; readonly requestId: string };

/** The facility's run, locked. Another facility's run is not known here. */
export async function lockOwnRun(trx: Transaction, actor: Actor, runId: string): Promise<RunFacts> {
  const run = await lockRun(trx, runId);
  if (run?.facilityId !== actor.facilityId) throw new NotFound('run.none', 'There is no such run here.');
  return run;
}

/** The same, when no load has taken it and nobody has dropped it. */
export async function lockWaitingRun(trx: Transaction, actor: Actor, runId: string): Promise<RunFacts> {
  const run = await lockOwnRun(trx, actor, runId);
  const decision = decideRunOpen(run);
  if (!decision.ok) throw refusalError(decision.refusal);
  return run;
}

/** The facility's packages with these ids, locked, in the asked order and each once. */
export async function lockOwnPackages(
  trx: Transaction,
  actor: Actor,
  packageIds: readonly string[],
): Promise<PackageFacts[]> {
  const wanted = [...new Set(packageIds)];
  await lockPackages(trx, wanted);
  const found = new Map((await findPackages(trx, wanted)).map((one) => [one.id, one]));
  return wanted.map((id) => {
    const one = found.get(id);
    if (one?.facilityId !== actor.facilityId)
      throw new NotFound('package.none', 'One of these packages is not known here.');
    return one;
  });
}

export async function recordStaging(
  trx: Transaction,
  act: RunAct,
  kind: 'package.staged' | 'package.unstaged',
  packageIds: readonly string[],
  runId: string,
): Promise<void> {
  for (const packageId of packageIds) {
    await appendEvent(trx, {
      kind,
      at: act.at,
      facilityId: act.actor.facilityId,
      actorId: act.actor.personId,
      subjectKind: 'package',
      subjectId: packageId,
      requestId: act.requestId,
      payload: { runId },
    });
  }
}

export async function recordRun<Kind extends 'run.added' | 'run.changed'>(
  trx: Transaction,
  act: RunAct,
  kind: Kind,
  runId: string,
  payload: AuditPayloads[Kind],
): Promise<void> {
  await appendEvent(trx, {
    kind,
    at: act.at,
    facilityId: act.actor.facilityId,
    actorId: act.actor.personId,
    subjectKind: 'run',
    subjectId: runId,
    requestId: act.requestId,
    payload,
  });
}
