import { beforeEach, describe, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent';
import { addTestPerson, openTestApp, testPassword, testPin, type TestPerson } from '../../support/test-app';
import { cookiePairOf, eventsAbout } from './session-support';

const app = openTestApp();
const nextPassword = 'nine wet herons on a kettle';

beforeEach(async () => {
  await app.db('sign_in_attempts').delete();
});

async function signIn(person: TestPerson, password = testPassword): Promise<TestAgent> {
  const agent = app.anyone();
  await agent.post('/api/session').send({ staffNumber: person.staffNumber, password }).expect(200);
  return agent;
}

async function aTechnician(): Promise<TestPerson> {
  return addTestPerson(app, { role: 'technician', facilityId: app.facilities.A, displayName: 'Hana Strudwick' });
}

async function hashOf(person: TestPerson): Promise<string> {
  const row = await app.db('people').where({ id: person.id }).first<{ password_hash: string }>('password_hash');
  return row.password_hash;
}

test('a new password takes the place of the old one, under a new session id, and ends every other session', async () => {
  const person = await aTechnician();
  const [agent, other] = [await signIn(person), await signIn(person)];
  const before = await hashOf(person);
  const reply = await agent
    .post('/api/session/password')
    .send({ current: testPassword, next: nextPassword })
    .expect(200);
  expect(reply.body).toMatchObject({ person: { id: person.id, mustChangePassword: false } });
  expect(cookiePairOf(reply)).toMatch(/^paperside=/);
  await agent.get('/api/session').expect(200);
  await other.get('/api/session').expect(401);
  await app.anyone().post('/api/session').send({ staffNumber: person.staffNumber, password: testPassword }).expect(401);
  await signIn(person, nextPassword);

  const after = await hashOf(person);
  expect(after).not.toBe(before);
  // The figures of the OWASP password storage sheet: 19 MiB, two passes, one lane (from memory).
  expect(after).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$[^$]{22}\$[^$]{43}$/);
  expect(await eventsAbout(app.db, person.id)).toContainEqual(
    expect.objectContaining({ kind: 'person.changed-password', actor_id: person.id, payload: {} }),
  );
});

test('a one-time password opens nothing but its own change', async () => {
  const person = await aTechnician();
  await app
    .db('people')
    .where({ id: person.id })
    .update({ must_change_password: true, one_time_password_expires_at: new Date(app.clock.now().getTime() + 60_000) });
  const agent = await signIn(person);
  expect((await agent.get('/api/session').expect(200)).body).toMatchObject({ person: { mustChangePassword: true } });
  for (const path of ['/api/loads', '/api/items', '/api/packages', '/api/today']) {
    const reply = await agent.get(path).expect(403);
    expect(reply.body).toMatchObject({ code: 'session.password-must-change' });
  }
  await agent.post('/api/session/facility').send({ facilityId: app.facilities.A }).expect(403);
  await agent.post('/api/session/pin').send({ password: testPassword, pin: '604193' }).expect(403);
  await agent.post('/api/session/password').send({ current: testPassword, next: nextPassword }).expect(200);
  await agent.get('/api/items').expect(200);
  expect(
    await app.db('people').where({ id: person.id }).first('must_change_password', 'one_time_password_expires_at'),
  ).toEqual({
    must_change_password: false,
    one_time_password_expires_at: null,
  });
});

