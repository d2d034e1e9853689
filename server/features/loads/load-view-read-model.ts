import { loadPolicySchema } from '#contract/policy';
import type { LoadView } from '#domain/load/model';
import type { LoadPolicy } from '#domain/load/policy';
import type { Db, Transaction } from '../../platform/db';
import {
  airRemovalOfDay,
  cartWithShelves,
  holderKinds,
  programById,
  qualifiedPrograms,
  sterilizerById,
} from '../equipment/read-model';
import { catalogueItems } from '../items/read-model';
import { facilityAt } from './facility-day';
import {
  listAcceptances,
  listCounts,
  listLoadHolders,
  listLoadPackages,
  type AcceptanceRow,
  type CountRow,
  type LoadRow,
} from './load-store';

export type LoadAsKnown = {
  readonly load: LoadRow;
  readonly view: LoadView;
  readonly policy: LoadPolicy;
  readonly policyNumber: number;
  readonly counts: readonly CountRow[];
  readonly acceptances: readonly AcceptanceRow[];
};

function present<Thing>(thing: Thing | undefined, what: string): Thing {
  if (thing === undefined) throw new Error(`the load names ${what} that is not there`);
  return thing;
}

/** Reads everything the rules look at. Inside a transaction that has locked the load, nothing of it can move meanwhile. */
export async function readLoadView(db: Db | Transaction, load: LoadRow, at: Date): Promise<LoadAsKnown> {
  const facilityId = load.facility_id;
  const facility = await facilityAt(db, facilityId, at);
  const sterilizer = present(await sterilizerById(db, facilityId, load.sterilizer_id), 'a sterilizer');
  const cart = present(await cartWithShelves(db, facilityId, load.cart_id), 'a cart');
  const programs = await qualifiedPrograms(db, facilityId, load.sterilizer_id);
  const packages = await listLoadPackages(db, load.id);
  const holders = await listLoadHolders(db, load.id);
  const counts = await listCounts(db, load.id);
  const acceptances = await listAcceptances(db, load.id);
  const policyRow = await db('policies')
    .where({ id: load.policy_id })
    .first<{ number: number; settings: unknown }>('number', 'settings');
  // The sterilizer may lose a qualification while a load is being built: then a rule says so.
  const qualified = programs.find((candidate) => candidate.id === load.program_id);
  return {
    load,
    policy: loadPolicySchema.parse(policyRow.settings),
    policyNumber: policyRow.number,
    counts,
    acceptances,
    view: {
      loadId: load.id,
      sterilizer,
      program: qualified ?? present(await programById(db, facilityId, load.program_id), 'a program'),
      qualifiedPrograms: programs,
      cart,
      holders,
      holderKinds: await holderKinds(db, facilityId),
      items: await catalogueItems(
        db,
        facilityId,
        packages.map((entry) => entry.itemId),
      ),
      packages,
      counts: counts.map(({ shelfId, counted }) => ({ shelfId, counted })),
      acceptances: acceptances.map(({ findingKey, ruleId, reason }) => ({ findingKey, ruleId, reason })),
      airRemoval: await airRemovalOfDay(db, facilityId, load.sterilizer_id, facility.day),
      today: facility.day,
    },
  };
}
