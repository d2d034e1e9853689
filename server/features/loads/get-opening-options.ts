import type { LoadOpeningOptions } from '#contract/loads';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import {
  airRemovalOfDay,
  cartsOf,
  qualifiedPrograms,
  sterilizersOf,
  unqualifiedPrograms,
} from '../equipment/read-model';
import { waitingRuns } from '../packages/read-model';
import { facilityDay } from '../../platform/facility-day';
import { buildingLoadOfCart } from './open-load-read-model';

/** What a load can be opened on now: sterilizers with the programs they are qualified for, carts, and runs that wait. */
export async function getOpeningOptions({ db, clock }: Services, actor: Actor): Promise<LoadOpeningOptions> {
  const { facilityId } = actor;
  const { day } = await facilityDay(db, facilityId, clock.now());
  const carts = await Promise.all(
    (await cartsOf(db, facilityId)).map(async (cart) => {
      const used = await buildingLoadOfCart(db, cart.id);
      return {
        ...cart,
        isFree: cart.isUsable && used === undefined,
        usedBy: used ? `load ${used.number}` : cart.isUsable ? null : cart.note || 'out of use',
      };
    }),
  );
  const sterilizers = await sterilizersOf(db, facilityId);
  return {
    sterilizers: await Promise.all(
      sterilizers.map(async (sterilizer) => ({
        sterilizer,
        programs: await qualifiedPrograms(db, facilityId, sterilizer.id),
        unqualified: (await unqualifiedPrograms(db, facilityId, sterilizer.id)).map(({ id, code }) => ({ id, code })),
        carts: carts.filter((cart) => cart.sizeClass === sterilizer.sizeClass),
        airRemoval: await airRemovalOfDay(db, facilityId, sterilizer.id, day),
      })),
    ),
    runs: (await waitingRuns(db, facilityId)).map((run) => ({ ...run, wantedAt: run.wantedAt?.toISOString() ?? null })),
  };
}
