import { usePattern } from './map-patterns';

/** A rectangle in screen pixels, y downwards. */
export type PixelBox = { readonly x: number; readonly y: number; readonly width: number; readonly height: number };

type GlyphProps = {
  readonly box: PixelBox;
  /** Short name shown where there is room for it. */
  readonly label?: string | undefined;
};

const roomForLabel = { width: 30, height: 14 };

/** A label inside a drawing: never below 12 px, left out where it does not fit. */
export function MapText({
  x,
  y,
  children,
  anchor = 'start',
  weight = 450,
  className = 'fill-ink-1',
  size = 12,
}: {
  x: number;
  y: number;
  children: string;
  anchor?: 'start' | 'middle' | 'end';
  weight?: number;
  className?: string;
  size?: number;
}) {
  return (
    <text x={x} y={y} textAnchor={anchor} fontSize={size} fontWeight={weight} className={className}>
      {children}
    </text>
  );
}

/** The middle of a thing, where its label stands: a rough box, wide enough for the letters. */
export function labelBox(label: string, box: PixelBox): PixelBox {
  const width = label.length * 6.7 + 8;
  return { x: box.x + box.width / 2 - width / 2, y: box.y + box.height / 2 - 9, width, height: 18 };
}

function isRoomFor(label: string, box: PixelBox): boolean {
  // About 6.7 px a character at 12 px in our face.
  return box.height >= roomForLabel.height && box.width >= Math.max(roomForLabel.width, label.length * 6.7 + 4);
}

export function CentredLabel({ box, label, ground }: { box: PixelBox; label: string | undefined; ground: string }) {
  if (label === undefined || !isRoomFor(label, box)) return null;
  return (
    <>
      <rect {...labelBox(label, box)} className={ground} />
      <MapText x={box.x + box.width / 2} y={box.y + box.height / 2 + 4} anchor="middle" weight={560}>
        {label}
      </MapText>
    </>
  );
}

/**
 * A pouch seen along its faces: two halves, paper and film, each with its own edge. First is left, or lower where the
 * faces lie across.
 */
export function Leaf({
  box,
  isPaperFirst,
  isAcross = false,
}: {
  box: PixelBox;
  isPaperFirst: boolean;
  isAcross?: boolean;
}) {
  const { x, y, width, height } = box;
  const first = isPaperFirst ? 'fill-leaf-paper' : 'fill-leaf-film';
  const second = isPaperFirst ? 'fill-leaf-film' : 'fill-leaf-paper';
  const firstEdge = isPaperFirst ? 'stroke-paper-edge' : 'stroke-film-4';
  const secondEdge = isPaperFirst ? 'stroke-film-4' : 'stroke-paper-edge';
  // Turned a quarter, slot 1 is nearest the door: the first half is the lower one.
  return isAcross ? (
    <g>
      <rect x={x} y={y + height / 2} width={width} height={height / 2} className={first} />
      <rect x={x} y={y} width={width} height={height / 2} className={second} />
      <path d={`M${x} ${y + height}h${width}`} strokeWidth="1.1" className={firstEdge} />
      <path d={`M${x} ${y}h${width}`} strokeWidth="1.1" className={secondEdge} />
    </g>
  ) : (
    <g>
      <rect x={x} y={y} width={width / 2} height={height} className={first} />
      <rect x={x + width / 2} y={y} width={width / 2} height={height} className={second} />
      <path d={`M${x} ${y}v${height}`} strokeWidth="1.1" className={firstEdge} />
      <path d={`M${x + width} ${y}v${height}`} strokeWidth="1.1" className={secondEdge} />
    </g>
  );
}

/** A pouch seen broadside: the face that looks at you. */
export function LeafFace({ box, isPaper, label }: GlyphProps & { isPaper: boolean }) {
  const { x, y, width, height } = box;
  return (
    <g>
      <rect
        {...box}
        rx={1}
        className={isPaper ? 'fill-leaf-paper stroke-paper-edge' : 'fill-leaf-film stroke-film-4'}
        strokeWidth="1.1"
      />
      {height > 10 && (
        <path
          d={`M${x + 3} ${y + 4}h${Math.max(0, width - 6)}`}
          strokeDasharray="1.5 2"
          strokeWidth="1"
          className="stroke-film-4"
        />
      )}
      {label !== undefined && isRoomFor(label, box) && (
        <MapText x={x + width / 2} y={y + height / 2 + 4} anchor="middle" weight={560}>
          {label}
        </MapText>
      )}
    </g>
  );
}

export function GhostLeaf({ box }: { box: PixelBox }) {
  return <rect {...box} fill="none" strokeWidth="0.8" strokeDasharray="2 2.5" className="stroke-ink-3" />;
}

/** Where the next one goes: heavy film outline, breathing slowly. */
export function NextSpot({ box }: { box: PixelBox }) {
  const grown = { x: box.x - 2, y: box.y - 2, width: Math.max(box.width + 4, 9), height: box.height + 4 };
  return <rect {...grown} strokeWidth="2.4" className="animate-breathe fill-paper-0 stroke-film-4" />;
}

