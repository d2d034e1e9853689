import { existsSync } from 'node:fs';
import path from 'node:path';
import express, { type Express } from 'express';
import helmet from 'helmet';
import type pg from 'pg';
import type { Route, Services } from './http/define-route';
import { mountRoutes } from './http/mount-routes';
import { noSuchRoute, problemMiddleware } from './http/problem-middleware';
import { openSession } from './http/session';
import { healthRoutes } from './features/health/health.routes';
import { sessionRoutes } from './features/session/session.routes';
import { peopleRoutes } from './features/people/people.routes';
import { itemRoutes } from './features/items/items.routes';
import { equipmentRoutes } from './features/equipment/equipment.routes';
import { packageRoutes } from './features/packages/packages.routes';
import { loadRoutes } from './features/loads/loads.routes';
import { lessonRoutes } from './features/lessons/lessons.routes';
import { policyRoutes } from './features/policies/policies.routes';

/** Every route there is. Tests walk this list to see that each names its permission. */
export const routes: readonly Route[] = [
  ...healthRoutes,
  ...sessionRoutes,
  ...peopleRoutes,
  ...itemRoutes,
  ...equipmentRoutes,
  ...packageRoutes,
  ...loadRoutes,
  ...lessonRoutes,
  ...policyRoutes,
];

export type AppSettings = {
  readonly sessionPool: pg.Pool;
  readonly sessionSecret: string;
  readonly isCookieSecure: boolean;
  readonly trustProxy: string | number | null;
  readonly clientDir: string | null;
};

/** The composition root: hands the services to the routes and puts the built client behind them. */
export function createApp(services: Services, settings: AppSettings): Express {
  const app = express();
  app.disable('x-powered-by');
  app.set('query parser', 'simple');
  if (settings.trustProxy !== null) app.set('trust proxy', settings.trustProxy);
  app.use(
    helmet({
      contentSecurityPolicy: {
        directives: {
          'script-src': ["'self'", "'wasm-unsafe-eval'"],
          'style-src': ["'self'", "'unsafe-inline'"],
          'img-src': ["'self'", 'data:', 'blob:'],
          'media-src': ["'self'", 'blob:'],
          'frame-src': ["'self'", 'blob:'],
          'worker-src': ["'self'", 'blob:'],
          'upgrade-insecure-requests': null,
        },
      },
      // Departments reach this over plain http on their own network; whoever puts TLS in front sets this there.
      strictTransportSecurity: false,
    }),
  );
  app.use('/api', express.json({ limit: '256kb' }));
  const session = openSession(services, settings);
  app.use('/api', session.middleware);
  mountRoutes(app, routes, services, session.resolveActor);
  app.use('/api', noSuchRoute);
  serveClient(app, settings.clientDir);
  app.use(problemMiddleware(services.logger));
  return app;
}

function serveClient(app: Express, clientDir: string | null): void {
  if (clientDir === null || !existsSync(path.join(clientDir, 'index.html'))) return;
  app.use(
    '/assets',
    express.static(path.join(clientDir, 'assets'), { immutable: true, maxAge: '1y', fallthrough: false }),
  );
  app.use(express.static(clientDir, { index: false, maxAge: 0 }));
  app.get('/{*page}', (_request, response) => {
    response.set('cache-control', 'no-cache').sendFile('index.html', { root: clientDir });
  });
}
