import type { Knex } from 'knex';
import type { AuditKind, AuditPayloads } from '../src/domain/audit/event-kinds';
import type { ItemKind, PackageState } from '../src/domain/load/model';
import { addDays, calendarDay } from '../src/domain/time/calendar-day';
import { takePackageCodes } from '../server/features/packages/package-codes';
import { timeOrderedIds } from '../server/platform/ids';
import { appendEvent } from '../server/platform/audit-writer';
import { hospitalId, surgeryCenterId } from './demonstration-facilities';
import { demonstrationPersonId } from './demonstration-people';

/*
 * What lies packed on the tables of the demonstration when a visitor comes in: runs for three loads that can be built side by
 * side, packages nobody has asked for yet, and one of each that a scanner has to refuse.
 */

const hospitalZone = 'America/Chicago';
const minuteMs = 60_000;

/** Item code, how many packages of it, and where they are asked for. */
type Contents = readonly (readonly [code: string, quantity: number, destination?: string])[];

type RunPlan = {
  readonly name: string;
  readonly sterilizer: string;
  readonly program: string;
  readonly wantedInMinutes: number;
  readonly contents: Contents;
};

/**
 * Each fits one cart of its sterilizer, in whatever order it is scanned: the first beside two small racks, the third with a
 * medium and a large one. The second has an implant, and a container on which C-17 from the table may be stacked.
 */
export const demonstrationRuns = {
  mixed: {
    name: 'Mixed sets and pouches',
    sterilizer: 'ST-1',
    program: 'W4-20',
    wantedInMinutes: 120,
    contents: [
      ['P-01', 3],
      ['P-02', 3],
      ['P-03', 3],
      ['P-04', 3, 'Labor ward'],
      ['P-16', 2, 'Clinic 3'],
      ['P-17', 2, 'Dental clinic'],
      ['C-14', 13, 'Eye clinic'],
      ['PCD-02', 1],
    ],
  },
  containers: {
    name: 'Containers and textiles',
    sterilizer: 'ST-2',
    program: 'W4-30',
    wantedInMinutes: 165,
    contents: [
      ['PCD-01', 1],
      ['C-18', 1, 'Emergency'],
      ['C-05', 1, 'Room 4'],
      ['W-12', 1, 'Room 4'],
      ['C-14', 2, 'Eye clinic'],
    ],
  },
  gravity: {
    name: 'Gravity 121',
    sterilizer: 'ST-3',
    program: 'G121-30',
    wantedInMinutes: 240,
    contents: [
      ['G-01', 4, 'Clinic 3'],
      ['G-02', 2, 'Women’s clinic'],
    ],
  },
} as const satisfies Readonly<Record<string, RunPlan>>;

/** Packed, and in no run yet: C-13 may not share a load with the others, and C-12 is heavier than a set may be. */
const onTheTable: Contents = [
  ['P-05', 2, 'Emergency'],
  ['P-06', 1, 'Clinic 3'],
  ['P-14', 2],
  ['P-20', 1],
  ['W-01', 1],
  ['W-08', 2],
  ['C-01', 1],
  ['C-17', 1],
  ['C-12', 1],
  ['C-13', 1, 'Room 7'],
];

type Odd = {
  readonly code: string;
  readonly state: PackageState;
  readonly heldReason: string | null;
  readonly isExpired: boolean;
};

const odd: readonly Odd[] = [
  { code: 'P-18', state: 'packed', heldReason: 'Seal open at one corner', isExpired: false },
  { code: 'P-13', state: 'recalled', heldReason: 'Internal CI of its lot in question', isExpired: false },
  { code: 'C-10', state: 'packed', heldReason: null, isExpired: true },
  { code: 'P-03', state: 'sterile', heldReason: null, isExpired: false },
];

type ItemRow = { readonly id: string; readonly code: string; readonly kind: ItemKind };

