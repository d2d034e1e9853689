import { paths } from '#contract/paths';
import {
  sessionResponseSchema,
  type BadgeSignInRequest,
  type ChangePasswordRequest,
  type ChangePinRequest,
  type ChooseFacilityRequest,
  type SessionResponse,
  type SignInRequest,
} from '#contract/session';
import { useMutation, useQueryClient, type Query, type QueryClient } from '@tanstack/react-query';
import { z } from 'zod';
import { api, type CallOptions } from '../../lib/api-client';
import { isProblem } from '../../lib/errors';
import { signedOutGate } from '../../lib/signed-out-gate';
import { sessionQueries } from './queries';

/** A wrong password is answered 401 too, and must not bring up the sheet that asks for one. */
const asksItself: CallOptions = { whenSignedOut: 'throw' };

const anyReplySchema = z.unknown();

function isOfScreens({ queryKey }: Query): boolean {
  return queryKey[0] !== sessionQueries.all[0];
}

/** Somebody is here now: every screen learns who, and shows nothing that another person or place was shown. */
export async function enter(queryClient: QueryClient, session: SessionResponse): Promise<void> {
  const before = queryClient.getQueryData(sessionQueries.current().queryKey);
  if (before !== undefined && before.facility.id !== session.facility.id) {
    queryClient.removeQueries({ predicate: isOfScreens });
  }
  queryClient.setQueryData(sessionQueries.current().queryKey, session);
  signedOutGate.signedIn(session.person.id);
  // What a screen shows may depend on the role, so all of it is asked for again; it stays on screen meanwhile.
  if (before !== undefined && before.person.id !== session.person.id) {
    await queryClient.invalidateQueries({ predicate: isOfScreens });
  }
}

export type Credentials =
  ({ readonly by: 'staff-number' } & SignInRequest) | ({ readonly by: 'badge' } & BadgeSignInRequest);

function signIn(credentials: Credentials): Promise<SessionResponse> {
  return credentials.by === 'badge'
    ? api.post(
        paths.sessionBadge,
        { badge: credentials.badge, pin: credentials.pin } satisfies BadgeSignInRequest,
        sessionResponseSchema,
        asksItself,
      )
    : api.post(
        paths.session,
        { staffNumber: credentials.staffNumber, password: credentials.password } satisfies SignInRequest,
        sessionResponseSchema,
        asksItself,
      );
}

export function useSignIn() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: signIn,
    onSuccess: (session) => enter(queryClient, session),
  });
}

/** Each of these answers with the session as it is afterwards. */
function useSessionChange<Request>(path: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (request: Request) => api.post(path, request, sessionResponseSchema, asksItself),
    onSuccess: (session) => enter(queryClient, session),
  });
}

export function useChangePassword() {
  return useSessionChange<ChangePasswordRequest>(paths.sessionPassword);
}

export function useChangePin() {
  return useSessionChange<ChangePinRequest>(paths.sessionPin);
}

export function useChooseFacility() {
  return useSessionChange<ChooseFacilityRequest>(paths.sessionFacility);
}

/** Ends the sign-in here, or wherever this person is signed in. */
export function useSignOut() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: async (where: 'here' | 'everywhere') => {
      try {
        if (where === 'here') await api.delete(paths.session, undefined, anyReplySchema, asksItself);
        else await api.post(paths.signOutEverywhere, undefined, anyReplySchema, asksItself);
      } catch (error) {
        // The sign-in had ended already, which is what was wanted.
        if (!isProblem(error) || error.httpStatus !== 401) throw error;
      }
    },
    onSuccess: () => {
      leave(queryClient);
    },
  });
}

/** Forgets everything that was shown to the person who leaves. */
export function leave(queryClient: QueryClient): void {
  signedOutGate.leave();
  queryClient.clear();
}
