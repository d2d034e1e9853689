import type { ReactNode } from 'react';
import { Button } from '../../../components/ui/button';
import { sentenceOf } from '../../../lib/errors';
import type { useFinishLesson } from '../mutations';

type LessonKeptProps = {
  readonly finish: ReturnType<typeof useFinishLesson>;
  /** Whether finished lessons are kept for the person at this station. */
  readonly isKept: boolean;
  readonly wayOn: ReactNode;
};

/** What becomes of a lesson that was answered right. */
export function LessonKept({ finish, isKept, wayOn }: LessonKeptProps) {
  const { variables } = finish;
  return (
    <div>
      <p role="status" className="text-row font-semibold">
        {!isKept
          ? 'Answered. For your role nothing is kept of it.'
          : finish.isPending
            ? 'Keeping it.'
            : finish.isSuccess
              ? 'Kept: you have finished this lesson.'
              : ''}
      </p>
      {finish.isError && (
        <div role="alert" className="mt-1 bg-madder-1 px-3.5 py-2.5 text-row">
          <p className="font-semibold text-madder-3">Not kept yet. {sentenceOf(finish.error)}</p>
          {variables && (
            <Button
              size="small"
              kind="quiet"
              className="mt-2"
              onPress={() => {
                finish.mutate(variables);
              }}
            >
              Try again
            </Button>
          )}
        </div>
      )}
      <div className="mt-2.5 flex flex-wrap gap-2">{wayOn}</div>
    </div>
  );
}
