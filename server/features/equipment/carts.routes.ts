import {
  addCartRequestSchema,
  changeCartRequestSchema,
  equipmentListQuerySchema,
  cartListResponseSchema,
  cartParamsSchema,
  cartSchema,
} from '#contract/equipment';
import { paths } from '#contract/paths';
import { defineRoute, type Route } from '../../http/define-route';
import { registerFileRoutes } from '../../http/register-routes';
import { addOne, changeOne } from '../../platform/register/write-one';
import { cartFileRegister } from './cart-file-register';
import { getCart, listCarts } from './cart-read-model';
import { cartRegister } from './cart-register';

const onePath = `${paths.carts}/:cartId`;

export const cartRoutes: readonly Route[] = [
  ...registerFileRoutes({
    register: cartFileRegister,
    path: paths.carts,
    fileName: 'carts',
    viewing: 'equipment.view',
    editing: 'equipment.edit',
  }),
  defineRoute({
    method: 'get',
    path: paths.carts,
    permission: 'equipment.view',
    query: equipmentListQuerySchema,
    response: cartListResponseSchema,
    handle: ({ services, actor, query }) => listCarts(services.db, actor.facilityId, query),
  }),
  defineRoute({
    method: 'get',
    path: onePath,
    permission: 'equipment.view',
    params: cartParamsSchema,
    response: cartSchema,
    handle: ({ services, actor, params }) => getCart(services.db, actor.facilityId, params.cartId),
  }),
  defineRoute({
    method: 'post',
    path: paths.carts,
    permission: 'equipment.edit',
    body: addCartRequestSchema,
    response: cartSchema,
    status: 201,
    handle: ({ services, actor, body: { requestId, ...fields } }) =>
      addOne(
        cartRegister,
        { desk: services, actor },
        { requestId, fields, view: (trx, id) => getCart(trx, actor.facilityId, id) },
      ),
  }),
  defineRoute({
    method: 'patch',
    path: onePath,
    permission: 'equipment.edit',
    params: cartParamsSchema,
    body: changeCartRequestSchema,
    response: cartSchema,
    handle: ({ services, actor, params, body: { requestId, version, ...changes } }) =>
      changeOne(
        cartRegister,
        { desk: services, actor },
        { requestId, id: params.cartId, version, changes, view: (trx, id) => getCart(trx, actor.facilityId, id) },
      ),
  }),
];
