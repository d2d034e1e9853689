import {
  areaOf,
  boxAt,
  commonRect,
  coveredArea,
  gapAcross,
  gapAlong,
  gapUpward,
  planDistance,
  rectAt,
} from '#domain/geometry/box';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

const a = boxAt({ x: 0, y: 0, z: 0 }, { widthMm: 100, depthMm: 200, heightMm: 50 });

describe('gaps between two boxes', () => {
  it('are how far they are apart along each axis, below zero how far they reach into each other', () => {
    const b = boxAt({ x: 130, y: 150, z: 50 }, { widthMm: 10, depthMm: 100, heightMm: 10 });
    expect([gapAcross(a, b), gapAlong(a, b), gapUpward(a, b)]).toEqual([30, -50, 0]);
    expect([gapAcross(b, a), gapAlong(b, a), gapUpward(b, a)]).toEqual([30, -50, 0]);
  });

  it('past a corner are the straight way between the corners', () => {
    expect(planDistance(a, rectAt({ x: 130, y: 240 }, { widthMm: 5, depthMm: 5 }))).toBe(50);
    expect(planDistance(a, rectAt({ x: 50, y: 50 }, { widthMm: 5, depthMm: 5 }))).toBe(0);
  });
});

describe('commonRect', () => {
  it('is what two rectangles share', () => {
    const shared = commonRect(a, rectAt({ x: 60, y: -20 }, { widthMm: 100, depthMm: 50 }));
    expect(shared).toEqual({ left: 60, right: 100, front: 0, back: 30 });
  });

  it('is nothing where they only touch', () => {
    expect(commonRect(a, rectAt({ x: 100, y: 0 }, { widthMm: 10, depthMm: 10 }))).toBeNull();
    expect(commonRect(a, rectAt({ x: 0, y: 200 }, { widthMm: 10, depthMm: 10 }))).toBeNull();
  });
});

describe('coveredArea', () => {
  it('counts what lies under two rectangles once', () => {
    const rects = [
      rectAt({ x: 0, y: 0 }, { widthMm: 10, depthMm: 10 }),
      rectAt({ x: 5, y: 5 }, { widthMm: 10, depthMm: 10 }),
    ];
    expect(coveredArea(rects)).toBe(175);
    expect(coveredArea(rects.slice(0, 1))).toBe(100);
    expect(coveredArea([])).toBe(0);
  });

  it('agrees with counting square by square', () => {
    const small = fc.record({
      x: fc.integer({ min: 0, max: 8 }),
      y: fc.integer({ min: 0, max: 8 }),
      widthMm: fc.integer({ min: 0, max: 5 }),
      depthMm: fc.integer({ min: 0, max: 5 }),
    });
    fc.assert(
      fc.property(fc.array(small, { maxLength: 7 }), (sizes) => {
        const squares = new Set<string>();
        for (const { x, y, widthMm, depthMm } of sizes) {
          for (let i = x; i < x + widthMm; i += 1) for (let j = y; j < y + depthMm; j += 1) squares.add(`${i} ${j}`);
        }
        const rects = sizes.map((size) => rectAt(size, size));
        expect(coveredArea(rects)).toBe(squares.size);
        expect(coveredArea(rects)).toBeLessThanOrEqual(rects.reduce((sum, rect) => sum + areaOf(rect), 0));
      }),
    );
  });
});
