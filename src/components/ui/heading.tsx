import type { ReactNode } from 'react';

/** The head of a screen: its name, a few facts beside it, something at the right. */
export function PageHead({ title, facts, aside }: { title: ReactNode; facts?: ReactNode; aside?: ReactNode }) {
  return (
    <header className="flex flex-wrap items-baseline gap-x-4.5 gap-y-1">
      <h1 className="text-title max-tablet:text-[1.6875rem]/[2rem]">{title}</h1>
      {facts !== undefined && <p className="flex flex-wrap gap-x-3.5 text-ink-2">{facts}</p>}
      {aside !== undefined && <div className="ml-auto flex items-baseline gap-3.5">{aside}</div>}
    </header>
  );
}

/** The head of a panel: what it is, and a small remark at the right. */
export function PanelHead({
  title,
  aside,
  level = 2,
  id,
}: {
  title: ReactNode;
  aside?: ReactNode;
  level?: 2 | 3;
  id?: string;
}) {
  const Heading = level === 2 ? 'h2' : 'h3';
  return (
    <div className="flex min-h-7 items-baseline justify-between gap-3">
      <Heading id={id} className="text-head">
        {title}
      </Heading>
      {aside !== undefined && <span className="text-least text-ink-2">{aside}</span>}
    </div>
  );
}
