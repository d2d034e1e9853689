import type { RunSummary } from '#contract/runs';
import type { Today, TodayLoad, TodaySterilizer } from '#contract/today';

/* A Tuesday in London, where the wall clock is Greenwich's in March. */

export const tenFortyEight = '2026-03-17T10:48:00.000Z';

export function aLoad(changes: Partial<TodayLoad> = {}): TodayLoad {
  return {
    id: '0190f000-0000-7000-8000-000000000701',
    number: '1-26076-01',
    countOfDay: 1,
    state: 'building',
    programCode: 'W4-20',
    cartName: 'Cart 3',
    openedBy: 'Ines Marchetti',
    openedAt: '2026-03-17T09:00:00.000Z',
    closedBy: null,
    closedAt: null,
    listed: 29,
    scanned: 12,
    implants: 0,
    ...changes,
  };
}

export function aSterilizer(changes: Partial<TodaySterilizer> = {}): TodaySterilizer {
  return {
    id: '0190f000-0000-7000-8000-000000000601',
    code: 'ST-1',
    number: '1',
    name: 'Sterilizer 1',
    serviceState: 'in-service',
    needsAirRemovalTest: true,
    tests: [
      {
        id: '0190f000-0000-7000-8000-000000000801',
        result: 'passed',
        testedAt: '2026-03-17T05:55:00.000Z',
        readBy: 'Joanna Prusak',
      },
    ],
    loads: [],
    ...changes,
  };
}

export function aRun(changes: Partial<RunSummary> = {}): RunSummary {
  return {
    id: '0190f000-0000-7000-8000-000000000501',
    name: 'Mixed sets',
    sterilizer: { id: '0190f000-0000-7000-8000-000000000601', code: 'ST-1', name: 'Sterilizer 1' },
    program: null,
    wantedAt: '2026-03-17T12:00:00.000Z',
    state: 'waiting',
    packages: 30,
    implants: 1,
    createdBy: 'Ines Marchetti',
    createdAt: '2026-03-17T08:00:00.000Z',
    load: null,
    version: 1,
    ...changes,
  };
}

export function aDay(changes: Partial<Today> = {}): Today {
  return {
    now: tenFortyEight,
    day: '2026-03-17',
    shift: { name: 'Day', endsAt: '15:00' },
    sterilizers: [aSterilizer()],
    carts: [],
    runs: [],
    packed: 0,
    waits: [],
    ...changes,
  };
}
