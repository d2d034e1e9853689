import type { Layout } from '#domain/load/layout';
import type { LoadView, Shelf } from '#domain/load/model';
import { memo, useMemo } from 'react';
import { BodyFront } from './body-glyph';
import { Drain, GhostLeaf, NextSpot, type PixelBox } from './glyphs';
import { anchorOf, freeSlots, ghostSlotBox, withFreeLabels, type LetteredFinding, type NextPlace } from './map-model';
import { MapDrawing, usePattern } from './map-patterns';
import { MapPin } from './map-pin';
import { spreadPins } from './spread-pins';

/** Of the drawing only: how thick a shelf's deck is. */
const deckMm = 16;
const topMarginPx = 18;
/** Room for the drain and its word, within the chamber. */
const footPx = 24;

type Box = { readonly left: number; readonly right: number; readonly bottom: number; readonly top: number };

/** From shelf millimetres, seen from the door end, to screen pixels. */
function frontFrame(view: LoadView, scale: number) {
  const upward = [...view.cart.shelves].sort((a, b) => a.level - b.level);
  const heightMm = upward.reduce((sum, shelf) => sum + shelf.clearHeightMm + deckMm, 0);
  const chamberWidthMm = Math.max(view.sterilizer.chamberWidthMm, ...upward.map((shelf) => shelf.widthMm));
  const width = chamberWidthMm * scale + 4;
  const height = topMarginPx + heightMm * scale + footPx;
  const deckOf = new Map<string, number>();
  let z = 0;
  for (const shelf of upward) {
    deckOf.set(shelf.id, z + deckMm);
    z += deckMm + shelf.clearHeightMm;
  }
  const floor = topMarginPx + heightMm * scale;
  const leftOf = (shelf: Shelf) => 2 + ((chamberWidthMm - shelf.widthMm) / 2) * scale;
  const toPixels = (shelf: Shelf, box: Box): PixelBox => ({
    x: leftOf(shelf) + box.left * scale,
    y: floor - ((deckOf.get(shelf.id) ?? 0) + box.top) * scale,
    width: (box.right - box.left) * scale,
    height: (box.top - box.bottom) * scale,
  });
  return { upward, width, height, floor, leftOf, toPixels, chamberWidthMm };
}

/** How wide the drawing is at this scale, px. */
export function elevationWidth(view: LoadView, scale: number): number {
  return frontFrame(view, scale).width;
}

/** How high the drawing is at this scale, px. */
export function elevationHeight(view: LoadView, scale: number): number {
  return frontFrame(view, scale).height;
}

export type CartElevationProps = {
  readonly view: LoadView;
  readonly layout: Layout;
  readonly findings: readonly LetteredFinding[];
  /** Screen pixels per millimetre. */
  readonly scale: number;
  readonly activeShelfId: string | null;
  readonly openFindingKey: string | null;
  readonly next: NextPlace | null;
  readonly onShelf?: (shelfId: string) => void;
};

