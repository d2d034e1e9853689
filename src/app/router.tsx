import type { QueryClient } from '@tanstack/react-query';
import type { ComponentType } from 'react';
import { createBrowserRouter, Navigate, redirect, type LoaderFunction, type RouteObject } from 'react-router-dom';
import { sessionQueries } from '../features/session/queries';
import { isProblem } from '../lib/errors';
import { Frame } from './frame';
import { NotFound } from './not-found';
import { RequirePermission } from './require-permission';
import { RouteError } from './route-error';
import { Starting } from './starting';

/** What a file in `routes/` exports. The loader is made with the query client: `queryClient.query({ ...options, staleTime: 'static' })`. */
export type RouteModule = {
  readonly Component: ComponentType;
  readonly loader?: (queryClient: QueryClient) => LoaderFunction;
  readonly ErrorBoundary?: ComponentType;
};

function lazily(queryClient: QueryClient, load: () => Promise<RouteModule>): NonNullable<RouteObject['lazy']> {
  return async () => {
    const { Component, loader, ErrorBoundary } = await load();
    return {
      Component,
      ...(loader ? { loader: loader(queryClient) } : {}),
      ...(ErrorBoundary ? { ErrorBoundary } : {}),
    };
  };
}

/** Lets only people who are signed in past; remembers where the others wanted to go. */
function requireSession(queryClient: QueryClient): LoaderFunction {
  return async ({ request }) => {
    try {
      const session = await queryClient.query({ ...sessionQueries.current(), staleTime: 'static' });
      return session.person.mustChangePassword ? redirect('/new-password') : null;
    } catch (error) {
      if (!isProblem(error) || error.httpStatus !== 401) throw error;
      const { pathname, search } = new URL(request.url);
      const wanted = pathname + search;
      return redirect(wanted === '/' ? '/sign-in' : `/sign-in?next=${encodeURIComponent(wanted)}`);
    }
  };
}

export function createRoutes(queryClient: QueryClient): RouteObject[] {
  const lazyRoute = (load: () => Promise<RouteModule>) => ({ lazy: lazily(queryClient, load) });
  return [
    {
      path: '/sign-in',
      HydrateFallback: Starting,
      ErrorBoundary: RouteError,
      ...lazyRoute(() => import('./routes/sign-in')),
    },
    {
      path: '/new-password',
      HydrateFallback: Starting,
      ErrorBoundary: RouteError,
      ...lazyRoute(() => import('./routes/new-password')),
    },
    ...(import.meta.env.DEV ? [{ path: '/style', ...lazyRoute(() => import('./routes/style')) }] : []),
    {
      path: '/',
      Component: Frame,
      HydrateFallback: Starting,
      ErrorBoundary: RouteError,
      loader: requireSession(queryClient),
      // The session is in the query cache; nothing a screen does makes it worth asking for again here.
      shouldRevalidate: () => false,
      children: [
        {
          ErrorBoundary: RouteError,
          children: [
            { index: true, ...lazyRoute(() => import('./routes/today')) },
            {
              element: <RequirePermission any={['load.view']} />,
              children: [
                { path: 'loads', ...lazyRoute(() => import('./routes/loads')) },
                { path: 'loads/:loadId', ...lazyRoute(() => import('./routes/load')) },
                { path: 'loads/:loadId/judged-again', ...lazyRoute(() => import('./routes/judged-again')) },
                { path: 'lessons', ...lazyRoute(() => import('./routes/lessons')) },
                { path: 'lessons/:ruleId', ...lazyRoute(() => import('./routes/lesson')) },
              ],
            },
            {
              element: <RequirePermission any={['package.pack']} />,
              children: [
                { path: 'pack', element: <Navigate to="/pack/station" replace /> },
                { path: 'pack/:part/:id?', ...lazyRoute(() => import('./routes/pack')) },
              ],
            },
            {
              element: <RequirePermission any={['item.view', 'equipment.view']} />,
              children: [
                { path: 'stock', element: <Navigate to="/stock/items" replace /> },
                { path: 'stock/:shelf', ...lazyRoute(() => import('./routes/stock')) },
              ],
            },
            {
              element: <RequirePermission any={['policy.view']} />,
              children: [
                { path: 'policy', element: <Navigate to="/policy/settings" replace /> },
                { path: 'policy/:part', ...lazyRoute(() => import('./routes/policy')) },
              ],
            },
            {
              element: <RequirePermission any={['people.view']} />,
              children: [{ path: 'people', ...lazyRoute(() => import('./routes/people')) }],
            },
            { path: '*', Component: NotFound },
          ],
        },
      ],
    },
  ];
}

export function createAppRouter(queryClient: QueryClient) {
  return createBrowserRouter(createRoutes(queryClient));
}
