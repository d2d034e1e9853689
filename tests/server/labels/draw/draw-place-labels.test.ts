import { describe, expect, test } from 'vitest';
import { readScan } from '#domain/label/read-scan';
import { drawPlaceLabels, type PlaceLabel } from '../../../../server/features/labels/draw/draw-place-labels';
import { decodeArea } from './decode-symbol';
import { readPdf, type PdfPage } from './read-pdf';

const holder: PlaceLabel = { code: 'H-00012-31', name: 'Rack RM 4', note: '12 slots, pitch 30 mm' };
const shelf: PlaceLabel = { code: 'S-00007-83', name: 'Cart 3, upper shelf', note: null };
const printing = { layout: 'single', printedAt: '2026-03-17T09:00:00Z' } as const;

describe('place labels', () => {
  test('say what place it is, and read back from the printed dots as that place', async () => {
    const pages = readPdf(await drawPlaceLabels([holder, shelf], printing));
    expect(pages.map((page) => page.texts.map((text) => text.words))).toEqual([
      ['Rack RM 4', 'Holder   H-00012-31', '12 slots, pitch 30 mm'],
      ['Cart 3, upper shelf', 'Shelf   S-00007-83'],
    ]);
    for (const [index, page] of pages.entries()) {
      const code = [holder.code, shelf.code][index];
      const bars = decodeArea(page, { x: 7.5, y: 30.5, width: 61, height: 17 }, 'code-128');
      const matrix = decodeArea(page, { x: 78, y: 28.5, width: 20, height: 20 }, 'data-matrix');
      expect([readScan(bars ?? ''), readScan(matrix ?? '')]).toMatchObject([
        { kind: 'place', code },
        { kind: 'place', code },
      ]);
    }
  });

  test('keep a long name off the bars', async () => {
    const page = readPdf(
      await drawPlaceLabels([{ ...holder, name: 'W'.repeat(200), note: 'W'.repeat(200) }], printing),
    )[0];
    for (const text of (page as PdfPage).texts) {
      expect(text.y + text.height).toBeLessThan(30);
      expect(text.x + text.width).toBeLessThanOrEqual(96.6);
    }
  });

  test('are not made for the code of a package or a badge', () => {
    for (const code of ['P-20431784-52', 'N-48120937-96', 'H-00012-13']) {
      expect(() => drawPlaceLabels([{ ...holder, code }], printing)).toThrow(RangeError);
    }
  });
});
