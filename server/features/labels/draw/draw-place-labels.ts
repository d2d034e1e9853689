import { parsePlaceCode } from '#domain/label/place-code';
import { drawRibbedEdge } from './draw-package-labels';
import type { LabelPen } from './label-page';
import { layOutLabels, packageLabelForm, type Printing } from './lay-out-labels';
import { moduleFitting } from './print-measures';
import { barsOf, matrixOf, symbolModules } from './symbol-modules';

/*
 * The label of a holder or a shelf, 100 x 50 mm, to be read at arm's length. It goes through the sterilizer with its holder,
 * so it is printed on material that stands steam, or taken as the pattern for an engraved plate.
 */

export type PlaceLabel = {
  /** As kept: H-00012-31. */
  readonly code: string;
  /** As people call it: "Rack RM 4", "Cart 3, upper shelf". */
  readonly name: string;
  /** What else helps to tell it: "12 slots, pitch 30 mm"; null for nothing. */
  readonly note: string | null;
};

const left = 11.25;
const right = 96.5;
const bottom = 47;
const barHeight = 16;
const matrixSide = 16.5;
/** 4 dots at 203 dpi: place codes are short, so their bars may be wider than a package's. */
const moduleMm = 0.5;

function drawPlaceLabel(pen: LabelPen, label: PlaceLabel): void {
  const parsed = parsePlaceCode(label.code);
  if (!parsed.ok) throw new RangeError('A place label carries the code of a place.');
  const { code, place } = parsed.value;
  drawRibbedEdge(pen, packageLabelForm.heightMm, false);
  const width = right - left;
  const nameEnd = pen.fitted(label.name, {
    x: left,
    top: 3.5,
    width,
    weight: 'bold',
    steps: [
      [1, 8, 6],
      [2, 6, 3.6],
    ],
  });
  const words = `${place === 'holder' ? 'Holder' : 'Shelf'}   ${code}`;
  const end = pen.text(words, { x: left, y: nameEnd + 6.5, size: 4.2, weight: 'bold' });
  if (label.note !== null) {
    pen.fitted(label.note, { x: left + end + 3, y: nameEnd + 6.5, width: width - end - 3, steps: [[1, 3.4, 2.4]] });
  }
  pen.symbol(symbolModules(barsOf(code)), left + 1.25, bottom - barHeight, moduleMm, barHeight);
  const matrix = symbolModules(matrixOf(code));
  const module = moduleFitting(matrix.columns, matrixSide);
  const side = matrix.columns * module;
  pen.symbol(matrix, right - side, bottom - side, module);
}

/** Place labels as a PDF: single pages of 100 x 50 mm, or A4 sheets of 2 x 5. */
export function drawPlaceLabels(labels: readonly PlaceLabel[], printing: Printing): Promise<Buffer> {
  return layOutLabels(labels, { ...printing, form: packageLabelForm, title: 'Place labels' }, drawPlaceLabel);
}
