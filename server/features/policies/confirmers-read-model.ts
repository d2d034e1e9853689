import { rolesPermitted } from '#domain/access/role-matrix';
import type { Transaction } from '../../platform/db';

/** Whether anybody but this person could confirm a change of policy in the facility now. */
export async function canOthersConfirm(
  trx: Transaction,
  { facilityId, personId, now }: { readonly facilityId: string; readonly personId: string; readonly now: Date },
): Promise<boolean> {
  const other = await trx('memberships')
    .join('people', 'people.id', 'memberships.person_id')
    .where({ 'memberships.facility_id': facilityId, 'people.is_disabled': false })
    .whereNot('memberships.person_id', personId)
    .whereIn('memberships.role', [...rolesPermitted('policy.confirm')])
    .whereRaw('(memberships.expires_at is null or memberships.expires_at > ?)', [now])
    .first<{ person_id: string } | undefined>('memberships.person_id');
  return other !== undefined;
}
