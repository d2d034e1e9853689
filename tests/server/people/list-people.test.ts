import { expect, test } from 'vitest';
import type { Person } from '../../../src/contract/people';
import { roles, type Role } from '../../../src/domain/access/permissions';
import { addTestPerson, openTestApp, testPin } from '../../support/test-app';

const app = openTestApp();

async function listed(query: string, role: Role = 'administrator'): Promise<Person[]> {
  const reply = await (await app.as(role)).get(`/api/people${query}`).expect(200);
  return (reply.body as { people: Person[] }).people;
}

test('lists the people of the facility by name, with everything an administrator needs', async () => {
  const people = await listed('');
  expect(people).toHaveLength(roles.length);
  const names = people.map(({ displayName }) => displayName);
  expect(names).toEqual([...names].sort());
  expect(people.find(({ role }) => role === 'lead')).toEqual({
    id: app.person('lead').id,
    staffNumber: app.person('lead').staffNumber,
    displayName: app.person('lead').displayName,
    initials: 'LE',
    role: 'lead',
    usualShift: null,
    expiresAt: null,
    isDisabled: false,
    hasBadge: true,
    badgeCode: app.person('lead').badge,
    hasPin: true,
    mustChangePassword: false,
    oneTimePasswordExpiresAt: null,
    worksElsewhere: false,
    version: 1,
  });
});

test('shows nobody’s hash to anybody, and a badge code only to who gives badges out', async () => {
  for (const role of ['supervisor', 'surveyor'] as const) {
    const people = await listed('', role);
    expect(people.map(({ badgeCode }) => badgeCode)).toEqual(people.map(() => null));
    expect(people.every(({ hasBadge }) => hasBadge)).toBe(true);
  }
  expect(JSON.stringify(await listed(''))).not.toMatch(/argon2|hash/);
});

test('shows no badge code after a sign-in by badge: half of the key would lead to all the others', async () => {
  const agent = app.anyone();
  await agent
    .post('/api/session/badge')
    .send({ badge: app.person('administrator').badge, pin: testPin })
    .expect(200);
  const reply = await agent.get('/api/people').expect(200);
  const { people } = reply.body as { people: Person[] };
  expect(people.length).toBeGreaterThan(1);
  expect(people.map(({ hasBadge, badgeCode }) => [hasBadge, badgeCode])).toEqual(people.map(() => [true, null]));
});

test('finds by part of name, initials or staff number, in any capitals', async () => {
  await addTestPerson(app, {
    role: 'lead',
    facilityId: app.facilities.A,
    displayName: 'Perpetua Öllinger',
    staffNumber: 'K77',
  });
  expect((await listed('?search=petua')).map(({ staffNumber }) => staffNumber)).toEqual(['K77']);
  expect((await listed('?search=%C3%B6lling')).map(({ staffNumber }) => staffNumber)).toEqual(['K77']);
  expect((await listed('?search=k7')).map(({ staffNumber }) => staffNumber)).toEqual(['K77']);
  expect(await listed('?search=nobody')).toEqual([]);
});

test('takes signs of the search language for what they are', async () => {
  await addTestPerson(app, { role: 'lead', facilityId: app.facilities.A, displayName: 'Under_score O’Percent%' });
  for (const search of ['%25', '_', 'r_s', 't%25']) {
    expect(
      (await listed(`?search=${search}`)).map(({ displayName }) => displayName),
      search,
    ).toEqual(['Under_score O’Percent%']);
  }
  expect(await listed(`?search=${encodeURIComponent("' or 1=1 --")}`)).toEqual([]);
  expect(await listed('?search=%5C')).toEqual([]);
});

test('narrows to one role', async () => {
  expect((await listed('?role=surveyor')).map(({ role }) => role)).toEqual(['surveyor']);
  expect((await listed('?search=ada&role=lead')).map(({ displayName }) => displayName)).toEqual(['Ada lead']);
});

test('refuses a query it does not know', async () => {
  const administrator = await app.as('administrator');
  for (const query of ['?role=boss', '?facilityId=x', `?search=${'x'.repeat(81)}`, '?search=a&search=b']) {
    const reply = await administrator.get(`/api/people${query}`);
    expect(reply.status, query).toBe(400);
    expect(reply.type).toBe('application/problem+json');
  }
});

test('a search for what no text can hold finds nobody or is refused, and fails nowhere', async () => {
  const administrator = await app.as('administrator');
  for (const query of ['?search=%00', '?search=%F0%9F%98%80', '?search=%ED%A0%80']) {
    expect((await administrator.get(`/api/people${query}`)).status, query).toBeLessThan(500);
  }
});