type Packing = {
  readonly facilityId: string;
  readonly item: ItemRow;
  readonly quantity: number;
  readonly packedBy: string;
  readonly packedAt: Date;
  readonly state?: PackageState;
  readonly heldReason?: string | null;
  readonly expiresOn?: string | null;
  readonly destination?: string;
};

type Made = { readonly id: string; readonly facilityId: string; readonly packedAt: Date };

function itemsByCode(rows: readonly ItemRow[]): (code: string) => ItemRow {
  const known = new Map(rows.map((row) => [row.code, row]));
  return (code) => {
    const row = known.get(code);
    if (!row) throw new Error(`The demonstration’s catalogue has no item ${code}.`);
    return row;
  };
}

function record<Kind extends AuditKind>(
  trx: Knex.Transaction,
  event: {
    readonly kind: Kind;
    readonly at: Date;
    readonly facilityId: string;
    readonly actorId: string;
    readonly subject: readonly ['package' | 'run', string];
    readonly payload: AuditPayloads[Kind];
  },
): Promise<number> {
  const { subject, ...rest } = event;
  return appendEvent(trx, { ...rest, subjectKind: subject[0], subjectId: subject[1] });
}

/** Packs as people do: codes, rows, a label for each, and the history that goes with it. */
async function packAll(trx: Knex.Transaction, packing: Packing): Promise<readonly Made[]> {
  const { facilityId, item, packedBy, packedAt } = packing;
  const codes = await takePackageCodes(trx, item.kind, packing.quantity);
  const made = codes.map((code) => ({ id: timeOrderedIds.next(), code, facilityId, packedAt }));
  const printedAt = new Date(packedAt.getTime() + minuteMs);
  await trx('packages').insert(
    made.map(({ id, code }) => ({
      id,
      facility_id: facilityId,
      code,
      item_id: item.id,
      state: packing.state ?? 'packed',
      held_reason: packing.heldReason ?? null,
      packed_by: packedBy,
      packed_at: packedAt,
      is_contents_confirmed: true,
      has_internal_indicator: true,
      has_external_indicator: true,
      expires_on: packing.expiresOn ?? null,
      destination: packing.destination ?? '',
    })),
  );
  const batchId = timeOrderedIds.next();
  await trx('label_prints').insert(
    made.map(({ id }) => ({
      id: timeOrderedIds.next(),
      batch_id: batchId,
      package_id: id,
      copy: 1,
      printed_by: packedBy,
      printed_at: printedAt,
    })),
  );
  for (const { id, code } of made) {
    const about = { facilityId, actorId: packedBy, subject: ['package', id] } as const;
    await record(trx, { ...about, kind: 'package.packed', at: packedAt, payload: { code, itemCode: item.code } });
    await record(trx, { ...about, kind: 'package.label-printed', at: printedAt, payload: { copy: 1, reason: null } });
  }
  return made;
}

async function idByCode(trx: Knex.Transaction, table: 'sterilizers' | 'programs', code: string): Promise<string> {
  const row = await trx(table).where({ facility_id: hospitalId, code }).first<{ id: string } | undefined>('id');
  if (!row) throw new Error(`The demonstration’s ${table} have no ${code}.`);
  return row.id;
}

/** The next full quarter of an hour at or after an instant: people ask for loads at such times. */
function quarterAfter(at: Date): Date {
  const quarterMs = 15 * minuteMs;
  return new Date(Math.ceil(at.getTime() / quarterMs) * quarterMs);
}

