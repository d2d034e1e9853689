import {
  airRemovalTestListQuerySchema,
  airRemovalTestListResponseSchema,
  recordAirRemovalTestRequestSchema,
  recordAirRemovalTestResponseSchema,
} from '#contract/air-removal-tests';
import { paths } from '#contract/paths';
import { defineRoute, type Route } from '../../http/define-route';
import { listAirRemovalTests } from './air-removal-test-read-model';
import { facilityDay } from '../../platform/facility-day';
import { listPossibleReaders, recordAirRemovalTest } from './record-air-removal-test';

export const airRemovalTestRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: paths.airRemovalTests,
    permission: 'equipment.view',
    query: airRemovalTestListQuerySchema,
    response: airRemovalTestListResponseSchema,
    handle: async ({ services, actor, query }) => {
      const now = services.clock.now();
      return {
        ...(await listAirRemovalTests(services.db, actor.facilityId, query)),
        today: (await facilityDay(services.db, actor.facilityId, now)).day,
        readers: await listPossibleReaders(services.db, actor.facilityId, now),
      };
    },
  }),
  defineRoute({
    method: 'post',
    path: paths.airRemovalTests,
    permission: 'air-removal-test.record',
    body: recordAirRemovalTestRequestSchema,
    response: recordAirRemovalTestResponseSchema,
    status: 201,
    handle: ({ services, actor, body }) => recordAirRemovalTest({ ...services, actor }, body),
  }),
];
