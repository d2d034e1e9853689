import { idSchema } from '#contract/common';
import { judgedAgainSchema } from '#contract/judged-again';
import {
  abandonLoadRequestSchema,
  acceptFindingRequestSchema,
  closeLoadResponseSchema,
  countShelfRequestSchema,
  editLoadRequestSchema,
  loadActRequestSchema,
  loadChangeResponseSchema,
  loadDetailSchema,
  loadHistorySchema,
  loadListQuerySchema,
  loadListResponseSchema,
  loadOpeningOptionsSchema,
  openLoadRequestSchema,
  openLoadResponseSchema,
  printStickersRequestSchema,
  printStickersResponseSchema,
  scanRequestSchema,
  scanResponseSchema,
  undoRequestSchema,
} from '#contract/loads';
import { paths } from '#contract/paths';
import { z } from 'zod';
import { defineRoute } from '../../http/define-route';
import { abandonLoad } from './abandon-load';
import { acceptFinding } from './accept-finding';
import { closeLoad } from './close-load';
import { countShelf } from './count-shelf';
import { editLoad } from './edit-load';
import { getLoadDetail } from './get-load-detail';
import { getOpeningOptions } from './get-opening-options';
import { judgeAgain } from './judge-again';
import { listLoadHistory } from './load-history-read-model';
import { listLoads } from './load-list-read-model';
import { getLoad } from './load-store';
import { openLoad } from './open-load';
import { drawStickerBatch, printStickers } from './print-stickers';
import { scanIntoLoad } from './scan-into-load';
import { undoLastAct } from './undo-last-act';

const loadParams = z.object({ loadId: idSchema });
const one = paths.load(':loadId');

export const loadRoutes = [
  defineRoute({
    method: 'get',
    path: paths.loads,
    permission: 'load.view',
    query: loadListQuerySchema,
    response: loadListResponseSchema,
    handle: ({ services, actor, query }) => listLoads(services.db, actor.facilityId, query),
  }),
  defineRoute({
    method: 'get',
    path: `${paths.loads}/opening-options`,
    permission: 'load.open',
    response: loadOpeningOptionsSchema,
    handle: ({ services, actor }) => getOpeningOptions(services, actor),
  }),
  defineRoute({
    method: 'post',
    path: paths.loads,
    permission: 'load.open',
    body: openLoadRequestSchema,
    response: openLoadResponseSchema,
    status: 201,
    handle: ({ services, actor, body }) => openLoad(services, actor, body),
  }),
  defineRoute({
    method: 'get',
    path: one,
    permission: 'load.view',
    params: loadParams,
    response: loadDetailSchema,
    handle: ({ services, actor, params }) => getLoadDetail(services, actor, params.loadId),
  }),
  defineRoute({
    method: 'get',
    path: `${one}/history`,
    permission: 'load.view',
    params: loadParams,
    response: loadHistorySchema,
    handle: async ({ services, actor, params }) => {
      const load = await getLoad(services.db, actor.facilityId, params.loadId);
      return { events: await listLoadHistory(services.db, load.id) };
    },
  }),
  defineRoute({
    method: 'get',
    path: paths.loadJudgedAgain(':loadId'),
    permission: 'load.view',
    params: loadParams,
    response: judgedAgainSchema,
    handle: ({ services, actor, params }) => judgeAgain(services, actor, params.loadId),
  }),
  defineRoute({
    method: 'post',
    path: `${one}/scans`,
    permission: 'load.build',
    params: loadParams,
    body: scanRequestSchema,
    response: scanResponseSchema,
    handle: ({ services, actor, params, body }) => scanIntoLoad(services, actor, params.loadId, body),
  }),
  defineRoute({
    method: 'post',
    path: `${one}/edits`,
    permission: 'load.build',
    params: loadParams,
    body: editLoadRequestSchema,
    response: loadChangeResponseSchema,
    handle: ({ services, actor, params, body }) => editLoad(services, actor, params.loadId, body),
  }),
  defineRoute({
    method: 'post',
    path: `${one}/undo`,
    permission: 'load.build',
    params: loadParams,
    body: undoRequestSchema,
    response: loadChangeResponseSchema,
    handle: ({ services, actor, params, body }) => undoLastAct(services, actor, params.loadId, body),
  }),
  defineRoute({
    method: 'post',
    path: `${one}/counts`,
    permission: 'load.build',
    params: loadParams,
    body: countShelfRequestSchema,
    response: loadChangeResponseSchema,
    handle: ({ services, actor, params, body }) => countShelf(services, actor, params.loadId, body),
  }),
  defineRoute({
    method: 'post',
    path: `${one}/acceptances`,
    permission: 'load.accept-finding',
    params: loadParams,
    body: acceptFindingRequestSchema,
    response: loadChangeResponseSchema,
    handle: ({ services, actor, params, body }) => acceptFinding(services, actor, params.loadId, body),
  }),
  defineRoute({
    method: 'post',
    path: `${one}/close`,
    permission: 'load.close',
    params: loadParams,
    body: loadActRequestSchema,
    response: closeLoadResponseSchema,
    handle: ({ services, actor, params, body }) => closeLoad(services, actor, params.loadId, body.requestId),
  }),
  defineRoute({
    method: 'post',
    path: `${one}/abandon`,
    permission: 'load.abandon',
    params: loadParams,
    body: abandonLoadRequestSchema,
    response: 'nothing',
    handle: ({ services, actor, params, body }) => abandonLoad(services, actor, params.loadId, body),
  }),
  defineRoute({
    method: 'post',
    path: `${one}/stickers`,
    permission: 'load.print-stickers',
    params: loadParams,
    body: printStickersRequestSchema,
    response: printStickersResponseSchema,
    handle: ({ services, actor, params, body }) => printStickers(services, actor, params.loadId, body),
  }),
  defineRoute({
    method: 'get',
    path: `${one}/stickers/:batchId`,
    permission: 'load.print-stickers',
    params: loadParams.extend({ batchId: idSchema }),
    response: 'file',
    handle: ({ services, actor, params }) => drawStickerBatch(services.db, actor, params.loadId, params.batchId),
  }),
];
