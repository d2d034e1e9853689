import { inflateSync } from 'node:zlib';
import { pointsPerMm } from '../../../../server/features/labels/draw/print-measures';

/*
 * Reads back a PDF as far as our labels use the format: pages and their sizes, filled rectangles, and texts with their
 * places. Everything is given in millimetres from the upper left corner of the page.
 */

export type Box = { readonly x: number; readonly y: number; readonly width: number; readonly height: number };

export type PlacedText = Box & { readonly words: string; readonly size: number };

export type PdfPage = {
  readonly widthMm: number;
  readonly heightMm: number;
  readonly dark: readonly Box[];
  readonly texts: readonly PlacedText[];
};

type PdfObject = { readonly dictionary: string; readonly stream: Buffer | null };
type Font = { readonly letters: readonly string[]; readonly widths: readonly number[] };
type Matrix = readonly [number, number, number, number, number, number];

function objectsOf(file: Buffer): Map<number, PdfObject> {
  const text = file.toString('latin1');
  const objects = new Map<number, PdfObject>();
  for (const match of text.matchAll(/(?:^|\n)(\d+) 0 obj\n/g)) {
    const start = match.index + match[0].length;
    const end = text.indexOf('endobj', start);
    const streamAt = text.indexOf('\nstream\n', start);
    const hasStream = streamAt >= 0 && streamAt < end;
    const dictionary = text.slice(start, hasStream ? streamAt : end);
    const length = Number(/\/Length (\d+)/.exec(dictionary)?.[1] ?? 0);
    const bytes = hasStream ? file.subarray(streamAt + 8, streamAt + 8 + length) : null;
    const isPacked = dictionary.includes('/FlateDecode');
    objects.set(Number(match[1]), { dictionary, stream: bytes && isPacked ? inflateSync(bytes) : bytes });
  }
  return objects;
}

function reference(dictionary: string, name: string): number {
  const found = new RegExp(`/${name} \\[?(\\d+) 0 R`).exec(dictionary);
  if (!found) throw new Error(`No ${name} in ${dictionary}`);
  return Number(found[1]);
}

function fontOf(objects: Map<number, PdfObject>, font: string): Font {
  const map = objects.get(reference(font, 'ToUnicode'))?.stream?.toString('latin1') ?? '';
  const letters: string[] = [];
  for (const [, , list = ''] of map.matchAll(/<([0-9a-f]{4})> <[0-9a-f]{4}> \[([^\]]*)\]/gi)) {
    for (const [, hex = ''] of list.matchAll(/<([0-9a-f ]*)>/gi)) {
      letters.push(String.fromCharCode(...(hex.match(/[0-9a-f]{4}/gi) ?? []).map((unit) => parseInt(unit, 16))));
    }
  }
  const descendant = objects.get(reference(font, 'DescendantFonts'))?.dictionary ?? '';
  const widths = (/\/W \[0 \[([^\]]*)\]/.exec(descendant)?.[1] ?? '').trim().split(/\s+/).map(Number);
  return { letters, widths };
}

function times(inner: Matrix, outer: Matrix): Matrix {
  const [a, b, c, d, e, f] = inner;
  const [A, B, C, D, E, F] = outer;
  return [a * A + b * C, a * B + b * D, c * A + d * C, c * B + d * D, e * A + f * C + E, e * B + f * D + F];
}

function pageOf(objects: Map<number, PdfObject>, page: string): PdfPage {
  const media = /\/MediaBox \[([^\]]*)\]/.exec(page)?.[1]?.trim().split(/\s+/).map(Number) ?? [];
  const [widthPt = 0, heightPt = 0] = media.slice(2);
  const resources = objects.get(reference(page, 'Resources'))?.dictionary ?? '';
  const fonts = new Map(
    [...(/\/Font <<([^>]*)>>/.exec(resources)?.[1] ?? '').matchAll(/\/(\w+) (\d+) 0 R/g)].map(([, name = '', id]) => [
      name,
      fontOf(objects, objects.get(Number(id))?.dictionary ?? ''),
    ]),
  );
  const content = objects.get(reference(page, 'Contents'))?.stream?.toString('latin1') ?? '';
  const toMm = (x: number, y: number) => [x / pointsPerMm, (heightPt - y) / pointsPerMm] as const;

  let matrix: Matrix = [1, 0, 0, 1, 0, 0];
  let textMatrix: Matrix = matrix;
  let font: Font = { letters: [], widths: [] };
  let size = 0;
  const saved: Matrix[] = [];
  let path: Box[] = [];
  const dark: Box[] = [];
  const texts: PlacedText[] = [];
  for (const line of content.split('\n')) {
    const parts = line.trim().split(/\s+/);
    const operator = parts.at(-1) ?? '';
    const numbers = parts.slice(0, -1).map(Number);
    const [n0 = 0, n1 = 0, n2 = 0, n3 = 0, n4 = 0, n5 = 0] = numbers;
    if (operator === 'q') saved.push(matrix);
    else if (operator === 'Q') matrix = saved.pop() ?? matrix;
    else if (operator === 'cm') matrix = times([n0, n1, n2, n3, n4, n5], matrix);
    else if (operator === 'Tm') textMatrix = times([n0, n1, n2, n3, n4, n5], matrix);
    else if (operator === 're') {
      const corners = [times([1, 0, 0, 1, n0, n1], matrix), times([1, 0, 0, 1, n0 + n2, n1 + n3], matrix)];
      const [one, two] = corners.map((corner) => toMm(corner[4], corner[5]));
      if (!one || !two) continue;
      const [x, y] = [Math.min(one[0], two[0]), Math.min(one[1], two[1])];
      path.push({ x, y, width: Math.abs(one[0] - two[0]), height: Math.abs(one[1] - two[1]) });
    } else if (operator === 'f') {
      dark.push(...path);
      path = [];
    } else if (operator === 'S' || operator === 'n') path = [];
    else if (operator === 'Tf') {
      font = fonts.get((parts[0] ?? '').slice(1)) ?? font;
      size = Number(parts[1]);
    } else if (operator === 'TJ') {
      const glyphs = [...line.matchAll(/<([0-9a-f]*)>/gi)]
        .flatMap(([, hex = '']) => hex.match(/.{4}/g) ?? [])
        .map((code) => parseInt(code, 16));
      const words = glyphs.map((glyph) => font.letters[glyph] ?? '').join('');
      const units = glyphs.reduce((sum, glyph) => sum + (font.widths[glyph] ?? 0), 0);
      const [x, base] = toMm(textMatrix[4], textMatrix[5]);
      const sizeMm = (size * Math.abs(textMatrix[0])) / pointsPerMm;
      const width = (units / 1000) * sizeMm;
      texts.push({ words, size: sizeMm, x, y: base - sizeMm * 0.76, width, height: sizeMm });
    }
  }
  return { widthMm: widthPt / pointsPerMm, heightMm: heightPt / pointsPerMm, dark, texts };
}

export function readPdf(file: Buffer): readonly PdfPage[] {
  const objects = objectsOf(file);
  const tree = [...objects.values()].find((object) => /\/Type \/Pages/.test(object.dictionary))?.dictionary ?? '';
  const kids = [...(/\/Kids \[([^\]]*)\]/.exec(tree)?.[1] ?? '').matchAll(/(\d+) 0 R/g)].map((kid) => Number(kid[1]));
  return kids.map((id) => pageOf(objects, objects.get(id)?.dictionary ?? ''));
}
