import { idSchema } from '#contract/common';
import { isPermitted } from '#domain/access/role-matrix';
import { paths } from '#contract/paths';
import {
  addPersonRequestSchema,
  addPersonResponseSchema,
  changePersonRequestSchema,
  joinPersonRequestSchema,
  oneTimePasswordResponseSchema,
  peopleQuerySchema,
  peopleResponseSchema,
  personActRequestSchema,
  personResponseSchema,
  pinResponseSchema,
} from '#contract/people';
import { z } from 'zod';
import { defineRoute, type Route } from '../../http/define-route';
import { isPasswordSignIn, requirePasswordSignIn } from '../../http/session';
import { addPerson, joinPerson } from './add-person';
import { changePerson } from './change-person';
import { listPeople } from './people-read-model';
import { printBadge } from './print-badge';
import { giveOneTimePassword, givePin } from './reset-secrets';

const personParams = z.object({ personId: idSchema });
const one = paths.person(':personId');

export const peopleRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: paths.people,
    permission: 'people.view',
    query: peopleQuerySchema,
    response: peopleResponseSchema,
    handle: async ({ services, actor, query, request }) => ({
      people: await listPeople(services.db, actor, {
        query,
        now: services.clock.now(),
        // A badge is half of a key, and the PIN of who came in by one may have been watched.
        mayShowBadges: isPermitted(actor.role, 'people.edit') && isPasswordSignIn(request),
      }),
    }),
  }),
  defineRoute({
    method: 'post',
    path: paths.people,
    permission: 'people.edit',
    body: addPersonRequestSchema,
    response: addPersonResponseSchema,
    status: 201,
    handle: ({ services, actor, body, request }) => {
      requirePasswordSignIn(request);
      return addPerson(services, actor, body);
    },
  }),
  defineRoute({
    method: 'post',
    path: paths.peopleJoin,
    permission: 'people.edit',
    body: joinPersonRequestSchema,
    response: personResponseSchema,
    status: 201,
    handle: ({ services, actor, body, request }) => {
      requirePasswordSignIn(request);
      return joinPerson(services, actor, body);
    },
  }),
  defineRoute({
    method: 'patch',
    path: one,
    permission: 'people.edit',
    params: personParams,
    body: changePersonRequestSchema,
    response: personResponseSchema,
    handle: ({ services, actor, params, body, request }) => {
      requirePasswordSignIn(request);
      return changePerson(services, actor, params.personId, body);
    },
  }),
  defineRoute({
    method: 'get',
    path: paths.personBadge(':personId'),
    permission: 'people.edit',
    params: personParams,
    response: 'file',
    handle: ({ services, actor, params, request }) => {
      requirePasswordSignIn(request);
      return printBadge(services, actor, params.personId);
    },
  }),
  defineRoute({
    method: 'post',
    path: `${one}/one-time-password`,
    permission: 'people.edit',
    params: personParams,
    body: personActRequestSchema,
    response: oneTimePasswordResponseSchema,
    handle: ({ services, actor, params, body, request }) => {
      requirePasswordSignIn(request);
      return giveOneTimePassword(services, actor, params.personId, body);
    },
  }),
  defineRoute({
    method: 'post',
    path: `${one}/pin`,
    permission: 'people.edit',
    params: personParams,
    body: personActRequestSchema,
    response: pinResponseSchema,
    handle: ({ services, actor, params, body, request }) => {
      requirePasswordSignIn(request);
      return givePin(services, actor, params.personId, body);
    },
  }),
];
