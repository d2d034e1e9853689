import { mm, type Millimetre } from '../units/quantity';

/**
 * A box with its sides along the axes of the shelf frame: x to the right, y away from the door, z up, in millimetres.
 * Every turn is a quarter turn, so a box says all there is about where a thing stands.
 */
export type ShelfBox = {
  readonly left: Millimetre;
  readonly right: Millimetre;
  /** The side nearest the door. */
  readonly front: Millimetre;
  readonly back: Millimetre;
  readonly bottom: Millimetre;
  readonly top: Millimetre;
};

/** A rectangle in the plan of a shelf. */
export type ShelfRect = Pick<ShelfBox, 'left' | 'right' | 'front' | 'back'>;

export type Extent = {
  /** Along x. */
  readonly widthMm: number;
  /** Along y. */
  readonly depthMm: number;
  readonly heightMm: number;
};

export function boxAt(corner: { readonly x: number; readonly y: number; readonly z: number }, size: Extent): ShelfBox {
  return {
    left: mm(corner.x),
    right: mm(corner.x + size.widthMm),
    front: mm(corner.y),
    back: mm(corner.y + size.depthMm),
    bottom: mm(corner.z),
    top: mm(corner.z + size.heightMm),
  };
}

export function rectAt(
  corner: { readonly x: number; readonly y: number },
  size: Pick<Extent, 'widthMm' | 'depthMm'>,
): ShelfRect {
  return {
    left: mm(corner.x),
    right: mm(corner.x + size.widthMm),
    front: mm(corner.y),
    back: mm(corner.y + size.depthMm),
  };
}

/** Free width between two things along x in mm; below zero is how far they reach into each other. */
export function gapAcross(a: ShelfRect, b: ShelfRect): number {
  return Math.max(a.left, b.left) - Math.min(a.right, b.right);
}

/** Free depth between two things along y in mm; below zero is how far they reach into each other. */
export function gapAlong(a: ShelfRect, b: ShelfRect): number {
  return Math.max(a.front, b.front) - Math.min(a.back, b.back);
}

/** Free height between two things in mm; below zero is how much of their heights they share. */
export function gapUpward(a: ShelfBox, b: ShelfBox): number {
  return Math.max(a.bottom, b.bottom) - Math.min(a.top, b.top);
}

/** Shortest way in mm between two footprints in plan; 0 where they touch or reach into each other. */
export function planDistance(a: ShelfRect, b: ShelfRect): number {
  return Math.hypot(Math.max(gapAcross(a, b), 0), Math.max(gapAlong(a, b), 0));
}

/** The part two rectangles share, or null where they share no area. */
export function commonRect(a: ShelfRect, b: ShelfRect): ShelfRect | null {
  const left = Math.max(a.left, b.left);
  const right = Math.min(a.right, b.right);
  const front = Math.max(a.front, b.front);
  const back = Math.min(a.back, b.back);
  return left < right && front < back ? { left: mm(left), right: mm(right), front: mm(front), back: mm(back) } : null;
}

/** Square millimetres. */
export function areaOf(rect: ShelfRect): number {
  return Math.max(rect.right - rect.left, 0) * Math.max(rect.back - rect.front, 0);
}

/** Square millimetres that the rectangles cover together, each spot counted once. */
export function coveredArea(rects: readonly ShelfRect[]): number {
  if (rects.length < 2) return rects.reduce((sum, rect) => sum + areaOf(rect), 0);
  const edges = [...new Set(rects.flatMap((rect) => [rect.left, rect.right]))].sort((a, b) => a - b);
  const byFront = [...rects].sort((a, b) => a.front - b.front);
  let area = 0;
  for (let index = 1; index < edges.length; index += 1) {
    const from = edges[index - 1] ?? 0;
    const to = edges[index] ?? 0;
    let covered = 0;
    let reached = -Infinity;
    for (const rect of byFront) {
      if (rect.left > from || rect.right < to) continue;
      covered += Math.max(rect.back - Math.max(rect.front, reached), 0);
      reached = Math.max(reached, rect.back);
    }
    area += covered * (to - from);
  }
  return area;
}
