import { normalizeStaffNumber } from '#domain/people/staff-number';
import type { SessionResponse } from '#contract/session';
import type { Services } from '../../http/define-route';
import { authenticateWithPassword, type SessionRequest } from '../../http/session';
import { sourceOf, subjectOf } from '../../platform/sign-in-tries';
import { admit, judgeSignIn } from './judge-sign-in';
import { getSession } from './session-read-model';
import { findByStaffNumber } from './sign-in-store';
import { takeSignInTry } from './take-sign-in-try';

/** Staff number and password, the only factor: long, throttled, and never told apart in the answer. */
export async function signInWithPassword(services: Services, request: SessionRequest): Promise<SessionResponse> {
  const admitted = await authenticateWithPassword(request, async (staffNumber, password) => {
    const number = normalizeStaffNumber(staffNumber);
    const tryId = await takeSignInTry(services, {
      by: 'password',
      subject: subjectOf('staff-number', number),
      source: sourceOf(request.ip),
      findPerson: () => findByStaffNumber(services.db, number),
    });
    const person = await findByStaffNumber(services.db, number);
    return judgeSignIn(services, {
      by: 'password',
      tryId,
      person,
      kept: person?.passwordHash ?? null,
      secret: password,
      sentence: 'Staff number and password do not belong together. Check both and try again.',
    });
  });
  const signIn = await admit(services, request, admitted, 'password');
  return getSession(services.db, signIn, services.clock.now());
}
