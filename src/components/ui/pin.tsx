import type { Severity } from '#domain/load/finding';

/** hold: holds the load. look: may stay with a written reason. note: good to know. Three outlines, not only three colours. */
export type PinLevel = 'hold' | 'look' | 'note';

export const levelOf: Readonly<Record<Severity, PinLevel>> = { stop: 'hold', accept: 'look', advice: 'note' };

export const pinWords: Readonly<Record<PinLevel, string>> = {
  hold: 'Holds the load',
  look: 'Look again',
  note: 'Note',
};

const looks: Readonly<Record<PinLevel, string>> = {
  hold: 'shield bg-madder-3 text-paper-0 pb-1',
  look: 'bg-straw-1 text-ink-1 rounded-[2px] shadow-[inset_0_0_0_2px_var(--color-straw-3)]',
  note: 'rounded-full text-ink-1 shadow-[inset_0_0_0_1.5px_var(--color-ink-2)]',
};

type PinProps = {
  /** The letter it has on the map and in the gate as well; or a count. */
  letter: string;
  level: PinLevel;
  /** The level is said beside it. */
  isLevelSaid?: boolean;
};

/** The same letter and outline in the list, in the gate and on the drawing. */
export function Pin({ letter, level, isLevelSaid = false }: PinProps) {
  return (
    <span
      className={`inline-grid h-6.5 w-6.5 flex-none place-items-center text-row leading-none font-bold ${looks[level]}`}
    >
      {letter}
      {!isLevelSaid && <span className="sr-only">, {pinWords[level]}</span>}
    </span>
  );
}

const levelColours: Readonly<Record<PinLevel, string>> = {
  hold: 'text-madder-3',
  look: 'text-straw-3',
  note: 'text-ink-2',
};

/** The level in words. */
export function LevelWords({ level }: { level: PinLevel }) {
  return <span className={`font-label ${levelColours[level]}`}>{pinWords[level]}</span>;
}
