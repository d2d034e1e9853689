import type { Role } from '#domain/access/permissions';
import type { PeopleQuery, Person } from '#contract/people';
import type { Actor } from '../../platform/actor';
import type { Db, Transaction } from '../../platform/db';
import { containing } from '../../platform/search-text';

type PersonRow = {
  readonly id: string;
  readonly staff_number: string;
  readonly display_name: string;
  readonly initials: string;
  readonly role: Role;
  readonly usual_shift: string | null;
  readonly expires_at: Date | null;
  readonly is_disabled: boolean;
  readonly badge_code: string | null;
  readonly has_pin: boolean;
  readonly must_change_password: boolean;
  readonly one_time_password_expires_at: Date | null;
  readonly works_elsewhere: boolean;
  readonly version: number;
};

function peopleOf(db: Db | Transaction, facilityId: string, now: Date) {
  return db('people')
    .join('memberships', 'memberships.person_id', 'people.id')
    .where({ 'memberships.facility_id': facilityId })
    .orderByRaw('lower(people.display_name), people.id')
    .select<PersonRow[]>(
      'people.id',
      'people.staff_number',
      'people.display_name',
      'people.initials',
      'memberships.role',
      'memberships.usual_shift',
      'memberships.expires_at',
      'people.is_disabled',
      'people.badge_code',
      db.raw('people.pin_hash is not null as has_pin'),
      'people.must_change_password',
      'people.one_time_password_expires_at',
      db.raw(
        `exists (select from memberships as others where others.person_id = people.id and others.facility_id <> ?
          and (others.expires_at is null or others.expires_at > ?)) as works_elsewhere`,
        [facilityId, now],
      ),
      'people.version',
    );
}

function fromRow(row: PersonRow, mayShowBadges: boolean): Person {
  return {
    id: row.id,
    staffNumber: row.staff_number,
    displayName: row.display_name,
    initials: row.initials,
    role: row.role,
    usualShift: row.usual_shift,
    expiresAt: row.expires_at?.toISOString() ?? null,
    isDisabled: row.is_disabled,
    hasBadge: row.badge_code !== null,
    badgeCode: mayShowBadges ? row.badge_code : null,
    hasPin: row.has_pin,
    mustChangePassword: row.must_change_password,
    oneTimePasswordExpiresAt: row.one_time_password_expires_at?.toISOString() ?? null,
    worksElsewhere: row.works_elsewhere,
    version: row.version,
  };
}

/** The people of the actor's facility, by name; those switched off or run out too. */
export async function listPeople(
  db: Db,
  actor: Actor,
  {
    query: { search, role },
    now,
    mayShowBadges,
  }: { readonly query: PeopleQuery; readonly now: Date; readonly mayShowBadges: boolean },
): Promise<Person[]> {
  const people = peopleOf(db, actor.facilityId, now);
  if (search !== '') {
    const pattern = containing(search);
    people.whereRaw('(people.display_name ilike ? or people.initials ilike ? or people.staff_number ilike ?)', [
      pattern,
      pattern,
      pattern,
    ]);
  }
  if (role !== undefined) people.where({ 'memberships.role': role });
  const rows = await people;
  return rows.map((row) => fromRow(row, mayShowBadges));
}

/** One person of the actor's facility, as just written: by somebody who edits people, signed in with a password. */
export async function getPersonView(trx: Transaction, actor: Actor, personId: string, now: Date): Promise<Person> {
  const rows = await peopleOf(trx, actor.facilityId, now).where({ 'people.id': personId });
  const row = rows[0];
  if (!row) throw new Error('the person who was just written is not there');
  return fromRow(row, true);
}
