import { describe, expect, it } from 'vitest';
import { bowlIn, leanFromRoom, type BowlProfile } from '../../../src/components/cart-map/basin-glyph';
import type { PixelBox } from '../../../src/components/cart-map/glyphs';

/** The outline point by point: the definition of a cubic curve, worked out here. */
function outline({ rim: [a, d], controls: [b, c] }: BowlProfile): { x: number; y: number }[] {
  return Array.from({ length: 201 }, (_, step) => {
    const t = step / 200;
    const of = (key: 'x' | 'y') =>
      (1 - t) ** 3 * a[key] + 3 * (1 - t) ** 2 * t * b[key] + 3 * (1 - t) * t ** 2 * c[key] + t ** 3 * d[key];
    return { x: of('x'), y: of('y') };
  });
}

function reach(profile: BowlProfile) {
  const points = outline(profile);
  const xs = points.map(({ x }) => x);
  const ys = points.map(({ y }) => y);
  return { left: Math.min(...xs), right: Math.max(...xs), top: Math.min(...ys), foot: Math.max(...ys) };
}

const degree = Math.PI / 180;

/** The room of a cross section turned by an angle, drawn 1 px for each mm: plain trigonometry. */
function roomOf(across: number, thick: number, lean: number): PixelBox {
  return {
    x: 40,
    y: 20,
    width: across * Math.cos(lean) + thick * Math.sin(lean),
    height: across * Math.sin(lean) + thick * Math.cos(lean),
  };
}

describe('a basin seen from the side', () => {
  it.each([
    { what: 'flat', pose: 'flat', lean: 0 },
    { what: 'on edge', pose: 'on-edge', lean: 0 },
    { what: 'tilted, seen along the tilt', pose: 'tilted', lean: 0 },
    { what: 'tilted, seen from its side', pose: 'tilted', lean: 15 * degree },
  ] as const)('$what: its lowest point is the foot of the room it takes, and nothing sticks out', ({ pose, lean }) => {
    const room = roomOf(380, 120, lean);
    const { left, right, top, foot } = reach(bowlIn(room, pose, lean));
    expect(foot).toBeCloseTo(room.y + room.height, 6);
    expect(top).toBeGreaterThanOrEqual(room.y - 1e-6);
    expect(left).toBeGreaterThanOrEqual(room.x - 1e-6);
    expect(right).toBeLessThanOrEqual(room.x + room.width + 1e-6);
    // It fills the room, so it is drawn as large as the rules reckon it.
    expect(right - left).toBeGreaterThan(room.width * 0.85);
    expect(foot - top).toBeGreaterThan(room.height * 0.65);
  });

  it('tilted lies on one end of its rim, raised by the angle of the wedge at the other', () => {
    const lean = 15 * degree;
    const [low, high] = bowlIn(roomOf(380, 120, lean), 'tilted', lean).rim;
    expect((Math.atan2(low.y - high.y, high.x - low.x) * 180) / Math.PI).toBeCloseTo(15, 6);
    expect(Math.hypot(high.x - low.x, low.y - high.y)).toBeCloseTo(380, 6);
  });

  it('stands on the shelf also where the sizes make no sense', () => {
    const room = { x: 0, y: 0, width: 10, height: 400 };
    expect(reach(bowlIn(room, 'tilted', 40 * degree)).foot).toBeCloseTo(400, 6);
  });
});

describe('how far a basin leans', () => {
  it.each([
    { across: 380, thick: 120 },
    { across: 260, thick: 160 },
  ])('is read from the room that $across by $thick takes', ({ across, thick }) => {
    const { height } = roomOf(across, thick, 15 * degree);
    expect(leanFromRoom({ across, thick }, height) / degree).toBeCloseTo(15, 6);
  });
});
