import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useParams, type LoaderFunction } from 'react-router-dom';
import { LoadStation } from '../../features/loads/components/load-station';
import { loadQueries } from '../../features/loads/queries';

export const loader =
  (queryClient: QueryClient): LoaderFunction =>
  async ({ params }) => {
    await queryClient.query({ ...loadQueries.detail(params.loadId ?? ''), staleTime: 0 });
    return null;
  };

export function Component() {
  const loadId = useParams().loadId ?? '';
  const { data: detail } = useSuspenseQuery(loadQueries.detail(loadId));
  // Another load is another station: nothing of the one before stays on the screen.
  return <LoadStation key={loadId} detail={detail} />;
}
