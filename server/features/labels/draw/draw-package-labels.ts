import { parsePackageCode } from '#domain/label/package-code';
import type { LabelPen } from './label-page';
import { expiryWords, kindWords, momentWords, oneLine, reprintWords, type LabelExpiry } from './label-words';
import { layOutLabels, packageLabelForm, type Printing } from './lay-out-labels';
import { barModuleMm, moduleFitting, onDot } from './print-measures';
import { barsOf, matrixOf, symbolModules, type LabelGtin } from './symbol-modules';

/*
 * The label stuck to a package when it is packed: 100 x 50 mm, black only. It carries no load: at packing nobody knows it;
 * the load sticker adds it. It belongs on the film side or on tape, never on pouch paper (label guides, restated).
 */

export type PackageLabel = {
  /** As kept: P-20431784-52. */
  readonly code: string;
  readonly itemName: string;
  /** In the facility's units, "90 × 230 mm"; null where size says nothing. */
  readonly size: string | null;
  /** The item's code in the facility's catalogue. */
  readonly catalogueReference: string;
  readonly packedBy: string;
  /** ISO 8601 instant. */
  readonly packedAt: string;
  readonly expiry: LabelExpiry;
  readonly isImplant: boolean;
  /** The item's GTIN, if it has one: makes the matrix symbol a GS1 DataMatrix. See `matrixOf`. */
  readonly gtin: LabelGtin | null;
  /** 1 for the first printing; from 2 on the label says "Reprint 2". */
  readonly copy: number;
};

const labelHeight = packageLabelForm.heightMm;
const edgeWidth = 7.5;
/** Where text and bars begin: the quiet zone of the bars is what parts them from the edge. */
const left = 11.25;
const right = 96.5;
const bottom = 47;
const symbolHeight = 11.25;

/** The seal of a pouch: fine ribs down the left edge; coarse ones on an implant, to be known from across the room. */
export function drawRibbedEdge(pen: LabelPen, height: number, isCoarse: boolean): void {
  const [rib, pitch] = isCoarse ? [2.25, 3] : [0.375, 1.25];
  for (let y = 0; y < height; y += pitch) pen.rect(0, y, edgeWidth, Math.min(rib, height - y));
  pen.rect(edgeWidth - 0.375, 0, 0.375, height);
}

/** The screen's implant mark, on its grid of 24. */
const implantMark = [
  { d: 'M12 2.5 L21 12 L12 21.5 L3 12 Z', line: 1.75 },
  { d: 'M12 7.5 L12 16.5 M9.5 9.5 L14.5 9.5 M9.5 14.5 L14.5 14.5', line: 1.4 },
] as const;

function drawImplantBox(pen: LabelPen, top: number): void {
  const words = 'Implant. Hold for BI.';
  const width = pen.text(words, { x: left + 9.25, y: top + 5, size: 4.5, weight: 'bold' });
  pen.icon(implantMark, left + 2.25, top + 0.9, 5.2);
  pen.frame(left, top, onDot(width + 12), 7, 0.5);
}

function drawFacts(pen: LabelPen, label: PackageLabel, y: number, timeZone: string): void {
  const size = 3;
  const fact = (name: string, value: string, at: { x: number; y: number; nameWidth: number; end: number }) => {
    pen.text(name, { x: at.x, y: at.y, size, weight: 'bold' });
    const x = at.x + at.nameWidth;
    pen.fitted(value, { x, y: at.y, width: at.end - x, steps: [[1, size, 2.4]] });
  };
  fact('Packed', momentWords(label.packedAt, timeZone), { x: left, y, nameWidth: 13, end: left + 44 });
  fact('By', label.packedBy, { x: left + 45, y, nameWidth: 6, end: right });
  fact('Item', label.catalogueReference, { x: left, y: y + 4.25, nameWidth: 13, end: right });
}

function drawSymbols(pen: LabelPen, label: PackageLabel): void {
  pen.symbol(symbolModules(barsOf(label.code)), left, bottom - symbolHeight, barModuleMm, symbolHeight);
  const matrix = symbolModules(matrixOf(label.code, label.gtin));
  const module = moduleFitting(matrix.columns, symbolHeight);
  const side = matrix.columns * module;
  pen.symbol(matrix, right - side, bottom - side, module);

  const edge = right - symbolHeight - 2.5;
  const [first, second] = expiryWords(label.expiry);
  const isDated = label.expiry.rule === 'dated';
  pen.text(first, { x: edge, y: bottom - 4.25, size: 3, align: 'right' });
  pen.text(second, {
    x: edge,
    y: bottom - 0.25,
    size: isDated ? 4 : 3,
    weight: isDated ? 'bold' : 'regular',
    align: 'right',
  });
  const reprint = reprintWords(label.copy);
  if (reprint !== null) pen.text(reprint, { x: edge, y: bottom - 8.75, size: 3, weight: 'bold', align: 'right' });
}

function drawPackageLabel(pen: LabelPen, label: PackageLabel, timeZone: string): void {
  const parsed = parsePackageCode(label.code);
  if (!parsed.ok) throw new RangeError('A package label carries the code of a package.');
  drawRibbedEdge(pen, labelHeight, label.isImplant);
  const width = right - left;
  const nameEnd = pen.fitted(label.itemName, {
    x: left,
    top: 3,
    width,
    weight: 'bold',
    steps: [
      [1, 5.6, 4.6],
      [2, 4.6, 3.2],
    ],
  });
  const codeLine = nameEnd + 5.75;
  const codeWidth = pen.text(parsed.value.code, { x: left, y: codeLine, size: 4.2, weight: 'bold' });
  const size = label.size === null ? '' : oneLine(label.size);
  pen.fitted(`${kindWords[parsed.value.itemKind]}   ${size}`.trim(), {
    x: left + codeWidth + 3,
    y: codeLine,
    width: width - codeWidth - 3,
    steps: [[1, 3.4, 2.4]],
  });
  drawFacts(pen, label, codeLine + 5, timeZone);
  if (label.isImplant) drawImplantBox(pen, 26.5);
  drawSymbols(pen, label);
}

/**
 * Package labels as a PDF: single pages of 100 x 50 mm, or A4 sheets of 2 x 5. `timeZone` is the facility's, for the time
 * of packing. Bars are Code 128 of the code, squares a Data Matrix: see `matrixOf` for when it is a GS1 DataMatrix.
 */
export function drawPackageLabels(
  labels: readonly PackageLabel[],
  { timeZone, ...printing }: Printing & { readonly timeZone: string },
): Promise<Buffer> {
  const form = packageLabelForm;
  return layOutLabels(labels, { ...printing, form, title: 'Package labels' }, (pen, label) => {
    drawPackageLabel(pen, label, timeZone);
  });
}
