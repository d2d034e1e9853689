import type { Permission } from '../access/permissions';

/* What waits for the person who looks: only what that person may do, the most pressing first. */

export type TodayFacts = {
  readonly sterilizers: readonly {
    readonly id: string;
    readonly name: string;
    readonly isInService: boolean;
    readonly needsAirRemovalTest: boolean;
    /** Result of the day's last air-removal test; null before the first. */
    readonly lastTest: 'passed' | 'failed' | null;
  }[];
  readonly loads: readonly {
    readonly id: string;
    readonly number: string;
    readonly isBuilding: boolean;
    readonly isClosed: boolean;
    readonly sterilizerName: string;
    readonly cartName: string;
    readonly openedById: string;
    readonly openedBy: string;
    readonly listed: number;
    readonly scanned: number;
  }[];
  /** Runs no load has taken, the soonest wanted first. */
  readonly runs: readonly {
    readonly id: string;
    readonly name: string;
    readonly sterilizerName: string | null;
    readonly packages: number;
    readonly implants: number;
    /** ISO instant; null when nobody has said when. */
    readonly wantedAt: string | null;
  }[];
  /** Packages that are packed and in no run. */
  readonly packed: number;
};

export type Watcher = { readonly personId: string; readonly permissions: readonly Permission[] };

export type Wait = { readonly title: string; readonly detail: string } & (
  | { readonly kind: 'air-removal-missing' | 'air-removal-failed'; readonly sterilizerId: string }
  | { readonly kind: 'load-building' | 'load-closed'; readonly loadId: string }
  | { readonly kind: 'run-waiting'; readonly runId: string; readonly wantedAt: string | null }
  | { readonly kind: 'packed-not-staged' }
);

function packagesInWords(count: number): string {
  return count === 1 ? '1 package' : `${count} packages`;
}

function airRemoval(facts: TodayFacts): Wait[] {
  return facts.sterilizers
    .filter(
      (sterilizer) => sterilizer.isInService && sterilizer.needsAirRemovalTest && sterilizer.lastTest !== 'passed',
    )
    .map((sterilizer): Wait => {
      const about = { sterilizerId: sterilizer.id };
      return sterilizer.lastTest === 'failed'
        ? {
            kind: 'air-removal-failed',
            ...about,
            title: `Air removal of ${sterilizer.name} failed`,
            detail: 'No load closes on it until a test has passed.',
          }
        : {
            kind: 'air-removal-missing',
            ...about,
            title: `Air removal of ${sterilizer.name} not yet recorded`,
            detail: 'No load closes on it before the test of the day has passed.',
          };
    })
    .sort((a, b) => (a.kind === b.kind ? 0 : a.kind === 'air-removal-failed' ? -1 : 1));
}

function building(facts: TodayFacts, personId: string): Wait[] {
  const isOwn = (load: TodayFacts['loads'][number]) => load.openedById === personId;
  return facts.loads
    .filter((load) => load.isBuilding)
    .sort((a, b) => Number(isOwn(b)) - Number(isOwn(a)))
    .map((load) => ({
      kind: 'load-building',
      loadId: load.id,
      title: `Load ${load.number}, ${load.scanned} of ${load.listed} scanned`,
      detail: `${load.cartName}, ${isOwn(load) ? 'opened by you' : `opened by ${load.openedBy}`}.`,
    }));
}

function runs(facts: TodayFacts): Wait[] {
  return facts.runs
    .filter((run) => run.packages > 0)
    .map((run) => ({
      kind: 'run-waiting',
      runId: run.id,
      wantedAt: run.wantedAt,
      title: `${run.name}, ${packagesInWords(run.packages)}`,
      detail: [
        run.sterilizerName === null ? 'For any sterilizer' : `For ${run.sterilizerName}`,
        ...(run.implants > 0 ? [run.implants === 1 ? '1 implant' : `${run.implants} implants`] : []),
      ].join(', '),
    }));
}

function closed(facts: TodayFacts): Wait[] {
  return facts.loads
    .filter((load) => load.isClosed)
    .map((load) => ({
      kind: 'load-closed',
      loadId: load.id,
      title: `Load ${load.number} is closed`,
      detail: `${load.cartName} waits for ${load.sterilizerName}.`,
    }));
}

function packed(facts: TodayFacts): Wait[] {
  if (facts.packed === 0) return [];
  return [
    {
      kind: 'packed-not-staged',
      title: facts.packed === 1 ? '1 package is in no run' : `${facts.packed} packages are in no run`,
      detail: 'Packed, and not asked into a load yet.',
    },
  ];
}

/** What waits for this person, the most pressing first. */
export function waitsFor(facts: TodayFacts, watcher: Watcher): Wait[] {
  const may = (permission: Permission) => watcher.permissions.includes(permission);
  return [
    ...(may('air-removal-test.record') ? airRemoval(facts) : []),
    ...(may('load.build') ? building(facts, watcher.personId) : []),
    ...(may('load.open') ? runs(facts) : []),
    ...(may('load.close') ? closed(facts) : []),
    ...(may('package.stage') ? packed(facts) : []),
  ];
}
