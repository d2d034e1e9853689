import type { ReactNode } from 'react';

type FilmPanelProps = {
  children: ReactNode;
  /** Where it is welded to the paper. */
  seal?: 'top' | 'left' | 'none';
  labelledBy?: string;
  label?: string;
  className?: string;
};

/** What you do now lies on film. A screen has one such surface, two at the very most. */
export function FilmPanel({ children, seal = 'top', labelledBy, label, className = '' }: FilmPanelProps) {
  const seals = { top: 'seal-t', left: 'seal-l', none: '' } as const;
  return (
    <section
      aria-labelledby={labelledBy}
      aria-label={label}
      className={`bg-film shadow-film ${seals[seal]} ${className}`}
    >
      {children}
    </section>
  );
}