/** The cart from the door end, to scale. The rows of the reckoning beside it choose a shelf for keyboards and readers. */
export const CartElevation = memo(function CartElevation({
  view,
  layout,
  findings,
  scale,
  activeShelfId,
  openFindingKey,
  next,
  onShelf,
}: CartElevationProps) {
  const frame = useMemo(() => frontFrame(view, scale), [view, scale]);
  const { upward, width, height, floor, leftOf, toPixels, chamberWidthMm } = frame;
  const shelfById = new Map(upward.map((shelf) => [shelf.id, shelf]));
  const lowest = upward[0];
  const pins = spreadPins(
    findings.flatMap(({ letter, finding }) => {
      const anchor = anchorOf(layout, finding);
      const shelf = anchor && shelfById.get(anchor.shelfId);
      if (!anchor || !shelf) return [];
      const box = toPixels(shelf, anchor.box);
      return [{ x: box.x + box.width / 2, y: box.y + 8, letter, finding }];
    }),
    { width, height },
  );
  pins.sort((a, b) => Number(a.finding.key === openFindingKey) - Number(b.finding.key === openFindingKey));
  return (
    <MapDrawing width={width} height={height} label={`${view.cart.name} from the door end`}>
      <path
        d={`M1 ${topMarginPx - 12}h${chamberWidthMm * scale + 2}v${height - topMarginPx + 11}h${-(chamberWidthMm * scale + 2)}z`}
        fill="none"
        strokeWidth="1"
        strokeDasharray="1 3"
        className="stroke-ink-3"
      />
      {upward.map((shelf) => {
        const left = leftOf(shelf);
        const right = left + shelf.widthMm * scale;
        const space = toPixels(shelf, { left: 0, right: shelf.widthMm, bottom: 0, top: shelf.clearHeightMm });
        return (
          <g
            key={shelf.id}
            {...(onShelf
              ? {
                  onClick: () => {
                    onShelf(shelf.id);
                  },
                  className: 'cursor-pointer',
                }
              : {})}
          >
            <rect {...space} className={shelf.id === activeShelfId ? 'fill-film-1/75' : 'fill-transparent'} />
            <path
              d={`M${left} ${space.y}V${floor}M${right} ${space.y}V${floor}`}
              strokeWidth="3"
              className="stroke-ink-1"
            />
            <rect
              x={left}
              y={space.y + space.height}
              width={shelf.widthMm * scale}
              height={Math.max(4, deckMm * scale * 0.6)}
              strokeWidth="1.1"
              className="fill-paper-0 stroke-ink-1"
            />
            {shelf.surface === 'wire' && (
              <path
                d={`M${left + 5} ${space.y + space.height + 2.2}H${right - 5}`}
                strokeWidth="1"
                strokeDasharray="1 3"
                className="stroke-ink-1"
              />
            )}
          </g>
        );
      })}
      {layout.shelves.map(({ shelf, bodies, holders }) => (
        <g key={shelf.id} className="pointer-events-none">
          {holders.map((holder) => {
            const rail = toPixels(shelf, { ...holder.box, bottom: 0, top: Math.min(60, holder.box.top) });
            return (
              <g key={holder.holder.holderId}>
                {holder.kind.form === 'rack' &&
                  holder.holder.turn === 0 &&
                  freeSlots(holder, bodies).map((slot) => (
                    <GhostLeaf key={slot} box={toPixels(shelf, ghostSlotBox(holder, slot))} />
                  ))}
                <path
                  d={`M${rail.x} ${rail.y}v${rail.height}h${rail.width}v${-rail.height}M${rail.x} ${rail.y + rail.height * 0.62}h${rail.width}`}
                  fill="none"
                  strokeWidth="1.2"
                  className="stroke-ink-1"
                />
              </g>
            );
          })}
          {withFreeLabels(
            [...bodies].sort((a, b) => b.box.front - a.box.front || a.box.bottom - b.box.bottom),
            (body) => toPixels(shelf, body.box),
          ).map(({ body, box, label }) => (
            <BodyFront key={body.packageId} body={body} box={box} label={label} />
          ))}
          {next?.shelfId === shelf.id && <NextSpot box={toPixels(shelf, next.box)} />}
        </g>
      ))}
      <FrontGaps findings={findings} layout={layout} toPixels={toPixels} />
      {lowest && <Drain x={leftOf(lowest) + view.sterilizer.drainXMm * scale} y={floor + 8} />}
      {pins.map(({ x, y, letter, finding }) => (
        <MapPin
          key={finding.key}
          x={x}
          y={y}
          letter={letter}
          severity={finding.severity}
          isOpen={finding.key === openFindingKey}
        />
      ))}
    </MapDrawing>
  );
});

/** Hatch over what a finding holds the load for, so that the place is seen and not only its pin. */
function FrontGaps({
  findings,
  layout,
  toPixels,
}: {
  findings: readonly LetteredFinding[];
  layout: Layout;
  toPixels: (shelf: Shelf, box: Box) => PixelBox;
}) {
  const bad = usePattern('bad');
  const stopped = new Set(
    findings.flatMap(({ finding }) =>
      finding.severity === 'stop'
        ? finding.places.flatMap((place) => (place.on === 'package' ? [place.packageId] : []))
        : [],
    ),
  );
  return layout.bodies
    .filter((body) => stopped.has(body.packageId))
    .map((body) => (
      <rect
        key={body.packageId}
        {...toPixels(body.shelf, body.box)}
        fill={bad}
        opacity={0.3}
        className="pointer-events-none"
      />
    ));
}
