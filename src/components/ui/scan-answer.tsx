import type { ReactNode } from 'react';
import { Icon, type IconName } from '../icon';

/**
 * How an answer of the scanner looks. taken: it is on the load. look: it is on the load, and something wants a second
 * glance. already-here, not-known: nothing was changed, read on. not-ready, held, called-back: put it down where the words
 * say. place: the place is set. Each has its own mark, ground and edge, so that none is told from another by colour alone.
 */
export type ScanAnswerLook =
  'taken' | 'look' | 'already-here' | 'not-known' | 'not-ready' | 'held' | 'called-back' | 'place';

const grounds: Readonly<Record<ScanAnswerLook, string>> = {
  taken: 'bg-film',
  look: 'bg-film',
  'already-here': 'bg-paper-2',
  'not-known': 'bg-paper-2',
  'not-ready': 'bg-madder-1',
  held: 'bg-straw-1',
  'called-back': 'bg-madder-1',
  place: 'bg-film',
};

const boxes: Readonly<Record<ScanAnswerLook, string>> = {
  taken: 'weld',
  look: 'hatch-straw text-ink-1 shadow-[inset_0_0_0_2px_var(--color-straw-3)]',
  'already-here': 'text-ink-1 shadow-[inset_0_0_0_1.5px_var(--color-ink-2)]',
  'not-known': 'text-ink-1 border-2 border-dashed border-ink-2',
  'not-ready': 'torn-r bg-madder-3 text-paper-0 pr-[6%]',
  held: 'bg-straw-3 text-paper-0',
  'called-back': 'torn-r bg-madder-4 text-paper-0 pr-[6%]',
  place: 'bg-paper-0 text-film-5 shadow-[inset_0_0_0_2.4px_var(--color-film-4)]',
};

const marks: Readonly<Record<Exclude<ScanAnswerLook, 'not-known'>, IconName>> = {
  taken: 'tick',
  look: 'tick',
  'already-here': 'eye',
  'not-ready': 'cross',
  held: 'lock',
  'called-back': 'recall',
  place: 'right',
};

function MarkOf({ look, size }: { look: ScanAnswerLook; size: number }) {
  if (look === 'not-known') return <span className="text-title leading-none font-semibold">?</span>;
  return <Icon name={marks[look]} size={size} />;
}

/** The square at the left of the scan line: the mark and, when it is large, the word. */
export function ScanMark({ look, word, isLarge = false }: { look: ScanAnswerLook; word: string; isLarge?: boolean }) {
  return isLarge ? (
    <div
      className={`grid h-22 w-16 flex-none place-items-center content-center gap-1.5 text-center text-small font-label leading-tight ${boxes[look]}`}
    >
      <MarkOf look={look} size={34} />
      <span className={look === 'look' ? 'bg-straw-1 px-1' : ''}>{word}</span>
    </div>
  ) : (
    <div aria-hidden="true" className={`grid place-items-center ${boxes[look]}`}>
      <MarkOf look={look} size={30} />
    </div>
  );
}

type ScanAnswerProps = {
  look: ScanAnswerLook;
  /** "Taken", "Not taken", "Already on this cart", "Not known". */
  word: string;
  /** What was scanned. */
  title: ReactNode;
  /** The reason, and where to put it. */
  children: ReactNode;
};

/** One answer of the scan line, in a list or on the phone. */
export function ScanAnswer({ look, word, title, children }: ScanAnswerProps) {
  return (
    <div className={`grid min-h-21 grid-cols-[3.625rem_1fr] ${grounds[look]}`}>
      <ScanMark look={look} word={word} />
      <div className="px-3.5 py-2.5">
        <p className="text-small font-semibold">{word}</p>
        <p className="text-[1.1875rem]/[1.5rem] font-semibold">{title}</p>
        <div className="text-small">{children}</div>
      </div>
    </div>
  );
}
