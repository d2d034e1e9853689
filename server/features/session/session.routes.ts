import { paths } from '#contract/paths';
import {
  badgeSignInRequestSchema,
  changePasswordRequestSchema,
  changePinRequestSchema,
  chooseFacilityRequestSchema,
  sessionResponseSchema,
  signInRequestSchema,
} from '#contract/session';
import { defineRoute, type Route } from '../../http/define-route';
import { signInOf } from '../../http/session';
import { changePassword, changePin } from './change-secrets';
import { chooseFacility } from './choose-facility';
import { getSession } from './session-read-model';
import { signInWithBadge } from './sign-in-with-badge';
import { signInWithPassword } from './sign-in-with-password';
import { signOut, signOutEverywhere } from './sign-out';

export const sessionRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: paths.session,
    permission: 'signed-in',
    response: sessionResponseSchema,
    handle: ({ services, request }) => {
      const signIn = signInOf(request);
      if (!signIn) throw new Error('a signed-in person has a session');
      return getSession(services.db, signIn, services.clock.now());
    },
  }),
  defineRoute({
    method: 'post',
    path: paths.session,
    permission: 'public',
    body: signInRequestSchema,
    response: sessionResponseSchema,
    // The strategy reads the fields from the request itself; the schema has refused what it would not understand.
    handle: ({ services, request }) => signInWithPassword(services, request),
  }),
  defineRoute({
    method: 'post',
    path: paths.sessionBadge,
    permission: 'public',
    body: badgeSignInRequestSchema,
    response: sessionResponseSchema,
    handle: ({ services, request, body }) => signInWithBadge(services, request, body),
  }),
  defineRoute({
    method: 'delete',
    path: paths.session,
    permission: 'public',
    response: 'nothing',
    handle: async ({ services, request }) => {
      await signOut(services, request);
      return undefined;
    },
  }),
  defineRoute({
    method: 'post',
    path: paths.signOutEverywhere,
    permission: 'signed-in',
    response: 'nothing',
    handle: async ({ services, request, actor }) => {
      await signOutEverywhere(services, request, actor);
      return undefined;
    },
  }),
  defineRoute({
    method: 'post',
    path: paths.sessionPassword,
    permission: 'signed-in',
    body: changePasswordRequestSchema,
    response: sessionResponseSchema,
    handle: ({ services, request, actor, body }) => changePassword(services, request, actor, body),
  }),
  defineRoute({
    method: 'post',
    path: paths.sessionPin,
    permission: 'signed-in',
    body: changePinRequestSchema,
    response: sessionResponseSchema,
    handle: ({ services, request, actor, body }) => changePin(services, request, actor, body),
  }),
  defineRoute({
    method: 'post',
    path: paths.sessionFacility,
    permission: 'signed-in',
    body: chooseFacilityRequestSchema,
    response: sessionResponseSchema,
    handle: ({ services, request, actor, body }) => chooseFacility(services, request, actor, body),
  }),
];
