import { beforeEach, describe, expect, test } from 'vitest';
import type { OneTimePasswordResponse, PinResponse } from '../../../src/contract/people';
import { judgePin } from '../../../src/domain/people/pin-policy';
import { isCommonPassword } from '../../../server/platform/common-passwords';
import { drawBadgeCode, drawOneTimePassword, drawPin } from '../../../server/features/people/secrets';
import { addTestPerson, anId, openTestApp, testPassword, testPin, type TestPerson } from '../../support/test-app';
import { eventsAbout } from '../session/session-support';
import { rowsOf } from './people-support';

const app = openTestApp();

beforeEach(async () => {
  await app.db('sign_in_attempts').delete();
});

async function aTechnician(): Promise<TestPerson> {
  return addTestPerson(app, { role: 'technician', facilityId: app.facilities.A });
}

describe('a one-time password', () => {
  test('takes the place of the password, ends the sessions, and holds for 24 hours', async () => {
    const person = await aTechnician();
    const working = app.anyone();
    await working.post('/api/session').send({ staffNumber: person.staffNumber, password: testPassword }).expect(200);
    const given = await (
      await app.as('administrator')
    )
      .post(`/api/people/${person.id}/one-time-password`)
      .send({ requestId: anId() })
      .expect(200);
    const { oneTimePassword, expiresAt } = given.body as OneTimePasswordResponse;
    expect(given.headers['cache-control']).toBe('no-store');
    expect(expiresAt).toBe(new Date(app.clock.now().getTime() + 24 * 3_600_000).toISOString());
    await working.get('/api/session').expect(401);

    const sign = (password: string | null) =>
      app.anyone().post('/api/session').send({ staffNumber: person.staffNumber, password });
    await sign(testPassword).expect(401);
    await sign(oneTimePassword).expect(200);
    app.clock.advance({ hours: 23, minutes: 59 });
    await sign(oneTimePassword).expect(200);
    app.clock.advance({ minutes: 1 });
    expect((await sign(oneTimePassword).expect(401)).body).toMatchObject({ code: 'session.one-time-password-expired' });
  });

  test('is shown once and kept nowhere in clear', async () => {
    const person = await aTechnician();
    const administrator = await app.as('administrator');
    const body = { requestId: anId() };
    const path = `/api/people/${person.id}/one-time-password`;
    const first = (await administrator.post(path).send(body).expect(200)).body as OneTimePasswordResponse;
    const hash = await rowsOf(app.db, person.id);
    const second = (await administrator.post(path).send(body).expect(200)).body as OneTimePasswordResponse;
    expect(second).toEqual({ oneTimePassword: null, expiresAt: first.expiresAt });
    expect(await rowsOf(app.db, person.id)).toEqual(hash);
    const events = await eventsAbout(app.db, person.id);
    expect(events).toMatchObject([{ kind: 'person.password-reset', payload: { expiresAt: first.expiresAt } }]);
    const kept = JSON.stringify([events, await app.db('requests').where({ id: body.requestId })]);
    expect(kept).not.toContain(first.oneTimePassword ?? 'nothing');
  });

  test('is not given out to oneself', async () => {
    const administrator = await app.as('administrator');
    const { id } = app.person('administrator');
    const before = await rowsOf(app.db, id);
    const reply = await administrator
      .post(`/api/people/${id}/one-time-password`)
      .send({ requestId: anId() })
      .expect(422);
    expect(reply.body).toMatchObject({ code: 'people.own-password' });
    expect(await rowsOf(app.db, id)).toEqual(before);
  });

  test('is drawn at random from 79 bits, without letters that are read for others', () => {
    const drawn = Array.from({ length: 500 }, drawOneTimePassword);
    expect(new Set(drawn).size).toBe(500);
    for (const one of drawn) expect(one).toMatch(/^(?:[^-iloILO01]{4}-){3}[^-iloILO01]{4}$/);
    expect(new Set(drawn.join('').replaceAll('-', '')).size).toBe(31);
    expect(Math.log2(31 ** 16)).toBeGreaterThan(79);
  });
});

