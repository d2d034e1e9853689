import { beforeEach, describe, expect, test } from 'vitest';
import { isPermitted } from '../../../src/domain/access/role-matrix';
import { roles } from '../../../src/domain/access/permissions';
import { anId, openTestApp, testPin } from '../../support/test-app';
import { aNewPerson, rowsOf } from './people-support';

const app = openTestApp();

beforeEach(async () => {
  await app.db('sign_in_attempts').delete();
});

const target = () => app.person('technician').id;

/** Every write there is upon people, as an administrator could send it. */
const writes = [
  {
    name: 'add a person',
    send: { method: 'post', path: () => '/api/people', body: () => aNewPerson({ staffNumber: anId().slice(0, 8) }) },
  },
  {
    name: 'let a person join',
    send: {
      method: 'post',
      path: () => '/api/people/join',
      body: () => ({ requestId: anId(), staffNumber: 'B1001', role: 'lead', usualShift: null, expiresAt: null }),
    },
  },
  {
    name: 'change a person',
    send: {
      method: 'patch',
      path: () => `/api/people/${target()}`,
      body: () => ({ requestId: anId(), version: 1, role: 'lead' }),
    },
  },
  {
    name: 'give out a one-time password',
    send: {
      method: 'post',
      path: () => `/api/people/${target()}/one-time-password`,
      body: () => ({ requestId: anId() }),
    },
  },
  {
    name: 'give out a PIN',
    send: { method: 'post', path: () => `/api/people/${target()}/pin`, body: () => ({ requestId: anId() }) },
  },
] as const;

const readers = roles.filter((role) => isPermitted(role, 'people.view'));
const strangers = roles.filter((role) => !isPermitted(role, 'people.view'));
const others = roles.filter((role) => !isPermitted(role, 'people.edit'));

test('supervisors, surveyors and administrators see the people, and only administrators change them', () => {
  expect(readers).toEqual(['supervisor', 'surveyor', 'administrator']);
  expect(roles.filter((role) => isPermitted(role, 'people.edit'))).toEqual(['administrator']);
});

test.each(readers)('a %s sees the people', async (role) => {
  await (await app.as(role)).get('/api/people').expect(200);
});

test.each(strangers)('a %s does not see the people', async (role) => {
  const reply = await (await app.as(role)).get('/api/people').expect(403);
  expect(reply.type).toBe('application/problem+json');
  expect(reply.body).toMatchObject({ code: 'access.not-permitted' });
});

describe.each(writes)('to $name', ({ send }) => {
  test.each(others)('is not for a %s, and changes nothing', async (role) => {
    const [before, people] = [await rowsOf(app.db, target()), await app.db('people').count()];
    const reply = await (await app.as(role))[send.method](send.path()).send(send.body()).expect(403);
    expect(reply.body).toMatchObject({ code: 'access.not-permitted' });
    expect(await rowsOf(app.db, target())).toEqual(before);
    expect(await app.db('people').count()).toEqual(people);
  });

  test('is not for who is not signed in', async () => {
    const before = await rowsOf(app.db, target());
    await app.anyone()[send.method](send.path()).send(send.body()).expect(401);
    expect(await rowsOf(app.db, target())).toEqual(before);
  });

  test('asks an administrator who came by badge for the password', async () => {
    const before = await rowsOf(app.db, target());
    const agent = app.anyone();
    await agent
      .post('/api/session/badge')
      .send({ badge: app.person('administrator').badge, pin: testPin })
      .expect(200);
    await agent.get('/api/people').expect(200);
    const reply = await agent[send.method](send.path()).send(send.body()).expect(403);
    expect(reply.body).toMatchObject({ code: 'session.password-needed' });
    expect(await rowsOf(app.db, target())).toEqual(before);
  });

  test('needs the header of our own pages', async () => {
    const before = await rowsOf(app.db, target());
    const administrator = await app.as('administrator');
    await administrator[send.method](send.path()).unset('X-Requested-With').send(send.body()).expect(403);
    expect(await rowsOf(app.db, target())).toEqual(before);
  });
});

describe('the administrator of another facility', () => {
  test('finds nobody of this one', async () => {
    const stranger = await app.as('administrator', 'B');
    const before = await rowsOf(app.db, target());
    const requests = [
      stranger.patch(`/api/people/${target()}`).send({ requestId: anId(), version: 1, role: 'lead' }),
      stranger.post(`/api/people/${target()}/one-time-password`).send({ requestId: anId() }),
      stranger.post(`/api/people/${target()}/pin`).send({ requestId: anId() }),
    ];
    for (const request of requests) {
      const reply = await request;
      expect(reply.status).toBe(404);
      expect(reply.body).toMatchObject({ code: 'people.none' });
    }
    expect(await rowsOf(app.db, target())).toEqual(before);
  });

  test('sees nobody of this one', async () => {
    const reply = await (await app.as('administrator', 'B')).get('/api/people').expect(200);
    const { people } = reply.body as { people: { staffNumber: string }[] };
    expect(people.map(({ staffNumber }) => staffNumber[0])).toEqual(people.map(() => 'B'));
    expect(people).toHaveLength(roles.length);
  });
});
