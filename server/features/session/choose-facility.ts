import type { ChooseFacilityRequest, SessionResponse } from '#contract/session';
import type { Services } from '../../http/define-route';
import { beginSession, signInOf, type SessionRequest } from '../../http/session';
import type { Actor } from '../../platform/actor';
import { NotFound } from '../../platform/errors';
import { getSession } from './session-read-model';
import { listFacilityIds } from './sign-in-store';

/** Goes on in another facility of this person, perhaps in another role; so under a new session id, and not for longer. */
export async function chooseFacility(
  { db, clock }: Services,
  request: SessionRequest,
  actor: Actor,
  { facilityId }: ChooseFacilityRequest,
): Promise<SessionResponse> {
  const held = signInOf(request);
  if (!held) throw new Error('a signed-in person has a session');
  const now = clock.now();
  const facilityIds = await listFacilityIds(db, actor.personId, now);
  if (!facilityIds.includes(facilityId)) throw new NotFound('facility.none', 'There is no such facility for you.');
  const signIn = { ...held, facilityId, activeAtMs: now.getTime() };
  await beginSession(request, signIn);
  return getSession(db, signIn, now);
}
