import fc from 'fast-check';
import { expect, test } from 'vitest';
import { roles } from '../../../src/domain/access/permissions';
import {
  decidePersonChange,
  type PersonAccess,
  type PersonChange,
} from '../../../src/domain/people/decide-person-change';

const technician: PersonAccess = { role: 'technician', expiresAtMs: null, isDisabled: false };
const administrator: PersonAccess = { role: 'administrator', expiresAtMs: null, isDisabled: false };
const endMs = Date.UTC(2026, 2, 14, 22);

const plain: PersonChange = {
  isSelf: false,
  before: technician,
  after: technician,
  signInActs: [],
  administersAll: true,
  othersAdministerHere: true,
  othersAdministerEverywhere: true,
};

function outcomeOf(change: Partial<PersonChange>): string {
  const decided = decidePersonChange({ ...plain, ...change });
  if (!decided.ok) return decided.refusal.code;
  return decided.value.endsSessions ? 'sessions end' : 'sessions stay';
}

test('another role, an end, or being switched off ends the sessions; a name or a shift does not', () => {
  expect(outcomeOf({ after: { ...technician, role: 'lead' } })).toBe('sessions end');
  expect(outcomeOf({ after: { ...technician, expiresAtMs: endMs } })).toBe('sessions end');
  expect(outcomeOf({ after: { ...technician, isDisabled: true }, signInActs: ['disable'] })).toBe('sessions end');
  for (const act of ['change-badge', 'reset-password', 'reset-pin'] as const) {
    expect(outcomeOf({ signInActs: [act] }), act).toBe('sessions end');
  }
  expect(outcomeOf({ signInActs: ['change-name'] })).toBe('sessions stay');
  expect(outcomeOf({})).toBe('sessions stay');
});

test('nobody changes their own access or resets their own password, but may have a new badge or name', () => {
  const self = { isSelf: true, before: administrator, after: administrator };
  expect(outcomeOf({ ...self, after: { ...administrator, role: 'supervisor' } })).toBe('own-access');
  expect(outcomeOf({ ...self, after: { ...administrator, isDisabled: true } })).toBe('own-access');
  expect(outcomeOf({ ...self, after: { ...administrator, expiresAtMs: endMs } })).toBe('own-access');
  expect(outcomeOf({ ...self, signInActs: ['reset-password'] })).toBe('own-password');
  expect(outcomeOf({ ...self, signInActs: ['change-badge', 'change-name'] })).toBe('sessions stay');
});

test('a surveyor has an end, whether new in the role or already in it', () => {
  expect(outcomeOf({ after: { ...technician, role: 'surveyor' } })).toBe('surveyor-needs-end');
  expect(outcomeOf({ after: { role: 'surveyor', expiresAtMs: endMs, isDisabled: false } })).toBe('sessions end');
  const surveyor: PersonAccess = { role: 'surveyor', expiresAtMs: endMs, isDisabled: false };
  expect(outcomeOf({ before: surveyor, after: { ...surveyor, expiresAtMs: null } })).toBe('surveyor-needs-end');
});

test('the last administrator stays, wherever they are the last', () => {
  const last = { before: administrator, othersAdministerHere: false, othersAdministerEverywhere: false };
  expect(outcomeOf({ ...last, after: { ...administrator, role: 'lead' } })).toBe('last-administrator');
  expect(outcomeOf({ ...last, after: { ...administrator, expiresAtMs: endMs } })).toBe('last-administrator');
  expect(outcomeOf({ ...last, after: { ...administrator, isDisabled: true } })).toBe('last-administrator');
  // Last elsewhere only: the place here may be changed, the person not switched off.
  const lastElsewhere = { ...last, othersAdministerHere: true };
  expect(outcomeOf({ ...lastElsewhere, after: { ...administrator, role: 'lead' } })).toBe('sessions end');
  expect(outcomeOf({ ...lastElsewhere, after: { ...administrator, isDisabled: true } })).toBe('last-administrator');
  // An administrator with an end, or already switched off, is none that stays.
  expect(outcomeOf({ ...last, before: { ...administrator, expiresAtMs: endMs }, after: technician })).toBe(
    'sessions end',
  );
  expect(
    outcomeOf({ ...last, before: { ...administrator, isDisabled: true }, after: { ...technician, isDisabled: true } }),
  ).toBe('sessions end');
});

test('the administrator of one facility has no say over the sign-in of somebody who also works at another', () => {
  for (const act of ['change-name', 'disable', 'enable', 'change-badge', 'reset-password', 'reset-pin'] as const) {
    expect(outcomeOf({ administersAll: false, signInActs: [act] }), act).toBe('works-elsewhere');
  }
  expect(outcomeOf({ administersAll: false, after: { ...technician, role: 'lead' } })).toBe('sessions end');
});

test('whatever is allowed, a surveyor has an end and nobody’s own access has changed', () => {
  const access = fc.record({
    role: fc.constantFrom(...roles),
    expiresAtMs: fc.constantFrom(null, endMs),
    isDisabled: fc.boolean(),
  });
  fc.assert(
    fc.property(fc.boolean(), access, access, fc.boolean(), (isSelf, before, after, othersAdminister) => {
      const decided = decidePersonChange({
        ...plain,
        isSelf,
        before,
        after,
        othersAdministerHere: othersAdminister,
        othersAdministerEverywhere: othersAdminister,
      });
      if (!decided.ok) return;
      expect(after.role === 'surveyor' && after.expiresAtMs === null).toBe(false);
      if (isSelf) expect(after).toEqual(before);
      const lost = before.role === 'administrator' && before.expiresAtMs === null && !before.isDisabled;
      const kept = after.role === 'administrator' && after.expiresAtMs === null && !after.isDisabled;
      if (lost && !kept) expect(othersAdminister).toBe(true);
    }),
  );
});
