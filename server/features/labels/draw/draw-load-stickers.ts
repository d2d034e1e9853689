import { formatLoadStickerCode } from '#domain/label/load-sticker-code';
import type { LabelPen } from './label-page';
import { dayWords, reprintWords } from './label-words';
import { layOutLabels, loadStickerForm, type Printing } from './lay-out-labels';
import { moduleFitting } from './print-measures';
import { symbolModules } from './symbol-modules';

/*
 * The sticker that tells which load a package was processed in: 50 x 25 mm, one for each package. It has what public rules
 * ask of a lot control label: sterilizer, load number, date, contents, and who put the package together (S.D. Admin. R.
 * 44:73:02:05, and APIC text chapter 108 restated).
 */

export type LoadSticker = {
  readonly loadNumber: string;
  /** As people call it: "Sterilizer 2". */
  readonly sterilizer: string;
  /** Day of the load by the facility's rule, YYYY-MM-DD. */
  readonly day: string;
  readonly packageCode: string;
  /** What is in the package: the item's name. */
  readonly itemName: string;
  readonly packedBy: string;
  readonly isImplant: boolean;
  /** 1 for the first printing; from 2 on the sticker says "Reprint 2". */
  readonly copy: number;
};

const left = 2.5;
const right = 47.5;
const matrixSide = 11.25;
const textWidth = right - left;

function drawLoadSticker(pen: LabelPen, sticker: LoadSticker): void {
  const { loadNumber, packageCode, copy } = sticker;
  const matrix = symbolModules({ form: 'data-matrix', text: formatLoadStickerCode({ loadNumber, packageCode, copy }) });
  const module = moduleFitting(matrix.columns, matrixSide);
  const side = matrix.columns * module;
  pen.symbol(matrix, right - side, 2.5, module);

  const besideMatrix = right - matrixSide - 1.5 - left;
  pen.fitted(loadNumber, {
    x: left,
    top: 2.5,
    width: besideMatrix,
    weight: 'bold',
    steps: [[1, 4.4, 2.6]],
  });
  pen.fitted(sticker.sterilizer, { x: left, y: 9.1, width: besideMatrix, steps: [[1, 2.6, 2.2]] });
  pen.text(dayWords(sticker.day), { x: left, y: 12.5, size: 2.6 });
  pen.text(packageCode, { x: left, y: 16.1, size: 2.9, weight: 'bold' });
  const reprint = reprintWords(copy);
  if (reprint !== null) pen.text(reprint, { x: right, y: 16.5, size: 2.4, weight: 'bold', align: 'right' });

  const contents = sticker.isImplant ? `Implant: ${sticker.itemName}` : sticker.itemName;
  pen.fitted(contents, { x: left, y: 19.6, width: textWidth, steps: [[1, 2.6, 2.2]] });
  pen.fitted(`Packed by ${sticker.packedBy}`, { x: left, y: 22.75, width: textWidth, steps: [[1, 2.4, 2.2]] });
}

/**
 * Load stickers as a PDF: single pages of 50 x 25 mm, or A4 sheets of 4 x 10. The symbol is a Data Matrix of the load
 * sticker's code, which names package, load and printing.
 */
export function drawLoadStickers(stickers: readonly LoadSticker[], printing: Printing): Promise<Buffer> {
  return layOutLabels(stickers, { ...printing, form: loadStickerForm, title: 'Load stickers' }, drawLoadSticker);
}
