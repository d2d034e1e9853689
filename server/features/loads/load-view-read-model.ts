import type { LoadView } from '#domain/load/model';
import type { LoadPolicy } from '#domain/load/policy';
import { policyFor } from '#domain/policy/settings';
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
import { policyById } from '../policies/read-model';
import { facilityDay } from '../../platform/facility-day';
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
  const [facility, sterilizerRow, cartRow, programs, packages, holders, kinds, counts, acceptances, policyRow] =
    await Promise.all([
      facilityDay(db, facilityId, at),
      sterilizerById(db, facilityId, load.sterilizer_id),
      cartWithShelves(db, facilityId, load.cart_id),
      qualifiedPrograms(db, facilityId, load.sterilizer_id),
      listLoadPackages(db, load.id),
      listLoadHolders(db, load.id),
      holderKinds(db, facilityId),
      listCounts(db, load.id),
      listAcceptances(db, load.id),
      policyById(db, load.policy_id),
    ]);
  const [items, airRemoval] = await Promise.all([
    catalogueItems(
      db,
      facilityId,
      packages.map((entry) => entry.itemId),
    ),
    airRemovalOfDay(db, facilityId, load.sterilizer_id, facility.day),
  ]);
  const policy = present(policyRow, 'a policy');
  const sterilizer = present(sterilizerRow, 'a sterilizer');
  const cart = present(cartRow, 'a cart');
  // The sterilizer may lose a qualification while a load is being built: then a rule says so.
  const qualified = programs.find((candidate) => candidate.id === load.program_id);
  return {
    load,
    policy: policyFor(policy.settings, load.sterilizer_id),
    policyNumber: policy.number,
    counts,
    acceptances,
    view: {
      loadId: load.id,
      sterilizer,
      program: qualified ?? present(await programById(db, facilityId, load.program_id), 'a program'),
      qualifiedPrograms: programs,
      cart,
      holders,
      holderKinds: kinds,
      items,
      packages,
      counts: counts.map(({ shelfId, counted }) => ({ shelfId, counted })),
      acceptances: acceptances.map(({ findingKey, ruleId, reason }) => ({ findingKey, ruleId, reason })),
      airRemoval,
      today: facility.day,
    },
  };
}
