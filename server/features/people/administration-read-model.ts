import type { Transaction } from '../../platform/db';

/* Who administers what, asked under the locks of the facilities concerned. */

const open = '(memberships.expires_at is null or memberships.expires_at > ?)';

/** Whether somebody is administrator of a facility now. */
export async function isAdministrator(
  trx: Transaction,
  personId: string,
  facilityId: string,
  now: Date,
): Promise<boolean> {
  const found = await trx('memberships')
    .join('people', 'people.id', 'memberships.person_id')
    .where({
      'memberships.person_id': personId,
      'memberships.facility_id': facilityId,
      'memberships.role': 'administrator',
      'people.is_disabled': false,
    })
    .whereRaw(open, [now])
    .first<{ person_id: string } | undefined>('memberships.person_id');
  return found !== undefined;
}

/** Whether somebody is administrator of every facility where another person works now. */
export async function administersAllOf(
  trx: Transaction,
  {
    administratorId,
    personId,
    now,
  }: { readonly administratorId: string; readonly personId: string; readonly now: Date },
): Promise<boolean> {
  const foreign = await trx('memberships')
    .where({ 'memberships.person_id': personId })
    .whereRaw(open, [now])
    .whereRaw(
      `not exists (select from memberships as own where own.person_id = ? and own.facility_id = memberships.facility_id
        and own.role = 'administrator' and (own.expires_at is null or own.expires_at > ?))`,
      [administratorId, now],
    )
    .first<{ facility_id: string } | undefined>('memberships.facility_id');
  return foreign === undefined;
}

/** Whether somebody is administrator of a facility, other than this one, where another person works now. */
export async function administersElsewhere(
  trx: Transaction,
  {
    administratorId,
    personId,
    facilityId,
    now,
  }: {
    readonly administratorId: string;
    readonly personId: string;
    readonly facilityId: string;
    readonly now: Date;
  },
): Promise<boolean> {
  const shared = await trx('memberships')
    .where({ 'memberships.person_id': personId })
    .whereNot({ 'memberships.facility_id': facilityId })
    .whereRaw(open, [now])
    .whereRaw(
      `exists (select from memberships as own where own.person_id = ? and own.facility_id = memberships.facility_id
        and own.role = 'administrator' and (own.expires_at is null or own.expires_at > ?))`,
      [administratorId, now],
    )
    .first<{ facility_id: string } | undefined>('memberships.facility_id');
  return shared !== undefined;
}

/** Facilities this person is the only lasting administrator of: not disabled, and without an end. */
export async function listAloneAdministered(trx: Transaction, personId: string): Promise<string[]> {
  const rows = await trx('memberships')
    .where({ 'memberships.person_id': personId, 'memberships.role': 'administrator' })
    .whereNull('memberships.expires_at')
    .whereRaw(
      `not exists (select from memberships as others join people on people.id = others.person_id
        where others.facility_id = memberships.facility_id and others.person_id <> memberships.person_id
          and others.role = 'administrator' and others.expires_at is null and not people.is_disabled)`,
    )
    .select<{ facility_id: string }[]>('memberships.facility_id');
  return rows.map((row) => row.facility_id);
}
