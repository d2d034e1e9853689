import { createHash } from 'node:crypto';
import { isIPv6 } from 'node:net';
import { judgeTry, sourceWindowS, waitInWords } from '#domain/people/sign-in-throttle';
import type { Clock } from './clock';
import type { Db, Transaction } from './db';
import { TooManyTries } from './errors';

/* Tries are counted in the database, so that any number of server processes share one count. */

/** What a try was made for. Kept as a digest: people type their password into the wrong field. */
export function subjectOf(kind: 'staff-number' | 'badge', name: string): string {
  return createHash('sha256').update(`${kind} ${name}`).digest('hex');
}

/** Where a try came from. Of IPv6 the first four groups: one household or ward holds the rest. */
export function sourceOf(address: string | undefined): string {
  if (address === undefined) return 'unknown';
  const plain = address.replace(/^::ffff:(?=\d+\.)/, '');
  if (!isIPv6(plain)) return plain;
  const [head = '', tail = ''] = plain.split('::');
  const front = head === '' ? [] : head.split(':');
  const back = tail === '' ? [] : tail.split(':');
  const zeros = plain.includes('::') ? Array<string>(Math.max(0, 8 - front.length - back.length)).fill('0') : [];
  return [...front, ...zeros, ...back].slice(0, 4).join(':');
}

/**
 * Counts a try before it is judged, as a failure until told otherwise: a hundred tries at once then find each other's.
 * @returns its id, for `noteSuccess`
 * @throws TooManyTries when this one has to wait; it then counts for nothing
 */
export async function takeTry(
  { db, clock }: { readonly db: Db; readonly clock: Clock },
  { subject, source }: { readonly subject: string; readonly source: string },
): Promise<number> {
  return db.transaction(async (trx) => {
    // Always in this order, so that two tries cannot wait for each other.
    await trx.raw('select pg_advisory_xact_lock(hashtextextended(?, 1))', [source]);
    await trx.raw('select pg_advisory_xact_lock(hashtextextended(?, 2))', [subject]);
    const now = clock.now();
    const row = await trx('sign_in_attempts')
      .where({ subject, is_success: false })
      .whereRaw('id > coalesce((select max(id) from sign_in_attempts where subject = ? and is_success), 0)', [subject])
      .first<{ failures: number; last_at: Date | null }>(
        trx.raw('count(*)::integer as failures'),
        trx.raw('max(at) as last_at'),
      );
    const fromSource = await trx('sign_in_attempts')
      .where({ source, is_success: false })
      .where('at', '>', new Date(now.getTime() - sourceWindowS * 1000))
      .orderBy('at')
      .select<{ at: Date }[]>('at');
    const verdict = judgeTry(
      {
        failuresInARow: row.failures,
        lastFailureMs: row.last_at?.getTime() ?? null,
        sourceFailuresMs: fromSource.map(({ at }) => at.getTime()),
      },
      now.getTime(),
    );
    if (verdict.may === 'wait') {
      const wait = waitInWords(verdict.seconds);
      throw new TooManyTries(
        'session.too-many-tries',
        `Too many tries. Wait ${wait}, then try again.`,
        verdict.seconds,
      );
    }
    if (verdict.may === 'not-until-reset') {
      throw new TooManyTries(
        'session.not-until-reset',
        'Too many wrong tries. An administrator has to give out a new one-time password or PIN.',
        24 * 60 * 60,
      );
    }
    const inserted = await trx('sign_in_attempts')
      .insert({ subject, source, at: now, is_success: false })
      .returning<{ id: number }[]>('id');
    const id = inserted[0]?.id;
    if (id === undefined) throw new Error('a try was not counted');
    return id;
  });
}

/** The try was right: what failed before it, under this name, counts no longer, and goes once no address needs it. */
export async function noteSuccess(trx: Db | Transaction, tryId: number, now: Date): Promise<void> {
  await trx('sign_in_attempts').where({ id: tryId }).update({ is_success: true });
  await trx.raw(
    `delete from sign_in_attempts as old using sign_in_attempts as own
      where own.id = ? and old.subject = own.subject and old.id < own.id and old.at < ?`,
    [tryId, new Date(now.getTime() - sourceWindowS * 1000)],
  );
}

/** Forgets the failures under a name, when an administrator gives out a new secret. */
export async function forgetTries(trx: Transaction, subject: string): Promise<void> {
  await trx('sign_in_attempts').where({ subject }).delete();
}
