import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { checkedAlphabet } from '#domain/label/check-character';
import { formatLoadNumber } from '#domain/label/load-number';
import { formatLoadStickerCode, parseLoadStickerCode } from '#domain/label/load-sticker-code';
import { formatPackageCode, greatestPackageNumber } from '#domain/label/package-code';

const sticker = fc.record({
  packageCode: fc
    .tuple(
      fc.constantFrom('pouch', 'wrapped-tray', 'rigid-container', 'textile-pack', 'basin', 'challenge-device'),
      fc.nat({ max: greatestPackageNumber }),
    )
    .map(([kind, number]) => formatPackageCode(kind, number)),
  loadNumber: fc
    .tuple(fc.constantFrom('1', '2', 'ST4', 'A1'), fc.integer({ min: 1, max: 120 }))
    .map(([sterilizer, count]) => formatLoadNumber({ sterilizer, day: '2026-03-17', count })),
  copy: fc.integer({ min: 1, max: 99 }),
});

const first = { packageCode: 'P-20431784-52', loadNumber: '2-26076-03', copy: 1 };

describe('load sticker codes', () => {
  test('carry package, printing and load number', () => {
    expect(formatLoadStickerCode(first)).toMatch(/^LP20431784012-26076-03\d\d$/);
    expect(formatLoadStickerCode({ ...first, copy: 2 })).toMatch(/^LP20431784022-26076-03\d\d$/);
  });

  test('are read back as what they were made from', () => {
    fc.assert(
      fc.property(sticker, (one) => {
        const code = formatLoadStickerCode(one);
        expect(parseLoadStickerCode(code)).toEqual({ ok: true, value: { code, ...one } });
        expect(parseLoadStickerCode(` ${code.toLowerCase()}`)).toEqual({ ok: true, value: { code, ...one } });
      }),
    );
  });

  test('are refused when one character is wrong, two neighbours are swapped or the end is missing', () => {
    fc.assert(
      fc.property(sticker, (one) => {
        const code = formatLoadStickerCode(one);
        for (let place = 0; place < code.length; place += 1) {
          for (const character of checkedAlphabet) {
            if (character === code.charAt(place)) continue;
            expect(parseLoadStickerCode(code.slice(0, place) + character + code.slice(place + 1)).ok).toBe(false);
          }
          const [left, right] = [code.charAt(place), code.charAt(place + 1)];
          if (right === '' || left === right) continue;
          expect(parseLoadStickerCode(code.slice(0, place) + right + left + code.slice(place + 2)).ok).toBe(false);
        }
      }),
      { numRuns: 30 },
    );
  });

  test('are made of a package, a load number and a printing, and of nothing else', () => {
    for (const wrong of [
      { ...first, packageCode: 'P-20431784-53' },
      { ...first, packageCode: 'H-00012-31' },
      { ...first, loadNumber: '' },
      { ...first, loadNumber: '2/26076/03' },
      { ...first, loadNumber: '2-'.repeat(11) + '2' },
      { ...first, copy: 0 },
      { ...first, copy: 100 },
      { ...first, copy: 1.5 },
    ]) {
      expect(() => formatLoadStickerCode(wrong)).toThrow(RangeError);
    }
  });

  test.each([
    ['P2043178452', 'foreign'],
    ['LAUNDRY', 'foreign'],
    ['', 'foreign'],
    ['L'.repeat(10_000), 'foreign'],
    ['LP20431784', 'check-character'],
    ['LP20431784012-26076-0370', 'check-character'],
  ])('%j is not one', (text, reason) => {
    expect(parseLoadStickerCode(text)).toMatchObject({ ok: false, refusal: { code: reason } });
  });
});
