import type { PackageDetail } from '#contract/packages';
import type { AuditKind } from '#domain/audit/event-kinds';
import { z } from 'zod';
import type { Db } from '../../platform/db';

type HistoryEntry = PackageDetail['history'][number];

const kindsShown = [
  'package.packed',
  'package.label-printed',
  'package.staged',
  'package.unstaged',
] as const satisfies readonly AuditKind[];

type EventRow = {
  readonly id: number;
  readonly at: Date;
  readonly who: string | null;
  readonly kind: (typeof kindsShown)[number];
  readonly payload: unknown;
  readonly run_name: string | null;
};

const printPayloadSchema = z.object({ copy: z.number(), reason: z.string().nullable() });

function sentenceOf(event: EventRow): string {
  const run = event.run_name === null ? 'a run' : `“${event.run_name}”`;
  switch (event.kind) {
    case 'package.packed':
      return 'Packed';
    case 'package.staged':
      return `Staged into ${run}`;
    case 'package.unstaged':
      return `Taken out of ${run}`;
    case 'package.label-printed': {
      const { copy, reason } = printPayloadSchema.parse(event.payload);
      return copy === 1 ? 'Label printed' : `Label printed again, copy ${copy}: ${reason ?? ''}`;
    }
  }
}

type ListedRow = {
  readonly load_id: string;
  readonly number: string;
  readonly listed_at: Date;
  readonly listed_by: string;
  readonly scanned_at: Date | null;
  readonly scanned_by: string | null;
};

function listedEntries(row: ListedRow): HistoryEntry[] {
  const listed = {
    id: `listed-${row.load_id}`,
    at: row.listed_at.toISOString(),
    who: row.listed_by,
    sentence: `Listed for load ${row.number}`,
  };
  if (row.scanned_at === null) return [listed];
  return [
    listed,
    {
      id: `scanned-${row.load_id}`,
      at: row.scanned_at.toISOString(),
      who: row.scanned_by ?? '',
      sentence: `Scanned into load ${row.number}`,
    },
  ];
}

/** What happened to a package, oldest first: its own history, and the loads that have it on their list. */
export async function packageHistory(db: Db, packageId: string): Promise<HistoryEntry[]> {
  const [events, listed] = await Promise.all([
    db('audit_events')
      .leftJoin('people', 'people.id', 'audit_events.actor_id')
      .leftJoin('runs', (join) => {
        join.on(db.raw("runs.id = (audit_events.payload ->> 'runId')::uuid"));
      })
      .where({ 'audit_events.subject_kind': 'package', 'audit_events.subject_id': packageId })
      .whereIn('audit_events.kind', [...kindsShown])
      .orderBy('audit_events.id')
      .select<EventRow[]>(
        'audit_events.id',
        'audit_events.at',
        'people.display_name as who',
        'audit_events.kind',
        'audit_events.payload',
        'runs.name as run_name',
      ),
    db('load_packages')
      .join('loads', 'loads.id', 'load_packages.load_id')
      .join('people as opener', 'opener.id', 'loads.opened_by')
      .leftJoin('people as scanner', 'scanner.id', 'load_packages.scanned_by')
      .where('load_packages.package_id', packageId)
      .select<ListedRow[]>(
        'loads.id as load_id',
        'loads.number',
        'load_packages.listed_at',
        'opener.display_name as listed_by',
        'load_packages.scanned_at',
        'scanner.display_name as scanned_by',
      ),
  ]);
  const own = events.map((event) => ({
    id: String(event.id),
    at: event.at.toISOString(),
    who: event.who ?? '',
    sentence: sentenceOf(event),
  }));
  // The sort is stable: what happened in the same instant stays in the order it was recorded.
  return [...own, ...listed.flatMap(listedEntries)].sort((a, b) => a.at.localeCompare(b.at));
}
