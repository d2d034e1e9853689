import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { formatPackageCode } from '#domain/label/package-code';
import { readScan } from '#domain/label/read-scan';
import { drawPackageLabels, type PackageLabel } from '../../../../server/features/labels/draw/draw-package-labels';
import { dotMm } from '../../../../server/features/labels/draw/print-measures';
import { oneCharacterOf } from '../../../support/one-character-of';
import vectors from '../../../support/vectors/codes.json';
import { decodeArea } from './decode-symbol';
import { readPdf, type Box, type PdfPage } from './read-pdf';

const pouch: PackageLabel = {
  code: 'P-20431784-52',
  itemName: 'Osteotome, 12 mm',
  size: '90 × 230 mm',
  catalogueReference: 'P-14',
  packedBy: 'I. Marchetti',
  packedAt: '2026-03-17T06:31:00Z',
  expiry: { rule: 'event-related' },
  isImplant: false,
  gtin: null,
  copy: 1,
};
const implant: PackageLabel = {
  ...pouch,
  code: formatPackageCode('wrapped-tray', 20_431_785),
  itemName: 'Screws, 3.5 mm, rack',
  isImplant: true,
  gtin: { gtin: '09501101530003', allocatedBy: 'maker' },
};
const printing = { layout: 'single', printedAt: '2026-03-17T07:00:00Z', timeZone: 'Europe/Berlin' } as const;

const draw = async (...labels: PackageLabel[]) => readPdf(await drawPackageLabels(labels, printing));
const drawOne = async (label: PackageLabel) => (await draw(label))[0] as PdfPage;
const wordsOf = (page: PdfPage) => page.texts.map((text) => text.words);

/** Where the bars and the matrix stand, quiet zones included: ten modules of 0.375 mm beside the bars, one around the matrix. */
const barArea: Box = { x: 7.5, y: 35, width: 49.5, height: 13 };
const matrixArea: Box = { x: 84.5, y: 35, width: 13, height: 13 };

function isInside(box: Box, area: Box): boolean {
  return (
    box.x >= area.x - 1e-3 &&
    box.y >= area.y - 1e-3 &&
    box.x + box.width <= area.x + area.width + 1e-3 &&
    box.y + box.height <= area.y + area.height + 1e-3
  );
}

function touches(one: Box, other: Box): boolean {
  const margin = 0.01;
  return (
    one.x + margin < other.x + other.width &&
    other.x + margin < one.x + one.width &&
    one.y + margin < other.y + other.height &&
    other.y + margin < one.y + one.height
  );
}

