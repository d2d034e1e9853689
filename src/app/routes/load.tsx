import type { RuleId } from '#domain/load/finding';
import { useSuspenseQuery, type QueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useParams, type LoaderFunction } from 'react-router-dom';
import { LessonSheet } from '../../features/lessons/components/lesson-sheet';
import { LoadStation } from '../../features/loads/components/load-station';
import { loadQueries } from '../../features/loads/queries';
import { LessonOpenerContext } from '../../lib/lesson-opener';

export const loader =
  (queryClient: QueryClient): LoaderFunction =>
  async ({ params }) => {
    await queryClient.query({ ...loadQueries.detail(params.loadId ?? ''), staleTime: 0 });
    return null;
  };

export function Component() {
  const loadId = useParams().loadId ?? '';
  const { data: detail } = useSuspenseQuery(loadQueries.detail(loadId));
  // Lessons come with the screen: at the cart, one that has to be fetched first may not come at all.
  const [lessonOf, setLessonOf] = useState<RuleId | null>(null);
  return (
    <LessonOpenerContext value={setLessonOf}>
      {/* Another load is another station: nothing of the one before stays on the screen. */}
      <LoadStation key={loadId} detail={detail} />
      {lessonOf !== null && (
        <LessonSheet
          ruleId={lessonOf}
          loadId={loadId}
          onClose={() => {
            setLessonOf(null);
          }}
        />
      )}
    </LessonOpenerContext>
  );
}
