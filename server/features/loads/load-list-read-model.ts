import type { LoadListQuery, LoadSummary } from '#contract/loads';
import type { Db, Transaction } from '../../platform/db';
import { getLoad } from './load-store';

type SummaryRow = {
  readonly id: string;
  readonly number: string;
  readonly state: LoadSummary['state'];
  readonly version: number;
  readonly sterilizer_id: string;
  readonly sterilizer_code: string;
  readonly sterilizer_name: string;
  readonly program_id: string;
  readonly program_code: string;
  readonly program_name: string;
  readonly cart_id: string;
  readonly cart_code: string;
  readonly cart_name: string;
  readonly opened_by_name: string;
  readonly opened_at: Date;
  readonly closed_by_name: string | null;
  readonly closed_at: Date | null;
  readonly listed: number;
  readonly scanned: number;
  readonly implants: number;
};

function summaries(db: Db | Transaction, facilityId: string) {
  return db('loads as load')
    .join('sterilizers as sterilizer', 'sterilizer.id', 'load.sterilizer_id')
    .join('programs as program', 'program.id', 'load.program_id')
    .join('carts as cart', 'cart.id', 'load.cart_id')
    .join('people as opener', 'opener.id', 'load.opened_by')
    .leftJoin('people as closer', 'closer.id', 'load.closed_by')
    .joinRaw(
      `left join lateral (
         select count(*) as listed, count(listed.scanned_at) as scanned,
                count(*) filter (where item.is_implant) as implants
           from load_packages as listed
           join packages as package on package.id = listed.package_id
           join items as item on item.id = package.item_id
          where listed.load_id = load.id
       ) as tally on true`,
    )
    .where('load.facility_id', facilityId)
    .select<SummaryRow[]>(
      'load.id',
      'load.number',
      'load.state',
      'load.version',
      'load.opened_at',
      'load.closed_at',
      'sterilizer.id as sterilizer_id',
      'sterilizer.code as sterilizer_code',
      'sterilizer.name as sterilizer_name',
      'program.id as program_id',
      'program.code as program_code',
      'program.name as program_name',
      'cart.id as cart_id',
      'cart.code as cart_code',
      'cart.name as cart_name',
      'opener.display_name as opened_by_name',
      'closer.display_name as closed_by_name',
      'tally.listed',
      'tally.scanned',
      'tally.implants',
    );
}

function fromRow(row: SummaryRow): LoadSummary {
  return {
    id: row.id,
    number: row.number,
    state: row.state,
    version: row.version,
    sterilizer: { id: row.sterilizer_id, code: row.sterilizer_code, name: row.sterilizer_name },
    program: { id: row.program_id, code: row.program_code, name: row.program_name },
    cart: { id: row.cart_id, code: row.cart_code, name: row.cart_name },
    openedBy: row.opened_by_name,
    openedAt: row.opened_at.toISOString(),
    closedBy: row.closed_by_name,
    closedAt: row.closed_at?.toISOString() ?? null,
    listed: row.listed,
    scanned: row.scanned,
    implants: row.implants,
  };
}

/** One page of the facility's loads, the newest first. */
export async function listLoads(
  db: Db,
  facilityId: string,
  { state, olderThan, limit }: LoadListQuery,
): Promise<{ loads: LoadSummary[]; hasOlder: boolean }> {
  const query = summaries(db, facilityId)
    .orderBy([
      { column: 'load.opened_at', order: 'desc' },
      { column: 'load.id', order: 'desc' },
    ])
    .limit(limit + 1);
  if (state === 'open') void query.where('load.state', 'building');
  if (state === 'closed') void query.whereNot('load.state', 'building');
  if (olderThan !== undefined) {
    const { id } = await getLoad(db, facilityId, olderThan);
    void query.whereRaw('(load.opened_at, load.id) < (select opened_at, id from loads where id = ?)', [id]);
  }
  const rows = await query;
  return { loads: rows.slice(0, limit).map(fromRow), hasOlder: rows.length > limit };
}

export async function findLoadSummary(
  db: Db | Transaction,
  facilityId: string,
  loadId: string,
): Promise<LoadSummary | undefined> {
  const [row] = await summaries(db, facilityId).where('load.id', loadId);
  return row && fromRow(row);
}
