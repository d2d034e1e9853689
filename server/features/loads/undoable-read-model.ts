import type { AuditKind } from '#domain/audit/event-kinds';
import type { LoadDifference } from '#domain/load/difference';
import type { Db, Transaction } from '../../platform/db';

export type Undoable = {
  readonly eventId: number;
  readonly words: string;
  readonly difference: LoadDifference;
};

const undoableKinds = [
  'load.package-scanned',
  'load.package-moved',
  'load.package-taken-off',
  'load.arranged',
  'load.holder-placed',
  'load.holder-taken-off',
  'load.program-changed',
] as const satisfies readonly AuditKind[];

export type UndoableKind = (typeof undoableKinds)[number];

type ToldAct = {
  readonly difference: LoadDifference;
  readonly packageCode?: string;
  readonly holder?: string;
  readonly packages?: number;
};

type EventRow = { readonly id: number; readonly kind: UndoableKind; readonly payload: ToldAct };

export function isUndoable(kind: AuditKind): kind is UndoableKind {
  return (undoableKinds as readonly AuditKind[]).includes(kind);
}

/** What taking an act back is called. */
export function undoWords(kind: UndoableKind, payload: ToldAct): string {
  switch (kind) {
    case 'load.package-scanned':
      return `Scan of ${payload.packageCode ?? ''}`;
    case 'load.package-moved':
      return `Move of ${payload.packageCode ?? ''}`;
    case 'load.package-taken-off':
      return `Taking off ${payload.packageCode ?? ''}`;
    case 'load.arranged':
      return `Arranging ${payload.packages ?? 0} packages`;
    case 'load.holder-placed':
      return `Putting ${payload.holder ?? ''} on the cart`;
    case 'load.holder-taken-off':
      return `Taking off ${payload.holder ?? ''}`;
    case 'load.program-changed':
      return 'Change of program';
  }
}

/** The last act on this load that has not been taken back. Undoing is itself told in the history, never erased from it. */
export async function getUndoable(db: Db | Transaction, loadId: string): Promise<Undoable | null> {
  const row = await db('audit_events as event')
    .where('event.load_id', loadId)
    .whereIn('event.kind', [...undoableKinds])
    .whereNotExists(
      db('audit_events as undone')
        .where('undone.load_id', loadId)
        .where('undone.kind', 'load.undone')
        .whereRaw("(undone.payload->>'undid')::bigint = event.id"),
    )
    .orderBy('event.id', 'desc')
    .first<EventRow | undefined>('event.id', 'event.kind', 'event.payload');
  return row ? { eventId: row.id, words: undoWords(row.kind, row.payload), difference: row.payload.difference } : null;
}
