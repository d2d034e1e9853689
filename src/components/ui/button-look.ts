/** film: press me. quiet: another way. plain: in a line of text. held: closed for now. stop: holds, fails, discards. */
export type ButtonKind = 'film' | 'quiet' | 'plain' | 'held' | 'stop' | 'by-exception';

export type ButtonSize = 'small' | 'normal' | 'large';

const kinds: Readonly<Record<ButtonKind, string>> = {
  film: 'bg-film-4 text-paper-0 shadow-[inset_0_-3px_0_var(--color-film-5)] hover:bg-film-5 active:shadow-none',
  quiet:
    'text-film-4 shadow-[inset_0_0_0_1.5px_var(--color-film-3)] hover:bg-paper-0/70 hover:text-film-5 active:bg-film-1',
  plain: 'text-film-4 px-3 hover:text-film-5 hover:underline underline-offset-4 decoration-1',
  held: 'bg-paper-2 text-ink-1 shadow-[inset_0_0_0_1.5px_var(--color-ink-2)]',
  stop: 'bg-madder-3 text-paper-0 shadow-[inset_0_-3px_0_var(--color-madder-4)] hover:bg-madder-4 active:shadow-none',
  'by-exception': 'weld-by-exception pb-1.5 hover:brightness-110',
};

const sizes: Readonly<Record<ButtonSize, string>> = {
  small: 'min-h-11 px-3.5 text-body',
  normal: 'min-h-12 px-5 text-body',
  large: 'min-h-14 px-6 text-head',
};

/** Square-cut like a pouch. Used for buttons and for links that look like them. */
export function buttonLook(kind: ButtonKind, size: ButtonSize): string {
  return [
    'inline-flex items-center justify-center gap-2.5 rounded border-0 font-semibold no-underline select-none',
    'text-center leading-tight cursor-pointer aria-disabled:cursor-not-allowed',
    sizes[size],
    kinds[kind],
  ].join(' ');
}