/** A rigid container from the door end: body, lid band, filters as film bars on the lid. */
export function ContainerFront({ box, label }: GlyphProps) {
  const { x, y, width: w, height: h } = box;
  const lid = Math.min(h * 0.26, 14);
  const corner = Math.min(3, w / 6, h / 6);
  return (
    <g strokeWidth="1.5">
      <path
        d={`M${x + 2} ${y + lid}h${Math.max(0, w - 4)}v${Math.max(0, h - lid - corner)}a${corner} ${corner} 0 0 1-${corner} ${corner}h${-Math.max(0, w - 4 - 2 * corner)}a${corner} ${corner} 0 0 1-${corner}-${corner}z`}
        className="fill-paper-0 stroke-ink-1"
      />
      <rect x={x} y={y} width={w} height={lid} rx={corner} className="fill-paper-2 stroke-ink-1" />
      <rect
        x={x + w * 0.12}
        y={y - 1.5}
        width={w * 0.3}
        height={4}
        strokeWidth="1"
        className="fill-film-1 stroke-film-5"
      />
      <rect
        x={x + w * 0.58}
        y={y - 1.5}
        width={w * 0.3}
        height={4}
        strokeWidth="1"
        className="fill-film-1 stroke-film-5"
      />
      {label !== undefined && isRoomFor(label, { ...box, height: h - lid }) && (
        <MapText x={x + w / 2} y={y + lid + (h - lid) / 2 + 4} anchor="middle" weight={560}>
          {label}
        </MapText>
      )}
    </g>
  );
}

/** A rigid container from above: its lid, with its filters where they really are. */
export function ContainerPlan({ box, label, filters }: GlyphProps & { filters: readonly PixelBox[] }) {
  const perforated = usePattern('perforated');
  return (
    <g>
      <rect {...box} rx={4} strokeWidth="1.5" className="fill-paper-0 stroke-ink-1" />
      {filters.map((filter) => (
        <g key={`${filter.x} ${filter.y}`}>
          <rect {...filter} rx={3} className="fill-film-1 stroke-film-5" strokeWidth="1" />
          <rect {...filter} rx={3} fill={perforated} opacity={0.5} />
        </g>
      ))}
      <CentredLabel box={box} label={label} ground="fill-paper-0" />
    </g>
  );
}

/** A wrapped tray: flap and tape. */
export function Wrapped({ box, label }: GlyphProps) {
  const { x, y, width: w, height: h } = box;
  return (
    <g>
      <rect {...box} rx={2} strokeWidth="1.5" className="fill-paper-0 stroke-paper-edge" />
      <path
        d={`M${x} ${y + h * 0.3}L${x + w / 2} ${y + h * 0.72}L${x + w} ${y + h * 0.3}`}
        fill="none"
        strokeWidth="1"
        className="stroke-paper-edge"
      />
      {w > 24 && h > 12 && (
        <rect
          x={x + w / 2 - 9}
          y={y + h * 0.66}
          width={18}
          height={Math.max(4, h * 0.12)}
          strokeWidth="0.8"
          className="fill-paper-3 stroke-paper-edge"
        />
      )}
      <CentredLabel box={box} label={label} ground="fill-paper-0/80" />
    </g>
  );
}

/** A textile pack: its folds upright, or lying where it lies flat. */
export function Textile({ box, label, isUpright }: GlyphProps & { isUpright: boolean }) {
  const { x, y, width: w, height: h } = box;
  const folds = Array.from({ length: 6 }, (_, fold) =>
    isUpright
      ? `M${x + (w * (fold + 1)) / 7} ${y + 4}v${Math.max(0, h - 8)}`
      : `M${x + 4} ${y + (h * (fold + 1)) / 7}h${Math.max(0, w - 8)}`,
  ).join('');
  return (
    <g>
      <rect {...box} rx={4} strokeWidth="1.4" className="fill-paper-0 stroke-paper-edge" />
      <path d={folds} strokeWidth="1" className="stroke-paper-edge/60" fill="none" />
      <CentredLabel box={box} label={label} ground="fill-paper-0" />
    </g>
  );
}

/** A challenge device: solid ink, with the word. */
export function ChallengeDevice({ box }: { box: PixelBox }) {
  const { x, y, width: w, height: h } = box;
  return (
    <g>
      <rect {...box} className="fill-ink-1" />
      {h > 10 && (
        <path
          d={`M${x + 3} ${y + h - 4}h${Math.max(0, w - 6)}`}
          strokeWidth="1.4"
          strokeDasharray="2 1.5"
          className="stroke-film-2"
        />
      )}
      {w >= 28 && h >= 14 && (
        <MapText x={x + w / 2} y={y + h / 2 + 4} anchor="middle" weight={650} className="fill-paper-0">
          PCD
        </MapText>
      )}
    </g>
  );
}

/** Three shortening lines: where the chamber drains. */
export function Drain({ x, y }: { x: number; y: number }) {
  return (
    <g transform={`translate(${x} ${y})`}>
      <path d="M-15 0h30M-11 3.5h22M-6 7h12" strokeWidth="1.5" className="stroke-ink-2" />
      <MapText x={20} y={5} className="fill-ink-2">
        drain
      </MapText>
    </g>
  );
}
