import type { QueryClient } from '@tanstack/react-query';
import type { LoaderFunction } from 'react-router-dom';
import { PeopleScreen } from '../../features/people/components/people-screen';
import { everyone, peopleQueries } from '../../features/people/queries';

export const loader =
  (queryClient: QueryClient): LoaderFunction =>
  () => {
    // Begun before the screen is there; the screen shows what becomes of it, a refusal too.
    void queryClient.query({ ...peopleQueries.list(everyone), staleTime: 'static' }).catch(() => undefined);
    return null;
  };

export function Component() {
  return <PeopleScreen />;
}
