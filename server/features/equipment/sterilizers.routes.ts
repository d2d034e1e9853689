import {
  addSterilizerRequestSchema,
  changeSterilizerRequestSchema,
  equipmentListQuerySchema,
  sterilizerListResponseSchema,
  sterilizerParamsSchema,
  sterilizerSchema,
} from '#contract/equipment';
import { paths } from '#contract/paths';
import { defineRoute, type Route } from '../../http/define-route';
import { registerFileRoutes } from '../../http/register-routes';
import { addOne, changeOne } from '../../platform/register/write-one';
import { getSterilizer, listSterilizers } from './sterilizer-read-model';
import { sterilizerRegister } from './sterilizer-register';

const onePath = `${paths.sterilizers}/:sterilizerId`;

export const sterilizerRoutes: readonly Route[] = [
  ...registerFileRoutes({
    register: sterilizerRegister,
    path: paths.sterilizers,
    fileName: 'sterilizers',
    viewing: 'equipment.view',
    editing: 'equipment.edit',
  }),
  defineRoute({
    method: 'get',
    path: paths.sterilizers,
    permission: 'equipment.view',
    query: equipmentListQuerySchema,
    response: sterilizerListResponseSchema,
    handle: ({ services, actor, query }) =>
      listSterilizers(services.db, { facilityId: actor.facilityId, at: services.clock.now(), filters: query }),
  }),
  defineRoute({
    method: 'get',
    path: onePath,
    permission: 'equipment.view',
    params: sterilizerParamsSchema,
    response: sterilizerSchema,
    handle: ({ services, actor, params }) =>
      getSterilizer(services.db, {
        facilityId: actor.facilityId,
        sterilizerId: params.sterilizerId,
        at: services.clock.now(),
      }),
  }),
  defineRoute({
    method: 'post',
    path: paths.sterilizers,
    permission: 'equipment.edit',
    body: addSterilizerRequestSchema,
    response: sterilizerSchema,
    status: 201,
    handle: ({ services, actor, body: { requestId, ...fields } }) =>
      addOne(
        sterilizerRegister,
        { desk: services, actor },
        {
          requestId,
          fields,
          view: (trx, id) =>
            getSterilizer(trx, { facilityId: actor.facilityId, sterilizerId: id, at: services.clock.now() }),
        },
      ),
  }),
  defineRoute({
    method: 'patch',
    path: onePath,
    permission: 'equipment.edit',
    params: sterilizerParamsSchema,
    body: changeSterilizerRequestSchema,
    response: sterilizerSchema,
    handle: ({ services, actor, params, body: { requestId, version, ...changes } }) =>
      changeOne(
        sterilizerRegister,
        { desk: services, actor },
        {
          requestId,
          id: params.sterilizerId,
          version,
          changes,
          view: (trx, id) =>
            getSterilizer(trx, { facilityId: actor.facilityId, sterilizerId: id, at: services.clock.now() }),
        },
      ),
  }),
];
