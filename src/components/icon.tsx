import { iconDrawings, type IconName } from './icon-drawings';

export type { IconName };

type IconProps = {
  name: IconName;
  /** Pixels. */
  size?: number;
  className?: string;
};

/** Decoration beside a word: hidden from screen readers, which hear the word. */
export function Icon({ name, size = 20, className = '' }: IconProps) {
  return (
    <svg
      className={`inline-block flex-none align-[-0.18em] ${className}`}
      width={size}
      height={size}
      viewBox="0 0 24 24"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.75"
      strokeLinecap="square"
      strokeLinejoin="miter"
      aria-hidden="true"
    >
      {iconDrawings[name]}
    </svg>
  );
}
