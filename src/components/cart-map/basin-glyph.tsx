import type { Pose } from '#domain/load/model';
import { CentredLabel, type PixelBox } from './glyphs';

type Point = { readonly x: number; readonly y: number };

/** A bowl seen from the side: a curve from one end of its rim to the other. y downwards, in screen pixels. */
export type BowlProfile = {
  readonly rim: readonly [Point, Point];
  readonly controls: readonly [Point, Point];
};

/** A cubic curve rises to three quarters of its control points. */
const controlShare = 4 / 3;

function bowl(origin: Point, along: Point, away: Point): BowlProfile {
  const at = (u: number, v: number): Point => ({
    x: origin.x + u * along.x + v * away.x,
    y: origin.y + u * along.y + v * away.y,
  });
  return { rim: [at(0, 0), at(1, 0)], controls: [at(0, controlShare), at(1, controlShare)] };
}

/**
 * How far a basin leans, in radians, from the room it takes: its cross section, `across` by `thick`, turned by the angle
 * is as high as across sin(a) + thick cos(a).
 */
export function leanFromRoom(section: { readonly across: number; readonly thick: number }, height: number): number {
  const diagonal = Math.hypot(section.across, section.thick);
  return Math.asin(Math.min(1, height / diagonal)) - Math.atan2(section.thick, section.across);
}

/**
 * The bowl within the room it takes, always down to the foot of it. Tilted, it lies with its mouth down on one end of its
 * rim and is raised at the other; flat, it stands on its bottom; on edge, on its rim.
 */
export function bowlIn({ x, y, width, height }: PixelBox, pose: Pose, lean = 0): BowlProfile {
  const foot = y + height;
  switch (pose) {
    case 'flat':
      return bowl({ x, y }, { x: width, y: 0 }, { x: 0, y: height });
    case 'on-edge':
      return bowl({ x, y }, { x: 0, y: height }, { x: width, y: 0 });
    case 'tilted': {
      const [sine, cosine, double] = [Math.sin(lean), Math.cos(lean), Math.cos(2 * lean)];
      const across = (width * cosine - height * sine) / double;
      const thick = (height * cosine - width * sine) / double;
      // Room of another shape than a leaning cross section: seen along the tilt, or sizes that make no sense.
      if (!(across > 0 && thick > 0)) return bowl({ x, y: foot }, { x: width, y: 0 }, { x: 0, y: -height });
      return bowl(
        { x: x + thick * sine, y: foot },
        { x: across * cosine, y: -across * sine },
        { x: -thick * sine, y: -thick * cosine },
      );
    }
  }
}

function pathOf({ rim: [from, to], controls: [first, second] }: BowlProfile): string {
  return `M${from.x} ${from.y}C${first.x} ${first.y} ${second.x} ${second.y} ${to.x} ${to.y}`;
}

/** The next bowl of a nest: smaller, in the mouth of the one around it. */
function nested({ rim, controls }: BowlProfile): BowlProfile {
  const middle = { x: (rim[0].x + rim[1].x) / 2, y: (rim[0].y + rim[1].y) / 2 };
  const inward = (point: Point): Point => ({
    x: middle.x + (point.x - middle.x) * 0.72,
    y: middle.y + (point.y - middle.y) * 0.72,
  });
  return { rim: [inward(rim[0]), inward(rim[1])], controls: [inward(controls[0]), inward(controls[1])] };
}

/** Basins from the side: nested bowls. One that leans shows the wedge that raises it. */
export function BasinSide({
  box,
  pose,
  lean = 0,
  label,
}: {
  box: PixelBox;
  pose: Pose;
  /** Radians, where the tilt is seen from its side; 0 where it is seen along. */
  lean?: number;
  label?: string | undefined;
}) {
  const profile = bowlIn(box, pose, lean);
  const [low, high] = profile.rim;
  return (
    <g>
      {pose === 'tilted' && lean > 0 && (
        <path
          d={`M${low.x} ${low.y}L${high.x} ${high.y}V${low.y}z`}
          strokeWidth="1"
          className="fill-paper-2 stroke-ink-1"
        />
      )}
      <path d={`${pathOf(profile)}z`} strokeWidth="1.5" className="fill-paper-0 stroke-paper-edge" />
      <path d={pathOf(nested(profile))} fill="none" strokeWidth="1" className="stroke-paper-edge" />
      <CentredLabel box={box} label={label} ground="fill-paper-0/80" />
    </g>
  );
}

/** Basins from above: one within the other. */
export function BasinPlan({ box, label }: { box: PixelBox; label?: string | undefined }) {
  const { x, y, width: w, height: h } = box;
  return (
    <g>
      <rect {...box} rx={Math.min(w, h) / 2.4} strokeWidth="1.5" className="fill-paper-0 stroke-paper-edge" />
      <rect
        x={x + w * 0.1}
        y={y + h * 0.1}
        width={w * 0.8}
        height={h * 0.8}
        rx={Math.min(w, h) / 3}
        fill="none"
        strokeWidth="1"
        className="stroke-paper-edge"
      />
      <CentredLabel box={box} label={label} ground="fill-paper-0/80" />
    </g>
  );
}
