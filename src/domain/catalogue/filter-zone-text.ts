import type { FilterZone } from '../load/model';
import { accept, refuse, type Result } from '../result';
import { mm } from '../units/quantity';
import { readNumberCell, shorten, type NumberStyle } from './csv-cell';

/*
 * Open filters as one line of text, separated by "|":
 *   lid 200 x 180 at 190 50 | base 200 x 180 at 190 50
 * Length along the item, width across it, then the corner's distance along and across from the item's own corner, in mm.
 */

const number = String.raw`(\d+(?:[.,]\d+)?)`;
const oneZone = new RegExp(String.raw`^(lid|base)\s+${number}\s*[x×]\s*${number}\s+at\s+${number}\s+${number}$`, 'i');

function readOne(text: string, style: NumberStyle): FilterZone | null {
  const match = oneZone.exec(text);
  if (match === null) return null;
  const figures = match.slice(2).map((figure) => readNumberCell(figure, style));
  const [lengthMm, widthMm, xMm, yMm] = figures.map((figure) => (figure.ok ? mm(figure.value) : undefined));
  if (lengthMm === undefined || widthMm === undefined || xMm === undefined || yMm === undefined) return null;
  return { face: match[1]?.toLowerCase() === 'base' ? 'base' : 'lid', xMm, yMm, lengthMm, widthMm };
}

export function readFilterZones(text: string, style: NumberStyle): Result<readonly FilterZone[], 'not-a-zone'> {
  const zones: FilterZone[] = [];
  for (const part of text.split('|')) {
    const zone = readOne(part.trim(), style);
    if (zone === null) {
      return refuse(
        'not-a-zone',
        `“${shorten(part.trim())}” is not a filter. Write it like “lid 200 x 180 at 190 50”, in mm.`,
      );
    }
    zones.push(zone);
  }
  return accept(zones);
}

export function writeFilterZones(zones: readonly FilterZone[]): string {
  return zones.map((zone) => `${zone.face} ${zone.lengthMm} x ${zone.widthMm} at ${zone.xMm} ${zone.yMm}`).join(' | ');
}
