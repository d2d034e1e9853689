import type { Response } from 'supertest';
import type { Db } from '../../../server/platform/db';

export type EventRow = {
  readonly kind: string;
  readonly actor_id: string | null;
  readonly facility_id: string | null;
  readonly payload: unknown;
  readonly at: Date;
};

/** What the history tells of a person, oldest first. */
export async function eventsAbout(db: Db, personId: string): Promise<EventRow[]> {
  return db('audit_events')
    .where({ subject_kind: 'person', subject_id: personId })
    .orderBy('id')
    .select<EventRow[]>('kind', 'actor_id', 'facility_id', 'payload', 'at');
}

/** The session cookie a reply sets, with its attributes; undefined when it sets none. */
export function cookieOf(reply: Response): string | undefined {
  const header: unknown = reply.headers['set-cookie'];
  return Array.isArray(header) ? header.map(String).find((cookie) => cookie.startsWith('paperside=')) : undefined;
}

/** The name and value of the cookie, as a browser sends them back. */
export function cookiePairOf(reply: Response): string {
  const pair = cookieOf(reply)?.split(';')[0];
  if (pair === undefined) throw new Error('this reply sets no session cookie');
  return pair;
}
