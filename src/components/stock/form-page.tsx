import { useEffect, useRef, type ReactNode } from 'react';
import { sentenceOf } from '../../lib/errors';
import { Button } from '../ui/button';
import { PageHead } from '../ui/heading';

type FormPageProps = {
  title: string;
  /** What is being changed, beside the title: its code. */
  facts?: ReactNode;
  onSend: () => void;
  onLeave: () => void;
  sendWords: string;
  isSending: boolean;
  /** What the server refused. */
  refusal: unknown;
  /** What the form as a whole lacks, counted for the foot. */
  problemCount: number;
  /** Drawn beside the fields, from what is filled in. */
  aside?: ReactNode;
  children: ReactNode;
};

/** A form that is a page of its own: its parts one under another, a drawing beside them, what it does at the foot. */
export function FormPage({
  title,
  facts,
  onSend,
  onLeave,
  sendWords,
  isSending,
  refusal,
  problemCount,
  aside,
  children,
}: FormPageProps) {
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => {
    // It comes in place of a list that may be scrolled far down, under the same address.
    const screen = form.current?.closest('main');
    if (screen) screen.scrollTop = 0;
    form.current?.focus({ preventScroll: true });
  }, []);
  return (
    <form
      ref={form}
      tabIndex={-1}
      aria-label={title}
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        onSend();
      }}
      className="flex flex-1 flex-col outline-none"
    >
      <div className="grid flex-1 content-start gap-6 px-6 py-5 max-tablet:px-4">
        <PageHead title={title} {...(facts === undefined ? {} : { facts })} />
        <div className={aside === undefined ? 'max-w-180' : 'grid gap-10 tablet:grid-cols-[minmax(0,1fr)_20rem]'}>
          <div className="grid content-start gap-9">{children}</div>
          {aside !== undefined && (
            <div className="self-start max-tablet:hidden tablet:sticky tablet:top-5">{aside}</div>
          )}
        </div>
      </div>
      <footer className="dashes-t sticky bottom-0 z-10 flex flex-wrap items-center gap-3 bg-paper-2 px-6 py-2.5 max-tablet:px-4">
        <Button type="submit" waitingWords={isSending ? 'Keeping it' : undefined}>
          {sendWords}
        </Button>
        <Button kind="quiet" onPress={onLeave} blockedBecause={isSending ? 'It is being done now.' : undefined}>
          Leave it
        </Button>
        <p role="alert" className="text-row font-semibold text-madder-3">
          {footWords(refusal, problemCount)}
        </p>
      </footer>
    </form>
  );
}

function footWords(refusal: unknown, problemCount: number): string | null {
  if (problemCount > 0) return problemCount === 1 ? 'One thing to put right.' : `${problemCount} things to put right.`;
  return refusal === null || refusal === undefined ? null : sentenceOf(refusal);
}

/** A part of a form: a heading, a hairline, fields side by side where there is room. */
export function FormPart({ title, hint, children }: { title: string; hint?: ReactNode; children: ReactNode }) {
  return (
    <fieldset>
      <legend className="mb-3 w-full border-b border-paper-3 pb-1.5 text-head">{title}</legend>
      {hint !== undefined && <div className="-mt-1 mb-3 text-small text-ink-2">{hint}</div>}
      <div className="grid items-start gap-x-4 gap-y-4 sm:grid-cols-2 tablet:grid-cols-3">{children}</div>
    </fieldset>
  );
}

/** How many complaints a form has, however deep they lie. */
export function countProblems(errors: object): number {
  return Object.values(errors).reduce<number>((sum, one: unknown) => {
    if (typeof one !== 'object' || one === null) return sum;
    if ('message' in one && typeof one.message === 'string') return sum + 1;
    return sum + countProblems(one);
  }, 0);
}
