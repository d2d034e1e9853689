import { describe, expect, test } from 'vitest';
import { dotMm, moduleFitting, onDot } from '../../../../server/features/labels/draw/print-measures';

describe('lengths on paper', () => {
  test('a module is as many whole dots as fit', () => {
    expect(moduleFitting(18, 11.25)).toBe(0.625);
    expect(moduleFitting(14, 11.25)).toBe(0.75);
    expect(moduleFitting(12, 11.24)).toBe(0.875);
  });

  test('a place is moved to the nearest dot', () => {
    expect([0, 0.06, 0.07, 21.8].map(onDot)).toEqual([0, 0, dotMm, 21.75]);
  });
});
