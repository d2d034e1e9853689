import type { LoadOpeningOptions } from '#contract/loads';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { airRemovalsOfDay, cartsOf, panelsOf, sterilizersOf } from '../equipment/read-model';
import { waitingRuns } from '../packages/read-model';
import { facilityDay } from '../../platform/facility-day';
import { buildingLoadsOf } from './open-load-read-model';

/** What a load can be opened on now: sterilizers with the programs they are qualified for, carts, and runs that wait. */
export async function getOpeningOptions({ db, clock }: Services, actor: Actor): Promise<LoadOpeningOptions> {
  const { facilityId } = actor;
  const { day } = await facilityDay(db, facilityId, clock.now());
  const [sterilizers, panelOf, airRemovalOf, allCarts, inUse, runs] = await Promise.all([
    sterilizersOf(db, facilityId),
    panelsOf(db, facilityId),
    airRemovalsOfDay(db, facilityId, day),
    cartsOf(db, facilityId),
    buildingLoadsOf(db, facilityId),
    waitingRuns(db, facilityId),
  ]);
  const carts = allCarts.map((cart) => {
    const used = inUse.get(cart.id);
    return {
      ...cart,
      isFree: cart.isUsable && used === undefined,
      usedBy: used ? `load ${used.number}` : cart.isUsable ? null : cart.note || 'out of use',
    };
  });
  return {
    sterilizers: sterilizers.map((sterilizer) => {
      const { qualified, unqualified } = panelOf(sterilizer.id);
      return {
        sterilizer,
        programs: [...qualified],
        unqualified: unqualified.map(({ id, code }) => ({ id, code })),
        carts: carts.filter((cart) => cart.sizeClass === sterilizer.sizeClass),
        airRemoval: airRemovalOf(sterilizer.id),
      };
    }),
    runs: runs.map((run) => ({ ...run, wantedAt: run.wantedAt?.toISOString() ?? null })),
  };
}
