import type { Role } from '#domain/access/permissions';
import type { Transaction } from '../../platform/db';

/** A person and their place in one facility, locked for the transaction. */
export type LockedPerson = {
  readonly id: string;
  readonly staffNumber: string;
  readonly displayName: string;
  readonly initials: string;
  readonly isDisabled: boolean;
  readonly badgeCode: string | null;
  readonly hasPin: boolean;
  readonly role: Role;
  readonly usualShift: string | null;
  readonly expiresAt: Date | null;
  readonly version: number;
};

type LockedRow = {
  readonly id: string;
  readonly staff_number: string;
  readonly display_name: string;
  readonly initials: string;
  readonly is_disabled: boolean;
  readonly badge_code: string | null;
  readonly has_pin: boolean;
  readonly role: Role;
  readonly usual_shift: string | null;
  readonly expires_at: Date | null;
  readonly version: number;
};

/**
 * Keeps the people of every facility this person belongs to, and of this one, as they are until the transaction ends:
 * two administrators who disable each other then do it one after the other. Always in the order of the ids.
 */
export async function lockFacilitiesOf(trx: Transaction, personId: string, facilityId: string): Promise<void> {
  await trx.raw(
    `select facilities.id from facilities
      where facilities.id = ? or facilities.id in (select memberships.facility_id from memberships where memberships.person_id = ?)
      order by facilities.id for no key update`,
    [facilityId, personId],
  );
}

export async function lockFacility(trx: Transaction, facilityId: string): Promise<void> {
  await trx.raw('select facilities.id from facilities where facilities.id = ? for no key update', [facilityId]);
}

/** Undefined when the person does not belong to the facility. */
export async function lockPerson(
  trx: Transaction,
  personId: string,
  facilityId: string,
): Promise<LockedPerson | undefined> {
  const row = await trx('people')
    .join('memberships', 'memberships.person_id', 'people.id')
    .where({ 'people.id': personId, 'memberships.facility_id': facilityId })
    // Not for update: whoever acts holds a reference to their own row, and may be waiting for this facility.
    .forNoKeyUpdate()
    .first<LockedRow | undefined>(
      'people.id',
      'people.staff_number',
      'people.display_name',
      'people.initials',
      'people.is_disabled',
      'people.badge_code',
      trx.raw('people.pin_hash is not null as has_pin'),
      'memberships.role',
      'memberships.usual_shift',
      'memberships.expires_at',
      'people.version',
    );
  if (!row) return undefined;
  return {
    id: row.id,
    staffNumber: row.staff_number,
    displayName: row.display_name,
    initials: row.initials,
    isDisabled: row.is_disabled,
    badgeCode: row.badge_code,
    hasPin: row.has_pin,
    role: row.role,
    usualShift: row.usual_shift,
    expiresAt: row.expires_at,
    version: row.version,
  };
}

export async function findPersonByStaffNumber(
  trx: Transaction,
  staffNumber: string,
): Promise<{ readonly id: string } | undefined> {
  return trx('people').where({ staff_number: staffNumber }).first<{ id: string } | undefined>('id');
}

export type NewPerson = {
  readonly id: string;
  readonly staffNumber: string;
  readonly displayName: string;
  readonly initials: string;
  readonly passwordHash: string;
  readonly oneTimePasswordExpiresAt: Date;
  readonly createdAt: Date;
};

/** @returns false when the staff number is taken */
export async function insertPerson(trx: Transaction, person: NewPerson): Promise<boolean> {
  const rows = await trx('people')
    .insert({
      id: person.id,
      staff_number: person.staffNumber,
      display_name: person.displayName,
      initials: person.initials,
      password_hash: person.passwordHash,
      must_change_password: true,
      one_time_password_expires_at: person.oneTimePasswordExpiresAt,
      created_at: person.createdAt,
    })
    .onConflict('staff_number')
    .ignore()
    .returning<{ id: string }[]>('id');
  return rows.length === 1;
}

export type NewMembership = {
  readonly personId: string;
  readonly facilityId: string;
  readonly role: Role;
  readonly usualShift: string | null;
  readonly expiresAt: Date | null;
};

/** @returns false when the person belongs to the facility already */
export async function insertMembership(trx: Transaction, membership: NewMembership): Promise<boolean> {
  const rows = await trx('memberships')
    .insert({
      person_id: membership.personId,
      facility_id: membership.facilityId,
      role: membership.role,
      usual_shift: membership.usualShift,
      expires_at: membership.expiresAt,
    })
    .onConflict(['person_id', 'facility_id'])
    .ignore()
    .returning<{ person_id: string }[]>('person_id');
  return rows.length === 1;
}

export async function updatePerson(
  trx: Transaction,
  personId: string,
  change: {
    readonly displayName: string;
    readonly initials: string;
    readonly isDisabled: boolean;
    readonly badgeCode: string | null;
    readonly keepsPin: boolean;
  },
): Promise<void> {
  await trx('people')
    .where({ id: personId })
    .increment('version', 1)
    .update({
      display_name: change.displayName,
      initials: change.initials,
      is_disabled: change.isDisabled,
      badge_code: change.badgeCode,
      ...(change.keepsPin ? {} : { pin_hash: null }),
    });
}

export async function updateMembership(
  trx: Transaction,
  { personId, facilityId, role, usualShift, expiresAt }: NewMembership,
): Promise<void> {
  await trx('memberships')
    .where({ person_id: personId, facility_id: facilityId })
    .update({ role, usual_shift: usualShift, expires_at: expiresAt });
}

export async function setOneTimePassword(
  trx: Transaction,
  personId: string,
  { passwordHash, expiresAt }: { readonly passwordHash: string; readonly expiresAt: Date },
): Promise<void> {
  await trx('people').where({ id: personId }).increment('version', 1).update({
    password_hash: passwordHash,
    must_change_password: true,
    one_time_password_expires_at: expiresAt,
  });
}

export async function setPinHash(trx: Transaction, personId: string, pinHash: string): Promise<void> {
  await trx('people').where({ id: personId }).increment('version', 1).update({ pin_hash: pinHash });
}

export async function isBadgeTaken(trx: Transaction, badgeCode: string): Promise<boolean> {
  return (await trx('people').where({ badge_code: badgeCode }).first('id')) !== undefined;
}

/** A new sign-in that began before this instant has ended, wherever it is kept. */
export async function endSignInsBefore(trx: Transaction, personId: string, at: Date): Promise<void> {
  await trx('people').where({ id: personId }).update({ signed_out_everywhere_at: at });
}
