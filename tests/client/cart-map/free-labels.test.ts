import { describe, expect, it } from 'vitest';
import type { PixelBox } from '../../../src/components/cart-map/glyphs';
import { withFreeLabels } from '../../../src/components/cart-map/map-model';
import type { Body } from '#domain/load/layout';

/** Of a body only its item's code is looked at here. */
function aBody(code: string): Body {
  return { packageId: code, item: { code } } as unknown as Body;
}

const [far, near] = [aBody('W-10'), aBody('C-14')];

function labels(boxes: Readonly<Record<string, PixelBox>>): (string | undefined)[] {
  return withFreeLabels([far, near], (body) => boxes[body.item.code] ?? { x: 0, y: 0, width: 0, height: 0 }).map(
    ({ label }) => label,
  );
}

describe('the codes on the drawing', () => {
  const behind = { x: 0, y: 0, width: 100, height: 60 };

  it('stand on everything whose middle can be seen', () => {
    expect(labels({ 'W-10': behind, 'C-14': { x: 120, y: 0, width: 80, height: 60 } })).toEqual(['W-10', 'C-14']);
    // Only the edge is covered.
    expect(labels({ 'W-10': behind, 'C-14': { x: 80, y: 0, width: 80, height: 60 } })).toEqual(['W-10', 'C-14']);
  });

  it('are left out where something painted later lies over the letters', () => {
    expect(labels({ 'W-10': behind, 'C-14': { x: 40, y: 30, width: 80, height: 40 } })).toEqual([undefined, 'C-14']);
  });
});
