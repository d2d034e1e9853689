import { beforeEach, expect, test } from 'vitest';
import { formatBadgeCode } from '../../../src/domain/label/badge-code';
import { addTestPerson, openTestApp, testPassword, testPin } from '../../support/test-app';
import { cookieOf, cookiePairOf, eventsAbout } from './session-support';

const app = openTestApp();

beforeEach(async () => {
  await app.db('sign_in_attempts').delete();
});

test('changes the person at a station with one request, and keeps nothing of the former', async () => {
  const [first, second] = [app.person('supervisor'), app.person('technician')];
  const agent = app.anyone();
  const before = await agent
    .post('/api/session')
    .send({ staffNumber: first.staffNumber, password: testPassword })
    .expect(200);
  const reply = await agent.post('/api/session/badge').send({ badge: second.badge, pin: testPin }).expect(200);

  expect(reply.body).toMatchObject({ person: { id: second.id, role: 'technician' } });
  expect(JSON.stringify(reply.body)).not.toContain(first.displayName);
  expect((await agent.get('/api/session').expect(200)).body).toEqual(reply.body);
  await agent.get('/api/people').expect(403);

  expect(cookiePairOf(reply)).not.toBe(cookiePairOf(before));
  const former = await app.anyone().get('/api/session').set('Cookie', cookiePairOf(before)).expect(401);
  expect(former.body).toMatchObject({ code: 'session.expired' });
  const kept = await app.db('session').whereRaw(`sess::text like ?`, [`%${first.id}%`]);
  expect(kept).toEqual([]);
  expect((await eventsAbout(app.db, second.id)).at(-1)).toMatchObject({
    kind: 'person.signed-in',
    actor_id: second.id,
    payload: { by: 'badge' },
  });
});

test('signs in by badge where nobody was before', async () => {
  const { badge, id } = app.person('lead');
  const reply = await app.anyone().post('/api/session/badge').send({ badge, pin: testPin }).expect(200);
  expect(reply.body).toMatchObject({ person: { id } });
});

test('reads a badge as scanners and people give it', async () => {
  const { badge } = app.person('lead');
  const digits = badge.replaceAll('-', '');
  for (const raw of [digits, digits.toLowerCase(), `${badge}\r\n`, `]C0${digits}`, badge.split('').join(' ')]) {
    const reply = await app.anyone().post('/api/session/badge').send({ badge: raw, pin: testPin });
    expect(reply.status, JSON.stringify(raw)).toBe(200);
  }
});

test('stays in the facility of the station when the next person works there too', async () => {
  const person = await addTestPerson(app, { role: 'lead', facilityId: app.facilities.A });
  await app.db('memberships').insert({ person_id: person.id, facility_id: app.facilities.B, role: 'technician' });
  const stranger = await app.as('technician', 'B');
  const there = await stranger.post('/api/session/badge').send({ badge: person.badge, pin: testPin }).expect(200);
  expect(there.body).toMatchObject({
    facility: { id: app.facilities.B },
    person: { role: 'technician' },
    facilities: [{ name: 'Alder Hospital' }, { name: 'Birch Hospital' }],
  });
  const anywhere = await app
    .anyone()
    .post('/api/session/badge')
    .send({ badge: person.badge, pin: testPin })
    .expect(200);
  expect(anywhere.body).toMatchObject({ facility: { id: app.facilities.A }, person: { role: 'lead' } });
});

test('refuses a wrong PIN and an unknown badge in the same words, and leaves who is there signed in', async () => {
  const [present, next] = [app.person('technician'), app.person('lead')];
  const agent = app.anyone();
  await agent.post('/api/session').send({ staffNumber: present.staffNumber, password: testPassword }).expect(200);
  const wrong = await agent.post('/api/session/badge').send({ badge: next.badge, pin: '730419' }).expect(401);
  const unknown = await agent
    .post('/api/session/badge')
    .send({ badge: formatBadgeCode(99_000_001), pin: testPin })
    .expect(401);
  expect(wrong.body).toMatchObject({ code: 'session.refused' });
  expect({ ...wrong.body, reference: '' }).toEqual({ ...unknown.body, reference: '' });
  expect(cookieOf(wrong)).toBeUndefined();
  expect((await agent.get('/api/session').expect(200)).body).toMatchObject({ person: { id: present.id } });
});

test('refuses a badge whose person has no PIN, is switched off, or may not work here any more', async () => {
  const sign = (badge: string) => app.anyone().post('/api/session/badge').send({ badge, pin: testPin }).expect(401);
  const [pinless, disabled, gone] = await Promise.all(
    [1, 2, 3].map(() => addTestPerson(app, { role: 'lead', facilityId: app.facilities.A })),
  );
  if (!pinless || !disabled || !gone) throw new Error('three people were added');
  await app.db('people').where({ id: pinless.id }).update({ pin_hash: null });
  await app.db('people').where({ id: disabled.id }).update({ is_disabled: true });
  await app.db('memberships').where({ person_id: gone.id }).update({ expires_at: app.clock.now() });
  expect((await sign(pinless.badge)).body).toMatchObject({ code: 'session.refused' });
  expect((await sign(disabled.badge)).body).toMatchObject({ code: 'session.disabled' });
  expect((await sign(gone.badge)).body).toMatchObject({ code: 'session.no-facility' });
});

test('says that a scan is no badge, without counting a try', async () => {
  const badge = app.person('lead').badge;
  const damaged = `${badge.slice(0, -1)}${badge.endsWith('0') ? '1' : '0'}`;
  for (const raw of [
    'P-20431784-52',
    'hello',
    damaged,
    'N'.repeat(10_000),
    '\u0001\u0002',
    '01095060001343521710',
    ' ',
  ]) {
    const reply = await app.anyone().post('/api/session/badge').send({ badge: raw, pin: testPin });
    expect(reply.status, raw.slice(0, 20)).toBe(400);
    expect(reply.body).toMatchObject({ code: 'session.not-a-badge' });
  }
  expect(await app.db('sign_in_attempts').select()).toEqual([]);
});

test('refuses extra, missing and mistyped fields', async () => {
  const { badge } = app.person('lead');
  for (const body of [
    {},
    { badge },
    { pin: testPin },
    { badge, pin: 730418 },
    { badge, pin: testPin, facilityId: app.facilities.B },
  ]) {
    const reply = await app.anyone().post('/api/session/badge').send(body).expect(400);
    expect(reply.body).toMatchObject({ code: 'request.not-understood' });
  }
});

test('a password does not open a badge, nor a PIN a staff number', async () => {
  const { badge, staffNumber } = app.person('lead');
  await app.anyone().post('/api/session/badge').send({ badge, pin: testPassword }).expect(401);
  await app.anyone().post('/api/session').send({ staffNumber, password: testPin }).expect(401);
});
