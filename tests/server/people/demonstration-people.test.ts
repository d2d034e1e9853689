import { expect, test } from 'vitest';
import { roles } from '../../../src/domain/access/permissions';
import { judgePassword } from '../../../src/domain/people/password-policy';
import { judgePin } from '../../../src/domain/people/pin-policy';
import { seedDemonstration } from '../../../seeds/demonstration';
import { hospitalId, surgeryCenterId } from '../../../seeds/demonstration-facilities';
import {
  allDemonstrationSignIns,
  demonstrationPeople,
  demonstrationPersonId,
  demonstrationSignIns,
} from '../../../seeds/demonstration-people';
import { isCommonPassword } from '../../../server/platform/common-passwords';
import { openTestApp } from '../../support/test-app';

const app = openTestApp();

test('lets the people of the demonstration sign in, each in their own role', async () => {
  await seedDemonstration(app.db, app.clock.now());
  for (const { staffNumber, password, name, role } of demonstrationSignIns) {
    const reply = await app.anyone().post('/api/session').send({ staffNumber, password }).expect(200);
    expect(reply.body).toMatchObject({ person: { displayName: name, role } });
  }
});

test('lets a badge and its PIN in at a station', async () => {
  const agent = app.anyone();
  for (const { badge, pin, name } of demonstrationSignIns) {
    const reply = await agent.post('/api/session/badge').send({ badge, pin }).expect(200);
    expect(reply.body).toMatchObject({ person: { displayName: name } });
  }
});

test('prints one sign-in for each role', () => {
  expect(demonstrationSignIns.map(({ role }) => role).sort()).toEqual([...roles].sort());
});

test('has the twenty people of the department, an administrator and a surveyor, with initials of their own', () => {
  const hospitalPeople = demonstrationPeople.slice(0, 22);
  expect(new Set(hospitalPeople.map(({ initials }) => initials)).size).toBe(22);
  expect(demonstrationPersonId('LM')).toBe(hospitalPeople.find(({ name }) => name === 'Lucasta Mburu')?.id);
  expect(() => demonstrationPersonId('??')).toThrow('Nobody');
});

test('keeps to the policies that bind everyone else', () => {
  for (const { password, pin, staffNumber, badge, name } of allDemonstrationSignIns) {
    const words = [staffNumber, name, 'Tarnquill Regional Hospital', 'Quenby Vale Surgery Center'];
    expect(judgePassword(password, { isCommon: isCommonPassword, words }), name).toMatchObject({ ok: true });
    expect(judgePin(pin, { isCommon: isCommonPassword, numbers: [staffNumber, badge] }), name).toMatchObject({
      ok: true,
    });
  }
});

test('gives one person two facilities, and the surveyor an end', async () => {
  const both = await app
    .db('memberships')
    .where({ person_id: demonstrationPersonId('KV') })
    .pluck<string[]>('facility_id');
  expect([...both].sort()).toEqual([hospitalId, surgeryCenterId].sort());
  const surveyor = await app
    .db('memberships')
    .where({ person_id: demonstrationPersonId('CH') })
    .first<{ expires_at: Date }>('expires_at');
  expect(surveyor.expires_at.getTime()).toBeGreaterThan(app.clock.now().getTime());
});
