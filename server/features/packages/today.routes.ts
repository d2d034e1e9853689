import { paths } from '#contract/paths';
import { todaySchema, type Today } from '#contract/today';
import { wallClock } from '#domain/time/wall-clock';
import { shiftAt } from '#domain/today/shift-at';
import { waitsFor } from '#domain/today/waits';
import { defineRoute, type Route, type Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { facilityDay } from '../../platform/facility-day';
import { listRuns } from './run-read-model';
import { cartsOfToday, countPacked, loadsOfToday, sterilizersOfToday } from './today-read-model';

async function getToday({ db, clock }: Services, actor: Actor): Promise<Today> {
  const now = clock.now();
  const { day, shifts, timeZone } = await facilityDay(db, actor.facilityId, now);
  const [sterilizers, loads, runs, packed] = await Promise.all([
    sterilizersOfToday(db, actor.facilityId, day),
    loadsOfToday(db, actor.facilityId, day),
    listRuns(db, actor.facilityId, 'waiting'),
    countPacked(db, actor.facilityId, day),
  ]);
  const carts = await cartsOfToday(db, actor.facilityId, loads);
  const nameOf = (sterilizerId: string) => sterilizers.find((one) => one.id === sterilizerId)?.name ?? '';
  const shift = shiftAt(shifts, wallClock(now.toISOString(), timeZone).time.slice(0, 5));
  const waits = waitsFor(
    {
      sterilizers: sterilizers.map((one) => ({
        id: one.id,
        name: one.name,
        isInService: one.serviceState === 'in-service',
        needsAirRemovalTest: one.needsAirRemovalTest,
        lastTest: one.tests.at(-1)?.result ?? null,
      })),
      loads: loads.map((load) => ({
        ...load,
        isBuilding: load.state === 'building',
        isClosed: load.state === 'closed',
        sterilizerName: nameOf(load.sterilizerId),
      })),
      runs: runs.map((run) => ({ ...run, sterilizerName: run.sterilizer?.name ?? null })),
      packed,
    },
    actor,
  );
  return {
    now: now.toISOString(),
    day,
    shift: shift && { name: shift.name, endsAt: shift.endsAt },
    sterilizers: sterilizers.map((one) => ({ ...one, loads: loads.filter((load) => load.sterilizerId === one.id) })),
    carts,
    runs,
    packed,
    waits,
  };
}

export const todayRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: paths.today,
    permission: 'load.view',
    response: todaySchema,
    handle: ({ services, actor }) => getToday(services, actor),
  }),
];
