import type { Actor } from '../../platform/actor';
import type { Transaction } from '../../platform/db';
import { NotAllowed } from '../../platform/errors';
import { isAdministrator } from './administration-read-model';

/**
 * Asked again under the facility's lock: the right may have been taken between the beginning of the request and now.
 * @throws NotAllowed when it was
 */
export async function requireStillAdministrator(trx: Transaction, actor: Actor, now: Date): Promise<void> {
  if (await isAdministrator(trx, actor.personId, actor.facilityId, now)) return;
  throw new NotAllowed('access.not-permitted', 'Your role does not allow this.');
}
