import type { RuleId } from '#domain/load/finding';
import { letterFindings } from '#domain/load/evaluate-load';
import { ruleSetVersion } from '#domain/load/policy';
import { lessonOf, ruleOf } from '#domain/lessons/all-lessons';
import { judgeLesson, lessonPolicy } from '#domain/lessons/judge-lesson';
import type { AnswerId } from '#domain/lessons/lesson';
import { useMemo, useState, type ReactNode } from 'react';
import { useMay } from '../../../lib/session';
import { newRequestId } from '../../../lib/request-id';
import { useFinishLesson } from '../mutations';
import { LessonCart } from './lesson-cart';
import { LessonKept } from './lesson-kept';
import { notCompetency } from '../lesson-words';
import { LessonQuestion } from './lesson-question';

type LessonBodyProps = {
  readonly ruleId: RuleId;
  /** The load whose finding opened it. */
  readonly loadId: string | null;
  /** The way on once it is answered. */
  readonly wayOn: ReactNode;
};

/** A lesson: why, the two carts, what to look for, one question. Everything but the keeping works without the server. */
export function LessonBody({ ruleId, loadId, wayOn }: LessonBodyProps) {
  const lesson = lessonOf(ruleId);
  const rule = ruleOf(ruleId);
  const policy = useMemo(() => lessonPolicy(ruleId), [ruleId]);
  const found = useMemo(
    () => letterFindings(judgeLesson(ruleId).bad.filter((finding) => finding.ruleId === ruleId)),
    [ruleId],
  );
  const [given, setGiven] = useState<readonly AnswerId[]>([]);
  const mayFinish = useMay('lesson.finish');
  const finish = useFinishLesson(ruleId);
  const isAnswered = given.includes(lesson.question.right);

  function answer(chosen: AnswerId) {
    const answers = [...given, chosen];
    setGiven(answers);
    if (chosen !== lesson.question.right || !mayFinish) return;
    finish.mutate({ requestId: newRequestId(), ruleSet: ruleSetVersion, answers, loadId });
  }

  const shared = { pictures: lesson.pictures, policy };
  return (
    <div className="@container">
      <div className="grid gap-x-8 gap-y-6 @min-[42rem]:grid-cols-2 @min-[62rem]:grid-cols-[minmax(0,1fr)_minmax(0,1fr)_21.5rem] @min-[62rem]:grid-rows-[auto_1fr]">
        <div className="text-body @min-[42rem]:col-span-2 @min-[62rem]:col-span-1 @min-[62rem]:col-start-3">
          {lesson.why.map((sentence) => (
            <p key={sentence} className="mt-1.5 first:mt-0">
              {sentence}
            </p>
          ))}
        </div>
        <div className="min-w-0 @min-[62rem]:col-start-1 @min-[62rem]:row-span-2 @min-[62rem]:row-start-1">
          <LessonCart side="bad" cart={lesson.bad} other={lesson.good} findings={found} {...shared} />
        </div>
        <div className="min-w-0 @min-[62rem]:col-start-2 @min-[62rem]:row-span-2 @min-[62rem]:row-start-1">
          <LessonCart side="good" cart={lesson.good} other={lesson.bad} findings={[]} {...shared} />
        </div>
        <div className="grid content-start gap-4 @min-[42rem]:col-span-2 @min-[62rem]:col-span-1 @min-[62rem]:col-start-3">
          <p className="text-body">
            <b className="font-semibold">At the cart:</b> {lesson.lookFor}
          </p>
          <LessonQuestion question={lesson.question} given={given} onAnswer={answer} />
          {isAnswered && <LessonKept finish={finish} isKept={mayFinish} wayOn={wayOn} />}
          <div className="grid gap-1.5 text-small text-ink-2">
            <p>Source: {rule.source.text} The instructions for use and your department’s own policy come first.</p>
            <p>{notCompetency}</p>
          </div>
        </div>
      </div>
    </div>
  );
}
