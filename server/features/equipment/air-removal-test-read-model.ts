import type { AirRemovalTest } from '#contract/air-removal-tests';
import type { Db, Transaction } from '../../platform/db';
import { pageOf } from '../../platform/paged-list';

type TestRow = {
  readonly id: string;
  readonly sterilizer_id: string;
  readonly sterilizer_code: string;
  readonly sterilizer_name: string;
  readonly tested_at: Date;
  readonly test_day: string;
  readonly result: 'passed' | 'failed';
  readonly pack_lot: string;
  readonly pack_expires_on: string;
  readonly is_before_first_load: boolean;
  readonly reader_name: string;
  readonly second_reader_name: string | null;
  readonly note: string;
};

const columns = [
  'air_removal_tests.*',
  'sterilizers.code as sterilizer_code',
  'sterilizers.name as sterilizer_name',
  'readers.display_name as reader_name',
  'second_readers.display_name as second_reader_name',
] as const;

function testsOf(trx: Transaction | Db, facilityId: string) {
  return trx('air_removal_tests')
    .join('sterilizers', 'sterilizers.id', 'air_removal_tests.sterilizer_id')
    .join('people as readers', 'readers.id', 'air_removal_tests.read_by')
    .leftJoin('people as second_readers', 'second_readers.id', 'air_removal_tests.second_reader')
    .where('air_removal_tests.facility_id', facilityId);
}

function testFrom(row: TestRow): AirRemovalTest {
  return {
    id: row.id,
    sterilizer: { id: row.sterilizer_id, code: row.sterilizer_code, name: row.sterilizer_name },
    testedAt: row.tested_at.toISOString(),
    testDay: row.test_day,
    result: row.result,
    packLot: row.pack_lot,
    packExpiresOn: row.pack_expires_on,
    isBeforeFirstLoad: row.is_before_first_load,
    readBy: row.reader_name,
    secondReader: row.second_reader_name,
    note: row.note,
  };
}

export async function getAirRemovalTest(
  trx: Transaction | Db,
  facilityId: string,
  id: string,
): Promise<AirRemovalTest> {
  const row = await testsOf(trx, facilityId)
    .where('air_removal_tests.id', id)
    .first<TestRow | undefined>([...columns]);
  if (!row) throw new Error('an air-removal test that was just written is not there');
  return testFrom(row);
}

const pageSize = 50;

/** One page of the facility's air-removal tests, the latest first. */
export async function listAirRemovalTests(
  db: Db,
  facilityId: string,
  {
    sterilizerId,
    day,
    page,
  }: { readonly sterilizerId?: string | undefined; readonly day?: string | undefined; readonly page: number },
) {
  const wanted = testsOf(db, facilityId);
  if (sterilizerId !== undefined) void wanted.where('air_removal_tests.sterilizer_id', sterilizerId);
  if (day !== undefined) void wanted.where('air_removal_tests.test_day', day);
  const { rows, ...paging } = await pageOf<TestRow>(wanted, {
    page,
    pageSize,
    orderBy: ['air_removal_tests.tested_at', 'air_removal_tests.id'],
    isDescending: true,
    select: columns,
  });
  return { tests: rows.map(testFrom), ...paging };
}

/** People of the facility who may read a sheet: those who record tests. */
export async function listReaders(
  trx: Transaction | Db,
  facilityId: string,
  roles: readonly string[],
  now: Date,
): Promise<{ id: string; name: string }[]> {
  return trx('people')
    .join('memberships', 'memberships.person_id', 'people.id')
    .where({ 'memberships.facility_id': facilityId, 'people.is_disabled': false })
    .whereIn('memberships.role', roles)
    .where((either) => {
      void either.whereNull('memberships.expires_at').orWhere('memberships.expires_at', '>', now);
    })
    .orderBy('people.display_name')
    .select<{ id: string; name: string }[]>('people.id', 'people.display_name as name');
}
