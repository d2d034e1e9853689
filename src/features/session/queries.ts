import { paths } from '#contract/paths';
import { sessionResponseSchema, type SessionResponse } from '#contract/session';
import { queryOptions, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { api } from '../../lib/api-client';

export const sessionQueries = {
  all: ['session'] as const,
  /** Who is signed in. Rejects with a 401 problem when nobody is. */
  current: () =>
    queryOptions({
      queryKey: [...sessionQueries.all, 'current'] as const,
      queryFn: ({ signal }) => api.get(paths.session, sessionResponseSchema, { signal, whenSignedOut: 'throw' }),
      // Only a sign-in changes it, and that writes it here.
      staleTime: Number.POSITIVE_INFINITY,
      gcTime: Number.POSITIVE_INFINITY,
    }),
};

/**
 * The session for what is on screen. It outlives the sign-in: while somebody signs out or in, the screen stays what it
 * was. Only below a route whose loader has made sure that there is one.
 */
export function useShownSession(): SessionResponse {
  const { data } = useQuery({ ...sessionQueries.current(), enabled: false });
  const [shown, setShown] = useState(data);
  if (data !== undefined && data !== shown) setShown(data);
  const session = data ?? shown;
  if (session === undefined) throw new Error('useShownSession needs a loader that fetched the session');
  return session;
}
