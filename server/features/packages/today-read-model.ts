import type { LoadState } from '#contract/loads';
import type { TodayCart, TodayLoad, TodaySterilizer } from '#contract/today';
import type { Db } from '../../platform/db';

/* One query for each part of the screen. */

/** A load in one of these is over: it is shown on its own day only. */
const over: readonly LoadState[] = [
  'released',
  'released-implant-early',
  'failed',
  'set-aside',
  'aborted',
  'abandoned',
];

export type LoadOfToday = TodayLoad & {
  readonly sterilizerId: string;
  readonly cartId: string;
  readonly openedById: string;
};

type LoadRow = {
  readonly id: string;
  readonly number: string;
  readonly count_of_day: number;
  readonly state: LoadState;
  readonly sterilizer_id: string;
  readonly program_code: string;
  readonly cart_id: string;
  readonly cart_name: string;
  readonly opened_by_id: string;
  readonly opened_by: string;
  readonly opened_at: Date;
  readonly closed_by: string | null;
  readonly closed_at: Date | null;
  readonly listed: number;
  readonly scanned: number;
  readonly implants: number;
};

/** Loads of the day and those not over yet, oldest first; abandoned ones are left out. */
export async function loadsOfToday(db: Db, facilityId: string, day: string): Promise<LoadOfToday[]> {
  const rows = await db('loads')
    .join('programs', 'programs.id', 'loads.program_id')
    .join('carts', 'carts.id', 'loads.cart_id')
    .join('people as opener', 'opener.id', 'loads.opened_by')
    .leftJoin('people as closer', 'closer.id', 'loads.closed_by')
    .joinRaw(
      `left join lateral (
         select count(*) as listed, count(load_packages.scanned_at) as scanned,
                count(*) filter (where items.is_implant) as implants
           from load_packages
           join packages on packages.id = load_packages.package_id
           join items on items.id = packages.item_id
          where load_packages.load_id = loads.id
       ) as contents on true`,
    )
    .where('loads.facility_id', facilityId)
    .whereNot('loads.state', 'abandoned')
    .andWhere((either) => {
      either.where('loads.day', day).orWhereNotIn('loads.state', [...over]);
    })
    .orderBy(['loads.opened_at', 'loads.id'])
    .select<LoadRow[]>(
      'loads.id',
      'loads.number',
      'loads.count_of_day',
      'loads.state',
      'loads.sterilizer_id',
      'programs.code as program_code',
      'loads.cart_id',
      'carts.name as cart_name',
      'loads.opened_by as opened_by_id',
      'opener.display_name as opened_by',
      'loads.opened_at',
      'closer.display_name as closed_by',
      'loads.closed_at',
      'contents.listed',
      'contents.scanned',
      'contents.implants',
    );
  return rows.map((row) => ({
    id: row.id,
    number: row.number,
    countOfDay: row.count_of_day,
    state: row.state,
    sterilizerId: row.sterilizer_id,
    programCode: row.program_code,
    cartId: row.cart_id,
    cartName: row.cart_name,
    openedById: row.opened_by_id,
    openedBy: row.opened_by,
    openedAt: row.opened_at.toISOString(),
    closedBy: row.closed_by,
    closedAt: row.closed_at?.toISOString() ?? null,
    listed: row.listed,
    scanned: row.scanned,
    implants: row.implants,
  }));
}

type SterilizerRow = {
  readonly id: string;
  readonly code: string;
  readonly number: string;
  readonly name: string;
  readonly service_state: TodaySterilizer['serviceState'];
  readonly needs_air_removal_test: boolean;
};

type TestRow = {
  readonly id: string;
  readonly sterilizer_id: string;
  readonly result: 'passed' | 'failed';
  readonly tested_at: Date;
  readonly read_by: string;
};

/** The facility's sterilizers with the day's air-removal tests, oldest first. */
export async function sterilizersOfToday(
  db: Db,
  facilityId: string,
  day: string,
): Promise<Omit<TodaySterilizer, 'loads'>[]> {
  const [sterilizers, tests] = await Promise.all([
    db('sterilizers')
      .where('sterilizers.facility_id', facilityId)
      .orderBy('sterilizers.code')
      .select<SterilizerRow[]>(
        'sterilizers.id',
        'sterilizers.code',
        'sterilizers.number',
        'sterilizers.name',
        'sterilizers.service_state',
        'sterilizers.needs_air_removal_test',
      ),
    db('air_removal_tests')
      .join('people', 'people.id', 'air_removal_tests.read_by')
      .where({ 'air_removal_tests.facility_id': facilityId, 'air_removal_tests.test_day': day })
      .orderBy(['air_removal_tests.tested_at', 'air_removal_tests.id'])
      .select<TestRow[]>(
        'air_removal_tests.id',
        'air_removal_tests.sterilizer_id',
        'air_removal_tests.result',
        'air_removal_tests.tested_at',
        'people.display_name as read_by',
      ),
  ]);
  return sterilizers.map((row) => ({
    id: row.id,
    code: row.code,
    number: row.number,
    name: row.name,
    serviceState: row.service_state,
    needsAirRemovalTest: row.needs_air_removal_test,
    tests: tests
      .filter((test) => test.sterilizer_id === row.id)
      .map((test) => ({
        id: test.id,
        result: test.result,
        testedAt: test.tested_at.toISOString(),
        readBy: test.read_by,
      })),
  }));
}

type CartRow = {
  readonly id: string;
  readonly code: string;
  readonly name: string;
  readonly is_usable: boolean;
  readonly note: string;
};

/** On these a load still stands on its cart. */
const onItsCart: readonly LoadState[] = ['building', 'closed', 'in-sterilizer', 'cooling'];

/** The facility's carts, each with the load that stands on it. */
export async function cartsOfToday(db: Db, facilityId: string, loads: readonly LoadOfToday[]): Promise<TodayCart[]> {
  const rows = await db('carts')
    .where('carts.facility_id', facilityId)
    .orderBy('carts.code')
    .select<CartRow[]>('carts.id', 'carts.code', 'carts.name', 'carts.is_usable', 'carts.note');
  return rows.map((row) => {
    const load = loads.findLast((one) => one.cartId === row.id && onItsCart.includes(one.state));
    return {
      id: row.id,
      code: row.code,
      name: row.name,
      isUsable: row.is_usable,
      note: row.note,
      load: load
        ? {
            id: load.id,
            number: load.number,
            state: load.state,
            openedBy: load.openedBy,
            listed: load.listed,
            scanned: load.scanned,
          }
        : null,
    };
  });
}

/** Packages that are packed, in no run, and that nothing speaks against. */
export async function countPacked(db: Db, facilityId: string, day: string): Promise<number> {
  const rows = await db('packages')
    .where({ 'packages.facility_id': facilityId, 'packages.state': 'packed' })
    .whereNull('packages.held_reason')
    .andWhere((either) => {
      either.whereNull('packages.expires_on').orWhere('packages.expires_on', '>=', day);
    })
    .count<{ packed: number }[]>('packages.id as packed');
  return rows[0]?.packed ?? 0;
}
