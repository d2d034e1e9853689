import type { AddPersonRequest, AddPersonResponse, JoinPersonRequest, Person } from '#contract/people';
import type { Services } from '../../http/define-route';
import type { Actor } from '../../platform/actor';
import { appendEvent } from '../../platform/audit-writer';
import type { Transaction } from '../../platform/db';
import { Conflict, InvalidInput, NotFound } from '../../platform/errors';
import { once } from '../../platform/once';
import { hashSecret } from '../../platform/secret-hash';
import { administersElsewhere } from './administration-read-model';
import { getPersonView } from './people-read-model';
import { findPersonByStaffNumber, insertMembership, insertPerson, lockFacility } from './person-store';
import { requireStillAdministrator } from './require-still-administrator';
import { drawOneTimePassword, oneTimePasswordHours } from './secrets';

type Place = Pick<AddPersonRequest, 'role' | 'usualShift' | 'expiresAt'>;

/** Makes a person with a one-time password, which the answer shows this once. */
export async function addPerson(services: Services, actor: Actor, body: AddPersonRequest): Promise<AddPersonResponse> {
  const { db, clock, ids } = services;
  requireEnd(body, clock.now());
  const drawn = drawOneTimePassword();
  const passwordHash = await hashSecret(drawn);
  let shown: string | null = null;
  const reply = await once(
    { db, clock, actor },
    { requestId: body.requestId, act: 'person.add', body },
    async (trx) => {
      const now = clock.now();
      await lockFacility(trx, actor.facilityId);
      await requireStillAdministrator(trx, actor, now);
      const id = ids.next();
      const oneTimePasswordExpiresAt = new Date(now.getTime() + oneTimePasswordHours * 3_600_000);
      const isNew = await insertPerson(trx, { ...body, id, passwordHash, oneTimePasswordExpiresAt, createdAt: now });
      if (!isNew) throw new Conflict('people.staff-number-taken', 'This staff number is already in use.');
      const person = await addMembership(trx, actor, { ...body, personId: id, now });
      shown = drawn;
      return { person, oneTimePasswordExpiresAt: oneTimePasswordExpiresAt.toISOString() };
    },
  );
  return { ...reply, oneTimePassword: shown };
}

/** Gives somebody of another facility a place in this one; only for an administrator of both. */
export async function joinPerson(
  services: Services,
  actor: Actor,
  body: JoinPersonRequest,
): Promise<{ person: Person }> {
  const { db, clock } = services;
  requireEnd(body, clock.now());
  return once({ db, clock, actor }, { requestId: body.requestId, act: 'person.join', body }, async (trx) => {
    const now = clock.now();
    await lockFacility(trx, actor.facilityId);
    await requireStillAdministrator(trx, actor, now);
    const found = await findPersonByStaffNumber(trx, body.staffNumber);
    const question = { administratorId: actor.personId, facilityId: actor.facilityId, now };
    if (!found || !(await administersElsewhere(trx, { ...question, personId: found.id }))) {
      throw new NotFound('people.none', 'Nobody with this staff number works at another facility you administer.');
    }
    return { person: await addMembership(trx, actor, { ...body, personId: found.id, now }) };
  });
}

function requireEnd({ role, expiresAt }: Place, now: Date): void {
  if (role === 'surveyor' && expiresAt === null) {
    refuseEnd('people.surveyor-needs-end', 'A surveyor sees this facility for a time only. Set when it ends.');
  }
  if (expiresAt !== null && new Date(expiresAt) <= now) refuseEnd('people.end-is-past', 'This end is already past.');
}

function refuseEnd(code: string, sentence: string): never {
  throw new InvalidInput(code, sentence, { fields: [{ pointer: '/body/expiresAt', detail: sentence }] });
}

async function addMembership(
  trx: Transaction,
  actor: Actor,
  {
    personId,
    requestId,
    role,
    usualShift,
    expiresAt,
    now,
  }: Place & { readonly personId: string; readonly requestId: string; readonly now: Date },
): Promise<Person> {
  const isNew = await insertMembership(trx, {
    personId,
    facilityId: actor.facilityId,
    role,
    usualShift,
    expiresAt: expiresAt === null ? null : new Date(expiresAt),
  });
  if (!isNew) throw new Conflict('people.already-here', 'This person already works here.');
  await appendEvent(trx, {
    kind: 'person.added',
    at: now,
    facilityId: actor.facilityId,
    actorId: actor.personId,
    subjectKind: 'person',
    subjectId: personId,
    requestId,
    payload: { role },
  });
  return getPersonView(trx, actor, personId, now);
}
