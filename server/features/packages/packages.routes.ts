import {
  identifyRequestSchema,
  identifyResponseSchema,
  labelSheetParamsSchema,
  labelSheetQuerySchema,
  packageDetailSchema,
  packageListQuerySchema,
  packageListResponseSchema,
  packageParamsSchema,
  packagesPerPage,
  packRequestSchema,
  packResponseSchema,
  printLabelsRequestSchema,
  printLabelsResponseSchema,
} from '#contract/packages';
import { paths } from '#contract/paths';
import { parsePackageCode } from '#domain/label/package-code';
import { defineRoute, type Route } from '../../http/define-route';
import { registerFileRoutes } from '../../http/register-routes';
import { drawLabelBatch } from './draw-label-batch';
import { facilityDay } from '../../platform/facility-day';
import { getPackage } from './get-package';
import { identifyScan } from './identify-scan';
import { packItem } from './pack-item';
import { listPackages } from './package-read-model';
import { packageRegister } from './package-register';
import { printLabels } from './print-labels';
import { runRoutes } from './runs.routes';
import { todayRoutes } from './today.routes';

export const packageRoutes: readonly Route[] = [
  ...registerFileRoutes({
    register: packageRegister,
    path: paths.packages,
    fileName: 'packages',
    viewing: 'package.view',
    editing: 'package.pack',
  }),
  defineRoute({
    method: 'get',
    path: paths.packages,
    permission: 'package.view',
    query: packageListQuerySchema,
    response: packageListResponseSchema,
    async handle({ services: { db, clock }, actor, query }) {
      const { search, itemId, state, runId, page = 1 } = query;
      const { day } = await facilityDay(db, actor.facilityId, clock.now());
      const parsed = search === undefined ? undefined : parsePackageCode(search);
      const code = parsed?.ok === true ? parsed.value.code : undefined;
      const filters = { search, code, itemId, state, runId };
      const found = await listPackages(db, actor.facilityId, filters, { page, perPage: packagesPerPage, today: day });
      return { ...found, page };
    },
  }),
  defineRoute({
    method: 'post',
    path: paths.packages,
    permission: 'package.pack',
    body: packRequestSchema,
    response: packResponseSchema,
    status: 201,
    handle: ({ services, actor, body }) => packItem(services, actor, body),
  }),
  defineRoute({
    method: 'post',
    path: paths.packageIdentify,
    permission: 'package.pack',
    body: identifyRequestSchema,
    response: identifyResponseSchema,
    handle: ({ services, actor, body }) => identifyScan(services, actor, body.raw),
  }),
  defineRoute({
    method: 'post',
    path: paths.packageLabels,
    permission: 'package.print-labels',
    body: printLabelsRequestSchema,
    response: printLabelsResponseSchema,
    status: 201,
    handle: ({ services, actor, body }) => printLabels(services, actor, body),
  }),
  defineRoute({
    method: 'get',
    path: '/api/packages/labels/:batchId',
    permission: 'package.print-labels',
    params: labelSheetParamsSchema,
    query: labelSheetQuerySchema,
    response: 'file',
    handle: ({ services, actor, params, query }) => drawLabelBatch(services, actor, params.batchId, query.layout),
  }),
  defineRoute({
    method: 'get',
    path: '/api/packages/:packageRef',
    permission: 'package.view',
    params: packageParamsSchema,
    response: packageDetailSchema,
    handle: ({ services, actor, params }) => getPackage(services, actor, params.packageRef),
  }),
  ...runRoutes,
  ...todayRoutes,
];
