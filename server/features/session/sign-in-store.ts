import type { Db, Transaction } from '../../platform/db';

/** What is needed to judge a sign-in. */
export type Credentials = {
  readonly personId: string;
  readonly staffNumber: string;
  readonly displayName: string;
  readonly badgeCode: string | null;
  readonly passwordHash: string;
  readonly pinHash: string | null;
  readonly isDisabled: boolean;
  readonly mustChangePassword: boolean;
  readonly oneTimePasswordExpiresAt: Date | null;
};

type CredentialsRow = {
  readonly id: string;
  readonly staff_number: string;
  readonly display_name: string;
  readonly badge_code: string | null;
  readonly password_hash: string;
  readonly pin_hash: string | null;
  readonly is_disabled: boolean;
  readonly must_change_password: boolean;
  readonly one_time_password_expires_at: Date | null;
};

function fromRow(row: CredentialsRow): Credentials {
  return {
    personId: row.id,
    staffNumber: row.staff_number,
    displayName: row.display_name,
    badgeCode: row.badge_code,
    passwordHash: row.password_hash,
    pinHash: row.pin_hash,
    isDisabled: row.is_disabled,
    mustChangePassword: row.must_change_password,
    oneTimePasswordExpiresAt: row.one_time_password_expires_at,
  };
}

const columns = [
  'id',
  'staff_number',
  'display_name',
  'badge_code',
  'password_hash',
  'pin_hash',
  'is_disabled',
  'must_change_password',
  'one_time_password_expires_at',
] as const;

export async function findByStaffNumber(db: Db, staffNumber: string): Promise<Credentials | undefined> {
  const row = await db('people')
    .where({ staff_number: staffNumber })
    .first<CredentialsRow | undefined>(...columns);
  return row && fromRow(row);
}

export async function findByBadge(db: Db, badgeCode: string): Promise<Credentials | undefined> {
  const row = await db('people')
    .where({ badge_code: badgeCode })
    .first<CredentialsRow | undefined>(...columns);
  return row && fromRow(row);
}

export async function getCredentials(db: Db, personId: string): Promise<Credentials> {
  const row = await db('people')
    .where({ id: personId })
    .first<CredentialsRow | undefined>(...columns);
  if (!row) throw new Error('the person who is signed in is not there');
  return fromRow(row);
}

/** Reads a person and keeps everyone else from changing the row until the transaction ends. */
export async function lockCredentials(trx: Transaction, personId: string): Promise<Credentials> {
  const row = await trx('people')
    .where({ id: personId })
    .forNoKeyUpdate()
    .first<CredentialsRow | undefined>(...columns);
  if (!row) throw new Error('the person who is signed in is not there');
  return fromRow(row);
}

/** Facilities where this person may work now, by name. */
export async function listFacilityIds(db: Db | Transaction, personId: string, now: Date): Promise<string[]> {
  const rows = await db('memberships')
    .join('facilities', 'facilities.id', 'memberships.facility_id')
    .where({ 'memberships.person_id': personId })
    .whereRaw('(memberships.expires_at is null or memberships.expires_at > ?)', [now])
    .orderBy(['facilities.name', 'facilities.id'])
    .select<{ facility_id: string }[]>('memberships.facility_id');
  return rows.map((row) => row.facility_id);
}

export async function setPassword(
  trx: Transaction,
  personId: string,
  { passwordHash, signedOutEverywhereAt }: { readonly passwordHash: string; readonly signedOutEverywhereAt: Date },
): Promise<void> {
  await trx('people').where({ id: personId }).increment('version', 1).update({
    password_hash: passwordHash,
    must_change_password: false,
    one_time_password_expires_at: null,
    signed_out_everywhere_at: signedOutEverywhereAt,
  });
}

export async function setPin(trx: Transaction, personId: string, pinHash: string): Promise<void> {
  await trx('people').where({ id: personId }).increment('version', 1).update({ pin_hash: pinHash });
}

export async function setSignedOutEverywhere(trx: Transaction, personId: string, at: Date): Promise<void> {
  await trx('people').where({ id: personId }).update({ signed_out_everywhere_at: at });
}
