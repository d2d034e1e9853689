import type { FinishedLesson } from '#contract/lessons';
import { ruleIds, type RuleId } from '#domain/load/finding';
import { ruleSetVersion } from '#domain/load/policy';
import { lessonsByFamily, ruleOf } from '#domain/lessons/all-lessons';
import type { LessonFamily } from '#domain/lessons/lesson';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { Icon } from '../../../components/icon';
import { PageHead, PanelHead } from '../../../components/ui/heading';
import { WrongState } from '../../../components/ui/states';
import { DateText } from '../../../components/ui/time';
import { countOf } from '../../../lib/format';
import { useMay } from '../../../lib/session';
import { lessonQueries } from '../queries';
import { notCompetency } from '../lesson-words';

const familyWords: Readonly<Record<LessonFamily, string>> = {
  pouches: 'Pouches',
  poses: 'How things lie',
  stacks: 'Stacks and filters',
  space: 'Room on the shelf',
  'mass-and-water': 'Mass and water',
  cycle: 'Cycle and packaging',
  proof: 'Proof',
  labels: 'Labels',
  counting: 'Scanned and counted',
  entries: 'Equipment and entries',
};

/** Every lesson, by family; one's own finished ones with their day. */
export function LessonList() {
  const isKept = useMay('lesson.finish');
  const finished = useQuery({ ...lessonQueries.finished(), enabled: isKept });
  const doneOf = new Map((finished.data ?? []).map((one) => [one.ruleId, one]));
  const done = ruleIds.filter((ruleId) => doneOf.has(ruleId)).length;
  return (
    <div className="px-6 py-5 max-tablet:px-4">
      <title>Lessons · Paperside</title>
      <PageHead
        title="Lessons"
        facts={`${countOf(ruleIds.length, 'rule')}, 90 seconds each${isKept && finished.isSuccess ? `, ${done} done by you` : ''}`}
      />
      <p className="mt-1 max-w-160 text-small text-ink-2">{notCompetency} Only you see here what you have done.</p>
      {finished.isError && (
        <div className="mt-4">
          <WrongState
            title="What you have done could not be fetched"
            error={finished.error}
            onTryAgain={() => {
              void finished.refetch();
            }}
          />
        </div>
      )}
      <div className="mt-5 gap-x-10 tablet:columns-2 desk:columns-3">
        {lessonsByFamily.map(({ family, ruleIds: ofFamily }) => (
          <section key={family} aria-label={familyWords[family]} className="mb-7 break-inside-avoid">
            <PanelHead title={familyWords[family]} />
            <ul>
              {ofFamily.map((ruleId) => (
                <LessonRow key={ruleId} ruleId={ruleId} done={doneOf.get(ruleId)} />
              ))}
            </ul>
          </section>
        ))}
      </div>
    </div>
  );
}

function LessonRow({ ruleId, done }: { ruleId: RuleId; done: FinishedLesson | undefined }) {
  return (
    <li className="border-t border-paper-3 first:border-t-0">
      <Link
        to={`/lessons/${ruleId}`}
        className="grid min-h-12 grid-cols-[1.5rem_1fr_auto] items-center gap-x-3 py-1.5 text-ink-1 no-underline hover:text-film-5"
      >
        {done ? (
          <span className="weld grid h-6 w-6 place-items-center">
            <Icon name="tick" size={16} />
          </span>
        ) : (
          <span className="h-6 w-6 border border-dashed border-paper-edge" aria-hidden="true" />
        )}
        <span className="font-semibold">{ruleOf(ruleId).name}</span>
        <span className="text-right text-least text-ink-2">
          {done ? (
            <>
              done on <DateText at={done.finishedAt} />
              {done.ruleSet !== ruleSetVersion && <span className="block">by earlier rules</span>}
            </>
          ) : (
            'not yet'
          )}
        </span>
      </Link>
    </li>
  );
}
