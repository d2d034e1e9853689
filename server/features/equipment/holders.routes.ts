import {
  addHolderRequestSchema,
  changeHolderRequestSchema,
  holderListQuerySchema,
  holderListResponseSchema,
  holderParamsSchema,
  holderSchema,
} from '#contract/equipment';
import { paths } from '#contract/paths';
import { defineRoute, type Route } from '../../http/define-route';
import { registerFileRoutes } from '../../http/register-routes';
import { addOne, changeOne } from '../../platform/register/write-one';
import { getHolder, listHolders } from './holder-read-model';
import { holderRegister } from './holder-register';

const onePath = `${paths.holders}/:holderId`;

export const holderRoutes: readonly Route[] = [
  ...registerFileRoutes({
    register: holderRegister,
    path: paths.holders,
    fileName: 'holders',
    viewing: 'equipment.view',
    editing: 'equipment.edit',
  }),
  defineRoute({
    method: 'get',
    path: paths.holders,
    permission: 'equipment.view',
    query: holderListQuerySchema,
    response: holderListResponseSchema,
    handle: ({ services, actor, query }) => listHolders(services.db, actor.facilityId, query),
  }),
  defineRoute({
    method: 'get',
    path: onePath,
    permission: 'equipment.view',
    params: holderParamsSchema,
    response: holderSchema,
    handle: ({ services, actor, params }) => getHolder(services.db, actor.facilityId, params.holderId),
  }),
  defineRoute({
    method: 'post',
    path: paths.holders,
    permission: 'equipment.edit',
    body: addHolderRequestSchema,
    response: holderSchema,
    status: 201,
    handle: ({ services, actor, body: { requestId, ...fields } }) =>
      addOne(
        holderRegister,
        { desk: services, actor },
        { requestId, fields: { ...fields, placeCode: null }, view: (trx, id) => getHolder(trx, actor.facilityId, id) },
      ),
  }),
  defineRoute({
    method: 'patch',
    path: onePath,
    permission: 'equipment.edit',
    params: holderParamsSchema,
    body: changeHolderRequestSchema,
    response: holderSchema,
    handle: ({ services, actor, params, body: { requestId, version, ...changes } }) =>
      changeOne(
        holderRegister,
        { desk: services, actor },
        { requestId, id: params.holderId, version, changes, view: (trx, id) => getHolder(trx, actor.facilityId, id) },
      ),
  }),
];
