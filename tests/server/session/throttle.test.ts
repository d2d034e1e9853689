import { beforeEach, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent';
import { addTestPerson, openTestApp, testPassword, testPin } from '../../support/test-app';
import { eventsAbout } from './session-support';

const app = openTestApp();
const wrongPassword = 'lantern gravel thirty badgers';

beforeEach(async () => {
  await app.db('sign_in_attempts').delete();
});

function tryPassword(agent: TestAgent, staffNumber: string, password = wrongPassword) {
  return agent.post('/api/session').send({ staffNumber, password });
}

/** Failures as the server counts them, for tests that need many. */
async function layDownFailures(subjectOfStaffNumber: string, count: number): Promise<void> {
  await tryPassword(app.anyone(), subjectOfStaffNumber).expect(401);
  const row = await app
    .db('sign_in_attempts')
    .where({ is_success: false })
    .first<{ subject: string; source: string }>('subject', 'source');
  const long = new Date(app.clock.now().getTime() - 24 * 3_600_000);
  await app.db('sign_in_attempts').insert(
    Array.from({ length: count - 1 }, () => ({
      subject: row.subject,
      source: 'elsewhere',
      at: long,
      is_success: false,
    })),
  );
}

test('answers the sixth wrong try in a row with 429, a wait in words and in Retry-After, and lets in after it', async () => {
  const { staffNumber } = app.person('lead');
  const agent = app.anyone();
  for (let failure = 0; failure < 5; failure += 1) await tryPassword(agent, staffNumber).expect(401);
  const held = await tryPassword(agent, staffNumber, testPassword).expect(429);
  expect(held.type).toBe('application/problem+json');
  expect(held.headers['retry-after']).toBe('30');
  expect(held.body).toMatchObject({
    code: 'session.too-many-tries',
    detail: 'Too many tries. Wait 30 seconds, then try again.',
  });
  app.clock.advance({ seconds: 29 });
  await tryPassword(agent, staffNumber, testPassword).expect(429);
  app.clock.advance({ seconds: 1 });
  await tryPassword(agent, staffNumber, testPassword).expect(200);
});

test('makes the wait grow with each failure after it', async () => {
  const { staffNumber } = app.person('lead');
  const agent = app.anyone();
  for (let failure = 0; failure < 5; failure += 1) await tryPassword(agent, staffNumber).expect(401);
  for (const seconds of [30, 60, 120]) {
    const held = await tryPassword(agent, staffNumber).expect(429);
    expect(held.headers['retry-after']).toBe(String(seconds));
    app.clock.advance({ seconds });
    await tryPassword(agent, staffNumber).expect(401);
  }
});

test('throttles a number that does not exist in the same way', async () => {
  const agent = app.anyone();
  for (let failure = 0; failure < 5; failure += 1) await tryPassword(agent, 'Z9999').expect(401);
  await tryPassword(agent, 'z9999 ').expect(429);
});

test('counts for both server processes together', async () => {
  const { staffNumber } = app.person('lead');
  const here = app.anyone();
  const there = (await app.besides()).anyone();
  for (const agent of [here, there, here, there, here]) await tryPassword(agent, staffNumber).expect(401);
  await tryPassword(there, staffNumber, testPassword).expect(429);
  await tryPassword(here, staffNumber, testPassword).expect(429);
  app.clock.advance({ seconds: 30 });
  await tryPassword(there, staffNumber, testPassword).expect(200);
});

test('lets no more than five of twenty tries through that come at the same moment from everywhere', async () => {
  const { staffNumber } = app.person('lead');
  const agents = [app.anyone(), (await app.besides()).anyone()];
  const replies = await Promise.all(
    Array.from({ length: 20 }, async (_, index) => {
      const agent = agents[index % 2];
      if (!agent) throw new Error('there are two agents');
      const from = `203.0.113.${String(index)}`;
      return (await tryPassword(agent, staffNumber).set('X-Forwarded-For', from)).status;
    }),
  );
  expect(replies.filter((status) => status === 401)).toHaveLength(5);
  expect(replies.filter((status) => status === 429)).toHaveLength(15);
});

test('lets no more than the sixtieth try through when many come at the same moment from one address', async () => {
  await layDownFromOneAddress(55);
  const agents = [app.anyone(), (await app.besides()).anyone()];
  const replies = await Promise.all(
    Array.from({ length: 20 }, async (_, index) => {
      const agent = agents[index % 2];
      if (!agent) throw new Error('there are two agents');
      return (await tryPassword(agent, `Y${String(index)}`)).status;
    }),
  );
  expect(replies.filter((status) => status === 401)).toHaveLength(5);
  expect(replies.filter((status) => status === 429)).toHaveLength(15);
});

test('a right password ends the count of its own number and of no other', async () => {
  const [own, other] = [app.person('lead'), app.person('technician')];
  const agent = app.anyone();
  for (let failure = 0; failure < 4; failure += 1) await tryPassword(agent, own.staffNumber).expect(401);
  for (let failure = 0; failure < 5; failure += 1) await tryPassword(agent, other.staffNumber).expect(401);
  await tryPassword(agent, own.staffNumber, testPassword).expect(200);
  await tryPassword(agent, other.staffNumber, testPassword).expect(429);
  for (let failure = 0; failure < 5; failure += 1) await tryPassword(agent, own.staffNumber).expect(401);
});

test('a right password by somebody at the same address does not wipe out that address’s failures', async () => {
  const { staffNumber } = app.person('lead');
  await layDownFromOneAddress(59);
  await tryPassword(app.anyone(), staffNumber, testPassword).expect(200);
  await tryPassword(app.anyone(), 'Z0001').expect(401);
  const held = await tryPassword(app.anyone(), 'Z0002').expect(429);
  expect(held.headers['retry-after']).toBe('900');
  app.clock.advance({ minutes: 15 });
  await tryPassword(app.anyone(), 'Z0002').expect(401);
});

async function layDownFromOneAddress(count: number): Promise<void> {
  await tryPassword(app.anyone(), 'Z0000').expect(401);
  const row = await app.db('sign_in_attempts').first<{ source: string }>('source');
  await app.db('sign_in_attempts').insert(
    Array.from({ length: count - 1 }, (_, index) => ({
      subject: `subject ${String(index)}`,
      source: row.source,
      at: app.clock.now(),
      is_success: false,
    })),
  );
}

test('counts addresses apart, as the proxy in front names them, and a whole IPv6 network as one', async () => {
  const from = (address: string) => tryPassword(app.anyone().set('X-Forwarded-For', address), 'Z0001');
  await from('203.0.113.7').expect(401);
  await from('2001:db8:1:2:aaaa::1').expect(401);
  await from('2001:db8:1:2:bbbb:0:0:2').expect(401);
  const rows = await app.db('sign_in_attempts').orderBy('id').pluck<string[]>('source');
  expect(rows).toEqual(['203.0.113.7', '2001:db8:1:2', '2001:db8:1:2']);
});

test('throttles PINs by badge, apart from the password of the same person', async () => {
  const { badge, staffNumber } = app.person('lead');
  const agent = app.anyone();
  for (let failure = 0; failure < 5; failure += 1) {
    await agent.post('/api/session/badge').send({ badge, pin: '111111' }).expect(401);
  }
  await agent
    .post('/api/session/badge')
    .send({ badge: badge.replaceAll('-', ''), pin: testPin })
    .expect(429);
  await tryPassword(agent, staffNumber, testPassword).expect(200);
});

test('throttles the present password asked for before a change, so that an open station is no way to guess it', async () => {
  const person = await addTestPerson(app, { role: 'technician', facilityId: app.facilities.A });
  const agent = app.anyone();
  await tryPassword(agent, person.staffNumber, testPassword).expect(200);
  const change = () =>
    agent.post('/api/session/password').send({ current: wrongPassword, next: 'another phrase of mine' });
  for (let failure = 0; failure < 5; failure += 1) await change().expect(400);
  await change().expect(429);
});

test('stops at a hundred failures in a row, until a new one-time password is given out', async () => {
  const person = await addTestPerson(app, { role: 'lead', facilityId: app.facilities.A });
  const administrator = await app.as('administrator');
  await layDownFailures(person.staffNumber, 99);
  app.clock.advance({ hours: 1 });
  await tryPassword(app.anyone(), person.staffNumber).expect(401);
  app.clock.advance({ hours: 48 });
  const held = await tryPassword(app.anyone(), person.staffNumber, testPassword).expect(429);
  expect(held.body).toMatchObject({ code: 'session.not-until-reset' });

  const again = await app.as('administrator');
  expect(again).not.toBe(administrator);
  const given = await again
    .post(`/api/people/${person.id}/one-time-password`)
    .send({ requestId: crypto.randomUUID() })
    .expect(200);
  const { oneTimePassword } = given.body as { oneTimePassword: string };
  await tryPassword(app.anyone(), person.staffNumber, oneTimePassword).expect(200);
});

test('tells in the history that tries had to wait, once a minute however many there are, and in the right name', async () => {
  const person = await addTestPerson(app, { role: 'lead', facilityId: app.facilities.A });
  const agent = app.anyone();
  const told = async () =>
    (await eventsAbout(app.db, person.id))
      .filter(({ kind }) => kind === 'person.sign-in-refused')
      .map(({ payload, facility_id }) => ({ ...(payload as { by: string; reason: string }), facility_id }));
  for (let failure = 0; failure < 5; failure += 1) await tryPassword(agent, person.staffNumber).expect(401);
  expect((await told()).map(({ reason }) => reason)).toEqual(Array(5).fill('wrong-secret'));

  for (let held = 0; held < 4; held += 1) await tryPassword(agent, person.staffNumber, testPassword).expect(429);
  expect((await told()).slice(5)).toEqual([
    { by: 'password', reason: 'too-many-tries', facility_id: app.facilities.A },
  ]);

  app.clock.advance({ seconds: 30 });
  await tryPassword(agent, person.staffNumber).expect(401);
  await tryPassword(agent, person.staffNumber).expect(429);
  expect((await told()).map(({ reason }) => reason).slice(5)).toEqual([
    'too-many-tries',
    'wrong-secret',
    'too-many-tries',
  ]);

  for (let failure = 0; failure < 5; failure += 1) {
    await agent.post('/api/session/badge').send({ badge: person.badge, pin: '111111' }).expect(401);
  }
  await agent.post('/api/session/badge').send({ badge: person.badge, pin: testPin }).expect(429);
  expect((await told()).at(-1)).toMatchObject({ by: 'badge', reason: 'too-many-tries' });
});

test('tells tries for nobody’s number that had to wait without that number', async () => {
  const agent = app.anyone();
  for (let failure = 0; failure < 5; failure += 1) await tryPassword(agent, 'Z8888').expect(401);
  await tryPassword(agent, 'Z8888').expect(429);
  const last = (await eventsAbout(app.db, 'unknown')).at(-1);
  expect(last).toMatchObject({ kind: 'person.sign-in-refused', facility_id: null, actor_id: null });
  expect(last?.payload).toEqual({ by: 'password', reason: 'too-many-tries' });
});

test('keeps what failed before a success only as long as the address it came from is counted', async () => {
  const { staffNumber } = app.person('lead');
  await tryPassword(app.anyone(), staffNumber).expect(401);
  await tryPassword(app.anyone(), 'Z0001').expect(401);
  await tryPassword(app.anyone(), staffNumber, testPassword).expect(200);
  expect(await app.db('sign_in_attempts').select()).toHaveLength(3);
  app.clock.advance({ minutes: 16 });
  await tryPassword(app.anyone(), staffNumber, testPassword).expect(200);
  const left = await app.db('sign_in_attempts').orderBy('id').pluck<boolean[]>('is_success');
  expect(left).toEqual([false, true]);
});

test('keeps no staff number and no password among the tries', async () => {
  await tryPassword(app.anyone(), 'my secret in the wrong field').expect(401);
  const rows = await app.db('sign_in_attempts').select();
  expect(JSON.stringify(rows)).not.toMatch(/secret|wrong field|badgers/i);
});
