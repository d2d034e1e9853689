import type { RuleId } from '#domain/load/finding';
import { lessonsByFamily, ruleOf } from '#domain/lessons/all-lessons';
import { readingSeconds } from '#domain/lessons/reading-time';
import { PageHead } from '../../../components/ui/heading';
import { LinkButton } from '../../../components/ui/link-button';
import { LessonBody } from './lesson-body';

/** The way through all of them, in the order of the list. */
const inOrder = lessonsByFamily.flatMap(({ ruleIds }) => ruleIds);

/** A lesson by itself, from the list. */
export function LessonPage({ ruleId }: { ruleId: RuleId }) {
  const { name } = ruleOf(ruleId);
  const next = inOrder[(inOrder.indexOf(ruleId) + 1) % inOrder.length] ?? ruleId;
  return (
    <div className="px-6 py-5 max-tablet:px-4">
      <title>{`${name} · Lessons · Paperside`}</title>
      <PageHead
        title={name}
        facts={`Read in about ${readingSeconds(ruleId)} s`}
        aside={
          <LinkButton to="/lessons" kind="plain" size="small" icon="left">
            All lessons
          </LinkButton>
        }
      />
      <div className="mt-4">
        <LessonBody
          key={ruleId}
          ruleId={ruleId}
          loadId={null}
          wayOn={
            <LinkButton to={`/lessons/${next}`} kind="quiet" iconAfter="right">
              Next: {ruleOf(next).name}
            </LinkButton>
          }
        />
      </div>
    </div>
  );
}
