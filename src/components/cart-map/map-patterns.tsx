import { createContext, use, useId, type ReactNode } from 'react';

type PatternName = 'keep-clear' | 'bad' | 'warn' | 'perforated' | 'wire' | 'gloss';

const PatternContext = createContext('');

/** Fill of a pattern of the drawing this is used in: several drawings on one page each have their own. */
export function usePattern(name: PatternName): string {
  return `url(#${use(PatternContext)}${name})`;
}

/** One drawing to scale, with the hatches it may need. Text in it is set in screen pixels. */
export function MapDrawing({
  width,
  height,
  label,
  className = '',
  children,
}: {
  width: number;
  height: number;
  label: string;
  className?: string;
  children: ReactNode;
}) {
  const prefix = useId();
  const hatch = (name: PatternName, size: number, stroke: string, strokeWidth: number) => (
    <pattern id={prefix + name} width={size} height={size} patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
      <path d={`M0 0V${size}`} className={stroke} strokeWidth={strokeWidth} />
    </pattern>
  );
  return (
    <PatternContext value={prefix}>
      <svg
        width={width}
        height={height}
        viewBox={`0 0 ${width} ${height}`}
        role="group"
        aria-label={label}
        className={`block select-none ${className}`}
      >
        <defs>
          {hatch('keep-clear', 6, 'stroke-paper-edge/35', 1.2)}
          {hatch('bad', 5, 'stroke-madder-3', 1.6)}
          {hatch('warn', 6, 'stroke-straw-3', 1.6)}
          <pattern id={`${prefix}perforated`} width="5" height="5" patternUnits="userSpaceOnUse">
            <circle cx="1.5" cy="1.5" r="0.95" className="fill-film-5" />
          </pattern>
          <pattern id={`${prefix}wire`} width="5" height="5" patternUnits="userSpaceOnUse">
            <path d="M0 .5H5" className="stroke-ink-2/20" strokeWidth="0.8" />
          </pattern>
          <linearGradient id={`${prefix}gloss`} x1="0" y1="0" x2="1" y2="1">
            <stop offset="0" stopColor="#fff" stopOpacity=".75" />
            <stop offset=".32" stopColor="#fff" stopOpacity=".1" />
            <stop offset=".33" stopColor="#fff" stopOpacity=".45" />
            <stop offset=".44" stopColor="#fff" stopOpacity=".05" />
            <stop offset="1" stopColor="#fff" stopOpacity=".15" />
          </linearGradient>
        </defs>
        {children}
      </svg>
    </PatternContext>
  );
}
