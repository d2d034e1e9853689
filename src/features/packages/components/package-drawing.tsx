import type { Item } from '#contract/items';
import type { ReactNode } from 'react';

/*
 * The package as it lies before the packer, to scale, with its label to scale on it. On a pouch the label goes on the film:
 * ink and glue let through the paper (label guides, restated).
 */

const labelMm = { width: 100, height: 50 };

type DrawingProps = {
  readonly item: Pick<Item, 'kind' | 'lengthMm' | 'widthMm' | 'heightMm'>;
  readonly hasLabel: boolean;
};

type Frame = {
  readonly width: number;
  readonly height: number;
  readonly body: ReactNode;
  /** Upper left corner, and whether the label stands on end. */
  readonly label: { readonly x: number; readonly y: number; readonly isOnEnd?: boolean };
};

function pouch(widthMm: number, lengthMm: number): Frame {
  const seal = 9;
  const chevron = Math.min(26, lengthMm * 0.12);
  // On a narrow pouch the label stands on end.
  const isOnEnd = widthMm < labelMm.width + 2 * seal;
  const [across, along] = isOnEnd ? [labelMm.height, labelMm.width] : [labelMm.width, labelMm.height];
  return {
    width: widthMm,
    height: lengthMm,
    label: { x: (widthMm - across) / 2, y: lengthMm - along - 24, isOnEnd },
    body: (
      <>
        <rect width={widthMm} height={lengthMm} fill="var(--color-leaf-paper)" stroke="var(--color-paper-edge)" />
        <path
          d={`M${seal} ${chevron} L${widthMm / 2} 8 L${widthMm - seal} ${chevron} V${lengthMm - seal} H${seal} Z`}
          fill="var(--color-film-1)"
          stroke="var(--color-film-4)"
          strokeWidth="1.4"
        />
        <path
          d={`M${widthMm * 0.16} ${chevron + 14} V${lengthMm - 34}`}
          stroke="var(--color-paper-0)"
          strokeWidth={Math.max(3, widthMm * 0.05)}
          opacity="0.8"
        />
        <path
          d={`M4 ${lengthMm - 4.5} H${widthMm - 4}`}
          stroke="var(--color-film-4)"
          strokeWidth="5"
          strokeDasharray="1.4 2.4"
        />
      </>
    ),
  };
}

function tray(lengthMm: number, widthMm: number): Frame {
  const middle = { x: lengthMm / 2, y: widthMm * 0.56 };
  return {
    width: lengthMm,
    height: widthMm,
    label: { x: lengthMm - labelMm.width - 14, y: 14 },
    body: (
      <>
        <rect
          width={lengthMm}
          height={widthMm}
          fill="var(--color-paper-0)"
          stroke="var(--color-paper-edge)"
          strokeWidth="2"
        />
        <path
          d={`M0 0 L${middle.x} ${middle.y} L${lengthMm} 0 M0 ${widthMm} L${middle.x * 0.72} ${middle.y * 0.9} M${lengthMm} ${widthMm} L${middle.x * 1.28} ${middle.y * 0.9}`}
          fill="none"
          stroke="var(--color-paper-edge)"
          strokeWidth="1.4"
        />
        <rect
          x={middle.x - 26}
          y={middle.y - 8}
          width="52"
          height="16"
          fill="var(--color-paper-3)"
          stroke="var(--color-paper-edge)"
        />
      </>
    ),
  };
}

function container(lengthMm: number, heightMm: number): Frame {
  const lid = heightMm * 0.3;
  return {
    width: lengthMm,
    height: heightMm,
    label: { x: lengthMm - labelMm.width - 26, y: lid + (heightMm - lid - labelMm.height) / 2 },
    body: (
      <>
        <rect
          x="8"
          y={lid}
          width={lengthMm - 16}
          height={heightMm - lid}
          fill="var(--color-paper-0)"
          stroke="var(--color-ink-1)"
          strokeWidth="2.4"
        />
        <rect
          y={lid * 0.25}
          width={lengthMm}
          height={lid * 0.75}
          fill="var(--color-paper-2)"
          stroke="var(--color-ink-1)"
          strokeWidth="2.4"
        />
        <rect
          x={lengthMm * 0.14}
          y="0"
          width={lengthMm * 0.26}
          height={lid * 0.25}
          fill="var(--color-film-2)"
          stroke="var(--color-film-4)"
        />
        <rect
          x={lengthMm * 0.6}
          y="0"
          width={lengthMm * 0.26}
          height={lid * 0.25}
          fill="var(--color-film-2)"
          stroke="var(--color-film-4)"
        />
      </>
    ),
  };
}

