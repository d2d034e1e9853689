import { normalizeStaffNumber } from '#domain/people/staff-number';
import type { SessionResponse } from '#contract/session';
import type { Request } from 'express';
import { Strategy as LocalStrategy } from 'passport-local';
import type { Services } from '../../http/define-route';
import { authenticate } from '../../http/session';
import { NotSignedIn } from '../../platform/errors';
import { sourceOf, subjectOf, takeTry } from '../../platform/sign-in-tries';
import { admit, judgeSignIn, type AdmittedPerson } from './judge-sign-in';
import { getSession } from './session-read-model';
import { findByStaffNumber } from './sign-in-store';

const refusal = 'Staff number and password do not belong together. Check both and try again.';

/** Staff number and password, the only factor: long, throttled, and never told apart in the answer. */
export async function signInWithPassword(services: Services, request: Request): Promise<SessionResponse> {
  const strategy = new LocalStrategy(
    { usernameField: 'staffNumber', passwordField: 'password', session: false },
    (staffNumber, password, done) => {
      judge(services, { staffNumber, password, address: request.ip }).then(
        (person) => {
          done(null, person);
        },
        (error: unknown) => {
          done(error);
        },
      );
    },
  );
  const person = (await authenticate(request, strategy)) as AdmittedPerson | null;
  if (!person) throw new NotSignedIn('session.refused', refusal);
  const signIn = await admit(services, request, person, 'password');
  return getSession(services.db, signIn, services.clock.now());
}

async function judge(
  services: Services,
  {
    staffNumber,
    password,
    address,
  }: { readonly staffNumber: string; readonly password: string; readonly address: string | undefined },
): Promise<AdmittedPerson> {
  const number = normalizeStaffNumber(staffNumber);
  const tryId = await takeTry(services, { subject: subjectOf('staff-number', number), source: sourceOf(address) });
  const person = await findByStaffNumber(services.db, number);
  return judgeSignIn(services, {
    by: 'password',
    tryId,
    person,
    kept: person?.passwordHash ?? null,
    secret: password,
    sentence: refusal,
  });
}
