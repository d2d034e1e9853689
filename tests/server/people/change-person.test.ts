import type { Knex } from 'knex';
import type { Test } from 'supertest';
import type TestAgent from 'supertest/lib/agent';
import { beforeEach, describe, expect, test, vi } from 'vitest';
import type { Person } from '../../../src/contract/people';
import { parseBadgeCode } from '../../../src/domain/label/badge-code';
import { addTestPerson, anId, openTestApp, testPassword, testPin, type TestPerson } from '../../support/test-app';
import { eventsAbout } from '../session/session-support';
import { rowsOf, versionOf } from './people-support';

const app = openTestApp();

beforeEach(async () => {
  await app.db('sign_in_attempts').delete();
});

async function aTechnician(): Promise<TestPerson> {
  return addTestPerson(app, { role: 'technician', facilityId: app.facilities.A });
}

/** Sends a change as the administrator of A, with the person's present version unless told otherwise. */
async function change(personId: string, changes: object) {
  const administrator = await app.as('administrator');
  const version = await versionOf(app.db, personId);
  return administrator.patch(`/api/people/${personId}`).send({ requestId: anId(), version, ...changes });
}

test('changes name, initials, role, shift and end, leaves what is absent, and tells before and after', async () => {
  const person = await aTechnician();
  const reply = await change(person.id, { displayName: 'Quill Otherwise', role: 'lead', usualShift: 'Night' });
  expect(reply.status).toBe(200);
  expect((reply.body as { person: Person }).person).toMatchObject({
    displayName: 'Quill Otherwise',
    initials: 'TE',
    role: 'lead',
    usualShift: 'Night',
    expiresAt: null,
    isDisabled: false,
    version: 2,
  });
  const cleared = await change(person.id, { usualShift: null, expiresAt: '2026-04-01T00:00:00.000Z' });
  expect((cleared.body as { person: Person }).person).toMatchObject({
    displayName: 'Quill Otherwise',
    usualShift: null,
    expiresAt: '2026-04-01T00:00:00.000Z',
    version: 3,
  });
  expect((await eventsAbout(app.db, person.id))[0]).toMatchObject({
    kind: 'person.changed',
    actor_id: app.person('administrator').id,
    payload: {
      before: { displayName: 'Quill Somebody', role: 'technician', usualShift: null },
      after: { displayName: 'Quill Otherwise', role: 'lead', usualShift: 'Night' },
    },
  });
});

test('a new badge opens in place of the old one, with the PIN there was; without a badge there is no PIN', async () => {
  const person = await aTechnician();
  const reply = await change(person.id, { badge: 'new' });
  const { badgeCode } = (reply.body as { person: Person }).person;
  if (badgeCode === null) throw new Error('the administrator is shown the badge');
  expect(parseBadgeCode(badgeCode).ok).toBe(true);
  expect(badgeCode).not.toBe(person.badge);
  const sign = (badge: string) => app.anyone().post('/api/session/badge').send({ badge, pin: testPin });
  await sign(person.badge).expect(401);
  await sign(badgeCode).expect(200);

  await change(person.id, { badge: null });
  await sign(badgeCode).expect(401);
  expect(await app.db('people').where({ id: person.id }).first('badge_code', 'pin_hash')).toEqual({
    badge_code: null,
    pin_hash: null,
  });
  const told = JSON.stringify(await eventsAbout(app.db, person.id));
  expect(told).not.toContain(badgeCode);
  expect(told).not.toContain(person.badge);
});

test('a repeated request changes nothing more and answers the same', async () => {
  const person = await aTechnician();
  const administrator = await app.as('administrator');
  const body = { requestId: anId(), version: 1, badge: 'new' };
  const first = await administrator.patch(`/api/people/${person.id}`).send(body).expect(200);
  const second = await administrator.patch(`/api/people/${person.id}`).send(body).expect(200);
  expect(second.body).toEqual(first.body);
  expect(await versionOf(app.db, person.id)).toBe(2);
});

