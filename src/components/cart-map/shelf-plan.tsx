import { commonRect } from '#domain/geometry/box';
import type { Finding } from '#domain/load/finding';
import { filterRects, type Body, type HolderBody, type Layout } from '#domain/load/layout';
import { placementWords } from '#domain/load/describe-place';
import type { LoadView, Shelf } from '#domain/load/model';
import { memo, useRef, useState, type KeyboardEvent } from 'react';
import { BodyPlan, type PlanRect } from './body-glyph';
import { GhostLeaf, MapText, NextSpot, type PixelBox } from './glyphs';
import {
  anchorOf,
  freeSlots,
  ghostSlotBox,
  subjectsOf,
  withFreeLabels,
  type LetteredFinding,
  type NextPlace,
} from './map-model';
import { MapDrawing, usePattern } from './map-patterns';
import { MapPin } from './map-pin';
import { spreadPins } from './spread-pins';

const marginPx = 10;
const doorPx = 26;

function planFrame(shelf: Shelf, scale: number) {
  const width = shelf.widthMm * scale + 2 * marginPx;
  const height = marginPx + shelf.depthMm * scale + doorPx;
  const toPixels = (rect: PlanRect): PixelBox => ({
    x: marginPx + rect.left * scale,
    y: marginPx + (shelf.depthMm - rect.back) * scale,
    width: (rect.right - rect.left) * scale,
    height: (rect.back - rect.front) * scale,
  });
  return { width, height, toPixels };
}

export function planWidth(shelf: Shelf, scale: number): number {
  return planFrame(shelf, scale).width;
}

export type ShelfPlanProps = {
  readonly view: LoadView;
  readonly layout: Layout;
  readonly shelf: Shelf;
  readonly findings: readonly LetteredFinding[];
  readonly scale: number;
  /** Free space asked for along the edge, mm: drawn as a fine hatch; 0 draws none. */
  readonly keepClearMm: number;
  readonly openFindingKey: string | null;
  readonly next: NextPlace | null;
  readonly activeHolderId: string | null;
  readonly pickedPackageId: string | null;
  readonly onPackage?: (packageId: string) => void;
  readonly onHolder?: (holderId: string) => void;
};

/** One shelf from above, door end at the bottom, so that left on the map is left at the door. */
export const ShelfPlan = memo(function ShelfPlan(props: ShelfPlanProps) {
  const { view, layout, shelf, findings, scale, openFindingKey, next, activeHolderId } = props;
  const { width, height, toPixels } = planFrame(shelf, scale);
  const here = layout.shelves.find((entry) => entry.shelf.id === shelf.id);
  const bodies = here?.bodies ?? [];
  const holders = here?.holders ?? [];
  const pins = spreadPins(
    findings.flatMap(({ letter, finding }) => {
      const anchor = anchorOf(layout, finding);
      if (anchor?.shelfId !== shelf.id) return [];
      const box = toPixels(anchor.box);
      return [{ x: box.x + box.width / 2, y: box.y + Math.min(box.height / 2 + 13, 34), letter, finding }];
    }),
    { width, height: height - doorPx },
  );
  pins.sort((a, b) => Number(a.finding.key === openFindingKey) - Number(b.finding.key === openFindingKey));
  return (
    <MapDrawing width={width} height={height} label={`${shelf.name} from above, the door at the bottom`}>
      <ShelfGround shelf={shelf} scale={scale} keepClearMm={props.keepClearMm} />
      {holders.map((holder) => (
        <HolderPlan
          key={holder.holder.holderId}
          holder={holder}
          bodies={bodies}
          isActive={holder.holder.holderId === activeHolderId}
          toPixels={toPixels}
          onHolder={props.onHolder}
        />
      ))}
      <Bodies
        {...props}
        bodies={bodies}
        toPixels={toPixels}
        describe={(body) => `${body.item.name}, ${placementWords(view, body.placement, body.item)}`}
      />
      {next?.shelfId === shelf.id && <NextSpot box={toPixels(next.box)} />}
      {holders.map((holder) => (
        <HolderLabel key={holder.holder.holderId} holder={holder} bodies={bodies} toPixels={toPixels} />
      ))}
      <Gaps findings={findings} layout={layout} shelf={shelf} toPixels={toPixels} />
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
      <DoorEnd width={width} y={height - doorPx} />
    </MapDrawing>
  );
});

function ShelfGround({ shelf, scale, keepClearMm }: { shelf: Shelf; scale: number; keepClearMm: number }) {
  const wire = usePattern('wire');
  const keepClear = usePattern('keep-clear');
  const [w, h, c] = [shelf.widthMm * scale, shelf.depthMm * scale, keepClearMm * scale];
  const m = marginPx;
  return (
    <>
      <rect x={m} y={m} width={w} height={h} className="fill-paper-0" />
      {shelf.surface === 'wire' && <rect x={m} y={m} width={w} height={h} fill={wire} />}
      {c > 1 && (
        <path
          fillRule="evenodd"
          fill={keepClear}
          d={`M${m} ${m}h${w}v${h}h${-w}zM${m + c} ${m + c}v${h - 2 * c}h${w - 2 * c}v${-(h - 2 * c)}z`}
        />
      )}
      <rect x={m} y={m} width={w} height={h} fill="none" strokeWidth="1.6" className="stroke-ink-1" />
    </>
  );
}

