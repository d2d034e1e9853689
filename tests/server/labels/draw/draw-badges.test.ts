import { describe, expect, test } from 'vitest';
import { readScan } from '#domain/label/read-scan';
import { drawBadges, type Badge } from '../../../../server/features/labels/draw/draw-badges';
import { decodeArea } from './decode-symbol';
import { readPdf, type PdfPage } from './read-pdf';

const badge: Badge = {
  code: 'N-48120937-96',
  name: 'Çiğdem Ağaoğlu',
  role: 'Technician',
  facility: 'Invented General',
};
const printing = { layout: 'single', printedAt: '2026-03-17T09:00:00Z' } as const;
const barArea = { x: 2, y: 35, width: 50, height: 15 };

describe('badges', () => {
  test('show a name to people and a number to a scanner', async () => {
    const page = readPdf(await drawBadges([badge], printing))[0] as PdfPage;
    expect([Math.round(page.widthMm * 10), Math.round(page.heightMm * 10)]).toEqual([856, 540]);
    expect(page.texts.map((text) => text.words)).toEqual(['Invented General', badge.name, 'Technician', badge.code]);
    const scanned = decodeArea(page, barArea, 'code-128');
    expect(scanned).toBe('N4812093796');
    expect(readScan(scanned ?? '')).toEqual({ kind: 'badge', code: badge.code, number: 48_120_937 });
  });

  test('keep a long name on the card and off the bars', async () => {
    const page = readPdf(
      await drawBadges([{ ...badge, name: 'W'.repeat(90), role: 'W'.repeat(90) }], printing),
    )[0] as PdfPage;
    for (const text of page.texts) {
      expect(text.x + text.width).toBeLessThanOrEqual(79.7);
      if (text.words !== badge.code) expect(text.y + text.height).toBeLessThan(36);
    }
  });

  test('lie ten on an A4 sheet', async () => {
    const pages = readPdf(
      await drawBadges(
        Array.from({ length: 11 }, () => badge),
        { ...printing, layout: 'sheet' },
      ),
    );
    expect(pages.map((page) => page.texts.filter((text) => text.words === badge.name).length)).toEqual([10, 1]);
  });

  test('are not made for the code of anything else', () => {
    expect(() => drawBadges([{ ...badge, code: 'P-20431784-52' }], printing)).toThrow(RangeError);
  });
});
