import { isSensibleLength, isSensibleMass, isSensiblePosition, massOrNothing } from '#domain/load/sensible';
import { mm } from '#domain/units/quantity';
import { describe, expect, it } from 'vitest';

describe('numbers that make sense', () => {
  it.each([
    [0.1, true],
    [5_000, true],
    [5_000.1, false],
    [0, false],
    [-1, false],
    [NaN, false],
    [Infinity, false],
  ])('a length of %d mm', (value, expected) => {
    expect(isSensibleLength(mm(value))).toBe(expected);
  });

  it.each([
    [-10_000, true],
    [0, true],
    [10_001, false],
    [NaN, false],
  ])('a position of %d mm', (value, expected) => {
    expect(isSensiblePosition(mm(value))).toBe(expected);
  });

  it.each([
    [0, true, 0],
    [1_000, true, 1_000],
    [1_001, false, 0],
    [-0.1, false, 0],
    [NaN, false, 0],
  ])('a mass of %d kg', (value, expected, counted) => {
    expect([isSensibleMass(value), massOrNothing(value)]).toEqual([expected, counted]);
  });
});
