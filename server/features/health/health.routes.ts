import { paths } from '#contract/paths';
import { z } from 'zod';
import { defineRoute } from '../../http/define-route';

export const healthRoutes = [
  defineRoute({
    method: 'get',
    path: paths.health,
    permission: 'public',
    response: z.object({ status: z.literal('ok') }),
    handle: async ({ services }) => {
      await services.db.raw('select 1');
      return { status: 'ok' as const };
    },
  }),
];
