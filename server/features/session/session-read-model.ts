import { idleTimeoutS, sessionEndMs } from '#domain/people/session-limits';
import { permissionsOf } from '#domain/access/role-matrix';
import type { Role } from '#domain/access/permissions';
import type { SessionResponse } from '#contract/session';
import type { Db } from '../../platform/db';
import type { SignIn } from '../../http/session';

type SessionRow = {
  readonly person_id: string;
  readonly display_name: string;
  readonly initials: string;
  readonly staff_number: string;
  readonly must_change_password: boolean;
  readonly has_badge: boolean;
  readonly has_pin: boolean;
  readonly role: Role;
  readonly expires_at: Date | null;
  readonly facility_id: string;
  readonly facility_name: string;
  readonly time_zone: string;
  readonly unit_system: 'metric' | 'us-customary';
};

/** Who is signed in, where, until when, and what they may do. */
export async function getSession(db: Db, signIn: SignIn, now: Date): Promise<SessionResponse> {
  const rows = await db('people')
    .join('memberships', 'memberships.person_id', 'people.id')
    .join('facilities', 'facilities.id', 'memberships.facility_id')
    .where({ 'people.id': signIn.personId })
    .whereRaw('(memberships.expires_at is null or memberships.expires_at > ?)', [now])
    .orderBy(['facilities.name', 'facilities.id'])
    .select<SessionRow[]>(
      'people.id as person_id',
      'people.display_name',
      'people.initials',
      'people.staff_number',
      'people.must_change_password',
      db.raw('people.badge_code is not null as has_badge'),
      db.raw('people.pin_hash is not null as has_pin'),
      'memberships.role',
      'memberships.expires_at',
      'facilities.id as facility_id',
      'facilities.name as facility_name',
      'facilities.time_zone',
      'facilities.unit_system',
    );
  const here = rows.find((row) => row.facility_id === signIn.facilityId);
  if (!here) throw new Error('somebody is signed in where they do not belong');
  const endMs = sessionEndMs(signIn);
  return {
    person: {
      id: here.person_id,
      displayName: here.display_name,
      initials: here.initials,
      staffNumber: here.staff_number,
      role: here.role,
      mustChangePassword: here.must_change_password,
      hasBadge: here.has_badge,
      hasPin: here.has_pin,
    },
    facility: {
      id: here.facility_id,
      name: here.facility_name,
      timeZone: here.time_zone,
      unitSystem: here.unit_system,
    },
    facilities: rows.map((row) => ({ id: row.facility_id, name: row.facility_name })),
    permissions: [...permissionsOf(here.role)],
    idleTimeoutSeconds: idleTimeoutS,
    expiresAt: new Date(Math.min(endMs, here.expires_at?.getTime() ?? endMs)).toISOString(),
  };
}
