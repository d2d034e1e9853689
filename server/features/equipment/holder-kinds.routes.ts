import {
  addHolderKindRequestSchema,
  changeHolderKindRequestSchema,
  equipmentListQuerySchema,
  holderKindListResponseSchema,
  holderKindParamsSchema,
  holderKindSchema,
} from '#contract/equipment';
import { paths } from '#contract/paths';
import { defineRoute, type Route } from '../../http/define-route';
import { registerFileRoutes } from '../../http/register-routes';
import { addOne, changeOne } from '../../platform/register/write-one';
import { getHolderKind, listHolderKinds } from './holder-kind-read-model';
import { holderKindRegister } from './holder-kind-register';

const onePath = `${paths.holderKinds}/:holderKindId`;

export const holderKindRoutes: readonly Route[] = [
  ...registerFileRoutes({
    register: holderKindRegister,
    path: paths.holderKinds,
    fileName: 'holder-kinds',
    viewing: 'equipment.view',
    editing: 'equipment.edit',
  }),
  defineRoute({
    method: 'get',
    path: paths.holderKinds,
    permission: 'equipment.view',
    query: equipmentListQuerySchema,
    response: holderKindListResponseSchema,
    handle: ({ services, actor, query }) => listHolderKinds(services.db, actor.facilityId, query),
  }),
  defineRoute({
    method: 'get',
    path: onePath,
    permission: 'equipment.view',
    params: holderKindParamsSchema,
    response: holderKindSchema,
    handle: ({ services, actor, params }) => getHolderKind(services.db, actor.facilityId, params.holderKindId),
  }),
  defineRoute({
    method: 'post',
    path: paths.holderKinds,
    permission: 'equipment.edit',
    body: addHolderKindRequestSchema,
    response: holderKindSchema,
    status: 201,
    handle: ({ services, actor, body: { requestId, ...fields } }) =>
      addOne(
        holderKindRegister,
        { desk: services, actor },
        { requestId, fields, view: (trx, id) => getHolderKind(trx, actor.facilityId, id) },
      ),
  }),
  defineRoute({
    method: 'patch',
    path: onePath,
    permission: 'equipment.edit',
    params: holderKindParamsSchema,
    body: changeHolderKindRequestSchema,
    response: holderKindSchema,
    handle: ({ services, actor, params, body: { requestId, version, ...changes } }) =>
      changeOne(
        holderKindRegister,
        { desk: services, actor },
        {
          requestId,
          id: params.holderKindId,
          version,
          changes,
          view: (trx, id) => getHolderKind(trx, actor.facilityId, id),
        },
      ),
  }),
];
