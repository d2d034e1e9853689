import { beforeEach, describe, expect, test } from 'vitest';
import { permissionsOf } from '../../../src/domain/access/role-matrix';
import { roles } from '../../../src/domain/access/permissions';
import { addTestPerson, openTestApp, testPassword } from '../../support/test-app';
import { cookieOf, eventsAbout } from './session-support';

const app = openTestApp();

beforeEach(async () => {
  await app.db('sign_in_attempts').delete();
});

test('signs in with staff number and password and tells who, where and what they may', async () => {
  const person = app.person('lead');
  const agent = app.anyone();
  const reply = await agent
    .post('/api/session')
    .send({ staffNumber: person.staffNumber, password: testPassword })
    .expect(200);
  expect(reply.body).toEqual({
    person: {
      id: person.id,
      displayName: person.displayName,
      initials: 'LE',
      staffNumber: person.staffNumber,
      role: 'lead',
      mustChangePassword: false,
      hasBadge: true,
      hasPin: true,
    },
    facility: { id: app.facilities.A, name: 'Alder Hospital', timeZone: 'America/Chicago', unitSystem: 'metric' },
    facilities: [{ id: app.facilities.A, name: 'Alder Hospital' }],
    permissions: permissionsOf('lead'),
    idleTimeoutSeconds: 600,
    expiresAt: '2026-03-04T01:30:00.000Z',
  });
  const again = await agent.get('/api/session').expect(200);
  expect(again.body).toEqual(reply.body);
});

test('gives every role exactly what the matrix gives it', async () => {
  for (const role of roles) {
    const agent = await app.as(role);
    const reply = await agent.get('/api/session').expect(200);
    expect(reply.body).toMatchObject({ person: { role }, permissions: permissionsOf(role) });
  }
});

test('takes a staff number as people type it, and a password in either Unicode form', async () => {
  const person = app.person('technician');
  const typed = ` ${person.staffNumber.toLowerCase()} `;
  await app.anyone().post('/api/session').send({ staffNumber: typed, password: testPassword }).expect(200);
  const wide = testPassword.replace('l', 'ｌ');
  await app.anyone().post('/api/session').send({ staffNumber: typed, password: wide }).expect(200);
});

test('keeps its cookie from scripts and foreign pages, and holds only an id in it', async () => {
  const reply = await app
    .anyone()
    .post('/api/session')
    .send({ staffNumber: app.person('lead').staffNumber, password: testPassword });
  const cookie = cookieOf(reply);
  expect(cookie).toMatch(/^paperside=s%3A[\w-]{32}\.[^;]+; Path=\/; HttpOnly; SameSite=Lax$/);
  expect(reply.headers['cache-control']).toBe('no-store');
});

test('behind https its cookie goes nowhere else: bound to the host, and never sent in clear', async () => {
  const secure = await app.besides({ isCookieSecure: true });
  const reply = await secure
    .anyone()
    .post('/api/session')
    .set('X-Forwarded-Proto', 'https')
    .send({ staffNumber: app.person('lead').staffNumber, password: testPassword })
    .expect(200);
  expect(String(reply.headers['set-cookie'])).toMatch(
    /^__Host-paperside=s%3A[\w-]{32}\.[^;]+; Path=\/; HttpOnly; Secure; SameSite=Lax$/,
  );
});

test('forgets sessions that ran out long ago, and keeps the others', async () => {
  const row = (sid: string, hours: number) => ({
    sid,
    sess: '{}',
    expire: app.db.raw(`localtimestamp + interval '${String(hours)} hours'`),
  });
  await app.db('session').insert([row('long gone', -1), row('still good', 1)]);
  await app
    .anyone()
    .post('/api/session')
    .send({ staffNumber: app.person('lead').staffNumber, password: testPassword })
    .expect(200);
  expect(await app.db('session').whereIn('sid', ['long gone', 'still good']).pluck('sid')).toEqual(['still good']);
});

test('records who signed in, where and how', async () => {
  const person = await addTestPerson(app, { role: 'technician', facilityId: app.facilities.B });
  await app.anyone().post('/api/session').send({ staffNumber: person.staffNumber, password: testPassword }).expect(200);
  expect(await eventsAbout(app.db, person.id)).toEqual([
    {
      kind: 'person.signed-in',
      actor_id: person.id,
      facility_id: app.facilities.B,
      payload: { by: 'password' },
      at: app.clock.now(),
    },
  ]);
});

