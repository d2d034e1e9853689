import type { Lesson, AnswerId } from '#domain/lessons/lesson';
import { answerIds } from '#domain/lessons/lesson';
import { useId } from 'react';
import { Icon } from '../../../components/icon';
import { useAnnounce } from '../../../components/ui/announcer';
import { FilmPanel } from '../../../components/ui/film-panel';

type LessonQuestionProps = {
  readonly question: Lesson['question'];
  /** In the order in which they were given. */
  readonly given: readonly AnswerId[];
  readonly onAnswer: (answer: AnswerId) => void;
};

/** One touch answers and says why. A wrong answer stays marked, and another can be tried. */
export function LessonQuestion({ question, given, onAnswer }: LessonQuestionProps) {
  const announce = useAnnounce();
  const id = useId();
  const isDone = given.includes(question.right);

  function answer(chosen: AnswerId) {
    if (isDone || given.includes(chosen)) return;
    const { because } = question.answers[chosen];
    announce(chosen === question.right ? `Right. ${because}` : `Not this one. ${because} Try another.`, 'assertive');
    onAnswer(chosen);
  }

  return (
    <FilmPanel labelledBy={id} className="px-4 pt-4 pb-3">
      <h2 id={id} className="text-head">
        {question.text}
      </h2>
      <ul className="mt-2 grid gap-2">
        {answerIds.map((one) => {
          const isGiven = given.includes(one);
          const look = !isGiven ? 'open' : one === question.right ? 'right' : 'wrong';
          return (
            <li key={one}>
              <AnswerButton
                look={look}
                isOver={isDone && !isGiven}
                answer={question.answers[one]}
                onPress={() => {
                  answer(one);
                }}
              />
            </li>
          );
        })}
      </ul>
    </FilmPanel>
  );
}

const looks = {
  open: 'bg-paper-0 shadow-[inset_0_0_0_1.5px_var(--color-film-3)] hover:shadow-[inset_0_0_0_2px_var(--color-film-4)]',
  right: 'weld animate-weld',
  wrong: 'bg-madder-1 shadow-[inset_4px_0_0_var(--color-madder-3)]',
} as const;

const marks = { open: null, right: 'Right.', wrong: 'Not this one.' } as const;

function AnswerButton({
  look,
  isOver,
  answer,
  onPress,
}: {
  readonly look: keyof typeof looks;
  /** The right one has been given: the others are no longer asked for. */
  readonly isOver: boolean;
  readonly answer: Lesson['question']['answers'][AnswerId];
  readonly onPress: () => void;
}) {
  const mark = marks[look];
  return (
    <button
      type="button"
      aria-disabled={look !== 'open' || isOver}
      onClick={onPress}
      className={`flex min-h-12 w-full items-start gap-2.5 px-3.5 py-3 text-left aria-disabled:cursor-default ${looks[look]}`}
    >
      {mark !== null && (
        <span className={look === 'wrong' ? 'text-madder-3' : ''}>
          <Icon name={look === 'right' ? 'tick' : 'cross'} size={20} />
        </span>
      )}
      <span>
        <span className="block font-semibold">{answer.text}</span>
        {mark !== null && (
          <span className="mt-0.5 block text-small">
            <b className="font-semibold">{mark}</b> {answer.because}
          </span>
        )}
      </span>
    </button>
  );
}