describe('package labels', () => {
  test('are pages of 100 x 50 mm, one for each package', async () => {
    const pages = await draw(pouch, implant, pouch);
    expect(pages.map((page) => [Math.round(page.widthMm * 1000), Math.round(page.heightMm * 1000)])).toEqual(
      Array.from({ length: 3 }, () => [100_000, 50_000]),
    );
  });

  test('say what it is, its code, kind and size, when and by whom it was packed, and how long it keeps', async () => {
    expect(wordsOf(await drawOne(pouch))).toEqual([
      'Osteotome, 12 mm',
      'P-20431784-52',
      'pouch 90 × 230 mm',
      'Packed',
      '17 Mar 2026 07:31',
      'By',
      'I. Marchetti',
      'Item',
      'P-14',
      'Use while whole',
      'and dry',
    ]);
  });

  test('tell the time of packing on the facility’s own clock', async () => {
    const page = readPdf(await drawPackageLabels([pouch], { ...printing, timeZone: 'America/Los_Angeles' }))[0];
    expect(page && wordsOf(page)).toContain('16 Mar 2026 23:31');
  });

  test.each(vectors.labelDate)(
    'give a date of use as $expected.text is written: $source',
    async ({ input, expected }) => {
      expect(input.words).toBe('January 2, 2014');
      const page = await drawOne({ ...pouch, expiry: { rule: 'dated', on: '2014-01-02' } });
      expect(wordsOf(page)).toContain(expected.text);
      expect(wordsOf(page)).toContain('Use by');
      expect(wordsOf(page)).not.toContain('Use while whole');
    },
  );

  test('say "Implant. Hold for BI." on an implant and on nothing else', async () => {
    expect(wordsOf(await drawOne(implant))).toContain('Implant. Hold for BI.');
    expect(wordsOf(await drawOne(pouch))).not.toContain('Implant. Hold for BI.');
  });

  test('have fine ribs down the left edge, and coarse ones on an implant', async () => {
    const ribs = async (label: PackageLabel) =>
      (await drawOne(label)).dark.filter((box) => box.x < 0.01 && box.width > 7).map((box) => box.height);
    expect((await ribs(pouch)).length).toBe(40);
    expect(Math.max(...(await ribs(pouch)))).toBeCloseTo(0.375, 3);
    expect((await ribs(implant)).length).toBe(17);
    expect(Math.min(...(await ribs(implant)).slice(0, -1))).toBeCloseTo(2.25, 3);
  });

  test('say which reprint it is from the second printing on', async () => {
    expect(wordsOf(await drawOne({ ...pouch, copy: 2 }))).toContain('Reprint 2');
    expect(wordsOf(await drawOne(pouch)).join()).not.toContain('Reprint');
  });

  test('never name a load: at packing nobody knows it', async () => {
    expect(wordsOf(await drawOne(pouch)).join(' ')).not.toMatch(/load|sterilizer/i);
  });

  test.each([
    ['a pouch without GTIN', pouch, null],
    ['an implant with the maker’s GTIN', implant, '09501101530003'],
    [
      'a set with the facility’s own GTIN',
      { ...implant, gtin: { gtin: '09501101530003', allocatedBy: 'facility' } },
      '09501101530003',
    ],
  ] as const)('read back from the printed dots as the package: %s', async (_what, label, gtin) => {
    const page = await drawOne(label);
    const bars = decodeArea(page, barArea, 'code-128');
    const matrix = decodeArea(page, matrixArea, 'data-matrix');
    expect(readScan(bars ?? '')).toMatchObject({ kind: 'package', code: label.code, gtin: null });
    expect(readScan(matrix ?? '')).toMatchObject({ kind: 'package', code: label.code, gtin });
  });

  test('keep the quiet zones of both symbols clear', async () => {
    const page = await drawOne({
      ...implant,
      itemName: 'W'.repeat(200),
      packedBy: 'W'.repeat(80),
      size: 'W'.repeat(80),
      copy: 99,
    });
    const symbols = page.dark.filter((box) => isInside(box, barArea) || isInside(box, matrixArea));
    const others = [...page.dark.filter((box) => !symbols.includes(box)), ...page.texts];
    const bars = symbols.filter((box) => isInside(box, barArea));
    const [left, right] = [Math.min(...bars.map((box) => box.x)), Math.max(...bars.map((box) => box.x + box.width))];
    expect(right - left).toBeCloseTo(112 * 0.375, 3);
    const top = Math.min(...bars.map((box) => box.y));
    const quiet = { x: left - 3.75, y: top, width: right - left + 7.5, height: 11.25 };
    const matrix = symbols.filter((box) => isInside(box, matrixArea));
    const edge = Math.min(...matrix.map((box) => box.x));
    const quietMatrix = { x: edge - 0.625, y: 47 - 11.25 - 0.625, width: 11.25 + 1.25, height: 11.25 + 1.25 };
    for (const other of others)
      expect([other, touches(other, quiet) || touches(other, quietMatrix)]).toEqual([other, false]);
  });

  test('have every bar and every square on the dots of a 203 dpi printer', async () => {
    const page = await drawOne(implant);
    const symbols = page.dark.filter((box) => isInside(box, barArea) || isInside(box, matrixArea));
    expect(symbols.length).toBeGreaterThan(60);
    for (const box of symbols) {
      for (const length of [box.x, box.y, box.width, box.height]) {
        expect(Math.abs(length / dotMm - Math.round(length / dotMm))).toBeLessThan(0.001);
      }
    }
  });

  test('hold letters of Latin, Greek and Cyrillic alphabets', async () => {
    const names = ['Ağız açacağı, İğne şişi', 'Łódź Ő Ű ß æ', 'Ножницы № 3', 'Ψαλίδι 12 Ω', '≥ 2 °C ± ½'];
    for (const itemName of names) expect(wordsOf(await drawOne({ ...pouch, itemName }))[0]).toBe(itemName);
  });

  test('break a long name into two lines and cut what is longer still, without running over anything', async () => {
    const long = 'Laparoscopic cholecystectomy set with 10 mm trocars and clip applier';
    const page = await drawOne({ ...pouch, itemName: long });
    expect(wordsOf(page).slice(0, 2).join(' ')).toBe(long);
    const longer = await drawOne({ ...pouch, itemName: `${long} and ${long}` });
    expect(wordsOf(longer)[1]).toMatch(/…$/);
    expect(wordsOf(longer)[2]).toBe('P-20431784-52');
  });

  test('never let a text leave the label or lie on another, whatever the names', async () => {
    const name = fc.oneof(
      fc.string({ unit: oneCharacterOf('WMiltfj ĞğЖщΩß漢…-,.1234567890'), minLength: 1, maxLength: 120 }),
      fc.lorem({ maxCount: 20 }),
      fc.constantFrom('W'.repeat(300), ' ', '\u0000\n\ud800', 'i'),
    );
    const label = fc.record({
      itemName: name,
      packedBy: name,
      catalogueReference: name,
      size: fc.option(name),
      isImplant: fc.boolean(),
    });
    await fc.assert(
      fc.asyncProperty(fc.array(label, { minLength: 40, maxLength: 40 }), async (labels) => {
        const pages = await draw(...labels.map((one) => ({ ...pouch, ...one, copy: 7 })));
        expect(pages.length).toBe(40);
        for (const { texts } of pages) {
          // Ascenders and descenders are taller than the letters; the letters are what must not meet.
          const letters = texts.map((text) => ({ ...text, y: text.y + text.height * 0.2, height: text.height * 0.6 }));
          for (const [place, text] of letters.entries()) {
            expect([text.words, isInside(text, { x: 11.2, y: 2, width: 85.4, height: 46 })]).toEqual([
              text.words,
              true,
            ]);
            for (const other of letters.slice(place + 1)) {
              expect([text.words, other.words, touches(text, other)]).toEqual([text.words, other.words, false]);
            }
          }
        }
      }),
      { numRuns: 2 },
    );
  });

  test('are the same bytes for the same labels, and name no program they were made with but this', async () => {
    const [one, two] = [
      await drawPackageLabels([pouch, implant], printing),
      await drawPackageLabels([pouch, implant], printing),
    ];
    expect(one.equals(two)).toBe(true);
    const text = one.toString('latin1');
    expect(text).toContain('(Package labels)');
    expect(text).toContain('(D:20260317070000Z)');
    expect(text).not.toMatch(/pdfkit|bwip/i);
  });

  test('are not made without a label, or for a code that is no package’s', async () => {
    expect(() => drawPackageLabels([], printing)).toThrow(RangeError);
    for (const code of ['P-20431784-53', 'H-00012-31', '']) {
      expect(() => drawPackageLabels([{ ...pouch, code }], printing)).toThrow(RangeError);
    }
    await expect(drawPackageLabels([pouch], printing)).resolves.toBeInstanceOf(Buffer);
  });
});

