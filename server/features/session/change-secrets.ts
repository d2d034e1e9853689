import { judgePassword } from '#domain/people/password-policy';
import { judgePin } from '#domain/people/pin-policy';
import type { ChangePasswordRequest, ChangePinRequest, SessionResponse } from '#contract/session';
import type { Services } from '../../http/define-route';
import { beginSession, signInOf, type SignIn, type SessionRequest } from '../../http/session';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import { isCommonPassword } from '../../platform/common-passwords';
import type { Transaction } from '../../platform/db';
import { Conflict, InvalidInput, RuleRefused } from '../../platform/errors';
import { hashSecret, isSecretOf } from '../../platform/secret-hash';
import { endSessionsOf } from '../../platform/sessions';
import { noteSuccess, sourceOf, subjectOf } from '../../platform/sign-in-tries';
import { getSession } from './session-read-model';
import { getCredentials, lockCredentials, setPassword, setPin, type Credentials } from './sign-in-store';
import { takeSignInTry } from './take-sign-in-try';

/**
 * A person's own new password. It ends every other session of theirs and puts this one under a new id.
 * @throws InvalidInput when the present password is wrong or the next one may not be used
 */
export async function changePassword(
  services: Services,
  request: SessionRequest,
  actor: Actor,
  { current, next }: ChangePasswordRequest,
): Promise<SessionResponse> {
  const { db, clock } = services;
  const person = await requireOwnPassword(services, request, actor, { password: current, pointer: '/body/current' });
  const facility = await db('facilities').where({ id: actor.facilityId }).first<{ name: string }>('name');
  const judged = judgePassword(next, {
    isCommon: isCommonPassword,
    words: [person.staffNumber, person.displayName, facility.name],
  });
  if (!judged.ok) refuseSecret(`password.${judged.refusal.code}`, judged.refusal.sentence, '/body/next');
  if (await isSecretOf(person.passwordHash, next)) {
    refuseSecret('password.unchanged', 'This is the password you have now. Choose another.', '/body/next');
  }
  const passwordHash = await hashSecret(next);
  const now = clock.now();
  await db.transaction(async (trx) => {
    await lockUnchanged(trx, person);
    await setPassword(trx, person.personId, { passwordHash, signedOutEverywhereAt: now });
    await endSessionsOf(trx, person.personId);
    await appendOwnEvent(trx, actor, now, 'person.changed-password');
  });
  const signIn: SignIn = {
    personId: actor.personId,
    facilityId: actor.facilityId,
    by: 'password',
    startedAtMs: now.getTime(),
    activeAtMs: now.getTime(),
  };
  await beginSession(request, signIn);
  return getSession(db, signIn, now);
}

/** A person's own new PIN; the password vouches for them. */
export async function changePin(
  services: Services,
  request: SessionRequest,
  actor: Actor,
  { password, pin }: ChangePinRequest,
): Promise<SessionResponse> {
  const { db, clock } = services;
  const held = signInOf(request);
  if (!held) throw new Error('a signed-in person has a session');
  const person = await requireOwnPassword(services, request, actor, { password, pointer: '/body/password' });
  if (person.badgeCode === null) {
    throw new RuleRefused('pin.no-badge', 'A PIN goes with a badge. Ask your administrator for a badge first.');
  }
  const judged = judgePin(pin, { isCommon: isCommonPassword, numbers: [person.staffNumber, person.badgeCode] });
  if (!judged.ok) refuseSecret(`pin.${judged.refusal.code}`, judged.refusal.sentence, '/body/pin');
  const pinHash = await hashSecret(pin);
  const now = clock.now();
  await db.transaction(async (trx) => {
    await lockUnchanged(trx, person);
    await setPin(trx, person.personId, pinHash);
    await appendOwnEvent(trx, actor, now, 'person.changed-pin');
  });
  return getSession(db, held, now);
}

/**
 * Counted like a sign-in: whoever sits down at an open station must not be able to guess the password from there.
 * @throws InvalidInput when it is wrong
 */
async function requireOwnPassword(
  services: Services,
  request: SessionRequest,
  actor: Actor,
  { password, pointer }: { readonly password: string; readonly pointer: string },
): Promise<Credentials> {
  const person = await getCredentials(services.db, actor.personId);
  const tryId = await takeSignInTry(services, {
    by: 'password',
    subject: subjectOf('staff-number', person.staffNumber),
    source: sourceOf(request.ip),
    findPerson: () => Promise.resolve(person),
  });
  if (!(await isSecretOf(person.passwordHash, password))) {
    refuseSecret('password.current-wrong', 'This is not your present password.', pointer);
  }
  await noteSuccess(services.db, tryId, services.clock.now());
  return person;
}

/** Hashing takes too long to hold a row meanwhile; so what was judged is compared again under the lock. */
async function lockUnchanged(trx: Transaction, judged: Credentials): Promise<void> {
  const locked = await lockCredentials(trx, judged.personId);
  if (locked.passwordHash !== judged.passwordHash || locked.badgeCode !== judged.badgeCode) {
    throw new Conflict(
      'session.changed-meanwhile',
      'This sign-in was changed meanwhile. Nothing was saved; try again.',
    );
  }
}

function refuseSecret(code: string, sentence: string, pointer: string): never {
  throw new InvalidInput(code, sentence, { fields: [{ pointer, detail: sentence }] });
}

async function appendOwnEvent(
  trx: Transaction,
  actor: Actor,
  at: Date,
  kind: 'person.changed-password' | 'person.changed-pin',
): Promise<void> {
  await appendEvent(trx, {
    kind,
    at,
    facilityId: actor.facilityId,
    actorId: actor.personId,
    subjectKind: 'person',
    subjectId: actor.personId,
    payload: {},
  });
}
