import { QueryClient } from '@tanstack/react-query';
import { NoLineError } from './errors';

/** One owner of everything that comes from the server. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      queries: {
        // A local network is not the internet: what the browser thinks of its connection says nothing about the server.
        networkMode: 'always',
        staleTime: 10_000,
        // A "no" stays a "no"; only silence is worth another try.
        retry: (failures, error) => error instanceof NoLineError && failures < 2,
        retryDelay: (failures) => 500 * 2 ** failures,
      },
      // A repeat has to carry the same request id, which only the caller can see to.
      mutations: { networkMode: 'always', retry: false },
    },
  });
}
