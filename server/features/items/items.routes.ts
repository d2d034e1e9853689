import {
  addItemRequestSchema,
  changeItemRequestSchema,
  itemListQuerySchema,
  itemListResponseSchema,
  itemParamsSchema,
  itemSchema,
} from '#contract/items';
import { paths } from '#contract/paths';
import { defineRoute, type Route } from '../../http/define-route';
import { registerFileRoutes } from '../../http/register-routes';
import { addOne, changeOne } from '../../platform/register/write-one';
import { getItem, listItems } from './item-list-read-model';
import { itemRegister } from './item-register';

const onePath = `${paths.items}/:itemId`;

export const itemRoutes: readonly Route[] = [
  ...registerFileRoutes({
    register: itemRegister,
    path: paths.items,
    fileName: 'items',
    viewing: 'item.view',
    editing: 'item.edit',
  }),
  defineRoute({
    method: 'get',
    path: paths.items,
    permission: 'item.view',
    query: itemListQuerySchema,
    response: itemListResponseSchema,
    handle: ({ services, actor, query }) => listItems(services.db, actor.facilityId, query),
  }),
  defineRoute({
    method: 'get',
    path: onePath,
    permission: 'item.view',
    params: itemParamsSchema,
    response: itemSchema,
    handle: ({ services, actor, params }) => getItem(services.db, actor.facilityId, params.itemId),
  }),
  defineRoute({
    method: 'post',
    path: paths.items,
    permission: 'item.edit',
    body: addItemRequestSchema,
    response: itemSchema,
    status: 201,
    handle: ({ services, actor, body: { requestId, ...fields } }) =>
      addOne(
        itemRegister,
        { desk: services, actor },
        { requestId, fields, view: (trx, id) => getItem(trx, actor.facilityId, id) },
      ),
  }),
  defineRoute({
    method: 'patch',
    path: onePath,
    permission: 'item.edit',
    params: itemParamsSchema,
    body: changeItemRequestSchema,
    response: itemSchema,
    handle: ({ services, actor, params, body: { requestId, version, ...changes } }) =>
      changeOne(
        itemRegister,
        { desk: services, actor },
        { requestId, id: params.itemId, version, changes, view: (trx, id) => getItem(trx, actor.facilityId, id) },
      ),
  }),
];