test('of two administrators who change one person at a time, the later looks again', async () => {
  const person = await aTechnician();
  const administrator = await app.as('administrator');
  const send = (role: string) =>
    administrator.patch(`/api/people/${person.id}`).send({ requestId: anId(), version: 1, role });
  const replies = await Promise.all([send('lead'), send('supervisor')]);
  expect(replies.map(({ status }) => status).sort()).toEqual([200, 409]);
  const late = replies.find(({ status }) => status === 409);
  expect(late?.body).toMatchObject({ code: 'people.changed-meanwhile' });
});

describe('refuses', () => {
  test('to change one’s own role, end or access', async () => {
    const { id } = app.person('administrator');
    const before = await rowsOf(app.db, id);
    for (const changes of [{ role: 'technician' }, { isDisabled: true }, { expiresAt: '2027-01-01T00:00:00.000Z' }]) {
      const reply = await change(id, changes);
      expect(reply.status, JSON.stringify(changes)).toBe(422);
      expect(reply.body).toMatchObject({ code: 'people.own-access' });
    }
    expect(await rowsOf(app.db, id)).toEqual(before);
    expect((await change(id, { usualShift: 'Day' })).status).toBe(200);
  });

  test('a surveyor without an end', async () => {
    const person = await aTechnician();
    const before = await rowsOf(app.db, person.id);
    const reply = await change(person.id, { role: 'surveyor' });
    expect(reply.status).toBe(422);
    expect(reply.body).toMatchObject({ code: 'people.surveyor-needs-end' });
    expect((await change(app.person('surveyor').id, { expiresAt: null })).body).toMatchObject({
      code: 'people.surveyor-needs-end',
    });
    expect(await rowsOf(app.db, person.id)).toEqual(before);
  });

  test('to touch the sign-in of somebody who also works elsewhere, but not their place here', async () => {
    const person = await aTechnician();
    await app.db('memberships').insert({ person_id: person.id, facility_id: app.facilities.B, role: 'lead' });
    const before = await rowsOf(app.db, person.id);
    const administrator = await app.as('administrator');
    for (const changes of [{ displayName: 'New Name' }, { isDisabled: true }, { badge: 'new' }, { badge: null }]) {
      const reply = await change(person.id, changes);
      expect(reply.status, JSON.stringify(changes)).toBe(422);
      expect(reply.body).toMatchObject({ code: 'people.works-elsewhere' });
    }
    for (const act of ['one-time-password', 'pin']) {
      const reply = await administrator.post(`/api/people/${person.id}/${act}`).send({ requestId: anId() });
      expect(reply.body).toMatchObject({ code: 'people.works-elsewhere' });
    }
    expect(await rowsOf(app.db, person.id)).toEqual(before);
    expect((await change(person.id, { role: 'lead' })).status).toBe(200);
  });

  test('missing, extra and mistyped fields', async () => {
    const person = await aTechnician();
    const administrator = await app.as('administrator');
    const before = await rowsOf(app.db, person.id);
    for (const body of [
      {},
      { requestId: anId() },
      { requestId: anId(), version: '1' },
      { requestId: anId(), version: 1, role: 'boss' },
      { requestId: anId(), version: 1, badge: 'N-48120937-25' },
      { requestId: anId(), version: 1, isDisabled: 'yes' },
      { requestId: anId(), version: 1, passwordHash: 'x' },
      { requestId: anId(), version: 1, displayName: null },
      { requestId: anId(), version: 1.5, role: 'lead' },
    ]) {
      const reply = await administrator.patch(`/api/people/${person.id}`).send(body);
      expect(reply.status, JSON.stringify(body)).toBe(400);
      expect(reply.body).toMatchObject({ code: 'request.not-understood' });
    }
    await administrator.patch('/api/people/not-an-id').send({ requestId: anId(), version: 1 }).expect(400);
    await administrator.patch(`/api/people/${anId()}`).send({ requestId: anId(), version: 1 }).expect(404);
    expect(await rowsOf(app.db, person.id)).toEqual(before);
  });
});

