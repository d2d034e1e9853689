import { mkdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import type { Box, PdfPage } from '../../server/labels/draw/read-pdf';

/*
 * A film for the browser's make-believe camera, of what a printed page shows. The format is YUV4MPEG2: one line of header,
 * then each frame as brightness of every picture point followed by two planes of colour at half the width and height.
 */

const width = 1280;
const height = 720;
/** The camera repeats the film for as long as it runs. */
const frames = 4;
const paper = 235;
const ink = 16;
const noColour = 128;

/** Where a package label of 100 x 50 mm has its bars and its matrix, with the blank around them, in mm. */
export const barsOnLabel: Box = { x: 7.6, y: 35, width: 49.4, height: 12.5 };
export const matrixOnLabel: Box = { x: 84.4, y: 35, width: 13, height: 13 };

/** Films the part of the page inside `area`, held still before the camera. */
export function filmOf(page: PdfPage, area: Box, file: string): void {
  // A whole number of picture points to a printed dot of 1/8 mm, so that no bar is drawn wider than it is printed.
  const pointsPerDot = Math.max(1, Math.min(4, Math.floor((width - 80) / (area.width * 8))));
  const scale = 8 * pointsPerDot;
  const left = Math.round((width - area.width * scale) / 2);
  const top = Math.round((height - area.height * scale) / 2);
  const brightness = Buffer.alloc(width * height, paper);
  for (const box of page.dark) {
    if (box.x < area.x || box.x + box.width > area.x + area.width + 1e-6) continue;
    if (box.y < area.y || box.y + box.height > area.y + area.height + 1e-6) continue;
    const fromX = left + Math.round((box.x - area.x) * scale);
    const toX = left + Math.round((box.x + box.width - area.x) * scale);
    const fromY = top + Math.round((box.y - area.y) * scale);
    const toY = top + Math.round((box.y + box.height - area.y) * scale);
    for (let y = fromY; y < toY; y += 1) brightness.fill(ink, y * width + fromX, y * width + toX);
  }
  const colour = Buffer.alloc((width * height) / 2, noColour);
  const parts: Buffer[] = [Buffer.from(`YUV4MPEG2 W${width} H${height} F10:1 Ip A1:1 C420jpeg\n`)];
  for (let frame = 0; frame < frames; frame += 1) parts.push(Buffer.from('FRAME\n'), brightness, colour);
  mkdirSync(path.dirname(file), { recursive: true });
  writeFileSync(file, Buffer.concat(parts));
}
