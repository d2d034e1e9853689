import { createHash } from 'node:crypto';
import type { Actor } from './actor';
import type { Clock } from './clock';
import type { Db, Transaction } from './db';
import { Conflict } from './errors';

export type OnceContext = {
  readonly db: Db;
  readonly clock: Clock;
  readonly actor: Actor;
};

type RequestRow = {
  readonly person_id: string;
  readonly act: string;
  readonly body_digest: string;
  readonly response: unknown;
};

/**
 * Does a write exactly once. The client-made `requestId` is taken first, in the same transaction as the work, so a
 * repeated or raced request waits for the first, then gets its answer and changes nothing.
 * @throws Conflict when the id was used for something else or by someone else
 */
export async function once<Reply>(
  context: OnceContext,
  { requestId, act, body }: { readonly requestId: string; readonly act: string; readonly body: unknown },
  work: (trx: Transaction) => Promise<Reply>,
): Promise<Reply> {
  const { db, clock, actor } = context;
  const bodyDigest = createHash('sha256').update(JSON.stringify(body)).digest('hex');
  return db.transaction(async (trx) => {
    const taken = await trx('requests')
      .insert({
        id: requestId,
        facility_id: actor.facilityId,
        person_id: actor.personId,
        act,
        body_digest: bodyDigest,
        response: null,
        at: clock.now(),
      })
      .onConflict('id')
      .ignore()
      .returning<{ id: string }[]>('id');
    if (taken.length === 0) {
      const first = await trx('requests')
        .where({ id: requestId })
        .first<RequestRow | undefined>('person_id', 'act', 'body_digest', 'response');
      if (first?.person_id !== actor.personId || first.act !== act || first.body_digest !== bodyDigest) {
        throw new Conflict('request.reused', 'This request was already used for something else. Please try again.');
      }
      return first.response as Reply;
    }
    const reply = await work(trx);
    await trx('requests')
      .where({ id: requestId })
      .update({ response: JSON.stringify(reply ?? null) });
    return reply;
  });
}
