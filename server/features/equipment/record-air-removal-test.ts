import { isPermitted } from '#domain/access/role-matrix';
import { roles } from '#domain/access/permissions';
import { decideAirRemovalTest } from '#domain/catalogue/decide-air-removal-test';
import type { recordAirRemovalTestRequestSchema } from '#contract/air-removal-tests';
import type { z } from 'zod';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import type { Clock } from '../../platform/clock';
import type { Db, Transaction } from '../../platform/db';
import { NotFound, RuleRefused } from '../../platform/errors';
import type { Ids } from '../../platform/ids';
import { once } from '../../platform/once';
import { lockRegister } from '../../platform/register/register';
import { getAirRemovalTest, listReaders } from './air-removal-test-read-model';
import type { SterilizerRow } from './equipment-rows';
import { facilityDay } from '../../platform/facility-day';

type Stated = z.output<typeof recordAirRemovalTestRequestSchema>;

const readingRoles = roles.filter((role) => isPermitted(role, 'air-removal-test.record'));

/** People who may be named as a second reader. */
export function listPossibleReaders(trx: Transaction | Db, facilityId: string, now: Date) {
  return listReaders(trx, facilityId, readingRoles, now);
}

async function requireSecondReader(trx: Transaction, actor: Actor, readerId: string | null, now: Date): Promise<void> {
  if (readerId === null) return;
  if (readerId === actor.personId) {
    throw new RuleRefused('air-removal-test.same-reader', 'The second reader has to be somebody else than you.');
  }
  const possible = await listPossibleReaders(trx, actor.facilityId, now);
  if (!possible.some((reader) => reader.id === readerId)) {
    throw new NotFound('air-removal-test.no-such-reader', 'The second reader is nobody who may read such a test here.');
  }
}

async function takeOutOfService(
  trx: Transaction,
  { actor, at, requestId }: { readonly actor: Actor; readonly at: Date; readonly requestId: string },
  sterilizer: SterilizerRow,
): Promise<void> {
  await trx('sterilizers')
    .where('sterilizers.id', sterilizer.id)
    .update({ service_state: 'out-of-service', version: sterilizer.version + 1 });
  await appendEvent(trx, {
    kind: 'equipment.changed',
    at,
    facilityId: actor.facilityId,
    actorId: actor.personId,
    subjectKind: 'sterilizer',
    subjectId: sterilizer.id,
    requestId,
    payload: {
      what: 'sterilizer',
      before: { serviceState: sterilizer.service_state },
      after: { serviceState: 'out-of-service' },
    },
  });
}

/** Records what the sheet of an air-removal test showed, and takes the sterilizer out of service when asked to. */
export async function recordAirRemovalTest(
  { db, clock, ids, actor }: { readonly db: Db; readonly clock: Clock; readonly ids: Ids; readonly actor: Actor },
  { requestId, ...stated }: Stated,
) {
  return once({ db, clock, actor }, { requestId, act: 'air-removal-test.record', body: stated }, async (trx) => {
    const at = clock.now();
    // The sterilizer's own form writes under the same lock.
    if (stated.isTakenOutOfService) await lockRegister(trx, actor.facilityId, 'sterilizer');
    const sterilizer = await trx('sterilizers')
      .where({ 'sterilizers.facility_id': actor.facilityId, 'sterilizers.id': stated.sterilizerId })
      .forUpdate()
      .first<SterilizerRow | undefined>('sterilizers.*');
    if (!sterilizer) throw new NotFound('sterilizer.none', 'There is no such sterilizer here.');
    const testedAt = new Date(stated.testedAt);
    const { day } = await facilityDay(trx, actor.facilityId, testedAt);
    const decided = decideAirRemovalTest({ ...stated, testDay: day, now: at.toISOString() });
    if (!decided.ok) throw new RuleRefused(decided.refusal.code, decided.refusal.sentence);
    await requireSecondReader(trx, actor, stated.secondReaderId, at);
    const id = ids.next();
    await trx('air_removal_tests').insert({
      id,
      facility_id: actor.facilityId,
      sterilizer_id: sterilizer.id,
      tested_at: testedAt,
      test_day: day,
      result: stated.result,
      pack_lot: stated.packLot,
      pack_expires_on: stated.packExpiresOn,
      is_before_first_load: stated.isBeforeFirstLoad,
      read_by: actor.personId,
      second_reader: stated.secondReaderId,
      note: stated.note,
      recorded_at: at,
    });
    await appendEvent(trx, {
      kind: 'air-removal-test.recorded',
      at,
      facilityId: actor.facilityId,
      actorId: actor.personId,
      subjectKind: 'sterilizer',
      subjectId: sterilizer.id,
      requestId,
      payload: { sterilizer: sterilizer.code, result: stated.result, testDay: day },
    });
    const leavesService = stated.isTakenOutOfService && sterilizer.service_state !== 'out-of-service';
    if (leavesService) await takeOutOfService(trx, { actor, at, requestId }, sterilizer);
    return {
      test: await getAirRemovalTest(trx, actor.facilityId, id),
      serviceState: leavesService ? ('out-of-service' as const) : sterilizer.service_state,
    };
  });
}
