import { paths } from '#contract/paths';
import {
  addRunRequestSchema,
  addRunResponseSchema,
  changeRunRequestSchema,
  changeRunResponseSchema,
  dropRunRequestSchema,
  dropRunResponseSchema,
  removePackagesResponseSchema,
  runDetailSchema,
  runListQuerySchema,
  runListResponseSchema,
  runParamsSchema,
  stagePackagesRequestSchema,
  stagePackagesResponseSchema,
  stagingScanRequestSchema,
  stagingScanResponseSchema,
} from '#contract/runs';
import { defineRoute, type Route } from '../../http/define-route';
import { NotFound } from '../../platform/errors';
import { addRun } from './add-run';
import { changeRun } from './change-run';
import { facilityDay } from '../../platform/facility-day';
import { listStagedPackages } from './package-read-model';
import { findRunSummary, listRuns } from './run-read-model';
import { scanIntoRun } from './scan-into-run';
import { dropRun, removePackages, stagePackages } from './stage-packages';

export const runRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: paths.runs,
    permission: 'package.view',
    query: runListQuerySchema,
    response: runListResponseSchema,
    handle: async ({ services, actor, query }) => ({
      runs: await listRuns(services.db, actor.facilityId, query.state),
    }),
  }),
  defineRoute({
    method: 'post',
    path: paths.runs,
    permission: 'package.stage',
    body: addRunRequestSchema,
    response: addRunResponseSchema,
    status: 201,
    handle: ({ services, actor, body }) => addRun(services, actor, body),
  }),
  defineRoute({
    method: 'get',
    path: '/api/runs/:runId',
    permission: 'package.view',
    params: runParamsSchema,
    response: runDetailSchema,
    async handle({ services: { db, clock }, actor, params }) {
      const run = await findRunSummary(db, actor.facilityId, params.runId);
      if (!run) throw new NotFound('run.none', 'There is no such run here.');
      const { day } = await facilityDay(db, actor.facilityId, clock.now());
      return { run, packages: await listStagedPackages(db, run.id, day) };
    },
  }),
  defineRoute({
    method: 'patch',
    path: '/api/runs/:runId',
    permission: 'package.stage',
    params: runParamsSchema,
    body: changeRunRequestSchema,
    response: changeRunResponseSchema,
    handle: ({ services, actor, params, body }) => changeRun(services, actor, params.runId, body),
  }),
  defineRoute({
    method: 'post',
    path: '/api/runs/:runId/packages',
    permission: 'package.stage',
    params: runParamsSchema,
    body: stagePackagesRequestSchema,
    response: stagePackagesResponseSchema,
    handle: ({ services, actor, params, body }) => stagePackages(services, actor, params.runId, body),
  }),
  defineRoute({
    method: 'post',
    path: '/api/runs/:runId/remove',
    permission: 'package.stage',
    params: runParamsSchema,
    body: stagePackagesRequestSchema,
    response: removePackagesResponseSchema,
    handle: ({ services, actor, params, body }) => removePackages(services, actor, params.runId, body),
  }),
  defineRoute({
    method: 'post',
    path: '/api/runs/:runId/scan',
    permission: 'package.stage',
    params: runParamsSchema,
    body: stagingScanRequestSchema,
    response: stagingScanResponseSchema,
    handle: ({ services, actor, params, body }) => scanIntoRun(services, actor, params.runId, body),
  }),
  defineRoute({
    method: 'post',
    path: '/api/runs/:runId/drop',
    permission: 'package.stage',
    params: runParamsSchema,
    body: dropRunRequestSchema,
    response: dropRunResponseSchema,
    handle: ({ services, actor, params, body }) => dropRun(services, actor, params.runId, body),
  }),
];
