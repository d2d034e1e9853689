import type { OpenLoadRequest } from '#contract/loads';
import { serviceStateWords } from '#domain/catalogue/service-state-words';
import { formatLoadNumber } from '#domain/label/load-number';
import type { Sterilizer } from '#domain/load/model';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import type { Transaction } from '../../platform/db';
import { Conflict, InvalidInput, NotFound, RuleRefused } from '../../platform/errors';
import { once } from '../../platform/once';
import { cartWithShelves, qualifiedPrograms, sterilizerById } from '../equipment/read-model';
import { lockPackages, lockRun, packagesOfRun, type RunFacts } from '../packages/read-model';
import { policyInForce } from '../policies/read-model';
import { facilityDay, type FacilityDay } from '../../platform/facility-day';
import { buildingLoadOfCart } from './open-load-read-model';

/** Opens a load on a sterilizer, cart and program, and lists the packages of a run as expected. */
export async function openLoad(
  services: Services,
  actor: Actor,
  request: OpenLoadRequest,
): Promise<{ loadId: string; number: string }> {
  const { db, clock, ids } = services;
  return once({ db, clock, actor }, { requestId: request.requestId, act: 'load.open', body: request }, async (trx) => {
    const at = clock.now();
    const facility = await facilityDay(trx, actor.facilityId, at);
    // Counting the day's loads of a sterilizer: one at a time.
    await trx('sterilizers').where({ id: request.sterilizerId, facility_id: actor.facilityId }).forUpdate().first('id');
    const sterilizer = await sterilizerById(trx, actor.facilityId, request.sterilizerId);
    if (!sterilizer) throw new NotFound('sterilizer.none', 'There is no such sterilizer here.');
    requireInService(sterilizer);
    await requireProgram(trx, actor.facilityId, sterilizer, request.programId);
    await requireCart(trx, actor.facilityId, request.cartId, sterilizer);

    // Before the load is written: its reference to the run would share a lock that two loads then could not both raise.
    const run = request.runId === null ? null : await requireRun(trx, actor.facilityId, request.runId);

    const count = (await greatestCount(trx, sterilizer.id, facility)) + 1;
    const number = formatLoadNumber(
      { sterilizer: sterilizer.number, day: facility.day, count },
      facility.loadNumberPattern,
    );
    const policy = await policyInForce(trx, actor.facilityId, facility.day);
    if (!policy) throw new RuleRefused('load.no-policy', 'No policy is in force here yet, so no load can be judged.');
    const loadId = ids.next();
    await trx('loads').insert({
      id: loadId,
      facility_id: actor.facilityId,
      number,
      day: facility.day,
      count_of_day: count,
      sterilizer_id: sterilizer.id,
      program_id: request.programId,
      cart_id: request.cartId,
      run_id: request.runId,
      state: 'building',
      opened_by: actor.personId,
      opened_at: at,
      policy_id: policy.id,
    });
    const listed = run === null ? 0 : await listRun(trx, run, loadId, at);
    await appendEvent(trx, {
      kind: 'load.opened',
      at,
      facilityId: actor.facilityId,
      actorId: actor.personId,
      subjectKind: 'load',
      subjectId: loadId,
      loadId,
      requestId: request.requestId,
      payload: { number, listed },
    });
    return { loadId, number };
  });
}

function requireInService({ name, serviceState }: Sterilizer): void {
  if (serviceState === 'in-service') return;
  const state = serviceStateWords[serviceState].toLowerCase();
  throw new RuleRefused('load.sterilizer-not-in-service', `${name} is ${state}. Choose another sterilizer.`);
}

async function requireProgram(
  trx: Transaction,
  facilityId: string,
  sterilizer: { readonly id: string; readonly name: string },
  programId: string,
): Promise<void> {
  const qualified = await qualifiedPrograms(trx, facilityId, sterilizer.id);
  if (qualified.some((program) => program.id === programId)) return;
  const program = await trx('programs')
    .where({ id: programId, facility_id: facilityId })
    .first<{ code: string } | undefined>('code');
  if (!program) throw new NotFound('program.none', 'There is no such program here.');
  throw new RuleRefused(
    'load.program-not-qualified',
    `${sterilizer.name} is not qualified for ${program.code}. Choose one of its qualified programs.`,
  );
}

async function requireCart(
  trx: Transaction,
  facilityId: string,
  cartId: string,
  sterilizer: { readonly name: string; readonly sizeClass: string },
): Promise<void> {
  await trx('carts').where({ id: cartId, facility_id: facilityId }).forUpdate().first('id');
  const cart = await cartWithShelves(trx, facilityId, cartId);
  if (!cart) throw new NotFound('cart.none', 'There is no such cart here.');
  if (!cart.isUsable)
    throw new RuleRefused('load.cart-not-usable', `${cart.name} is out of use.${cart.note ? ` ${cart.note}` : ''}`);
  if (cart.sizeClass !== sterilizer.sizeClass) {
    throw new RuleRefused('load.cart-does-not-fit', `${cart.name} does not fit ${sterilizer.name}.`);
  }
  const used = await buildingLoadOfCart(trx, cartId);
  if (used)
    throw new Conflict('load.cart-in-use', `${cart.name} carries load ${used.number}, opened by ${used.openedBy}.`);
}

async function greatestCount(trx: Transaction, sterilizerId: string, facility: FacilityDay): Promise<number> {
  const row = await trx('loads')
    .where({ sterilizer_id: sterilizerId, day: facility.day })
    .orderBy('count_of_day', 'desc')
    .first<{ count_of_day: number } | undefined>('count_of_day');
  return row?.count_of_day ?? 0;
}

async function requireRun(trx: Transaction, facilityId: string, runId: string): Promise<RunFacts> {
  const run = await lockRun(trx, runId);
  if (run?.facilityId !== facilityId) throw new NotFound('run.none', 'There is no such run here.');
  if (run.state === 'taken') throw new Conflict('run.taken', `${run.name} is already on another load.`);
  if (run.state === 'dropped') throw new InvalidInput('run.dropped', `${run.name} was dropped.`);
  return run;
}

async function listRun(trx: Transaction, run: RunFacts, loadId: string, at: Date): Promise<number> {
  const staged = await packagesOfRun(trx, run.id);
  await lockPackages(
    trx,
    staged.map((entry) => entry.id),
  );
  const free = (await packagesOfRun(trx, run.id)).filter((entry) => entry.openLoad === null);
  if (free.length > 0) {
    await trx('load_packages').insert(
      free.map((entry) => ({ load_id: loadId, package_id: entry.id, is_open: true, was_staged: true, listed_at: at })),
    );
  }
  await trx('runs')
    .where({ id: run.id })
    .update({ state: 'taken', version: run.version + 1 });
  return free.length;
}
