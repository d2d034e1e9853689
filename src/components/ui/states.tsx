import { useEffect, useState, type ReactNode } from 'react';
import { sentenceOf } from '../../lib/errors';
import { Icon } from '../icon';
import { Button } from './button';

/** Headings of these panels: 1 when they are all of the screen, 2 below its head, 3 inside a panel that has a heading. */
type Level = 1 | 2 | 3;

function StateHeading({ level, children }: { level: Level; children: ReactNode }) {
  const Heading = ({ 1: 'h1', 2: 'h2', 3: 'h3' } as const)[level];
  return <Heading className="text-head">{children}</Heading>;
}

/** Nothing here yet: one sentence, one act. No pictures. */
export function EmptyState({
  title,
  children,
  act,
  level = 2,
}: {
  title: string;
  children?: ReactNode;
  act?: ReactNode;
  level?: Level;
}) {
  return (
    <section className="border border-paper-edge px-5 py-4.5">
      <StateHeading level={level}>{title}</StateHeading>
      {children !== undefined && <div className="mt-1 text-row">{children}</div>}
      {act !== undefined && <div className="mt-3.5 flex flex-wrap gap-2">{act}</div>}
    </section>
  );
}

const waitUntilSaidMs = 4_000;

/** Bare paper with dashed lines where words will come. After four seconds it says what it waits for. */
export function WaitingState({
  title,
  waitsFor,
  lines = 3,
  level = 2,
}: {
  title: string;
  /** Said after four seconds: "The server has not answered yet." */
  waitsFor: string;
  lines?: number;
  level?: Level;
}) {
  const [isLong, setIsLong] = useState(false);
  useEffect(() => {
    const timer = window.setTimeout(() => {
      setIsLong(true);
    }, waitUntilSaidMs);
    return () => {
      window.clearTimeout(timer);
    };
  }, []);
  return (
    <section aria-busy="true" className="px-5 py-4.5">
      <StateHeading level={level}>{title}</StateHeading>
      <div aria-hidden="true" className="mt-2">
        {Array.from({ length: lines }, (_, line) => (
          <div key={line} className="dashes my-2.5 h-3.5" style={{ width: `${[82, 64, 74, 58][line % 4] ?? 70}%` }} />
        ))}
      </div>
      <p role="status" className="mt-3 text-small text-ink-1">
        {isLong ? waitsFor : ''}
      </p>
    </section>
  );
}

type WrongStateProps = {
  /** What happened. */
  title: string;
  /** What it means for the work, or the error itself, which then speaks for itself. */
  children?: ReactNode;
  error?: unknown;
  onTryAgain?: () => void;
  /** The second way on. */
  other?: ReactNode;
  level?: Level;
};

/** Something went wrong: what happened, what it means, two ways on. No numbers, no blame. */
export function WrongState({ title, children, error, onTryAgain, other, level = 2 }: WrongStateProps) {
  return (
    <section role="alert" className="bg-madder-1 px-5 py-4.5 shadow-[inset_5px_0_0_var(--color-madder-3)]">
      <StateHeading level={level}>{title}</StateHeading>
      <div className="mt-1 text-row">{children ?? <p>{sentenceOf(error)}</p>}</div>
      {(onTryAgain !== undefined || other !== undefined) && (
        <div className="mt-3 flex flex-wrap gap-2">
          {onTryAgain !== undefined && (
            <Button size="small" onPress={onTryAgain}>
              Try again
            </Button>
          )}
          {other}
        </div>
      )}
    </section>
  );
}

/** The straw band: cut off from the server, since when, what is kept here, what has to wait. */
export function Banner({ title, children, foot }: { title: ReactNode; children?: ReactNode; foot?: ReactNode }) {
  return (
    <section role="status" className="bg-straw-1 px-5 py-3.5 text-ink-1 shadow-[inset_0_0_0_2px_var(--color-straw-3)]">
      <h2 className="flex items-center gap-2.5 text-head">
        <Icon name="off" size={22} />
        <span>{title}</span>
      </h2>
      {children !== undefined && <div className="mt-1 text-row">{children}</div>}
      {foot !== undefined && <p className="mt-2 text-small font-semibold">{foot}</p>}
    </section>
  );
}
