import { decidePersonChange, type PersonAccess, type SignInAct } from '#domain/people/decide-person-change';
import type { Actor } from '../../platform/actor';
import type { Transaction } from '../../platform/db';
import { NotFound, RuleRefused } from '../../platform/errors';
import { endSessionsOf } from '../../platform/sessions';
import { administersAllOf, listAloneAdministered } from './administration-read-model';
import { endSignInsBefore, lockFacilitiesOf, lockPerson, type LockedPerson } from './person-store';
import { requireStillAdministrator } from './require-still-administrator';

/** Locks what the decision about a person of this facility rests upon. */
export async function lockForChange(
  trx: Transaction,
  actor: Actor,
  { personId, now }: { readonly personId: string; readonly now: Date },
): Promise<LockedPerson> {
  await lockFacilitiesOf(trx, personId, actor.facilityId);
  await requireStillAdministrator(trx, actor, now);
  const person = await lockPerson(trx, personId, actor.facilityId);
  if (!person) throw new NotFound('people.none', 'There is no such person here.');
  return person;
}

export function accessOf({ role, expiresAt, isDisabled }: LockedPerson): PersonAccess {
  return { role, expiresAtMs: expiresAt?.getTime() ?? null, isDisabled };
}

/**
 * Asks the core, and ends the person's sessions where it says so.
 * @throws RuleRefused with the core's sentence
 */
export async function requireAllowedChange(
  trx: Transaction,
  actor: Actor,
  {
    person,
    after,
    signInActs,
    now,
  }: {
    readonly person: LockedPerson;
    readonly after: PersonAccess;
    readonly signInActs: readonly SignInAct[];
    readonly now: Date;
  },
): Promise<void> {
  const alone = await listAloneAdministered(trx, person.id);
  const decided = decidePersonChange({
    isSelf: person.id === actor.personId,
    before: accessOf(person),
    after,
    signInActs,
    administersAll: await administersAllOf(trx, { administratorId: actor.personId, personId: person.id, now }),
    othersAdministerHere: !alone.includes(actor.facilityId),
    othersAdministerEverywhere: alone.length === 0,
  });
  if (!decided.ok) throw new RuleRefused(`people.${decided.refusal.code}`, decided.refusal.sentence);
  if (!decided.value.endsSessions) return;
  await endSignInsBefore(trx, person.id, now);
  await endSessionsOf(trx, person.id);
}
