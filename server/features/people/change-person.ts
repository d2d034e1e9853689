import type { SignInAct } from '#domain/people/decide-person-change';
import type { ChangePersonRequest, Person } from '#contract/people';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import type { Transaction } from '../../platform/db';
import { Conflict } from '../../platform/errors';
import { once } from '../../platform/once';
import { lockForChange, requireAllowedChange } from './lock-for-change';
import { getPersonView } from './people-read-model';
import { isBadgeTaken, updateMembership, updatePerson, type LockedPerson } from './person-store';
import { drawBadgeCode } from './secrets';

/** Changes a person's name, their place in this facility, or whether and how they come in. */
export async function changePerson(
  { db, clock }: Services,
  actor: Actor,
  personId: string,
  body: ChangePersonRequest,
): Promise<{ person: Person }> {
  return once(
    { db, clock, actor },
    { requestId: body.requestId, act: `person.change ${personId}`, body },
    async (trx) => {
      const now = clock.now();
      const before = await lockForChange(trx, actor, { personId, now });
      if (before.version !== body.version) {
        throw new Conflict('people.changed-meanwhile', 'Somebody else changed this person meanwhile. Look again.');
      }
      const after = await apply(trx, before, body);
      await requireAllowedChange(trx, actor, {
        person: before,
        after: { role: after.role, expiresAtMs: after.expiresAt?.getTime() ?? null, isDisabled: after.isDisabled },
        signInActs: signInActsBetween(before, after),
        now,
      });
      await updatePerson(trx, personId, { ...after, keepsPin: after.badgeCode !== null });
      await updateMembership(trx, { ...after, personId, facilityId: actor.facilityId });
      await appendEvent(trx, {
        kind: 'person.changed',
        at: now,
        facilityId: actor.facilityId,
        actorId: actor.personId,
        subjectKind: 'person',
        subjectId: personId,
        requestId: body.requestId,
        payload: { before: told(before), after: told(after) },
      });
      return { person: await getPersonView(trx, actor, personId, now) };
    },
  );
}

async function apply(trx: Transaction, before: LockedPerson, body: ChangePersonRequest): Promise<LockedPerson> {
  return {
    ...before,
    displayName: body.displayName ?? before.displayName,
    initials: body.initials ?? before.initials,
    role: body.role ?? before.role,
    usualShift: body.usualShift === undefined ? before.usualShift : body.usualShift,
    expiresAt: body.expiresAt === undefined ? before.expiresAt : instantOrNull(body.expiresAt),
    isDisabled: body.isDisabled ?? before.isDisabled,
    badgeCode: body.badge === undefined ? before.badgeCode : body.badge && (await drawFreeBadgeCode(trx)),
  };
}

function instantOrNull(text: string | null): Date | null {
  return text === null ? null : new Date(text);
}

async function drawFreeBadgeCode(trx: Transaction): Promise<string> {
  for (;;) {
    const code = drawBadgeCode();
    if (!(await isBadgeTaken(trx, code))) return code;
  }
}

function signInActsBetween(before: LockedPerson, after: LockedPerson): SignInAct[] {
  const acts: SignInAct[] = [];
  if (before.displayName !== after.displayName || before.initials !== after.initials) acts.push('change-name');
  if (before.isDisabled !== after.isDisabled) acts.push(after.isDisabled ? 'disable' : 'enable');
  if (before.badgeCode !== after.badgeCode) acts.push('change-badge');
  return acts;
}

/** For the history: a badge is half of a key, so only whether there is one. */
function told({ displayName, initials, role, usualShift, expiresAt, isDisabled, badgeCode }: LockedPerson) {
  return { displayName, initials, role, usualShift, expiresAt, isDisabled, hasBadge: badgeCode !== null };
}
