import type { ReactNode } from 'react';

/** What is known of one thing: words at the left, facts at the right. */
export function Facts({ children }: { children: ReactNode }) {
  return <dl className="grid grid-cols-[7.5rem_minmax(0,1fr)] gap-x-3 gap-y-1.5 text-row">{children}</dl>;
}

export function Fact({ name, children }: { name: string; children: ReactNode }) {
  return (
    <>
      <dt className="text-ink-2">{name}</dt>
      <dd className="font-medium [overflow-wrap:anywhere]">{children}</dd>
    </>
  );
}
