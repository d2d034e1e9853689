import type { Services } from '../../http/define-route';
import { endSession, signInOf, type SessionRequest } from '../../http/session';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import { endSessionsOf } from '../../platform/sessions';
import { setSignedOutEverywhere } from './sign-in-store';

/** Ends the session of this station. Signing out twice is no mistake. */
export async function signOut({ db, clock }: Services, request: SessionRequest): Promise<void> {
  const signIn = signInOf(request);
  await endSession(request);
  if (!signIn) return;
  await appendEvent(db, {
    kind: 'person.signed-out',
    at: clock.now(),
    facilityId: signIn.facilityId,
    actorId: signIn.personId,
    subjectKind: 'person',
    subjectId: signIn.personId,
    payload: { everywhere: false },
  });
}

/** Ends every session of this person, on every station: OWASP ASVS 5.0, 7.4.1. */
export async function signOutEverywhere({ db, clock }: Services, request: SessionRequest, actor: Actor): Promise<void> {
  const now = clock.now();
  await db.transaction(async (trx) => {
    await setSignedOutEverywhere(trx, actor.personId, now);
    await endSessionsOf(trx, actor.personId);
    await appendEvent(trx, {
      kind: 'person.signed-out',
      at: now,
      facilityId: actor.facilityId,
      actorId: actor.personId,
      subjectKind: 'person',
      subjectId: actor.personId,
      payload: { everywhere: true },
    });
  });
  await endSession(request);
}
