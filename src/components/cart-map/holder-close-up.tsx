import type { Body, HolderBody } from '#domain/load/layout';
import type { PaperSide } from '#domain/load/model';
import { memo } from 'react';
import { MapText } from './glyphs';
import type { LetteredFinding } from './map-model';
import { MapDrawing, usePattern } from './map-patterns';
import { MapPin } from './map-pin';

const baseHeightPx = 9;
const labelPx = 30;
const topPx = 30;
const depth = { dx: 27, dy: 18 };

export type HolderCloseUpProps = {
  readonly holder: HolderBody;
  /** What is in it. */
  readonly bodies: readonly Body[];
  readonly findings: readonly LetteredFinding[];
  readonly width: number;
  readonly height: number;
  readonly nextSlot: number | null;
  /** Name and paper side of what goes into the next slot. */
  readonly nextName: string | null;
  readonly nextPaper: PaperSide | null;
  readonly openFindingKey: string | null;
  readonly onSlot?: (slot: number, packageId: string | null) => void;
};

/**
 * One rack from the side and a little from the right, so that the right face of every leaf shows: a row that faces one way
 * is a row of film, and one that is turned shows its paper among them. Slots are the touch targets.
 */
export const HolderCloseUp = memo(function HolderCloseUp(props: HolderCloseUpProps) {
  const { holder, bodies, findings, width, height, nextSlot, openFindingKey, onSlot } = props;
  const slots = Array.from({ length: holder.kind.slots ?? 0 }, (_, index) => index + 1);
  const pitch = Math.min(68, (width - depth.dx - 16) / Math.max(slots.length, 1));
  const floor = height - labelPx - baseHeightPx;
  const tallest = floor - topPx - depth.dy;
  const greatest = Math.max(holder.kind.greatestHeightMm ?? 0, ...bodies.map((body) => body.box.top), 1);
  const pixelsHigh = (mm: number) => Math.max(24, (mm / greatest) * tallest);
  const span = slots.length * pitch;
  const inSlot = (slot: number) => bodies.filter((body) => body.slot === slot);
  return (
    <MapDrawing width={width} height={height} label={`${holder.holder.name}, close up`}>
      <path
        d={`M4 ${floor}l${depth.dx + 6} ${-(depth.dy + 4)}h${span}l${-(depth.dx + 6)} ${depth.dy + 4}z`}
        strokeWidth="1.2"
        className="fill-paper-2 stroke-ink-1"
      />
      <rect
        x={4}
        y={floor}
        width={span}
        height={baseHeightPx}
        strokeWidth="1.2"
        className="fill-paper-0 stroke-ink-1"
      />
      {slots.map((slot) => {
        const x = 4 + 12 + (slot - 1) * pitch;
        const here = inSlot(slot);
        const first = here[0];
        const isNext = slot === nextSlot && !first;
        return (
          <g key={slot}>
            {here.map((body, index) => (
              <StandingLeaf
                key={body.packageId}
                x={x + index * 7}
                floor={floor - 3}
                height={pixelsHigh(body.box.top - body.box.bottom)}
                isPaperLeft={body.placement.paper !== 'right'}
                name={pitch >= 30 ? body.item.name : ''}
              />
            ))}
            {isNext && (
              <g className="animate-breathe">
                <StandingLeaf
                  x={x}
                  floor={floor - 3}
                  height={pixelsHigh(greatest * 0.8)}
                  isPaperLeft={props.nextPaper !== 'right'}
                  name={props.nextName ?? ''}
                  isNext
                />
              </g>
            )}
            {!first && !isNext && (
              <path
                d={`M${x} ${floor - 3}v-58l${depth.dx} ${-depth.dy}v58z`}
                fill="none"
                strokeWidth="1"
                strokeDasharray="2.5 3"
                className="stroke-ink-3"
              />
            )}
            {isNext && (
              <rect x={x - 12} y={floor + 12} width={Math.max(pitch - 7, 26)} height={22} className="fill-film-5" />
            )}
            <MapText
              x={x + pitch / 2 - 15}
              y={floor + 28}
              anchor="middle"
              size={14}
              weight={isNext ? 700 : 560}
              className={isNext ? 'fill-paper-0' : first ? 'fill-ink-1' : 'fill-ink-2'}
            >
              {String(slot)}
            </MapText>
            {onSlot && (
              <rect
                x={x - 13}
                y={4}
                width={pitch}
                height={height - 6}
                fill="transparent"
                role="button"
                tabIndex={0}
                aria-label={slotWords(slot, here, isNext)}
                className="cursor-pointer outline-offset-[-3px] focus-visible:outline-3 focus-visible:outline-ink-1"
                onClick={() => {
                  onSlot(slot, first?.packageId ?? null);
                }}
                onKeyDown={(event) => {
                  if (event.key !== 'Enter' && event.key !== ' ') return;
                  event.preventDefault();
                  onSlot(slot, first?.packageId ?? null);
                }}
              />
            )}
          </g>
        );
      })}
      {findings.flatMap(({ letter, finding }) => {
        const slot = slotOf(finding, holder, bodies);
        if (slot === null) return [];
        return [
          <MapPin
            key={finding.key}
            x={4 + 24 + (slot - 1) * pitch}
            y={topPx}
            letter={letter}
            severity={finding.severity}
            isOpen={finding.key === openFindingKey}
          />,
        ];
      })}
    </MapDrawing>
  );
});

