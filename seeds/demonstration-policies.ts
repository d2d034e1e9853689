import type { Knex } from 'knex';
import { defaultPolicy } from '../src/domain/load/policy';
import { withChanges, type SettingChange } from '../src/domain/policy/setting-change';
import { storedSettings, type PolicySettings } from '../src/domain/policy/settings';
import { calendarDay } from '../src/domain/time/calendar-day';
import { hospitalId, setUpDaysAgo, surgeryCenterId } from './demonstration-facilities';
import { demonstrationPersonId } from './demonstration-people';

/* Invented decisions of invented people, so that a policy with a past is there to look at. */

const dayMs = 24 * 3_600_000;

const firstSettings: PolicySettings = { policy: defaultPolicy, facingBySterilizer: {} };

function id(end: number): string {
  return `0198a000-0000-7000-8000-0000000000${end}`;
}

/** Both begin with the defaults; the hospital has changed something since, and has thought better of something else. */
export async function seedPolicies(trx: Knex.Transaction, now: Date): Promise<void> {
  const ago = (days: number) => new Date(now.getTime() - days * dayMs);
  const dayAgo = (days: number) => calendarDay(ago(days).toISOString(), 'America/Chicago');
  await trx('policies').insert(
    [
      { id: id(11), facility_id: hospitalId },
      { id: id(12), facility_id: surgeryCenterId },
    ].map((facility) => ({
      ...facility,
      number: 1,
      settings: JSON.stringify(storedSettings(firstSettings)),
      reason: 'The settings Paperside begins with.',
      effective_on: dayAgo(setUpDaysAgo),
      effective_at: ago(setUpDaysAgo),
      created_at: ago(setUpDaysAgo),
    })),
  );

  const sterileCore = await trx('sterilizers')
    .where({ facility_id: hospitalId, code: 'ST-4' })
    .first<{ id: string }>('id');
  const changes: readonly SettingChange[] = [
    { of: 'parameter', id: 'challengeDeviceReachMm', before: defaultPolicy.challengeDeviceReachMm, after: 350 },
    { of: 'facing-at-sterilizer', sterilizerId: sterileCore.id, before: null, after: 'not-set' },
  ];
  const second = {
    reason:
      'At the requalification the coldest place was 40 mm further from the drain; and nothing in pouches goes into the sterile core.',
    effective_on: dayAgo(21),
  };
  const proposed = { facility_id: hospitalId, base_number: 1, ...second, changes: JSON.stringify(changes) };
  await trx('policy_proposals').insert([
    {
      ...proposed,
      id: id(21),
      proposed_by: demonstrationPersonId('OB'),
      proposed_at: ago(24),
      state: 'confirmed',
      settled_by: demonstrationPersonId('PT'),
      settled_at: ago(22),
    },
    {
      id: id(22),
      facility_id: hospitalId,
      base_number: 2,
      changes: JSON.stringify([
        { of: 'parameter', id: 'massMarginPercent', before: defaultPolicy.massMarginPercent, after: 10 },
      ]),
      reason: 'The evening shift loads heavier than the day shift.',
      effective_on: dayAgo(10),
      proposed_by: demonstrationPersonId('KV'),
      proposed_at: ago(12),
      state: 'refused',
      settled_by: demonstrationPersonId('OB'),
      settled_at: ago(11),
      settled_reason: 'The shelves are rated for what we load. Let us look at the dry times of the evening first.',
    },
  ]);
  await trx('policies').insert({
    id: id(13),
    facility_id: hospitalId,
    number: 2,
    settings: JSON.stringify(storedSettings(withChanges(firstSettings, changes))),
    changes: JSON.stringify(changes),
    author_id: demonstrationPersonId('OB'),
    second_person_id: demonstrationPersonId('PT'),
    proposal_id: id(21),
    ...second,
    effective_at: ago(21),
    created_at: ago(22),
  });
}
