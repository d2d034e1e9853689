import { leanOf } from '#domain/geometry/lean';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

const firm = { supportHeightMm: Infinity };

describe('how far a pouch can fall over', () => {
  it('is not at all where it is held on both faces', () => {
    expect(leanOf({ heightMm: 200, thicknessMm: 45, gapMm: 0, ...firm })).toBe(0);
  });

  it('is 30 degrees for a thin one whose free gap is half of its height', () => {
    // sin 30 = 1/2
    expect(leanOf({ heightMm: 100, thicknessMm: 0, gapMm: 50, ...firm })).toBeCloseTo(30, 9);
  });

  it('is until it lies down where nothing is near enough to catch it', () => {
    // The diagonal of 30 by 40 is 50: with 10 mm and its own 40 mm it just falls through.
    expect(leanOf({ heightMm: 30, thicknessMm: 40, gapMm: 10, ...firm })).toBe(90);
    expect(leanOf({ heightMm: 75, thicknessMm: 10, gapMm: Infinity, supportHeightMm: 0 })).toBe(90);
  });

  it('ends on the upper edge of a support that is lower than where its corner would meet it', () => {
    // tan 45 = 1: the edge is 50 mm away and 50 mm high.
    expect(leanOf({ heightMm: 200, thicknessMm: 5, gapMm: 50, supportHeightMm: 50 })).toBeCloseTo(45, 9);
    // The edge is beyond its reach: it lies down in front of it.
    expect(leanOf({ heightMm: 60, thicknessMm: 5, gapMm: 50, supportHeightMm: 50 })).not.toBe(90);
    expect(leanOf({ heightMm: 60, thicknessMm: 5, gapMm: 58, supportHeightMm: 20 })).toBe(90);
  });

  it('is where its upper corner meets the support', () => {
    const standing = fc.record({
      heightMm: fc.double({ min: 20, max: 400, noNaN: true }),
      thicknessMm: fc.double({ min: 1, max: 60, noNaN: true }),
      gapMm: fc.double({ min: 0.1, max: 300, noNaN: true }),
    });
    fc.assert(
      fc.property(standing, ({ heightMm, thicknessMm, gapMm }) => {
        const lean = (leanOf({ heightMm, thicknessMm, gapMm, ...firm }) * Math.PI) / 180;
        if (lean > Math.PI / 2 - 1e-9) {
          expect(thicknessMm + gapMm).toBeGreaterThanOrEqual(Math.hypot(heightMm, thicknessMm) - 1e-6);
        } else {
          expect(heightMm * Math.sin(lean) + thicknessMm * Math.cos(lean)).toBeCloseTo(thicknessMm + gapMm, 6);
        }
      }),
    );
  });

  it('never grows when there is less room', () => {
    const two = fc.tuple(fc.integer({ min: 0, max: 200 }), fc.integer({ min: 0, max: 200 }));
    fc.assert(
      fc.property(two, fc.integer({ min: 50, max: 250 }), ([one, other], heightMm) => {
        const [less, more] = [Math.min(one, other), Math.max(one, other)];
        const at = (gapMm: number) => leanOf({ heightMm, thicknessMm: 20, gapMm, ...firm });
        expect(at(less)).toBeLessThanOrEqual(at(more) + 1e-9);
      }),
    );
  });
});
