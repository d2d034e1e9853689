import type { RunSummary } from '#contract/runs';
import type { Knex } from 'knex';
import type { Db, Transaction } from '../../platform/db';

type RunRow = {
  readonly id: string;
  readonly name: string;
  readonly sterilizer_id: string | null;
  readonly sterilizer_code: string | null;
  readonly sterilizer_name: string | null;
  readonly program_id: string | null;
  readonly program_code: string | null;
  readonly program_name: string | null;
  readonly wanted_at: Date | null;
  readonly state: RunSummary['state'];
  readonly packages: number;
  readonly implants: number;
  readonly created_by: string;
  readonly created_at: Date;
  readonly load_id: string | null;
  readonly load_number: string | null;
  readonly version: number;
};

type Named = { readonly id: string; readonly code: string; readonly name: string };

function named(id: string | null, code: string | null, name: string | null): Named | null {
  return id === null || code === null || name === null ? null : { id, code, name };
}

function fromRow(row: RunRow): RunSummary {
  return {
    id: row.id,
    name: row.name,
    sterilizer: named(row.sterilizer_id, row.sterilizer_code, row.sterilizer_name),
    program: named(row.program_id, row.program_code, row.program_name),
    wantedAt: row.wanted_at?.toISOString() ?? null,
    state: row.state,
    packages: row.packages,
    implants: row.implants,
    createdBy: row.created_by,
    createdAt: row.created_at.toISOString(),
    load: row.load_id === null || row.load_number === null ? null : { id: row.load_id, number: row.load_number },
    version: row.version,
  };
}

/** The latest load of each run comes along: a run goes to a second one only when the first was abandoned. */
function summaries(trx: Transaction | Db): Knex.QueryBuilder {
  return trx('runs')
    .join('people', 'people.id', 'runs.created_by')
    .leftJoin('sterilizers', 'sterilizers.id', 'runs.sterilizer_id')
    .leftJoin('programs', 'programs.id', 'runs.program_id')
    .joinRaw(
      `left join lateral (
         select loads.id, loads.number from loads
          where loads.run_id = runs.id and loads.state <> 'abandoned'
          order by loads.opened_at desc limit 1
       ) as taking on true`,
    )
    .joinRaw(
      `left join lateral (
         select count(*) as packages, count(*) filter (where items.is_implant) as implants
           from packages join items on items.id = packages.item_id
          where packages.run_id = runs.id and packages.state = 'staged'
       ) as waiting on true`,
    )
    .select(
      'runs.id',
      'runs.name',
      'runs.sterilizer_id',
      'sterilizers.code as sterilizer_code',
      'sterilizers.name as sterilizer_name',
      'runs.program_id',
      'programs.code as program_code',
      'programs.name as program_name',
      'runs.wanted_at',
      'runs.state',
      'waiting.packages',
      'waiting.implants',
      'people.display_name as created_by',
      'runs.created_at',
      'taking.id as load_id',
      'taking.number as load_number',
      'runs.version',
    );
}

/** Runs taken or dropped long ago are history, not work. */
const greatestList = 200;

/** The facility's runs, the soonest wanted first. */
export async function listRuns(db: Db, facilityId: string, state: RunSummary['state'] | 'all'): Promise<RunSummary[]> {
  const query = summaries(db).where('runs.facility_id', facilityId);
  if (state !== 'all') query.andWhere('runs.state', state);
  const rows = (await query
    .orderByRaw("runs.state = 'waiting' desc, runs.wanted_at nulls last, runs.created_at desc")
    .limit(greatestList)) as RunRow[];
  return rows.map(fromRow);
}

export async function findRunSummary(
  db: Transaction | Db,
  facilityId: string,
  runId: string,
): Promise<RunSummary | undefined> {
  const rows = (await summaries(db).where({ 'runs.facility_id': facilityId, 'runs.id': runId })) as RunRow[];
  return rows[0] && fromRow(rows[0]);
}