function HolderPlan({
  holder,
  bodies,
  isActive,
  toPixels,
  onHolder,
}: {
  holder: HolderBody;
  bodies: readonly Body[];
  isActive: boolean;
  toPixels: (rect: PlanRect) => PixelBox;
  onHolder: ((holderId: string) => void) | undefined;
}) {
  const box = toPixels(holder.box);
  const { holderId } = holder.holder;
  const free = freeSlots(holder, bodies);
  return (
    <g
      {...(onHolder
        ? {
            onClick: () => {
              onHolder(holderId);
            },
            className: 'cursor-pointer',
          }
        : {})}
    >
      <rect
        {...box}
        strokeWidth={isActive ? 2.4 : 1.5}
        className={isActive ? 'fill-film-1/80 stroke-film-5' : 'fill-transparent stroke-ink-1'}
      />
      {holder.kind.form === 'rack' &&
        free.map((slot) => <GhostLeaf key={slot} box={toPixels(ghostSlotBox(holder, slot))} />)}
    </g>
  );
}

/** Over the leaves, at the holder's foot: its name and how full it is. */
function HolderLabel({
  holder,
  bodies,
  toPixels,
}: {
  holder: HolderBody;
  bodies: readonly Body[];
  toPixels: (rect: PlanRect) => PixelBox;
}) {
  const box = toPixels(holder.box);
  const { name } = holder.holder;
  const slots = holder.kind.slots ?? 0;
  const taken = slots - freeSlots(holder, bodies).length;
  const label = slots === 0 ? name : taken === slots ? `${name}, full` : `${name}, ${taken} of ${slots}`;
  return (
    <g className="pointer-events-none">
      <rect x={box.x + 1} y={box.y + box.height - 16} width={box.width - 2} height={15} className="fill-paper-0" />
      <MapText x={box.x + 4} y={box.y + box.height - 4} weight={600}>
        {label}
      </MapText>
    </g>
  );
}

type BodiesProps = ShelfPlanProps & {
  readonly bodies: readonly Body[];
  readonly toPixels: (rect: PlanRect) => PixelBox;
  readonly describe: (body: Body) => string;
};

/** Packages can be walked with the arrow keys: one stop for Tab, nearest the door first. */
function Bodies({ bodies, toPixels, describe, findings, pickedPackageId, onPackage }: BodiesProps) {
  const group = useRef<SVGGElement>(null);
  const [stop, setStop] = useState(0);
  const walk = [...bodies].sort((a, b) => a.box.front - b.box.front || a.box.left - b.box.left);
  const painted = [...bodies].sort((a, b) => a.box.bottom - b.box.bottom);
  const order = new Map(walk.map((body, index) => [body.packageId, index]));
  const bad = usePattern('bad');
  const stopped = new Set(findings.flatMap(({ finding }) => (finding.severity === 'stop' ? subjectsOf(finding) : [])));

  function go(event: KeyboardEvent<SVGGElement>, index: number) {
    const steps: Readonly<Record<string, number>> = { ArrowRight: 1, ArrowUp: 1, ArrowLeft: -1, ArrowDown: -1 };
    const step = steps[event.key];
    if (event.key === 'Enter' || event.key === ' ') {
      event.preventDefault();
      const body = walk[index];
      if (body) onPackage?.(body.packageId);
      return;
    }
    if (step === undefined) return;
    event.preventDefault();
    const to = Math.min(Math.max(index + step, 0), walk.length - 1);
    setStop(to);
    group.current?.querySelector<SVGGElement>(`[data-walk="${to}"]`)?.focus();
  }

  return (
    <g ref={group}>
      {withFreeLabels(painted, (body) => toPixels(body.box)).map(({ body, box, label }) => {
        const index = order.get(body.packageId) ?? 0;
        return (
          <g
            key={body.packageId}
            {...(onPackage
              ? {
                  role: 'button',
                  tabIndex: index === Math.min(stop, walk.length - 1) ? 0 : -1,
                  'data-walk': index,
                  'aria-label': describe(body),
                  'aria-pressed': body.packageId === pickedPackageId,
                  onClick: () => {
                    onPackage(body.packageId);
                  },
                  onKeyDown: (event: KeyboardEvent<SVGGElement>) => {
                    go(event, index);
                  },
                  className: 'cursor-pointer focus-visible:outline-3 focus-visible:outline-ink-1',
                }
              : {})}
          >
            <BodyPlan body={body} box={box} label={label} toPixels={toPixels} />
            {stopped.has(body.packageId) && <rect {...box} fill={bad} opacity={0.3} />}
            {body.packageId === pickedPackageId && (
              <rect
                x={box.x - 3}
                y={box.y - 3}
                width={box.width + 6}
                height={box.height + 6}
                fill="none"
                strokeWidth="2.4"
                className="stroke-ink-1"
              />
            )}
          </g>
        );
      })}
    </g>
  );
}

