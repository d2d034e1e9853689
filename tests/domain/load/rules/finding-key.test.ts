import type { Figure } from '#domain/load/finding';
import { keyOf } from '#domain/load/rules/finding-key';
import { describe, expect, it } from 'vitest';

const figure: Figure = { measured: 12.4, limit: 25, unit: 'mm', want: 'at-least', limitFrom: 'default' };

describe('the key of a finding', () => {
  it('is the rule, the things in any order, and the figure to the millimetre', () => {
    expect(keyOf('gap', ['b', 'a', 'b'], figure)).toBe('gap|a+b|12 mm');
    expect(keyOf('gap', ['a', 'b'], { ...figure, measured: 11.6 })).toBe('gap|a+b|12 mm');
    expect(keyOf('gap', ['a', 'b'], { ...figure, measured: 12.6 })).toBe('gap|a+b|13 mm');
    expect(keyOf('gap', ['a', 'b'], { ...figure, measured: -0.2 })).toBe('gap|a+b|0 mm');
    expect(keyOf('gap', ['a', 'b'], { ...figure, measured: -7 })).toBe('gap|a+b|-7 mm');
    expect(keyOf('facing', ['a'], null)).toBe('facing|a');
  });

  it('goes to 10 g for masses', () => {
    expect(keyOf('set-mass', ['a'], { ...figure, measured: 12.104, unit: 'kg' })).toBe('set-mass|a|12.10 kg');
    expect(keyOf('set-mass', ['a'], { ...figure, measured: -0.001, unit: 'kg' })).toBe('set-mass|a|0.00 kg');
  });

  it('stays short for hundreds of things, and still tells them apart', () => {
    const ids = Array.from({ length: 300 }, (_, index) => `01900000-0000-7000-8000-${String(index).padStart(12, '0')}`);
    const key = keyOf('unscanned', ids, null);
    expect(key.length).toBeLessThan(60);
    expect(keyOf('unscanned', [...ids].reverse(), null)).toBe(key);
    expect(
      new Set(
        ids.map((gone) =>
          keyOf(
            'unscanned',
            ids.filter((id) => id !== gone),
            null,
          ),
        ),
      ).size,
    ).toBe(300);
  });
});