describe('refuses', () => {
  test('a wrong password and an unknown number in the same words, and records the try', async () => {
    const person = await addTestPerson(app, { role: 'lead', facilityId: app.facilities.A });
    const wrong = await app
      .anyone()
      .post('/api/session')
      .send({ staffNumber: person.staffNumber, password: 'lantern gravel thirty badgers' })
      .expect(401);
    const unknown = await app
      .anyone()
      .post('/api/session')
      .send({ staffNumber: 'Z9999', password: 'lantern gravel thirty badgers' })
      .expect(401);
    expect(wrong.type).toBe('application/problem+json');
    expect(wrong.headers['set-cookie']).toBeUndefined();
    expect(wrong.body).toMatchObject({ code: 'session.refused', status: 401 });
    expect({ ...wrong.body, reference: '' }).toEqual({ ...unknown.body, reference: '' });
    expect(await eventsAbout(app.db, person.id)).toMatchObject([
      {
        kind: 'person.sign-in-refused',
        actor_id: null,
        facility_id: app.facilities.A,
        payload: { by: 'password', reason: 'wrong-secret' },
      },
    ]);
    expect(await eventsAbout(app.db, 'unknown')).toMatchObject([
      { kind: 'person.sign-in-refused', facility_id: null, payload: { by: 'password', reason: 'unknown' } },
    ]);
  });

  test('a password that is cut off or in other capitals', async () => {
    const { staffNumber } = app.person('lead');
    for (const password of [testPassword.slice(0, -1), testPassword.toUpperCase(), `${testPassword} `]) {
      await app.anyone().post('/api/session').send({ staffNumber, password }).expect(401);
    }
  });

  test('who is switched off, and says so only to who knows the password', async () => {
    const person = await addTestPerson(app, { role: 'lead', facilityId: app.facilities.A });
    await app.db('people').where({ id: person.id }).update({ is_disabled: true });
    const sign = (password: string) =>
      app.anyone().post('/api/session').send({ staffNumber: person.staffNumber, password }).expect(401);
    expect((await sign(testPassword)).body).toMatchObject({ code: 'session.disabled' });
    expect((await sign('lantern gravel thirty badgers')).body).toMatchObject({ code: 'session.refused' });
  });

  test('whose place here has run out, and takes them until it has', async () => {
    const person = await addTestPerson(app, {
      role: 'surveyor',
      facilityId: app.facilities.A,
      expiresAt: new Date(app.clock.now().getTime() + 60_000),
    });
    const sign = () =>
      app.anyone().post('/api/session').send({ staffNumber: person.staffNumber, password: testPassword });
    const inTime = await sign().expect(200);
    expect(inTime.body).toMatchObject({ expiresAt: '2026-03-03T13:31:00.000Z' });
    app.clock.advance({ minutes: 1 });
    expect((await sign().expect(401)).body).toMatchObject({ code: 'session.no-facility' });
  });

  test('a one-time password that has run out', async () => {
    const person = await addTestPerson(app, { role: 'lead', facilityId: app.facilities.A });
    await app
      .db('people')
      .where({ id: person.id })
      .update({ must_change_password: true, one_time_password_expires_at: app.clock.now() });
    const reply = await app
      .anyone()
      .post('/api/session')
      .send({ staffNumber: person.staffNumber, password: testPassword })
      .expect(401);
    expect(reply.body).toMatchObject({ code: 'session.one-time-password-expired' });
  });

  test('requests with a missing, extra or mistyped field, in plain words and without a try counted', async () => {
    const password = testPassword;
    const bodies: readonly (object | string | undefined)[] = [
      {},
      { staffNumber: 'A1001' },
      { password },
      { staffNumber: 'A1001', password, role: 'administrator' },
      { staffNumber: 1001, password },
      { staffNumber: 'A1001', password: null },
      { staffNumber: ['A1001'], password },
      { staffNumber: { $ne: '' }, password: { $ne: '' } },
      { staffNumber: '', password },
      { staffNumber: 'A1001', password: '' },
      { staffNumber: 'A'.repeat(201), password },
      { staffNumber: 'A1001', password: 'x'.repeat(1001) },
      [],
      undefined,
    ];
    for (const body of bodies) {
      const reply = await app.anyone().post('/api/session').send(body);
      expect(reply.status, JSON.stringify(body)).toBe(400);
      expect(reply.type).toBe('application/problem+json');
      expect(reply.body).toMatchObject({ code: 'request.not-understood' });
    }
    expect(await app.db('sign_in_attempts').select()).toEqual([]);
  });

  test('bodies that are no JSON, too large, or of another kind', async () => {
    const agent = app.anyone();
    await agent.post('/api/session').type('json').send('{"staffNumber":').expect(400);
    await agent.post('/api/session').type('form').send('staffNumber=A1001&password=x').expect(400);
    const large = await agent.post('/api/session').send({ staffNumber: 'A1001', password: 'x'.repeat(300_000) });
    expect(large.status).toBe(413);
  });

  test('names with characters the database cannot keep', async () => {
    const reply = await app.anyone().post('/api/session').send({ staffNumber: 'A\u0000B', password: testPassword });
    expect(reply.status).toBeGreaterThanOrEqual(400);
    expect(reply.status).toBeLessThan(500);
    const half = await app
      .anyone()
      .post('/api/session')
      .send({ staffNumber: 'A\ud800B', password: `\ud800${testPassword}` });
    expect(half.status).toBe(401);
  });

  test('a write without the header our own pages send', async () => {
    const reply = await app
      .anyone()
      .post('/api/session')
      .unset('X-Requested-With')
      .send({ staffNumber: app.person('lead').staffNumber, password: testPassword })
      .expect(403);
    expect(reply.body).toMatchObject({ code: 'request.foreign' });
  });
});