/** The gap a clearance is measured across: a hatch and the figure. And the part of a lid filter that is covered. */
function Gaps({
  findings,
  layout,
  shelf,
  toPixels,
}: {
  findings: readonly LetteredFinding[];
  layout: Layout;
  shelf: Shelf;
  toPixels: (rect: PlanRect) => PixelBox;
}) {
  const warn = usePattern('warn');
  const bad = usePattern('bad');
  return findings.flatMap(({ finding }) => {
    const onShelf = subjectsOf(finding).flatMap((id) => {
      const body = layout.bodyOf.get(id);
      return body?.shelf.id === shelf.id ? [body] : [];
    });
    if (finding.ruleId === 'lid-filter-covered') {
      return coveredFilters(onShelf).map((rect) => (
        <rect
          key={`${finding.key} ${rect.left} ${rect.front}`}
          {...toPixels(rect)}
          fill={bad}
          className="pointer-events-none"
        />
      ));
    }
    const gap = gapOf(finding, onShelf, shelf);
    if (!gap) return [];
    const box = toPixels(gap);
    const figure = finding.figure ? `${Math.round(finding.figure.measured)} mm` : '';
    const halfWidth = figure.length * 3.4 + 3;
    // At the very edge of the shelf the figure would be cut off by the edge of the drawing.
    const farthest =
      toPixels({ left: shelf.widthMm, right: shelf.widthMm, front: 0, back: 0 }).x + marginPx - halfWidth;
    const middle = Math.min(Math.max(box.x + box.width / 2, halfWidth), farthest);
    return [
      <g key={finding.key} className="pointer-events-none">
        <rect {...box} width={Math.max(box.width, 2)} height={Math.max(box.height, 2)} fill={warn} />
        <rect
          x={middle - halfWidth}
          y={box.y + box.height / 2 - 8}
          width={2 * halfWidth}
          height={16}
          className="fill-straw-1"
        />
        <MapText x={middle} y={box.y + box.height / 2 + 4} anchor="middle" weight={600}>
          {figure}
        </MapText>
      </g>,
    ];
  });
}

function coveredFilters(bodies: readonly Body[]): PlanRect[] {
  return bodies.flatMap((container) =>
    filterRects(container, 'lid').flatMap((filter) =>
      bodies.flatMap((other) => {
        if (other === container || other.box.bottom < container.box.top) return [];
        const common = commonRect(filter, other.box);
        return common ? [common] : [];
      }),
    ),
  );
}

function gapOf(finding: Finding, [one, other]: readonly Body[], shelf: Shelf): PlanRect | null {
  if (finding.figure?.unit !== 'mm' || !one) return null;
  if (finding.ruleId === 'wall-clearance' || finding.ruleId === 'shelf-edge') {
    const { left, right, front, back } = one.box;
    const sides = [
      { free: left, rect: { left: 0, right: left, front, back } },
      { free: shelf.widthMm - right, rect: { left: right, right: shelf.widthMm, front, back } },
      { free: front, rect: { left, right, front: 0, back: front } },
      { free: shelf.depthMm - back, rect: { left, right, front: back, back: shelf.depthMm } },
    ];
    const nearest = sides.sort((a, b) => a.free - b.free)[0];
    return nearest && nearest.free > 0 ? nearest.rect : null;
  }
  if (!other || (finding.ruleId !== 'gap' && finding.ruleId !== 'package-clearance')) return null;
  return between(one.box, other.box);
}

function between(a: PlanRect, b: PlanRect): PlanRect | null {
  const isBeside = Math.min(a.back, b.back) > Math.max(a.front, b.front);
  const isBehind = Math.min(a.right, b.right) > Math.max(a.left, b.left);
  if (isBeside) {
    const [left, right] = a.left < b.left ? [a.right, b.left] : [b.right, a.left];
    return left < right ? { left, right, front: Math.max(a.front, b.front), back: Math.min(a.back, b.back) } : null;
  }
  if (isBehind) {
    const [front, back] = a.front < b.front ? [a.back, b.front] : [b.back, a.front];
    return front < back ? { left: Math.max(a.left, b.left), right: Math.min(a.right, b.right), front, back } : null;
  }
  return null;
}

function DoorEnd({ width, y }: { width: number; y: number }) {
  return (
    <>
      <path
        d={`M${marginPx} ${y + 5}v6h${width - 2 * marginPx}v-6`}
        fill="none"
        strokeWidth="1.2"
        className="stroke-ink-1"
      />
      <rect x={width / 2 - 62} y={y + 4} width={124} height={14} className="fill-paper-1" />
      <MapText x={width / 2} y={y + 15} anchor="middle" weight={600}>
        Door, you stand here
      </MapText>
    </>
  );
}
