import type { AddRunRequest } from '#contract/runs';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import type { Transaction } from '../../platform/db';
import { NotFound, RuleRefused } from '../../platform/errors';
import { once } from '../../platform/once';
import { qualifiedPrograms, sterilizerById } from '../equipment/read-model';
import { recordRun } from './run-acts';

async function requireProgram(
  trx: Transaction,
  facilityId: string,
  { sterilizerId, programId }: Pick<AddRunRequest, 'sterilizerId' | 'programId'>,
): Promise<void> {
  const sterilizer = sterilizerId === null ? null : await sterilizerById(trx, facilityId, sterilizerId);
  if (sterilizer === undefined) throw new NotFound('sterilizer.none', 'There is no such sterilizer here.');
  if (programId === null) return;
  const program = await trx('programs')
    .where({ id: programId, facility_id: facilityId })
    .first<{ code: string; is_retired: boolean } | undefined>('code', 'is_retired');
  if (!program) throw new NotFound('program.none', 'There is no such program here.');
  if (program.is_retired) {
    throw new RuleRefused('run.program-retired', `Program ${program.code} is retired. Choose another one.`);
  }
  if (sterilizer === null) return;
  const qualified = await qualifiedPrograms(trx, facilityId, sterilizer.id);
  if (!qualified.some((one) => one.id === programId)) {
    throw new RuleRefused(
      'run.program-not-qualified',
      `${sterilizer.name} is not qualified for program ${program.code}.`,
    );
  }
}

/** A new run, to be filled with packages. Sterilizer, program and hour may be left to whoever opens the load. */
export async function addRun(services: Services, actor: Actor, request: AddRunRequest): Promise<{ runId: string }> {
  const { db, clock, ids } = services;
  return once({ db, clock, actor }, { requestId: request.requestId, act: 'run.add', body: request }, async (trx) => {
    const at = clock.now();
    await requireProgram(trx, actor.facilityId, request);
    const runId = ids.next();
    await trx('runs').insert({
      id: runId,
      facility_id: actor.facilityId,
      name: request.name,
      sterilizer_id: request.sterilizerId,
      program_id: request.programId,
      wanted_at: request.wantedAt === null ? null : new Date(request.wantedAt),
      state: 'waiting',
      created_at: at,
      created_by: actor.personId,
    });
    await recordRun(trx, { actor, at, requestId: request.requestId }, 'run.added', runId, { name: request.name });
    return { runId };
  });
}
