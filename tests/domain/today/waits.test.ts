import { describe, expect, it } from 'vitest';
import type { Role } from '../../../src/domain/access/permissions';
import { permissionsOf } from '../../../src/domain/access/role-matrix';
import { waitsFor, type TodayFacts } from '../../../src/domain/today/waits';

const facts: TodayFacts = {
  sterilizers: [
    { id: 'st-1', name: 'Sterilizer 1', isInService: true, needsAirRemovalTest: true, lastTest: 'passed' },
    { id: 'st-2', name: 'Sterilizer 2', isInService: true, needsAirRemovalTest: true, lastTest: null },
    { id: 'st-3', name: 'Sterilizer 3', isInService: true, needsAirRemovalTest: true, lastTest: 'failed' },
    { id: 'st-4', name: 'Sterilizer 4', isInService: true, needsAirRemovalTest: false, lastTest: null },
    { id: 'st-5', name: 'Sterilizer 5', isInService: false, needsAirRemovalTest: true, lastTest: 'failed' },
  ],
  loads: [
    {
      id: 'load-other',
      number: '1-26062-01',
      isBuilding: true,
      isClosed: false,
      sterilizerName: 'Sterilizer 1',
      cartName: 'Cart 1',
      openedById: 'someone-else',
      openedBy: 'Hana Strudwick',
      listed: 29,
      scanned: 12,
    },
    {
      id: 'load-own',
      number: '1-26062-02',
      isBuilding: true,
      isClosed: false,
      sterilizerName: 'Sterilizer 1',
      cartName: 'Cart 2',
      openedById: 'me',
      openedBy: 'Amabel Wyncote',
      listed: 8,
      scanned: 0,
    },
    {
      id: 'load-closed',
      number: '3-26062-01',
      isBuilding: false,
      isClosed: true,
      sterilizerName: 'Sterilizer 3',
      cartName: 'Cart 3',
      openedById: 'me',
      openedBy: 'Amabel Wyncote',
      listed: 8,
      scanned: 8,
    },
  ],
  runs: [
    {
      id: 'run-1',
      name: 'Mixed',
      sterilizerName: 'Sterilizer 1',
      packages: 30,
      implants: 1,
      wantedAt: '2026-03-03T16:00:00Z',
    },
    { id: 'run-empty', name: 'Nothing yet', sterilizerName: null, packages: 0, implants: 0, wantedAt: null },
  ],
  packed: 5,
};

function waits(role: Role): string[] {
  return waitsFor(facts, { personId: 'me', permissions: permissionsOf(role) }).map((wait) =>
    'sterilizerId' in wait
      ? `${wait.kind} ${wait.sterilizerId}`
      : 'loadId' in wait
        ? `${wait.kind} ${wait.loadId}`
        : 'runId' in wait
          ? `${wait.kind} ${wait.runId}`
          : wait.kind,
  );
}

describe('what waits', () => {
  it('for a technician: the failed test, the missing one, the own load before another’s, the run, the closed load, the packed', () => {
    expect(waits('technician')).toEqual([
      'air-removal-failed st-3',
      'air-removal-missing st-2',
      'load-building load-own',
      'load-building load-other',
      'run-waiting run-1',
      'load-closed load-closed',
      'packed-not-staged',
    ]);
  });

  it('for the engineer: only the tests', () => {
    expect(waits('engineer')).toEqual(['air-removal-failed st-3', 'air-removal-missing st-2']);
  });

  it.each(['surveyor', 'operating-room', 'infection-prevention', 'administrator'] as const)(
    'for %s: nothing',
    (role) => {
      expect(waits(role)).toEqual([]);
    },
  );

  it('says how far a load is and who has it', () => {
    const [own] = waitsFor(facts, { personId: 'me', permissions: ['load.build'] });
    expect(own).toMatchObject({ title: 'Load 1-26062-02, 0 of 8 scanned', detail: 'Cart 2, opened by you.' });
  });

  it('counts one package as one', () => {
    const one = waitsFor({ ...facts, packed: 1 }, { personId: 'me', permissions: ['package.stage'] });
    expect(one.map((wait) => wait.title)).toEqual(['1 package is in no run']);
    expect(waitsFor({ ...facts, packed: 0 }, { personId: 'me', permissions: ['package.stage'] })).toEqual([]);
  });
});
