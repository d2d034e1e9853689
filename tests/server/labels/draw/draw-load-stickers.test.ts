import { describe, expect, test } from 'vitest';
import { readScan } from '#domain/label/read-scan';
import { drawLoadStickers, type LoadSticker } from '../../../../server/features/labels/draw/draw-load-stickers';
import { decodeArea } from './decode-symbol';
import { readPdf, type PdfPage } from './read-pdf';

const sticker: LoadSticker = {
  loadNumber: '2-26076-03',
  sterilizer: 'Sterilizer 2',
  day: '2026-03-17',
  packageCode: 'P-20431784-52',
  itemName: 'Osteotome, 12 mm',
  packedBy: 'I. Marchetti',
  isImplant: false,
  copy: 1,
};
const printing = { layout: 'single', printedAt: '2026-03-17T09:00:00Z' } as const;
const matrixArea = { x: 35.5, y: 1.5, width: 13, height: 13 };

const drawOne = async (one: LoadSticker) => readPdf(await drawLoadStickers([one], printing))[0] as PdfPage;
const wordsOf = (page: PdfPage) => page.texts.map((text) => text.words);

describe('load stickers', () => {
  test('are 50 x 25 mm and say load, sterilizer, date, package, contents and who packed it', async () => {
    const page = await drawOne(sticker);
    expect([page.widthMm, page.heightMm].map(Math.round)).toEqual([50, 25]);
    expect(wordsOf(page)).toEqual([
      '2-26076-03',
      'Sterilizer 2',
      '17 Mar 2026',
      'P-20431784-52',
      'Osteotome, 12 mm',
      'Packed by I. Marchetti',
    ]);
  });

  test('say which reprint they are, in words and in the symbol', async () => {
    const page = await drawOne({ ...sticker, copy: 2 });
    expect(wordsOf(page)).toContain('Reprint 2');
    expect(wordsOf(await drawOne(sticker)).join()).not.toContain('Reprint');
    expect(readScan(decodeArea(page, matrixArea, 'data-matrix') ?? '')).toMatchObject({
      kind: 'load-sticker',
      copy: 2,
    });
  });

  test('read back from the printed dots as load and package', async () => {
    for (const loadNumber of ['2-26076-03', 'ABC123-20260317-1234', '1-26001-100']) {
      const page = await drawOne({ ...sticker, loadNumber });
      expect(readScan(decodeArea(page, matrixArea, 'data-matrix') ?? '')).toMatchObject({
        kind: 'load-sticker',
        packageCode: 'P-20431784-52',
        loadNumber,
        copy: 1,
      });
    }
  });

  test('name an implant as one', async () => {
    expect(wordsOf(await drawOne({ ...sticker, isImplant: true }))).toContain('Implant: Osteotome, 12 mm');
  });

  test('keep long names inside, and off the symbol', async () => {
    const wide = 'W'.repeat(200);
    const page = await drawOne({
      ...sticker,
      itemName: wide,
      sterilizer: wide,
      packedBy: wide,
      copy: 99,
      isImplant: true,
    });
    for (const text of page.texts) {
      expect(text.x + text.width).toBeLessThanOrEqual(47.51);
      // 11.25 mm of symbol and one module around it.
      if (text.y < 13.75 + 0.625 && text.y + text.height > 1.875)
        expect(text.x + text.width).toBeLessThan(47.5 - 11.25 - 0.625);
    }
  });

  test('fill A4 sheets of four columns and ten rows', async () => {
    const many = Array.from({ length: 41 }, () => sticker);
    const pages = readPdf(await drawLoadStickers(many, { ...printing, layout: 'sheet' }));
    expect(pages.map((page) => page.texts.filter((text) => text.words === '2-26076-03').length)).toEqual([40, 1]);
    const last = { x: 5 + 3 * 50 + 35.5, y: 23.5 + 9 * 25 + 1.5, width: 13, height: 13 };
    expect(readScan(decodeArea(pages[0] as PdfPage, last, 'data-matrix') ?? '')).toMatchObject({
      kind: 'load-sticker',
    });
  });

  test('are not made for a package or a load number that is none', () => {
    for (const wrong of [{ packageCode: 'P-20431784-53' }, { loadNumber: '2/26076/03' }, { copy: 0 }]) {
      expect(() => drawLoadStickers([{ ...sticker, ...wrong }], printing)).toThrow(RangeError);
    }
  });
});
