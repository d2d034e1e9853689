import type { Role } from '#domain/access/permissions';
import type { Db, Transaction } from './db';

/** Where a person stands in one facility, as of now. */
export type Standing = {
  readonly displayName: string;
  readonly role: Role;
  /** Of the membership; null when it does not end. */
  readonly expiresAt: Date | null;
  readonly isDisabled: boolean;
  readonly mustChangePassword: boolean;
  readonly signedOutEverywhereAt: Date | null;
};

type StandingRow = {
  readonly display_name: string;
  readonly role: Role;
  readonly expires_at: Date | null;
  readonly is_disabled: boolean;
  readonly must_change_password: boolean;
  readonly signed_out_everywhere_at: Date | null;
};

/** Undefined when the person does not belong to the facility. */
export async function findStanding(
  db: Db | Transaction,
  personId: string,
  facilityId: string,
): Promise<Standing | undefined> {
  const row = await db('people')
    .join('memberships', 'memberships.person_id', 'people.id')
    .where({ 'people.id': personId, 'memberships.facility_id': facilityId })
    .first<StandingRow | undefined>(
      'people.display_name',
      'memberships.role',
      'memberships.expires_at',
      'people.is_disabled',
      'people.must_change_password',
      'people.signed_out_everywhere_at',
    );
  if (!row) return undefined;
  return {
    displayName: row.display_name,
    role: row.role,
    expiresAt: row.expires_at,
    isDisabled: row.is_disabled,
    mustChangePassword: row.must_change_password,
    signedOutEverywhereAt: row.signed_out_everywhere_at,
  };
}
