import { beginLabelSheets, type LabelPen, type LabelSheets, type SheetSize } from './label-page';

/* One label to a page, for a label printer, or rows and columns of them on A4, for an office printer. */

export type LabelLayout = 'single' | 'sheet';

export type LabelForm = {
  readonly widthMm: number;
  readonly heightMm: number;
  /** Columns and rows on A4. */
  readonly columns: number;
  readonly rows: number;
};

export const packageLabelForm: LabelForm = { widthMm: 100, heightMm: 50, columns: 2, rows: 5 };
export const loadStickerForm: LabelForm = { widthMm: 50, heightMm: 25, columns: 4, rows: 10 };
/** Card ID-1 of ISO/IEC 7810 is 85.60 x 53.98 mm (from memory). */
export const badgeForm: LabelForm = { widthMm: 85.6, heightMm: 54, columns: 2, rows: 5 };

/** ISO 216. */
export const a4: SheetSize = { widthMm: 210, heightMm: 297 };

export type Printing = {
  readonly layout: LabelLayout;
  /** When it is printed, an ISO 8601 instant. */
  readonly printedAt: string;
  /** Places already used on the first sheet, counted along the rows. Has no meaning for single labels. */
  readonly skip?: number;
};

const markLength = 3;
const markGap = 1;
const markWidth = 0.2;

/** Short lines in the margin where to cut; nothing between the labels, where a cut that is off would leave them. */
function drawCutMarks(pen: LabelPen, form: LabelForm): void {
  const [width, height] = [form.columns * form.widthMm, form.rows * form.heightMm];
  for (let column = 0; column <= form.columns; column += 1) {
    const x = column * form.widthMm - markWidth / 2;
    pen.rect(x, -markGap - markLength, markWidth, markLength);
    pen.rect(x, height + markGap, markWidth, markLength);
  }
  for (let row = 0; row <= form.rows; row += 1) {
    const y = row * form.heightMm - markWidth / 2;
    pen.rect(-markGap - markLength, y, markLength, markWidth);
    pen.rect(width + markGap, y, markLength, markWidth);
  }
}

function layOutSheets<Label>(
  sheets: LabelSheets,
  form: LabelForm,
  labels: readonly Label[],
  { skip, draw }: { skip: number; draw: (pen: LabelPen, label: Label) => void },
): void {
  const left = (a4.widthMm - form.columns * form.widthMm) / 2;
  const top = (a4.heightMm - form.rows * form.heightMm) / 2;
  const perSheet = form.columns * form.rows;
  for (const [index, label] of labels.entries()) {
    const place = (skip + index) % perSheet;
    if (index === 0 || place === 0) {
      sheets.page(a4);
      sheets.at(left, top, (pen) => {
        drawCutMarks(pen, form);
      });
    }
    const [column, row] = [place % form.columns, Math.floor(place / form.columns)];
    sheets.at(left + column * form.widthMm, top + row * form.heightMm, (pen) => {
      draw(pen, label);
    });
  }
}

/** Draws labels of one form into a PDF. Throws a RangeError when there are none, or `skip` leaves no place on a sheet. */
export function layOutLabels<Label>(
  labels: readonly Label[],
  printing: Printing & { readonly title: string; readonly form: LabelForm },
  draw: (pen: LabelPen, label: Label) => void,
): Promise<Buffer> {
  const { form, layout, printedAt, title, skip = 0 } = printing;
  if (labels.length === 0) throw new RangeError('There is no label to print.');
  if (!Number.isInteger(skip) || skip < 0 || skip >= form.columns * form.rows) {
    throw new RangeError('There are not so many places on a sheet.');
  }
  const sheets = beginLabelSheets({ title, printedAt });
  if (layout === 'sheet') {
    layOutSheets(sheets, form, labels, { skip, draw });
  } else {
    for (const label of labels) {
      sheets.page(form);
      sheets.at(0, 0, (pen) => {
        draw(pen, label);
      });
    }
  }
  return sheets.finish();
}
