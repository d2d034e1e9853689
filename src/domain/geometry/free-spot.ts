import { mm, type Millimetre } from '../units/quantity';
import { gapAcross, gapAlong, planDistance, rectAt, type ShelfRect } from './box';

export type Obstacle = {
  readonly rect: ShelfRect;
  /** Free space it asks for around itself, in mm. */
  readonly clearanceMm: number;
};

export type SpotSearch = {
  readonly shelf: { readonly widthMm: number; readonly depthMm: number };
  readonly size: { readonly widthMm: number; readonly depthMm: number };
  /** Free space the thing asks for around itself, in mm. */
  readonly clearanceMm: number;
  /** Kept free at the left and right, and at the door and the far end, in mm. */
  readonly marginAcrossMm: number;
  readonly marginAlongMm: number;
  readonly obstacles: readonly Obstacle[];
};

export type Spot = { readonly xMm: Millimetre; readonly yMm: Millimetre };

/**
 * Free spots for a footprint on a shelf, from the door inwards and from the left: every spot in which it touches a margin
 * or just keeps its clearance to something. Where no such spot is free, none is.
 */
export function freeSpots(search: SpotSearch): readonly Spot[] {
  const { shelf, size, obstacles, marginAcrossMm, marginAlongMm } = search;
  const lastX = shelf.widthMm - marginAcrossMm - size.widthMm;
  const lastY = shelf.depthMm - marginAlongMm - size.depthMm;
  if (lastX < marginAcrossMm || lastY < marginAlongMm) return [];
  const keeps = obstacles.map((obstacle) => Math.max(obstacle.clearanceMm, search.clearanceMm));
  const xs = [marginAcrossMm, lastX];
  const ys = [marginAlongMm, lastY];
  obstacles.forEach(({ rect }, index) => {
    const keep = keeps[index] ?? 0;
    xs.push(rect.right + keep, rect.left - keep - size.widthMm);
    ys.push(rect.back + keep, rect.front - keep - size.depthMm);
  });
  const within = (values: readonly number[], least: number, greatest: number) =>
    [...new Set(values)].filter((value) => value >= least && value <= greatest).sort((a, b) => a - b);
  const spots: Spot[] = [];
  const columns = within(xs, marginAcrossMm, lastX);
  for (const y of within(ys, marginAlongMm, lastY)) {
    for (const x of columns) {
      const rect = rectAt({ x, y }, size);
      const isFree = obstacles.every(
        (obstacle, index) =>
          !isOver(rect, obstacle.rect) && planDistance(rect, obstacle.rect) >= (keeps[index] ?? 0) - 1e-6,
      );
      if (isFree) spots.push({ xMm: mm(x), yMm: mm(y) });
    }
  }
  return spots;
}

function isOver(a: ShelfRect, b: ShelfRect): boolean {
  return gapAcross(a, b) < 0 && gapAlong(a, b) < 0;
}
