import { expect, test } from 'vitest';
import type TestAgent from 'supertest/lib/agent';
import { openTestApp, testPassword } from '../../support/test-app';

const app = openTestApp();

async function signedIn(): Promise<TestAgent> {
  const agent = app.anyone();
  await agent
    .post('/api/session')
    .send({ staffNumber: app.person('lead').staffNumber, password: testPassword })
    .expect(200);
  return agent;
}

test('tells nobody signed in from a sign-in that ran out', async () => {
  const none = await app.anyone().get('/api/session').expect(401);
  expect(none.type).toBe('application/problem+json');
  expect(none.body).toMatchObject({ code: 'session.none' });
  const agent = await signedIn();
  app.clock.advance({ minutes: 10 });
  for (const path of ['/api/session', '/api/items', '/api/session']) {
    expect((await agent.get(path).expect(401)).body).toMatchObject({ code: 'session.expired' });
  }
});

test('lasts as long as the person goes on working, up to twelve hours', async () => {
  const agent = await signedIn();
  // 79 acts, nine minutes apart: 11 h 51 min.
  for (let act = 0; act < 79; act += 1) {
    app.clock.advance({ minutes: 9 });
    await agent.get('/api/session').expect(200);
  }
  app.clock.advance({ minutes: 8, seconds: 59 });
  await agent.get('/api/session').expect(200);
  app.clock.advance({ seconds: 1 });
  expect((await agent.get('/api/session').expect(401)).body).toMatchObject({ code: 'session.expired' });
});

test('does not take a screen that asks by itself for a person at work', async () => {
  const agent = await signedIn();
  for (let poll = 0; poll < 9; poll += 1) {
    app.clock.advance({ minutes: 1 });
    await agent.get('/api/session').set('x-background', 'yes').expect(200);
  }
  app.clock.advance({ minutes: 1 });
  expect((await agent.get('/api/session').set('x-background', 'yes').expect(401)).body).toMatchObject({
    code: 'session.expired',
  });
});

test('takes every write for a person at work, whatever its headers say', async () => {
  const agent = await signedIn();
  app.clock.advance({ minutes: 9 });
  await agent.post('/api/session/facility').set('x-background', 'yes').send({ facilityId: 'no id' }).expect(400);
  app.clock.advance({ minutes: 9 });
  await agent.get('/api/session').expect(200);
});

test('counts a refused act as an act', async () => {
  const agent = await signedIn();
  app.clock.advance({ minutes: 9 });
  await agent.post('/api/session/password').send({}).expect(400);
  app.clock.advance({ minutes: 9 });
  await agent.get('/api/session').expect(200);
});

test('does not write for every act, yet loses at most 15 seconds by it', async () => {
  const agent = await signedIn();
  app.clock.advance({ seconds: 14 });
  await agent.get('/api/session').expect(200);
  app.clock.advance({ minutes: 9, seconds: 46 });
  await agent.get('/api/session').expect(401);
});

test('a sign-in that ran out is gone from the store, and the next one begins anew', async () => {
  const { id, staffNumber } = app.person('supervisor');
  const agent = app.anyone();
  const kept = () => app.db('session').whereRaw(`sess #>> '{passport,user,personId}' = ?`, [id]);
  await agent.post('/api/session').send({ staffNumber, password: testPassword }).expect(200);
  expect(await kept()).toHaveLength(1);
  app.clock.advance({ minutes: 10 });
  await agent.get('/api/session').expect(401);
  expect(await kept()).toHaveLength(0);
  const reply = await agent.post('/api/session').send({ staffNumber, password: testPassword }).expect(200);
  expect(reply.body).toMatchObject({ expiresAt: new Date(app.clock.now().getTime() + 43_200_000).toISOString() });
});
