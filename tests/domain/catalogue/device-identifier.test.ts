import { describe, expect, it } from 'vitest';
import { readDeviceIdentifier } from '../../../src/domain/catalogue/device-identifier';

function codeOf(text: string): string {
  const read = readDeviceIdentifier(text);
  return read.ok ? read.value : read.refusal.code;
}

describe('a device identifier', () => {
  // Check digits worked out by hand: weights 3 and 1 from the right, up to the next ten (GS1, "How to calculate a check
  // digit manually"). The first three are of the prefix that belongs to nobody, the others GS1's own demonstration number.
  it.each([
    ['20000004', '00000020000004'],
    ['200000000004', '00200000000004'],
    ['2012345678903', '02012345678903'],
    ['09506000134352', '09506000134352'],
    [' 0950 6000 1343 52 ', '09506000134352'],
  ])('GTIN %s is kept with 14 digits', (typed, kept) => {
    expect(codeOf(typed)).toBe(kept);
  });

  it('whose last digit does not fit is refused', () => {
    expect(codeOf('09506000134353')).toBe('check-digit');
    expect(codeOf('09506000314352')).toBe('check-digit');
  });

  // +A123BJC5D6E71 has the check character G: HIBC supplier labelling, the standard's own example.
  it('that is a HIBC is kept without plus and check character', () => {
    expect(codeOf('+A123BJC5D6E71G')).toBe('A123BJC5D6E71');
    expect(codeOf('A123BJC5D6E71')).toBe('A123BJC5D6E71');
    expect(codeOf('a123bjc5d6e71')).toBe('A123BJC5D6E71');
  });

  it('that is a HIBC with a wrong check character is refused', () => {
    expect(codeOf('+A123BJC5D6E71H')).toBe('check-character');
  });

  it.each(['', '12345', '123456789012345', 'hello world', '+', 'A1B', '-1', '1'.repeat(5_000), '٢٠١٢٣٤٥٦٧٨٩٠٣'])(
    'is not “%s”',
    (text) => {
      expect(codeOf(text)).toBe('foreign');
    },
  );
});
