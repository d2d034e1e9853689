import { beforeEach, expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent';
import { addTestPerson, anId, openTestApp, testPassword, type TestPerson } from '../../support/test-app';
import { cookieOf, cookiePairOf, eventsAbout } from './session-support';

const app = openTestApp();

beforeEach(async () => {
  await app.db('sign_in_attempts').delete();
});

async function signIn(person: TestPerson): Promise<TestAgent> {
  const agent = app.anyone();
  await agent.post('/api/session').send({ staffNumber: person.staffNumber, password: testPassword }).expect(200);
  return agent;
}

async function aLead(): Promise<TestPerson> {
  return addTestPerson(app, { role: 'lead', facilityId: app.facilities.A });
}

test('an id that was known before the sign-in is worth nothing after it', async () => {
  const { staffNumber } = app.person('lead');
  const planted = 'paperside=s%3AAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAA.forged';
  const reply = await app
    .anyone()
    .post('/api/session')
    .set('Cookie', planted)
    .send({ staffNumber, password: testPassword })
    .expect(200);
  expect(cookiePairOf(reply)).not.toBe(planted);
  await app.anyone().get('/api/session').set('Cookie', planted).expect(401);

  // Also one of our own making: somebody signs in, and a second person at the same browser gets another.
  const agent = app.anyone();
  const first = await agent.post('/api/session').send({ staffNumber, password: testPassword }).expect(200);
  const second = await agent.post('/api/session').send({ staffNumber, password: testPassword }).expect(200);
  expect(cookiePairOf(second)).not.toBe(cookiePairOf(first));
  await app.anyone().get('/api/session').set('Cookie', cookiePairOf(first)).expect(401);
  await app.anyone().get('/api/session').set('Cookie', cookiePairOf(second)).expect(200);
});

test('a forged or cut-off cookie is nobody, and no failure of ours', async () => {
  for (const cookie of ['paperside=x', 'paperside=s%3Aabc.def', 'paperside=', `paperside=${'s%3A'.repeat(900)}`]) {
    const reply = await app.anyone().get('/api/session').set('Cookie', cookie);
    expect(reply.status, cookie.slice(0, 30)).toBe(401);
  }
});

test('signing out ends this session, takes the cookie back, and may be done twice', async () => {
  const person = await aLead();
  const agent = await signIn(person);
  const other = await signIn(person);
  const reply = await agent.delete('/api/session').expect(204);
  expect(cookieOf(reply)).toMatch(/^paperside=; .*Expires=Thu, 01 Jan 1970/);
  expect((await agent.get('/api/session').expect(401)).body).toMatchObject({ code: 'session.none' });
  await agent.delete('/api/session').expect(204);
  await other.get('/api/session').expect(200);
  expect(await eventsAbout(app.db, person.id)).toMatchObject([
    { kind: 'person.signed-in' },
    { kind: 'person.signed-in' },
    { kind: 'person.signed-out', actor_id: person.id, payload: { everywhere: false } },
  ]);
});

test('signing out everywhere ends every session of this person, and nobody else’s', async () => {
  const person = await aLead();
  const [here, there, stranger] = [await signIn(person), await signIn(person), await app.as('lead')];
  await here.post('/api/session/sign-out-everywhere').send({}).expect(204);
  await here.get('/api/session').expect(401);
  await there.get('/api/session').expect(401);
  await stranger.get('/api/session').expect(200);
  expect((await eventsAbout(app.db, person.id)).at(-1)).toMatchObject({
    kind: 'person.signed-out',
    payload: { everywhere: true },
  });
  const again = await signIn(person);
  await again.get('/api/session').expect(200);
});

test('a session that began before a sign-out everywhere is out, even if the store still holds it', async () => {
  const person = await aLead();
  const agent = await signIn(person);
  const other = await signIn(person);
  const kept = await app
    .db('session')
    .whereRaw(`sess #>> '{passport,user,personId}' = ?`, [person.id])
    .select<{ sid: string; sess: object; expire: Date }[]>();
  app.clock.advance({ seconds: 1 });
  await other.post('/api/session/sign-out-everywhere').send({}).expect(204);
  await app.db('session').insert(kept.map((row) => ({ ...row, sess: JSON.stringify(row.sess) })));
  expect((await agent.get('/api/session').expect(401)).body).toMatchObject({ code: 'session.expired' });
});

test('an act under way cannot bring back a session that has been ended meanwhile', async () => {
  const person = await aLead();
  const [agent, other] = [await signIn(person), await signIn(person)];
  app.clock.advance({ minutes: 1 });
  await Promise.all([
    ...Array.from({ length: 12 }, () => agent.get('/api/session')),
    other.post('/api/session/sign-out-everywhere').send({}),
  ]);
  await agent.get('/api/session').expect(401);
  expect(await app.db('session').whereRaw(`sess::text like ?`, [`%${person.id}%`])).toEqual([]);
});

test('a person who is switched off is out at the very next request, and back in only anew', async () => {
  const person = await aLead();
  const agent = await signIn(person);
  const administrator = await app.as('administrator');
  const change = async (isDisabled: boolean) => {
    const { version } = await app.db('people').where({ id: person.id }).first<{ version: number }>('version');
    await administrator.patch(`/api/people/${person.id}`).send({ requestId: anId(), version, isDisabled }).expect(200);
  };
  await change(true);
  expect((await agent.get('/api/session').expect(401)).body).toMatchObject({ code: 'session.expired' });
  await change(false);
  await agent.get('/api/session').expect(401);
  await (await signIn(person)).get('/api/session').expect(200);
});

test('a person who is switched off behind the sessions’ back is out all the same', async () => {
  const person = await aLead();
  const agent = await signIn(person);
  await app.db('people').where({ id: person.id }).update({ is_disabled: true });
  await agent.get('/api/session').expect(401);
});

test('a person in another role signs in again for it', async () => {
  const person = await aLead();
  const agent = await signIn(person);
  const administrator = await app.as('administrator');
  await administrator
    .patch(`/api/people/${person.id}`)
    .send({ requestId: anId(), version: 1, role: 'operating-room' })
    .expect(200);
  await agent.get('/api/session').expect(401);
  const reply = await (await signIn(person)).get('/api/session').expect(200);
  expect(reply.body).toMatchObject({ person: { role: 'operating-room' } });
});

test('a surveyor is out at the very instant their time ends, however busy', async () => {
  const person = await addTestPerson(app, {
    role: 'surveyor',
    facilityId: app.facilities.A,
    expiresAt: new Date(app.clock.now().getTime() + 300_000),
  });
  const agent = await signIn(person);
  app.clock.advance({ seconds: 299 });
  await agent.get('/api/session').expect(200);
  app.clock.advance({ seconds: 1 });
  expect((await agent.get('/api/session').expect(401)).body).toMatchObject({ code: 'session.expired' });
});

test('a person taken out of a facility is out of it', async () => {
  const person = await aLead();
  const agent = await signIn(person);
  await app.db('memberships').where({ person_id: person.id }).delete();
  await agent.get('/api/session').expect(401);
});
