import type { QueryClient } from '@tanstack/react-query';
import type { LoaderFunction } from 'react-router-dom';
import { LoadList } from '../../features/loads/components/load-list';
import { loadQueries } from '../../features/loads/queries';

export const loader =
  (queryClient: QueryClient): LoaderFunction =>
  async () => {
    await queryClient.infiniteQuery({ ...loadQueries.list('open'), staleTime: 'static' });
    return null;
  };

export function Component() {
  return <LoadList />;
}
