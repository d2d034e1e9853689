import { describe, expect, it } from 'vitest';
import { shownScan } from '../../../server/platform/shown-scan';

describe('what was read, as it is shown', () => {
  it.each([
    ['P-20431784-52', 'P-20431784-52'],
    ['  P-20431784-52\r\n', 'P-20431784-52'],
    ['\u0000\u0001P\u001b[31m', 'P [31m'],
    ['A\u0085B', 'A B'],
    ['Curé µ 漢字', 'Curé µ 漢字'],
    ['', ''],
  ])('%j is %j', (raw, shown) => {
    expect(shownScan(raw)).toBe(shown);
  });

  it('is cut after 40 signs, and never through the middle of one', () => {
    expect(shownScan('x'.repeat(10_000))).toBe(`${'x'.repeat(40)}…`);
    expect(shownScan('x'.repeat(40))).toBe('x'.repeat(40));
    // An astral sign is two halves to the machine; half of one could not be kept.
    expect(shownScan(`${'x'.repeat(39)}😀😀`)).toBe(`${'x'.repeat(39)}😀…`);
    expect(shownScan(`${'x'.repeat(399)}😀`)).toBe(`${'x'.repeat(40)}…`);
    expect(shownScan('a\ud83d')).toBe('a');
  });
});
