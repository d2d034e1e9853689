import type { OneTimePasswordResponse, PersonActRequest, PinResponse } from '#contract/people';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import { RuleRefused } from '../../platform/errors';
import { once } from '../../platform/once';
import { hashSecret } from '../../platform/secret-hash';
import { forgetTries, subjectOf } from '../../platform/sign-in-tries';
import { accessOf, lockForChange, requireAllowedChange } from './lock-for-change';
import { setOneTimePassword, setPinHash } from './person-store';
import { drawOneTimePassword, drawPin, oneTimePasswordHours } from './secrets';

/** Gives out a one-time password. It is shown in this answer and nowhere else; a repeated request does not show it again. */
export async function giveOneTimePassword(
  { db, clock }: Services,
  actor: Actor,
  personId: string,
  { requestId }: PersonActRequest,
): Promise<OneTimePasswordResponse> {
  const drawn = drawOneTimePassword();
  const passwordHash = await hashSecret(drawn);
  let shown: string | null = null;
  const reply = await once(
    { db, clock, actor },
    { requestId, act: `person.reset-password ${personId}`, body: {} },
    async (trx) => {
      const now = clock.now();
      const person = await lockForChange(trx, actor, { personId, now });
      await requireAllowedChange(trx, actor, { person, after: accessOf(person), signInActs: ['reset-password'], now });
      const expiresAt = new Date(now.getTime() + oneTimePasswordHours * 3_600_000);
      await setOneTimePassword(trx, personId, { passwordHash, expiresAt });
      await forgetTries(trx, subjectOf('staff-number', person.staffNumber));
      await appendEvent(trx, {
        kind: 'person.password-reset',
        at: now,
        facilityId: actor.facilityId,
        actorId: actor.personId,
        subjectKind: 'person',
        subjectId: personId,
        requestId,
        payload: { expiresAt: expiresAt.toISOString() },
      });
      shown = drawn;
      return { expiresAt: expiresAt.toISOString() };
    },
  );
  return { ...reply, oneTimePassword: shown };
}

/** Gives out a PIN for the person's badge, shown once in the same way. */
export async function givePin(
  { db, clock }: Services,
  actor: Actor,
  personId: string,
  { requestId }: PersonActRequest,
): Promise<PinResponse> {
  let shown: string | null = null;
  await once({ db, clock, actor }, { requestId, act: `person.reset-pin ${personId}`, body: {} }, async (trx) => {
    const now = clock.now();
    const person = await lockForChange(trx, actor, { personId, now });
    if (person.badgeCode === null) {
      throw new RuleRefused('pin.no-badge', 'A PIN goes with a badge. Give this person a badge first.');
    }
    await requireAllowedChange(trx, actor, { person, after: accessOf(person), signInActs: ['reset-pin'], now });
    const drawn = drawPin([person.staffNumber, person.badgeCode]);
    await setPinHash(trx, personId, await hashSecret(drawn));
    await forgetTries(trx, subjectOf('badge', person.badgeCode));
    await appendEvent(trx, {
      kind: 'person.pin-reset',
      at: now,
      facilityId: actor.facilityId,
      actorId: actor.personId,
      subjectKind: 'person',
      subjectId: personId,
      requestId,
      payload: {},
    });
    shown = drawn;
    return null;
  });
  return { pin: shown };
}
