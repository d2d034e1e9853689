import {
  addProgramRequestSchema,
  changeProgramRequestSchema,
  equipmentListQuerySchema,
  programListResponseSchema,
  programParamsSchema,
  programSchema,
} from '#contract/equipment';
import { paths } from '#contract/paths';
import { defineRoute, type Route } from '../../http/define-route';
import { registerFileRoutes } from '../../http/register-routes';
import { addOne, changeOne } from '../../platform/register/write-one';
import { getProgram, listPrograms } from './program-read-model';
import { programRegister } from './program-register';

const onePath = `${paths.programs}/:programId`;

export const programRoutes: readonly Route[] = [
  ...registerFileRoutes({
    register: programRegister,
    path: paths.programs,
    fileName: 'programs',
    viewing: 'equipment.view',
    editing: 'equipment.edit',
  }),
  defineRoute({
    method: 'get',
    path: paths.programs,
    permission: 'equipment.view',
    query: equipmentListQuerySchema,
    response: programListResponseSchema,
    handle: ({ services, actor, query }) => listPrograms(services.db, actor.facilityId, query),
  }),
  defineRoute({
    method: 'get',
    path: onePath,
    permission: 'equipment.view',
    params: programParamsSchema,
    response: programSchema,
    handle: ({ services, actor, params }) => getProgram(services.db, actor.facilityId, params.programId),
  }),
  defineRoute({
    method: 'post',
    path: paths.programs,
    permission: 'equipment.edit',
    body: addProgramRequestSchema,
    response: programSchema,
    status: 201,
    handle: ({ services, actor, body: { requestId, ...fields } }) =>
      addOne(
        programRegister,
        { desk: services, actor },
        { requestId, fields, view: (trx, id) => getProgram(trx, actor.facilityId, id) },
      ),
  }),
  defineRoute({
    method: 'patch',
    path: onePath,
    permission: 'equipment.edit',
    params: programParamsSchema,
    body: changeProgramRequestSchema,
    response: programSchema,
    handle: ({ services, actor, params, body: { requestId, version, ...changes } }) =>
      changeOne(
        programRegister,
        { desk: services, actor },
        { requestId, id: params.programId, version, changes, view: (trx, id) => getProgram(trx, actor.facilityId, id) },
      ),
  }),
];
