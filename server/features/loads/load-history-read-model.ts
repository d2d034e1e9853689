import type { AuditKind } from '#domain/audit/event-kinds';
import type { Db } from '../../platform/db';

type EventRow = {
  readonly id: number;
  readonly at: Date;
  readonly kind: AuditKind;
  readonly display_name: string | null;
  readonly payload: Readonly<Record<string, unknown>>;
};

export type HistoryLine = {
  readonly id: string;
  readonly at: string;
  readonly who: string;
  readonly kind: string;
  readonly sentence: string;
};

function text(payload: EventRow['payload'], key: string): string {
  const value = payload[key];
  return typeof value === 'string' || typeof value === 'number' ? String(value) : '';
}

function sentenceOf({ kind, payload }: EventRow): string {
  const say = (key: string) => text(payload, key);
  switch (kind) {
    case 'load.opened':
      return `Opened, ${say('listed')} ${say('listed') === '1' ? 'package' : 'packages'} listed`;
    case 'load.package-scanned':
      return `${say('packageCode')} scanned`;
    case 'load.scan-refused':
      return `Scan not taken: ${say('read') || 'nothing readable'} (${say('answer').replace('-', ' ')})`;
    case 'load.package-moved':
      return say('words') === '' ? `${say('packageCode')} moved or turned` : `${say('packageCode')}: ${say('words')}`;
    case 'load.package-taken-off':
      return `${say('packageCode')} taken off`;
    case 'load.arranged':
      return say('words') === '' ? `${say('packages')} packages arranged` : say('words');
    case 'load.holder-placed':
      return `${say('holder')} put on the cart`;
    case 'load.holder-taken-off':
      return `${say('holder')} taken off the cart`;
    case 'load.program-changed':
      return `Program changed from ${say('before')} to ${say('after')}`;
    case 'load.undone':
      return 'Last act taken back';
    case 'load.counted':
      return `${say('shelf')}: counted ${say('counted')}`;
    case 'load.finding-accepted':
      return `Finding left as it is (${say('ruleId').replaceAll('-', ' ')}): ${say('reason')}`;
    case 'load.sticker-printed':
      return say('copy') === '1'
        ? 'Load sticker printed'
        : `Load sticker printed again, copy ${say('copy')}: ${say('reason')}`;
    case 'load.close-refused':
      return `Close refused: ${Array.isArray(payload.blocks) ? payload.blocks.join('; ') : ''}`;
    case 'load.closed':
      return `Closed under rule set ${say('ruleSet')}`;
    case 'load.abandoned':
      return `Given up: ${say('reason')}`;
    default:
      return kind.replaceAll('-', ' ').replace('.', ': ');
  }
}

const longestHistory = 1_000;

/** Everything that happened to a load, newest first. */
export async function listLoadHistory(db: Db, loadId: string): Promise<HistoryLine[]> {
  const rows = await db('audit_events as event')
    .leftJoin('people as person', 'person.id', 'event.actor_id')
    .where('event.load_id', loadId)
    .orderBy('event.id', 'desc')
    .limit(longestHistory)
    .select<EventRow[]>('event.id', 'event.at', 'event.kind', 'event.payload', 'person.display_name');
  return rows.map((row) => ({
    id: String(row.id),
    at: row.at.toISOString(),
    who: row.display_name ?? '',
    kind: row.kind,
    sentence: sentenceOf(row),
  }));
}
