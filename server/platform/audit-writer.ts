import type { AuditKind, AuditPayloads } from '#domain/audit/event-kinds';
import type { Db, Transaction } from './db';

export type AuditEvent<Kind extends AuditKind> = {
  readonly kind: Kind;
  readonly at: Date;
  readonly facilityId: string | null;
  readonly actorId: string | null;
  readonly subjectKind: string;
  readonly subjectId: string;
  readonly payload: AuditPayloads[Kind];
  readonly loadId?: string;
  readonly requestId?: string;
};

/**
 * Appends to the history in the transaction that changes the state: both happen, or neither does.
 * Only a refused attempt may be written outside of one, since its transaction was rolled back.
 * @returns the event's position in the history
 */
export async function appendEvent<Kind extends AuditKind>(
  trx: Transaction | Db,
  event: AuditEvent<Kind>,
): Promise<number> {
  const rows = await trx('audit_events').insert(rowOf(event)).returning<{ id: number }[]>('id');
  const row = rows[0];
  if (!row) throw new Error('the history did not take an event');
  return row.id;
}

// PostgreSQL takes at most 65,535 values in one statement; an event has nine.
const eventsPerStatement = 2_000;

/** Appends many events, as a file taken over makes them, in the transaction that changes the state. */
export async function appendEvents<Kind extends AuditKind>(
  trx: Transaction,
  events: readonly AuditEvent<Kind>[],
): Promise<void> {
  for (let from = 0; from < events.length; from += eventsPerStatement) {
    await trx('audit_events').insert(events.slice(from, from + eventsPerStatement).map(rowOf));
  }
}

function rowOf<Kind extends AuditKind>(event: AuditEvent<Kind>) {
  return {
    kind: event.kind,
    at: event.at,
    facility_id: event.facilityId,
    actor_id: event.actorId,
    subject_kind: event.subjectKind,
    subject_id: event.subjectId,
    load_id: event.loadId ?? null,
    request_id: event.requestId ?? null,
    payload: JSON.stringify(event.payload),
  };
}
