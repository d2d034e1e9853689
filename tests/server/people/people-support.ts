import type { Db } from '../../../server/platform/db';
import { anId } from '../../support/test-app';

/** A person and their places as the tables hold them, to see that nothing changed. */
export async function rowsOf(db: Db, personId: string): Promise<unknown> {
  return {
    person: await db('people').where({ id: personId }).first<object>(),
    memberships: await db('memberships').where({ person_id: personId }).orderBy('facility_id').select<object[]>(),
  };
}

export async function versionOf(db: Db, personId: string): Promise<number> {
  const row = await db('people').where({ id: personId }).first<{ version: number }>('version');
  return row.version;
}

export function aNewPerson(changes: object = {}): Record<string, unknown> {
  return {
    requestId: anId(),
    staffNumber: 'N4001',
    displayName: 'Ottoline Marsh-Ferreira',
    initials: 'OM',
    role: 'technician',
    usualShift: 'Night',
    expiresAt: null,
    ...changes,
  };
}
