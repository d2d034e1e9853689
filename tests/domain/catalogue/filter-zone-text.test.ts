import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readFilterZones, writeFilterZones } from '../../../src/domain/catalogue/filter-zone-text';
import { mm } from '../../../src/domain/units/quantity';

describe('open filters in a cell', () => {
  it('are read with their face, size and corner', () => {
    expect(readFilterZones('lid 200 x 180 at 190 50 | BASE 60×40,5 at 0 0', 'point')).toEqual({
      ok: true,
      value: [
        { face: 'lid', lengthMm: 200, widthMm: 180, xMm: 190, yMm: 50 },
        { face: 'base', lengthMm: 60, widthMm: 40.5, xMm: 0, yMm: 0 },
      ],
    });
  });

  it.each(['lid', 'side 200 x 180 at 190 50', 'lid 200 x 180', 'lid 200 x 180 at -10 50', '200x180'])(
    'refuses “%s” and shows how to write it',
    (text) => {
      const read = readFilterZones(text, 'point');
      expect(read.ok || read.refusal.sentence).toContain('Write it like “lid 200 x 180 at 190 50”, in mm.');
    },
  );

  it('come back from the file as they went out', () => {
    const length = fc.nat(3_000).map(mm);
    const zone = fc.record({
      face: fc.constantFrom('lid' as const, 'base' as const),
      xMm: length,
      yMm: length,
      lengthMm: length,
      widthMm: length,
    });
    fc.assert(
      fc.property(fc.array(zone, { minLength: 1, maxLength: 4 }), (zones) => {
        expect(readFilterZones(writeFilterZones(zones), 'point')).toEqual({ ok: true, value: zones });
      }),
    );
  });
});
