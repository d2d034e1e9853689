import { gapAcross, gapAlong, planDistance, rectAt } from '#domain/geometry/box';
import { freeSpots, type SpotSearch } from '#domain/geometry/free-spot';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

const search: SpotSearch = {
  shelf: { widthMm: 560, depthMm: 1150 },
  size: { widthMm: 260, depthMm: 500 },
  clearanceMm: 25,
  marginAcrossMm: 0,
  marginAlongMm: 0,
  obstacles: [],
};

describe('freeSpots', () => {
  it('on an empty shelf are its corners, the one at the door and left first', () => {
    expect(freeSpots(search)).toEqual([
      { xMm: 0, yMm: 0 },
      { xMm: 300, yMm: 0 },
      { xMm: 0, yMm: 650 },
      { xMm: 300, yMm: 650 },
    ]);
  });

  it('keep clear of what is there, by the greater of the two clearances', () => {
    const obstacles = [{ rect: rectAt({ x: 0, y: 0 }, { widthMm: 260, depthMm: 500 }), clearanceMm: 40 }];
    expect(freeSpots({ ...search, obstacles })[0]).toEqual({ xMm: 300, yMm: 0 });
    const wider = { ...search, size: { widthMm: 280, depthMm: 500 }, obstacles };
    expect(freeSpots(wider)[0]).toEqual({ xMm: 0, yMm: 540 });
  });

  it('keep the margins', () => {
    expect(freeSpots({ ...search, marginAcrossMm: 10, marginAlongMm: 20 })[0]).toEqual({ xMm: 10, yMm: 20 });
  });

  it('are none where it is larger than the shelf, or the shelf is full', () => {
    expect(freeSpots({ ...search, size: { widthMm: 561, depthMm: 10 } })).toEqual([]);
    const full = [{ rect: rectAt({ x: 100, y: 100 }, { widthMm: 400, depthMm: 900 }), clearanceMm: 0 }];
    expect(freeSpots({ ...search, obstacles: full })).toEqual([]);
  });

  it('are really free, whatever stands there', () => {
    const obstacle = fc
      .record({
        x: fc.integer({ min: -50, max: 500 }),
        y: fc.integer({ min: -50, max: 1100 }),
        widthMm: fc.integer({ min: 1, max: 300 }),
        depthMm: fc.integer({ min: 1, max: 500 }),
      })
      .map((at) => ({ rect: rectAt(at, at), clearanceMm: 30 }));
    fc.assert(
      fc.property(fc.array(obstacle, { maxLength: 6 }), (obstacles) => {
        for (const { xMm, yMm } of freeSpots({ ...search, obstacles })) {
          const rect = rectAt({ x: xMm, y: yMm }, search.size);
          expect(rect.right <= 560 && rect.back <= 1150 && xMm >= 0 && yMm >= 0).toBe(true);
          for (const other of obstacles) {
            expect(planDistance(rect, other.rect)).toBeGreaterThanOrEqual(30 - 1e-6);
            expect(Math.max(gapAcross(rect, other.rect), gapAlong(rect, other.rect))).toBeGreaterThan(0);
          }
        }
      }),
    );
  });
});
