import { readScan } from '#domain/label/read-scan';
import type { BadgeSignInRequest, SessionResponse } from '#contract/session';
import type { Services } from '../../http/define-route';
import type { SessionRequest } from '../../http/session';
import { InvalidInput } from '../../platform/errors';
import { sourceOf, subjectOf } from '../../platform/sign-in-tries';
import { admit, judgeSignIn } from './judge-sign-in';
import { getSession } from './session-read-model';
import { findByBadge } from './sign-in-store';
import { takeSignInTry } from './take-sign-in-try';

/** The change of person at a shared station: one request ends the former session and begins the next. */
export async function signInWithBadge(
  services: Services,
  request: SessionRequest,
  { badge, pin }: BadgeSignInRequest,
): Promise<SessionResponse> {
  const scan = readScan(badge);
  if (scan.kind !== 'badge') {
    throw new InvalidInput('session.not-a-badge', 'This is not a badge. Scan the code on your badge.');
  }
  const tryId = await takeSignInTry(services, {
    by: 'badge',
    subject: subjectOf('badge', scan.code),
    source: sourceOf(request.ip),
    findPerson: () => findByBadge(services.db, scan.code),
  });
  const person = await findByBadge(services.db, scan.code);
  const admitted = await judgeSignIn(services, {
    by: 'badge',
    tryId,
    person,
    kept: person?.pinHash ?? null,
    secret: pin,
    sentence: 'Badge and PIN do not belong together. Scan again and type your PIN.',
  });
  const signIn = await admit(services, request, admitted, 'badge');
  return getSession(services.db, signIn, services.clock.now());
}
