import { beforeEach, describe, expect, test } from 'vitest';
import type { AddPersonResponse } from '../../../src/contract/people';
import { addTestPerson, anId, openTestApp, testPassword } from '../../support/test-app';
import { eventsAbout } from '../session/session-support';
import { aNewPerson } from './people-support';

const app = openTestApp();
const nextPassword = 'nine wet herons on a kettle';

beforeEach(async () => {
  await app.db('sign_in_attempts').delete();
});

test('adds a person who signs in once with the one-time password and then chooses their own', async () => {
  const administrator = await app.as('administrator');
  const reply = await administrator
    .post('/api/people')
    .send(aNewPerson({ staffNumber: ' n4001 ' }))
    .expect(201);
  const { person, oneTimePassword, oneTimePasswordExpiresAt } = reply.body as AddPersonResponse;
  expect(person).toMatchObject({
    staffNumber: 'N4001',
    displayName: 'Ottoline Marsh-Ferreira',
    role: 'technician',
    usualShift: 'Night',
    hasBadge: false,
    hasPin: false,
    mustChangePassword: true,
    worksElsewhere: false,
  });
  expect(oneTimePassword).toMatch(/^(?:[a-hjkmnp-z2-9]{4}-){3}[a-hjkmnp-z2-9]{4}$/);
  expect(oneTimePasswordExpiresAt).toBe(new Date(app.clock.now().getTime() + 24 * 3_600_000).toISOString());

  const agent = app.anyone();
  await agent.post('/api/session').send({ staffNumber: 'N4001', password: oneTimePassword }).expect(200);
  await agent.get('/api/items').expect(403);
  await agent.post('/api/session/password').send({ current: oneTimePassword, next: nextPassword }).expect(200);
  await agent.get('/api/items').expect(200);
  await app.anyone().post('/api/session').send({ staffNumber: 'N4001', password: oneTimePassword }).expect(401);

  expect((await eventsAbout(app.db, person.id))[0]).toMatchObject({
    kind: 'person.added',
    actor_id: app.person('administrator').id,
    facility_id: app.facilities.A,
    payload: { role: 'technician' },
  });
});

test('a repeated request adds nobody and does not show the one-time password again', async () => {
  const administrator = await app.as('administrator');
  const body = aNewPerson({ staffNumber: 'N4002' });
  const first = (await administrator.post('/api/people').send(body).expect(201)).body as AddPersonResponse;
  const second = (await administrator.post('/api/people').send(body).expect(201)).body as AddPersonResponse;
  expect(second).toEqual({ ...first, oneTimePassword: null });
  expect(await app.db('people').where({ staff_number: 'N4002' })).toHaveLength(1);
  const kept = JSON.stringify(await app.db('requests').where({ id: body.requestId }));
  expect(kept).not.toContain(first.oneTimePassword ?? 'nothing');
  await administrator
    .post('/api/people')
    .send({ ...body, displayName: 'Somebody Else' })
    .expect(409);
});

test('two requests at the same moment for one staff number make one person', async () => {
  const administrator = await app.as('administrator');
  const replies = await Promise.all(
    [1, 2, 3].map(() => administrator.post('/api/people').send(aNewPerson({ staffNumber: 'N4003' }))),
  );
  expect(replies.map(({ status }) => status).sort()).toEqual([201, 409, 409]);
  expect(await app.db('people').where({ staff_number: 'N4003' })).toHaveLength(1);
});

describe('refuses', () => {
  test('a staff number in use, here or elsewhere', async () => {
    const administrator = await app.as('administrator');
    for (const staffNumber of ['A1001', 'b1001']) {
      const reply = await administrator.post('/api/people').send(aNewPerson({ staffNumber })).expect(409);
      expect(reply.body).toMatchObject({ code: 'people.staff-number-taken' });
    }
  });

  test('a surveyor without an end, and an end that is past', async () => {
    const administrator = await app.as('administrator');
    const send = (changes: object) =>
      administrator.post('/api/people').send(aNewPerson({ staffNumber: 'N4004', ...changes }));
    expect((await send({ role: 'surveyor' }).expect(400)).body).toMatchObject({
      code: 'people.surveyor-needs-end',
      fields: [{ pointer: '/body/expiresAt' }],
    });
    expect((await send({ expiresAt: app.clock.now().toISOString() }).expect(400)).body).toMatchObject({
      code: 'people.end-is-past',
    });
    const later = new Date(app.clock.now().getTime() + 1).toISOString();
    await send({ role: 'surveyor', expiresAt: later }).expect(201);
  });

  test('missing, extra and mistyped fields in plain words, and keeps nothing', async () => {
    const administrator = await app.as('administrator');
    const before = await app.db('people').count();
    for (const changes of [
      { requestId: undefined },
      { requestId: 'no id' },
      { staffNumber: '' },
      { staffNumber: 'N 4005' },
      { staffNumber: 'N'.repeat(21) },
      { displayName: '   ' },
      { displayName: 'x'.repeat(81) },
      { displayName: 'Otto\u0000line' },
      { displayName: 7 },
      { initials: 'TOOLONG' },
      { role: 'manager' },
      { role: null },
      { usualShift: undefined },
      { expiresAt: 'tomorrow' },
      { expiresAt: '2026-03-05T10:00:00' },
      { password: 'my own choice of words' },
      { facilityId: app.facilities.B },
      { id: anId() },
    ]) {
      const reply = await administrator.post('/api/people').send(aNewPerson({ staffNumber: 'N4005', ...changes }));
      expect(reply.status, JSON.stringify(changes)).toBe(400);
      expect(reply.type).toBe('application/problem+json');
      expect(reply.body).toMatchObject({ code: 'request.not-understood' });
    }
    expect(await app.db('people').count()).toEqual(before);
  });
});

describe('somebody of another facility', () => {
  const joining = (staffNumber: string, changes: object = {}) => ({
    requestId: anId(),
    staffNumber,
    role: 'lead',
    usualShift: null,
    expiresAt: null,
    ...changes,
  });

  test('joins through an administrator of both, keeps their password, and has a role of their own here', async () => {
    const person = await addTestPerson(app, { role: 'technician', facilityId: app.facilities.B });
    await app
      .db('memberships')
      .insert({ person_id: app.person('administrator').id, facility_id: app.facilities.B, role: 'administrator' });
    const administrator = await app.as('administrator');
    const reply = await administrator.post('/api/people/join').send(joining(person.staffNumber)).expect(201);
    expect(reply.body).toMatchObject({ person: { id: person.id, role: 'lead', worksElsewhere: true } });
    const session = await app
      .anyone()
      .post('/api/session')
      .send({ staffNumber: person.staffNumber, password: testPassword })
      .expect(200);
    expect((session.body as { facilities: unknown[] }).facilities).toHaveLength(2);
    await administrator.post('/api/people/join').send(joining(person.staffNumber)).expect(409);
    await app
      .db('memberships')
      .where({ person_id: app.person('administrator').id, facility_id: app.facilities.B })
      .delete();
  });

  test('is not found by an administrator of this one only, no more than nobody is', async () => {
    const administrator = await app.as('administrator');
    const elsewhere = await administrator.post('/api/people/join').send(joining('B1001')).expect(404);
    const nobody = await administrator.post('/api/people/join').send(joining('Z9999')).expect(404);
    expect({ ...elsewhere.body, reference: '' }).toEqual({ ...nobody.body, reference: '' });
    expect(await app.db('memberships').where({ person_id: app.person('technician', 'B').id })).toHaveLength(1);
  });
});
