import type { QueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { LoaderFunction } from 'react-router-dom';
import { OpenLoadSheet } from '../../features/loads/components/open-load-sheet';
import { TodayScreen } from '../../features/today/components/today-screen';
import { todayQueries } from '../../features/today/queries';

export const loader =
  (queryClient: QueryClient): LoaderFunction =>
  async () => {
    await queryClient.query({ ...todayQueries.day(), staleTime: 'static' });
    return null;
  };

export function Component() {
  const [openingRunId, setOpeningRunId] = useState<string | null>(null);
  return (
    <>
      <TodayScreen onOpenLoad={setOpeningRunId} />
      {openingRunId !== null && (
        <OpenLoadSheet
          runId={openingRunId}
          onClose={() => {
            setOpeningRunId(null);
          }}
        />
      )}
    </>
  );
}
