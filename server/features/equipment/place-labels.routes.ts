import { placeLabelQuerySchema } from '#contract/equipment';
import { paths } from '#contract/paths';
import { defineRoute, type Route } from '../../http/define-route';
import { printPlaceLabels } from './print-place-labels';

export const placeLabelRoutes: readonly Route[] = [
  defineRoute({
    method: 'get',
    path: paths.placeLabels,
    permission: 'equipment.view',
    query: placeLabelQuerySchema,
    response: 'file',
    handle: async ({ services, actor, query }) => ({
      file: await printPlaceLabels(services.db, { facilityId: actor.facilityId, at: services.clock.now(), query }),
      mediaType: 'application/pdf' as const,
      name: 'place-labels.pdf',
    }),
  }),
];
