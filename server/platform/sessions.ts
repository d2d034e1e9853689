import type { Db, Transaction } from './db';

/* The session table belongs to the session store; these are the writes it has no call for. */

const personInSession = `sess #>> '{passport,user,personId}'`;

/**
 * Notes an act of the person. An update of its own, so that it can neither bring back a session that another request has
 * just ended nor set the time back.
 */
export async function noteActivity(db: Db, sessionId: string, at: Date): Promise<void> {
  await db.raw(
    `update session set sess = jsonb_set(sess::jsonb, '{passport,user,activeAtMs}', to_jsonb(?::bigint))::json
      where sid = ? and (sess #>> '{passport,user,activeAtMs}')::bigint < ?::bigint`,
    [at.getTime(), sessionId, at.getTime()],
  );
}

/** Ends every session of a person, wherever it is, in the transaction that gives the reason. */
export async function endSessionsOf(trx: Transaction, personId: string): Promise<void> {
  await trx.raw(`delete from session where ${personInSession} = ?`, [personId]);
}

/** Forgets sessions that the store would not answer with any more. It writes `expire` in the connection's own zone. */
export async function sweepSessions(db: Db): Promise<void> {
  await db.raw('delete from session where expire < localtimestamp');
}