async function seedRun(
  trx: Knex.Transaction,
  plan: RunPlan,
  itemOf: (code: string) => ItemRow,
  now: Date,
): Promise<void> {
  const before = (minutes: number) => new Date(now.getTime() - minutes * minuteMs);
  const packers = ['AW', 'HS', 'JQ'].map(demonstrationPersonId);
  const stagedBy = demonstrationPersonId('AW');
  const runId = timeOrderedIds.next();
  await trx('runs').insert({
    id: runId,
    facility_id: hospitalId,
    name: plan.name,
    sterilizer_id: await idByCode(trx, 'sterilizers', plan.sterilizer),
    program_id: await idByCode(trx, 'programs', plan.program),
    wanted_at: quarterAfter(new Date(now.getTime() + plan.wantedInMinutes * minuteMs)),
    state: 'waiting',
    created_at: before(55),
    created_by: stagedBy,
  });
  await record(trx, {
    kind: 'run.added',
    at: before(55),
    facilityId: hospitalId,
    actorId: stagedBy,
    subject: ['run', runId],
    payload: { name: plan.name },
  });
  const made: Made[] = [];
  for (const [turn, [code, quantity, destination = '']] of plan.contents.entries()) {
    const packedBy = packers[turn % packers.length] ?? stagedBy;
    made.push(
      ...(await packAll(trx, {
        facilityId: hospitalId,
        item: itemOf(code),
        quantity,
        packedBy,
        packedAt: before(250 - 17 * turn),
        destination,
      })),
    );
  }
  const ids = made.map(({ id }) => id);
  await trx('packages').whereIn('id', ids).update({ state: 'staged', run_id: runId, version: 2 });
  for (const id of ids) {
    await record(trx, {
      kind: 'package.staged',
      at: before(40),
      facilityId: hospitalId,
      actorId: stagedBy,
      subject: ['package', id],
      payload: { runId },
    });
  }
}

async function seedOdd(trx: Knex.Transaction, itemOf: (code: string) => ItemRow, now: Date): Promise<void> {
  const yesterday = addDays(calendarDay(now.toISOString(), hospitalZone), -1);
  for (const { code, state, heldReason, isExpired } of odd) {
    const daysAgo = isExpired ? 31 : 1;
    await packAll(trx, {
      facilityId: hospitalId,
      item: itemOf(code),
      quantity: 1,
      packedBy: demonstrationPersonId('BN'),
      packedAt: new Date(now.getTime() - daysAgo * 24 * 60 * minuteMs),
      state,
      heldReason,
      expiresOn: isExpired ? yesterday : null,
    });
  }
}

/** The other facility’s packages: to the hospital’s scanners they do not exist. */
async function seedSurgeryCenter(trx: Knex.Transaction, now: Date): Promise<void> {
  const rows = await trx('items')
    .where({ facility_id: surgeryCenterId, is_retired: false })
    .whereNot({ kind: 'challenge-device' })
    .orderBy('code')
    .limit(3)
    .select<ItemRow[]>('id', 'code', 'kind');
  if (rows.length === 0) throw new Error('The demonstration’s second facility has no catalogue.');
  for (const item of rows) {
    await packAll(trx, {
      facilityId: surgeryCenterId,
      item,
      quantity: 2,
      packedBy: demonstrationPersonId('WL'),
      packedAt: new Date(now.getTime() - 90 * minuteMs),
    });
  }
}

/** Packages and runs of both facilities, whose people, catalogue and equipment must be there already. */
export async function seedPackages(trx: Knex.Transaction, now: Date): Promise<void> {
  const itemOf = itemsByCode(
    await trx('items').where({ facility_id: hospitalId }).select<ItemRow[]>('id', 'code', 'kind'),
  );
  for (const plan of Object.values(demonstrationRuns)) await seedRun(trx, plan, itemOf, now);
  for (const [turn, [code, quantity, destination = '']] of onTheTable.entries()) {
    await packAll(trx, {
      facilityId: hospitalId,
      item: itemOf(code),
      quantity,
      packedBy: demonstrationPersonId(turn % 2 === 0 ? 'HS' : 'JQ'),
      packedAt: new Date(now.getTime() - (95 - 8 * turn) * minuteMs),
      destination,
    });
  }
  await seedOdd(trx, itemOf, now);
  await seedSurgeryCenter(trx, now);
}