describe('sheets of package labels', () => {
  const sheet = { ...printing, layout: 'sheet' } as const;
  const many = Array.from({ length: 12 }, (_, index) => ({
    ...pouch,
    code: formatPackageCode('pouch', 20_431_784 + index),
  }));

  test('are A4 with two columns and five rows', async () => {
    const pages = readPdf(await drawPackageLabels(many, sheet));
    expect(pages.map((page) => [Math.round(page.widthMm), Math.round(page.heightMm)])).toEqual([
      [210, 297],
      [210, 297],
    ]);
    expect(pages.map((page) => page.texts.filter((text) => text.words === 'and dry').length)).toEqual([10, 2]);
  });

  test('have every label read back from its own place', async () => {
    const page = readPdf(await drawPackageLabels(many, sheet))[0] as PdfPage;
    for (let place = 0; place < 10; place += 1) {
      const [x, y] = [5 + (place % 2) * 100, 23.5 + Math.floor(place / 2) * 50];
      const bars = decodeArea(page, { ...barArea, x: barArea.x + x, y: barArea.y + y }, 'code-128');
      const matrix = decodeArea(page, { ...matrixArea, x: matrixArea.x + x, y: matrixArea.y + y }, 'data-matrix');
      expect([readScan(bars ?? ''), readScan(matrix ?? '')]).toMatchObject([
        { code: many[place]?.code },
        { code: many[place]?.code },
      ]);
    }
  });

  test('leave out the places already used', async () => {
    const pages = readPdf(await drawPackageLabels(many.slice(0, 3), { ...sheet, skip: 8 }));
    expect(pages.map((page) => page.texts.filter((text) => text.words === 'and dry').length)).toEqual([2, 1]);
    expect(pages[0]?.texts.every((text) => text.y > 23.5 + 4 * 50)).toBe(true);
    for (const skip of [-1, 10, 1.5]) expect(() => drawPackageLabels(many, { ...sheet, skip })).toThrow(RangeError);
  });

  test('have cut marks in the margin only', async () => {
    const page = readPdf(await drawPackageLabels(many, sheet))[0] as PdfPage;
    const marks = page.dark.filter((box) => Math.min(box.width, box.height) < 0.21);
    expect(marks.length).toBe(2 * (3 + 6));
    for (const mark of marks) expect(touches(mark, { x: 5, y: 23.5, width: 200, height: 250 })).toBe(false);
  });
});