describe('refuses a next password', () => {
  test('for what the policy says, names the field, and changes nothing', async () => {
    const person = await aTechnician();
    const agent = await signIn(person);
    const before = await hashOf(person);
    for (const [next, code] of [
      ['otters dig tar', 'password.too-short'],
      ['lantern gravel '.repeat(9), 'password.too-long'],
      ['passwordpassword', 'password.common'],
      ['1234567890123456', 'password.repetitive'],
      ['Alder Hospital 2026', 'password.of-this-place'],
      ['Hana Strudwick 2026', 'password.of-this-place'],
      ['lantern\u0000gravel otters', 'password.not-typable'],
      [testPassword, 'password.unchanged'],
    ] as const) {
      const reply = await agent.post('/api/session/password').send({ current: testPassword, next });
      expect(reply.status, next).toBe(400);
      expect(reply.body, next).toMatchObject({ code, fields: [{ pointer: '/body/next' }] });
    }
    expect(await hashOf(person)).toBe(before);
    await agent.get('/api/session').expect(200);
  });

  test('that was refused without counting it as a wrong try', async () => {
    const person = await aTechnician();
    const agent = await signIn(person);
    for (let failure = 0; failure < 7; failure += 1) {
      await agent.post('/api/session/password').send({ current: testPassword, next: 'short' }).expect(400);
    }
  });

  test('when the present one is wrong', async () => {
    const person = await aTechnician();
    const agent = await signIn(person);
    const before = await hashOf(person);
    const reply = await agent
      .post('/api/session/password')
      .send({ current: 'not my password at all', next: nextPassword })
      .expect(400);
    expect(reply.body).toMatchObject({ code: 'password.current-wrong', fields: [{ pointer: '/body/current' }] });
    expect(await hashOf(person)).toBe(before);
  });

  test('from nobody', async () => {
    await app.anyone().post('/api/session/password').send({ current: testPassword, next: nextPassword }).expect(401);
  });
});

describe('a PIN of one’s own', () => {
  test('takes the place of the one given out', async () => {
    const person = await aTechnician();
    const agent = await signIn(person);
    await agent.post('/api/session/pin').send({ password: testPassword, pin: '604193' }).expect(200);
    await app.anyone().post('/api/session/badge').send({ badge: person.badge, pin: testPin }).expect(401);
    await app.anyone().post('/api/session/badge').send({ badge: person.badge, pin: '604193' }).expect(200);
    const row = await app.db('people').where({ id: person.id }).first<{ pin_hash: string }>('pin_hash');
    expect(row.pin_hash).toMatch(/^\$argon2id\$/);
  });

  test('is refused when it is guessable, without the password, or without a badge', async () => {
    const person = await aTechnician();
    const agent = await signIn(person);
    const send = (body: object) => agent.post('/api/session/pin').send(body);
    for (const [pin, code] of [
      ['12345', 'pin.too-short'],
      ['123456', 'pin.guessable'],
      ['7304-18', 'pin.not-digits'],
      [person.badge.replace(/\D/g, '').slice(0, 6), 'pin.own-number'],
    ] as const) {
      expect((await send({ password: testPassword, pin }).expect(400)).body, pin).toMatchObject({ code });
    }
    expect((await send({ password: testPin, pin: '604193' }).expect(400)).body).toMatchObject({
      code: 'password.current-wrong',
    });
    await app.db('people').where({ id: person.id }).update({ badge_code: null });
    expect((await send({ password: testPassword, pin: '604193' }).expect(422)).body).toMatchObject({
      code: 'pin.no-badge',
    });
  });
});

describe('people of several facilities', () => {
  test('go on in the other one, in their role there, under a new session id and not for longer', async () => {
    const person = await aTechnician();
    await app.db('memberships').insert({ person_id: person.id, facility_id: app.facilities.B, role: 'administrator' });
    const agent = await signIn(person);
    const before = await agent.get('/api/session').expect(200);
    await agent.get('/api/people').expect(403);
    app.clock.advance({ minutes: 5 });
    const reply = await agent.post('/api/session/facility').send({ facilityId: app.facilities.B }).expect(200);
    expect(reply.body).toMatchObject({ facility: { id: app.facilities.B }, person: { role: 'administrator' } });
    expect((reply.body as { expiresAt: string }).expiresAt).toBe((before.body as { expiresAt: string }).expiresAt);
    const people = await agent.get('/api/people').expect(200);
    const names = (people.body as { people: { displayName: string }[] }).people.map(({ displayName }) => displayName);
    expect(names).toContain('Bo lead');
    expect(names).not.toContain('Ada lead');
  });

  test('are told of no facility that is not theirs', async () => {
    const agent = await signIn(await aTechnician());
    for (const facilityId of [app.facilities.B, crypto.randomUUID()]) {
      const reply = await agent.post('/api/session/facility').send({ facilityId }).expect(404);
      expect(reply.body).toMatchObject({ code: 'facility.none' });
    }
    await agent.post('/api/session/facility').send({ facilityId: 'B' }).expect(400);
    expect((await agent.get('/api/session').expect(200)).body).toMatchObject({ facility: { id: app.facilities.A } });
  });
});