function slotOf({ places }: LetteredFinding['finding'], holder: HolderBody, bodies: readonly Body[]): number | null {
  for (const place of places) {
    if (place.on === 'holder' && place.holderId === holder.holder.holderId) return place.slot;
    if (place.on === 'package') {
      const body = bodies.find((entry) => entry.packageId === place.packageId);
      if (body) return body.slot;
    }
  }
  return null;
}

function slotWords(slot: number, here: readonly Body[], isNext: boolean): string {
  if (here.length === 0) return `Slot ${slot}, ${isNext ? 'next' : 'free'}`;
  return here
    .map(
      (body) =>
        `Slot ${slot}, ${body.item.name}${body.placement.paper === null ? '' : `, paper side ${body.placement.paper}`}`,
    )
    .join('; ');
}

function StandingLeaf({
  x,
  floor,
  height,
  isPaperLeft,
  name,
  isNext = false,
}: {
  x: number;
  floor: number;
  height: number;
  isPaperLeft: boolean;
  name: string;
  isNext?: boolean;
}) {
  const gloss = usePattern('gloss');
  const { dx, dy } = depth;
  const face = `M${x} ${floor}v${-height}l${dx} ${-dy}v${height}z`;
  const edgeX = x - 2.5;
  // As many characters as the leaf is high: about 7 px each at 13 px.
  const fitting = Math.floor((height - 14) / 7);
  const shown = name.length > fitting ? `${name.slice(0, Math.max(0, fitting - 1)).trimEnd()}…` : name;
  return (
    <g>
      <path
        d={face}
        strokeWidth="1.2"
        className={
          isPaperLeft
            ? isNext
              ? 'fill-film-1/75 stroke-film-4'
              : 'fill-leaf-film stroke-film-4'
            : 'fill-leaf-paper stroke-paper-edge'
        }
        strokeDasharray={isNext ? '5 3' : undefined}
      />
      {isPaperLeft && !isNext && <path d={face} fill={gloss} />}
      {isPaperLeft && !isNext && <path d={`M${x + dx} ${floor - dy}v-9l${-dx} ${dy}v9z`} className="fill-film-3/35" />}
      <path
        d={`M${edgeX} ${floor + 1}v${-height - 2}`}
        strokeWidth="5"
        className={isPaperLeft ? 'stroke-leaf-paper' : 'stroke-leaf-film'}
      />
      <path
        d={`M${edgeX - 2.5} ${floor + 1}v${-height - 2}`}
        strokeWidth="1.2"
        className={isPaperLeft ? 'stroke-paper-edge' : 'stroke-film-4'}
      />
      {fitting >= 4 && (
        <text
          transform={`matrix(0 -1 ${(dx / 32).toFixed(3)} ${(-dy / 32).toFixed(3)} ${x + dx * 0.62} ${floor - 7 - dy * 0.62})`}
          fontSize={13}
          fontWeight={isNext ? 640 : 560}
          className={isNext ? 'fill-film-5' : 'fill-ink-1'}
        >
          {shown}
        </text>
      )}
    </g>
  );
}
