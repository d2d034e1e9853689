import { createRequire } from 'node:module';
import PDFDocument from 'pdfkit';
import { fitText, type TextBox } from './fit-text';
import { oneLine } from './label-words';
import { pointsPerMm } from './print-measures';
import type { SymbolModules } from './symbol-modules';

/*
 * A sheet of paper measured in millimetres from its upper left corner, black ink only.
 *
 * The typeface is DejaVu Sans Condensed, because labels carry people's and things' names in any of the Latin, Greek and
 * Cyrillic alphabets: the screen's own typeface comes split by script, and split it prints boxes for some letters.
 */

const resolve = createRequire(import.meta.url).resolve;
const typefaces = {
  regular: resolve('dejavu-fonts-ttf/ttf/DejaVuSansCondensed.ttf'),
  bold: resolve('dejavu-fonts-ttf/ttf/DejaVuSansCondensed-Bold.ttf'),
} as const;

export type Weight = keyof typeof typefaces;

export type Align = 'left' | 'right';

/** Height of the typeface's capitals and digits, as a share of its size (1493 of 2048 units in its own tables). */
const capShare = 0.729;

/** Where a text goes: `y` is the base line of its first line, `top` the upper edge of that line's capitals. */
export type TextPlace = { x: number; weight?: Weight; align?: Align } & ({ y: number } | { top: number });

/** What a label is drawn with. All lengths in mm. */
export type LabelPen = {
  /** One line of text as it is: for words of ours, whose width is known to fit. Returns its width. */
  text(words: string, at: TextPlace & { size: number }): number;
  /** Text that has to fit a box, whatever it is. Returns the base line of its last line. */
  fitted(words: string, at: TextPlace & TextBox): number;
  rect(x: number, y: number, width: number, height: number): void;
  frame(x: number, y: number, width: number, height: number, line: number): void;
  /** A drawing on a grid of 24, as the screen's icons are, at a place and size. */
  icon(paths: readonly { readonly d: string; readonly line: number }[], x: number, y: number, size: number): void;
  /** A symbol with its upper left dark corner at a place; `rowHeight` for bars, whose rows are not square. */
  symbol(modules: SymbolModules, x: number, y: number, module: number, rowHeight?: number): void;
};

export type SheetSize = { readonly widthMm: number; readonly heightMm: number };

export type LabelSheets = {
  /** Begins a new page of a size. */
  page(size: SheetSize): void;
  /** Draws with a pen whose origin lies at a place on the page. */
  at(x: number, y: number, draw: (pen: LabelPen) => void): void;
  /** Ends the document. */
  finish(): Promise<Buffer>;
};

/** From one base line to the next, as a share of the size. */
const leading = 1.14;

function baseLine(at: TextPlace, size: number): number {
  return 'y' in at ? at.y : at.top + size * capShare;
}

function penOn(document: PDFKit.PDFDocument): LabelPen {
  // A text is as wide as its size is large, and measuring is the slow part: each text is measured once.
  const unitWidths: Record<Weight, Map<string, number>> = { regular: new Map(), bold: new Map() };
  const widthOf = (words: string, weight: Weight, size: number) => {
    const known = unitWidths[weight].get(words);
    const unit = known ?? document.font(weight).fontSize(1).widthOfString(words);
    unitWidths[weight].set(words, unit);
    return unit * size;
  };
  const pen: LabelPen = {
    text(words, at) {
      const { x, size, weight = 'regular', align = 'left' } = at;
      const width = widthOf(words, weight, size);
      if (words !== '') {
        const start = align === 'left' ? x : x - width;
        document
          .font(weight)
          .fontSize(size)
          .text(words, start, baseLine(at, size), { lineBreak: false, baseline: 'alphabetic' });
      }
      return width;
    },
    fitted(words, at) {
      const { x, weight = 'regular', align = 'left' } = at;
      const fit = fitText(oneLine(words), at, (piece, size) => widthOf(piece, weight, size));
      let y = baseLine(at, fit.size);
      for (const [place, line] of fit.lines.entries()) {
        if (place > 0) y += fit.size * leading;
        pen.text(line, { x, y, size: fit.size, weight, align });
      }
      return y;
    },
    rect(x, y, width, height) {
      document.rect(x, y, width, height).fill();
    },
    frame(x, y, width, height, line) {
      document
        .lineWidth(line)
        .rect(x + line / 2, y + line / 2, width - line, height - line)
        .stroke();
    },
    icon(paths, x, y, size) {
      document
        .save()
        .translate(x, y)
        .scale(size / 24);
      for (const { d, line } of paths) document.lineWidth(line).path(d).stroke();
      document.restore();
    },
    symbol(modules, x, y, module, rowHeight = module) {
      for (const dark of modules.dark) {
        document.rect(x + dark.x * module, y + dark.y * rowHeight, dark.width * module, dark.height * rowHeight);
      }
      document.fill();
    },
  };
  return pen;
}

/**
 * Begins a document of labels. `printedAt` (an ISO 8601 instant) is the only time in it, so that the same labels give the
 * same bytes.
 */
export function beginLabelSheets({ title, printedAt }: { title: string; printedAt: string }): LabelSheets {
  const document = new PDFDocument({
    autoFirstPage: false,
    margin: 0,
    lang: 'en',
    displayTitle: true,
    info: { Title: title, Creator: 'Paperside', Producer: 'Paperside', CreationDate: new Date(printedAt) },
  });
  for (const [name, file] of Object.entries(typefaces)) document.registerFont(name, file);
  const pieces: Buffer[] = [];
  document.on('data', (piece: Buffer) => pieces.push(piece));
  const whole = new Promise<Buffer>((done, failed) => {
    document.on('end', () => {
      done(Buffer.concat(pieces));
    });
    document.on('error', failed);
  });
  const pen = penOn(document);
  return {
    page({ widthMm, heightMm }) {
      document.addPage({ size: [widthMm * pointsPerMm, heightMm * pointsPerMm], margin: 0 });
      document.scale(pointsPerMm).fillColor('black').strokeColor('black');
    },
    at(x, y, draw) {
      document.save().translate(x, y);
      draw(pen);
      document.restore();
    },
    finish() {
      document.end();
      return whole;
    },
  };
}
