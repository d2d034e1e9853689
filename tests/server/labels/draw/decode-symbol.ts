import zxing from '@zxing/library';
import { dotMm } from '../../../../server/features/labels/draw/print-measures';
import type { SymbolModules } from '../../../../server/features/labels/draw/symbol-modules';
import type { Box, PdfPage } from './read-pdf';

const { BarcodeFormat, BinaryBitmap, DecodeHintType, HybridBinarizer, MultiFormatReader, RGBLuminanceSource } = zxing;

/** What a reader makes of a picture of dark boxes, printed with so many dots to the millimetre. Null: nothing. */
function decode(dark: readonly Box[], area: Box, format: 'code-128' | 'data-matrix', dot: number): string | null {
  const [width, height] = [Math.round(area.width / dot), Math.round(area.height / dot)];
  const picture = new Uint8ClampedArray(width * height).fill(255);
  const within = (length: number, greatest: number) => Math.min(Math.max(Math.round(length / dot), 0), greatest);
  for (const box of dark) {
    const [left, right] = [within(box.x - area.x, width), within(box.x + box.width - area.x, width)];
    const [top, bottom] = [within(box.y - area.y, height), within(box.y + box.height - area.y, height)];
    for (let y = top; y < bottom; y += 1) picture.fill(0, y * width + left, y * width + right);
  }
  const hints = new Map<unknown, unknown>([
    [DecodeHintType.POSSIBLE_FORMATS, [format === 'code-128' ? BarcodeFormat.CODE_128 : BarcodeFormat.DATA_MATRIX]],
    [DecodeHintType.TRY_HARDER, true],
  ]);
  if (format === 'data-matrix') hints.set(DecodeHintType.PURE_BARCODE, true);
  const reader = new MultiFormatReader();
  reader.setHints(hints as Parameters<typeof reader.setHints>[0]);
  try {
    const source = new RGBLuminanceSource(picture, width, height);
    return reader.decodeWithState(new BinaryBitmap(new HybridBinarizer(source))).getText();
  } catch {
    return null;
  }
}

/** Reads a symbol's own modules, 4 dots to a module, with a quiet zone of ten. */
export function decodeModules(symbol: SymbolModules, format: 'code-128' | 'data-matrix'): string | null {
  const rowHeight = symbol.rows === 1 ? 30 : 1;
  const dark = symbol.dark.map((one) => ({ ...one, y: one.y * rowHeight, height: one.height * rowHeight }));
  const area = { x: -10, y: -10, width: symbol.columns + 20, height: symbol.rows * rowHeight + 20 };
  return decode(dark, area, format, 0.25);
}

/**
 * Reads what a page shows inside an area, as a 203 dpi printer puts it on paper; two picture points to a printed dot,
 * because this reader halves the width of a module and loses its place when that is not a whole number.
 */
export function decodeArea(page: PdfPage, area: Box, format: 'code-128' | 'data-matrix'): string | null {
  return decode(page.dark, area, format, dotMm / 2);
}