/**
 * Holds the facility until every request waits for it, does something in its hold, and lets go. Who of the waiting comes
 * first is the database's choice.
 */
async function whileAllWait(
  requests: readonly (() => Test)[],
  meanwhile: (held: Knex.Transaction) => Promise<unknown> = () => Promise.resolve(),
): Promise<number[]> {
  const held = await app.db.transaction();
  await held('facilities').where({ id: app.facilities.A }).forNoKeyUpdate().select('id');
  const sent = requests.map((request) => request().then(({ status }) => status));
  try {
    await vi.waitFor(async () => {
      const waiting = await app
        .db('pg_stat_activity')
        .whereRaw(`datname = current_database() and wait_event_type = 'Lock'`)
        .select('pid');
      expect(waiting).toHaveLength(requests.length);
    }, 10_000);
    await meanwhile(held);
  } finally {
    await held.commit();
  }
  return Promise.all(sent);
}

async function anAgentOf(person: TestPerson): Promise<TestAgent> {
  const agent = app.anyone();
  await agent.post('/api/session').send({ staffNumber: person.staffNumber, password: testPassword }).expect(200);
  return agent;
}

describe('two administrators at the same moment', () => {
  test('cannot both lose the role by taking it from each other', async () => {
    const [first, second] = [
      app.person('administrator'),
      await addTestPerson(app, { role: 'administrator', facilityId: app.facilities.A }),
    ];
    const [byFirst, bySecond] = [await anAgentOf(first), await anAgentOf(second)];
    const versions = { first: await versionOf(app.db, first.id), second: await versionOf(app.db, second.id) };
    const statuses = await whileAllWait([
      () =>
        byFirst
          .patch(`/api/people/${second.id}`)
          .send({ requestId: anId(), version: versions.second, role: 'supervisor' }),
      () =>
        bySecond
          .patch(`/api/people/${first.id}`)
          .send({ requestId: anId(), version: versions.first, role: 'supervisor' }),
    ]);
    expect(statuses.toSorted()).toEqual([200, 403]);
    const left = await app
      .db('memberships')
      .where({ facility_id: app.facilities.A, role: 'administrator' })
      .pluck<string[]>('person_id');
    expect(left).toEqual([statuses[0] === 200 ? first.id : second.id]);
  });

  test('an act under way by one who has just lost the role is not done any more', async () => {
    const leaving = await addTestPerson(app, { role: 'administrator', facilityId: app.facilities.A });
    const person = await aTechnician();
    const going = await anAgentOf(leaving);
    const before = await rowsOf(app.db, person.id);
    const statuses = await whileAllWait(
      [
        () => going.post(`/api/people/${person.id}/one-time-password`).send({ requestId: anId() }),
        () => going.patch(`/api/people/${person.id}`).send({ requestId: anId(), version: 1, role: 'administrator' }),
      ],
      (held) => held('people').where({ id: leaving.id }).update({ is_disabled: true }),
    );
    expect(statuses).toEqual([403, 403]);
    expect(await rowsOf(app.db, person.id)).toEqual(before);
  });
});

describe('the last administrator', () => {
  test('stays when the other one’s access only has an end', async () => {
    const lastId = app.person('administrator', 'B').id;
    const passing = await addTestPerson(app, {
      role: 'administrator',
      facilityId: app.facilities.B,
      expiresAt: new Date(app.clock.now().getTime() + 3_600_000),
    });
    const agent = await anAgentOf(passing);
    const before = await rowsOf(app.db, lastId);
    for (const changes of [{ role: 'lead' }, { isDisabled: true }, { expiresAt: '2026-12-01T00:00:00.000Z' }]) {
      const reply = await agent
        .patch(`/api/people/${lastId}`)
        .send({ requestId: anId(), version: await versionOf(app.db, lastId), ...changes });
      expect(reply.status, JSON.stringify(changes)).toBe(422);
      expect(reply.body).toMatchObject({ code: 'people.last-administrator' });
    }
    expect(await rowsOf(app.db, lastId)).toEqual(before);
  });
});
