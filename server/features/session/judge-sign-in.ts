import type { Services } from '../../http/define-route';
import { beginSession, signInOf, type SignIn, type SessionRequest } from '../../http/session';
import { appendEvent } from '../../platform/audit-writer';
import { NotSignedIn } from '../../platform/errors';
import { isSecretOf } from '../../platform/secret-hash';
import { sweepSessions } from '../../platform/sessions';
import { noteSuccess } from '../../platform/sign-in-tries';
import { listFacilityIds, type Credentials } from './sign-in-store';
import { noteRefusedSignIn } from './take-sign-in-try';

type Attempt = {
  readonly by: 'password' | 'badge';
  readonly tryId: number;
  readonly person: Credentials | undefined;
  /** The hash to compare with; null when there is none. */
  readonly kept: string | null;
  readonly secret: string;
  /** What to say when number and secret do not belong together. It must not tell which of the two was wrong. */
  readonly sentence: string;
};

export type AdmittedPerson = {
  readonly personId: string;
  readonly facilityIds: readonly string[];
  readonly tryId: number;
};

/**
 * Says whether a person comes in. The first question is always the secret, whoever it is: only who knows it learns that
 * the sign-in is switched off or has run out.
 * @throws NotSignedIn otherwise
 */
export async function judgeSignIn(services: Services, attempt: Attempt): Promise<AdmittedPerson> {
  const { db, clock } = services;
  const { by, person, kept, secret, sentence } = attempt;
  const isRight = await isSecretOf(kept, secret);
  const now = clock.now();

  async function refused(reason: string, code: string, words: string): Promise<NotSignedIn> {
    await noteRefusedSignIn(services, { by, person, reason }, now);
    return new NotSignedIn(code, words);
  }

  if (!person) throw await refused('unknown', 'session.refused', sentence);
  if (!isRight) throw await refused('wrong-secret', 'session.refused', sentence);
  if (person.isDisabled) {
    throw await refused('disabled', 'session.disabled', 'This sign-in is switched off. Ask your administrator.');
  }
  if (
    by === 'password' &&
    person.mustChangePassword &&
    (person.oneTimePasswordExpiresAt === null || person.oneTimePasswordExpiresAt <= now)
  ) {
    throw await refused(
      'one-time-password-expired',
      'session.one-time-password-expired',
      'This one-time password has run out. Ask your administrator for a new one.',
    );
  }
  const facilityIds = await listFacilityIds(db, person.personId, now);
  if (facilityIds.length === 0) {
    throw await refused('no-facility', 'session.no-facility', 'This sign-in has run out. Ask your administrator.');
  }
  return { personId: person.personId, facilityIds, tryId: attempt.tryId };
}

/**
 * Begins the session of an admitted person. The station stays in the facility it was in, if that person works there.
 * Nothing else of whoever was signed in before goes on.
 */
export async function admit(
  { db, clock }: Services,
  request: SessionRequest,
  { personId, facilityIds, tryId }: AdmittedPerson,
  by: SignIn['by'],
): Promise<SignIn> {
  const now = clock.now();
  const former = signInOf(request)?.facilityId;
  const facilityId = facilityIds.find((id) => id === former) ?? facilityIds[0];
  if (facilityId === undefined) throw new Error('an admitted person works somewhere');
  await db.transaction(async (trx) => {
    await noteSuccess(trx, tryId, now);
    await appendEvent(trx, {
      kind: 'person.signed-in',
      at: now,
      facilityId,
      actorId: personId,
      subjectKind: 'person',
      subjectId: personId,
      payload: { by },
    });
  });
  await sweepSessions(db);
  const signIn: SignIn = { personId, facilityId, by, startedAtMs: now.getTime(), activeAtMs: now.getTime() };
  await beginSession(request, signIn);
  return signIn;
}
