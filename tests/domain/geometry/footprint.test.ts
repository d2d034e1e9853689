import { footprintOf } from '#domain/geometry/footprint';
import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';

const pouch = { lengthMm: mm(330), widthMm: mm(200), heightMm: mm(45) };
const basin = { lengthMm: mm(400), widthMm: mm(300), heightMm: mm(100) };

describe('footprintOf', () => {
  it('lies flat with its length away from the door, or across when turned', () => {
    expect(footprintOf(pouch, 'flat', 0)).toEqual({ widthMm: 200, depthMm: 330, heightMm: 45 });
    expect(footprintOf(pouch, 'flat', 90)).toEqual({ widthMm: 330, depthMm: 200, heightMm: 45 });
  });

  it('on edge stands on its long side, as high as it is wide and as deep as it is long', () => {
    expect(footprintOf(pouch, 'on-edge', 0)).toEqual({ widthMm: 45, depthMm: 330, heightMm: 200 });
    expect(footprintOf(pouch, 'on-edge', 90)).toEqual({ widthMm: 330, depthMm: 45, heightMm: 200 });
  });

  it('tilted by 15 degrees takes less room across and more height', () => {
    // 300 cos 15 + 100 sin 15 and 300 sin 15 + 100 cos 15, worked out by hand.
    const tilted = footprintOf(basin, 'tilted', 0);
    expect(tilted.widthMm).toBeCloseTo(315.66, 2);
    expect(tilted.depthMm).toBe(400);
    expect(tilted.heightMm).toBeCloseTo(174.24, 2);
    const turned = footprintOf(basin, 'tilted', 90);
    expect([turned.widthMm, turned.depthMm]).toEqual([400, tilted.widthMm]);
  });
});
