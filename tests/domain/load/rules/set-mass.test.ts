import { kg } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';
import { aLoad, nowhere, onLower } from '../../../support/load-builder';
import { findingsOf, fixesOf, titlesOf } from '../../../support/findings';

const rule = 'set-mass';
const weighing = (massKg: number, code = 'C-01') =>
  aLoad()
    .withItemChanged(code, { massKg: kg(massKg) })
    .withPackage(code, onLower(0, 0));

describe('sets are not too heavy', () => {
  it('says nothing up to 25 lb', () => {
    expect(titlesOf(rule, weighing(11.3))).toEqual([]);
  });

  it('finds a heavier one, placed or not, and takes it off', () => {
    expect(findingsOf(rule, weighing(12.1))).toMatchObject([
      {
        severity: 'stop',
        title: 'General container set A weighs 12.1 kg, want at most 11.3 kg',
        figure: { measured: 12.1, limit: 11.3, unit: 'kg', limitFrom: 'default' },
        source: { provenance: 'restated' },
        fix: { label: 'Take it off the load' },
      },
    ]);
    expect(titlesOf(rule, aLoad().withPackage('C-12', nowhere, { isScanned: false }))).toHaveLength(1);
    expect(titlesOf(rule, weighing(11.34))).toEqual(['General container set A weighs 11.34 kg, want at most 11.3 kg']);
  });

  it('goes by the instructions of the set before the house', () => {
    const permitted = weighing(12.1).withItemChanged('C-01', { massKg: kg(12.1), massLimitKg: kg(13) });
    expect(titlesOf(rule, permitted)).toEqual([]);
    const stricter = weighing(9).withItemChanged('C-01', { massKg: kg(9), massLimitKg: kg(8.5) });
    expect(findingsOf(rule, stricter)[0]).toMatchObject({
      figure: { limitFrom: 'ifu' },
      source: { provenance: 'ifu' },
    });
    expect(findingsOf(rule, weighing(9), { greatestSetMassKg: kg(8) })[0]?.figure?.limitFrom).toBe('house-rule');
    const nonsense = weighing(12.1).withItemChanged('C-01', { massKg: kg(12.1), massLimitKg: kg(NaN) });
    expect(titlesOf(rule, nonsense)).toHaveLength(1);
  });

  it('holds textile packs to 12 lb, and leaves pouches to their own rule', () => {
    expect(titlesOf(rule, weighing(5.4, 'W-12'))).toEqual([]);
    expect(titlesOf(rule, weighing(5.5, 'W-12'))).toEqual(['Drape pack reusable weighs 5.5 kg, want at most 5.4 kg']);
    expect(titlesOf(rule, weighing(20, 'P-01'))).toEqual([]);
  });

  it('offers nothing for a package that has not been scanned but to take it off', () => {
    expect(fixesOf(rule, aLoad().withPackage('C-12', nowhere, { isScanned: false }))).toEqual(['Take it off the load']);
  });
});