describe('a PIN', () => {
  test('takes the place of the old one, ends the sessions, and is shown once', async () => {
    const person = await aTechnician();
    const working = app.anyone();
    await working.post('/api/session/badge').send({ badge: person.badge, pin: testPin }).expect(200);
    const administrator = await app.as('administrator');
    const body = { requestId: anId() };
    const { pin } = (await administrator.post(`/api/people/${person.id}/pin`).send(body).expect(200))
      .body as PinResponse;
    expect(pin).toMatch(/^\d{6}$/);
    await working.get('/api/session').expect(401);
    await app.anyone().post('/api/session/badge').send({ badge: person.badge, pin: testPin }).expect(401);
    await app.anyone().post('/api/session/badge').send({ badge: person.badge, pin }).expect(200);
    const again = await administrator.post(`/api/people/${person.id}/pin`).send(body).expect(200);
    expect(again.body).toEqual({ pin: null });
    await app.anyone().post('/api/session/badge').send({ badge: person.badge, pin }).expect(200);
    expect(await eventsAbout(app.db, person.id)).toContainEqual(
      expect.objectContaining({ kind: 'person.pin-reset', payload: {} }),
    );
  });

  test('opens a badge that was held for too many tries', async () => {
    const person = await aTechnician();
    const sign = (pin: string) => app.anyone().post('/api/session/badge').send({ badge: person.badge, pin });
    for (let failure = 0; failure < 5; failure += 1) await sign('111111').expect(401);
    await sign(testPin).expect(429);
    const reply = await (
      await app.as('administrator')
    )
      .post(`/api/people/${person.id}/pin`)
      .send({ requestId: anId() });
    await sign((reply.body as { pin: string }).pin).expect(200);
  });

  test('is not given out without a badge', async () => {
    const person = await aTechnician();
    await app.db('people').where({ id: person.id }).update({ badge_code: null, pin_hash: null });
    const before = await rowsOf(app.db, person.id);
    const reply = await (
      await app.as('administrator')
    )
      .post(`/api/people/${person.id}/pin`)
      .send({ requestId: anId() })
      .expect(422);
    expect(reply.body).toMatchObject({ code: 'pin.no-badge' });
    expect(await rowsOf(app.db, person.id)).toEqual(before);
  });

  test('is drawn so that it passes the policy for its badge', () => {
    for (let draw = 0; draw < 200; draw += 1) {
      const badge = drawBadgeCode();
      expect(judgePin(drawPin([badge]), { isCommon: isCommonPassword, numbers: [badge] })).toMatchObject({ ok: true });
    }
  });
});

test('refuses extra and missing fields', async () => {
  const administrator = await app.as('administrator');
  const { id } = await aTechnician();
  for (const act of ['one-time-password', 'pin']) {
    for (const body of [
      {},
      { requestId: 'x' },
      { requestId: anId(), pin: '604193' },
      { requestId: anId(), password: testPassword },
    ]) {
      await administrator.post(`/api/people/${id}/${act}`).send(body).expect(400);
    }
    await administrator.post(`/api/people/${anId()}/${act}`).send({ requestId: anId() }).expect(404);
  }
});

describe('a printed badge', () => {
  test('is a PDF for who gives badges out, and never kept by a browser', async () => {
    const person = await aTechnician();
    const reply = await (await app.as('administrator')).get(`/api/people/${person.id}/badge`).expect(200);
    expect(reply.type).toBe('application/pdf');
    expect(reply.headers['cache-control']).toBe('no-store');
    expect((reply.body as Buffer).subarray(0, 5).toString()).toBe('%PDF-');
  });

  test('is told in the history each time, with who printed it and without its code', async () => {
    const person = await aTechnician();
    const administrator = await app.as('administrator');
    for (let print = 0; print < 2; print += 1) await administrator.get(`/api/people/${person.id}/badge`).expect(200);
    const events = await eventsAbout(app.db, person.id);
    expect(events.map(({ kind, actor_id, facility_id, payload }) => [kind, actor_id, facility_id, payload])).toEqual(
      [0, 1].map(() => ['person.badge-printed', app.person('administrator').id, app.facilities.A, {}]),
    );
  });

  test('needs a sign-in with the password', async () => {
    const person = await aTechnician();
    const agent = app.anyone();
    await agent
      .post('/api/session/badge')
      .send({ badge: app.person('administrator').badge, pin: testPin })
      .expect(200);
    const reply = await agent.get(`/api/people/${person.id}/badge`).expect(403);
    expect(reply.body).toMatchObject({ code: 'session.password-needed' });
    expect(await eventsAbout(app.db, person.id)).toEqual([]);
  });

  test('is nobody else’s to have', async () => {
    const person = await aTechnician();
    for (const role of ['technician', 'lead', 'supervisor', 'surveyor'] as const) {
      await (await app.as(role)).get(`/api/people/${person.id}/badge`).expect(403);
    }
    const foreign = await (await app.as('administrator', 'B')).get(`/api/people/${person.id}/badge`).expect(404);
    expect(foreign.body).toMatchObject({ code: 'people.none' });
    await app.db('people').where({ id: person.id }).update({ badge_code: null });
    const none = await (await app.as('administrator')).get(`/api/people/${person.id}/badge`).expect(404);
    expect(none.body).toMatchObject({ code: 'people.no-badge' });
  });
});