function textile(lengthMm: number, heightMm: number): Frame {
  const folds = 7;
  return {
    width: lengthMm,
    height: heightMm,
    label: { x: (lengthMm - labelMm.width) / 2, y: (heightMm - labelMm.height) / 2 },
    body: (
      <>
        <rect
          width={lengthMm}
          height={heightMm}
          rx="10"
          fill="var(--color-paper-0)"
          stroke="var(--color-paper-edge)"
          strokeWidth="2"
        />
        {Array.from({ length: folds }, (_, fold) => {
          const x = ((fold + 1) * lengthMm) / (folds + 1);
          return (
            <path
              key={fold}
              d={`M${x} 6 Q${x - 7} ${heightMm / 2} ${x} ${heightMm - 6}`}
              fill="none"
              stroke="var(--color-paper-3)"
              strokeWidth="2"
            />
          );
        })}
        <path d={`M0 ${heightMm * 0.5} H${lengthMm}`} stroke="var(--color-paper-edge)" strokeWidth="9" opacity="0.35" />
      </>
    ),
  };
}

function basin(lengthMm: number, widthMm: number): Frame {
  const [x, y] = [lengthMm / 2, widthMm / 2];
  return {
    width: lengthMm,
    height: widthMm,
    label: { x: x - labelMm.width / 2, y: y - labelMm.height / 2 },
    body: (
      <>
        {[1, 0.82, 0.64].map((share) => (
          <ellipse
            key={share}
            cx={x}
            cy={y}
            rx={x * share}
            ry={y * share}
            fill="var(--color-paper-0)"
            stroke="var(--color-paper-edge)"
            strokeWidth="1.8"
          />
        ))}
      </>
    ),
  };
}

function challengeDevice(lengthMm: number, widthMm: number): Frame {
  return {
    width: lengthMm,
    height: widthMm,
    label: { x: (lengthMm - labelMm.width) / 2, y: (widthMm - labelMm.height) / 2 },
    body: <rect width={lengthMm} height={widthMm} fill="var(--color-ink-1)" />,
  };
}

function frameOf({ kind, lengthMm, widthMm, heightMm }: DrawingProps['item']): Frame {
  switch (kind) {
    case 'pouch':
      return pouch(widthMm, lengthMm);
    case 'wrapped-tray':
      return tray(lengthMm, widthMm);
    case 'rigid-container':
      return container(lengthMm, heightMm);
    case 'textile-pack':
      return textile(lengthMm, heightMm);
    case 'basin':
      return basin(lengthMm, widthMm);
    case 'challenge-device':
      return challengeDevice(lengthMm, widthMm);
  }
}

function LabelOnIt({ at, isThere }: { at: Frame['label']; isThere: boolean }) {
  const { width, height } = labelMm;
  const turn = at.isOnEnd === true ? ` translate(${height} 0) rotate(90)` : '';
  return (
    <g transform={`translate(${at.x} ${at.y})${turn}`}>
      {isThere ? (
        <g className="animate-weld">
          <rect width={width} height={height} fill="var(--color-paper-0)" stroke="var(--color-ink-1)" />
          <path d={`M4 0 V${height}`} stroke="var(--color-ink-1)" strokeWidth="8" strokeDasharray="1 3" />
          <path d="M14 10 H76 M14 18 H58" stroke="var(--color-ink-1)" strokeWidth="4" />
          <path
            d="M14 35.5 H72"
            stroke="var(--color-ink-1)"
            strokeWidth="17"
            strokeDasharray="2 2 4 1.6 1.6 3 3 2 1.6 1.6 5 2"
          />
          <path d="M81 38 H93" stroke="var(--color-ink-1)" strokeWidth="12" strokeDasharray="2 1" />
        </g>
      ) : (
        <rect
          width={width}
          height={height}
          fill="var(--color-paper-0)"
          fillOpacity="0.45"
          stroke="var(--color-film-4)"
          strokeWidth="2"
          strokeDasharray="7 5"
        />
      )}
    </g>
  );
}

/** Drawn at the size it is given; the label is dashed until it is printed. */
export function PackageDrawing({ item, hasLabel }: DrawingProps) {
  const frame = frameOf(item);
  const { label } = frame;
  const margin = 6;
  const [across, along] = label.isOnEnd === true ? [labelMm.height, labelMm.width] : [labelMm.width, labelMm.height];
  // A small thing is smaller than its label, which then hangs over.
  const left = Math.min(0, label.x) - margin;
  const top = Math.min(0, label.y) - margin;
  const right = Math.max(frame.width, label.x + across) + margin;
  const bottom = Math.max(frame.height, label.y + along) + margin;
  return (
    <svg
      viewBox={`${left} ${top} ${right - left} ${bottom - top}`}
      className="mx-auto block max-h-72 w-full"
      preserveAspectRatio="xMidYMin meet"
      aria-hidden="true"
    >
      {frame.body}
      <LabelOnIt at={label} isThere={hasLabel} />
    </svg>
  );
}

/** Where the label goes, in words. */
export function labelPlaceInWords(kind: DrawingProps['item']['kind']): string {
  switch (kind) {
    case 'pouch':
      return 'The label goes on the film side, never on the paper.';
    case 'wrapped-tray':
    case 'textile-pack':
      return 'The label goes on the tape, or on the wrap beside it.';
    case 'rigid-container':
      return 'The label goes into the card holder, clear of the filters.';
    case 'basin':
    case 'challenge-device':
      return 'The label goes where it can be read on the cart.';
  }
}
