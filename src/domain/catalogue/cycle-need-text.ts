import type { CycleNeed, CycleType } from '../load/model';
import { accept, refuse, type Result } from '../result';
import { celsius, seconds } from '../units/quantity';
import { readNumberCell, shorten, type NumberStyle } from './csv-cell';

/*
 * Permitted cycles as one line of text, separated by "|":
 *   dynamic-air-removal 132 C 240 s dry 1800 s | gravity 121 C 1800-2700 s dry 1800 s
 * The exposure is the least, or the least and the greatest.
 */

export const cycleTypes = ['dynamic-air-removal', 'gravity', 'immediate-use'] as const satisfies readonly CycleType[];

const number = String.raw`\d+(?:[.,]\d+)?`;
const oneNeed = new RegExp(
  String.raw`^(${cycleTypes.join('|')})\s+(${number})\s*°?C\s+(\d+)(?:\s*-\s*(\d+))?\s*s\s+dry\s+(\d+)\s*s$`,
  'i',
);

function isCycleType(text: string): text is CycleType {
  return cycleTypes.some((type) => type === text);
}

function readOne(text: string, style: NumberStyle): CycleNeed | null {
  const match = oneNeed.exec(text);
  if (match === null) return null;
  const [, type = '', temperature = '', least = '', greatest, dry = ''] = match;
  const temperatureC = readNumberCell(temperature, style);
  const lower = type.toLowerCase();
  if (!temperatureC.ok || !isCycleType(lower)) return null;
  return {
    type: lower,
    temperatureC: celsius(temperatureC.value),
    leastExposureS: seconds(Number(least)),
    greatestExposureS: greatest === undefined ? null : seconds(Number(greatest)),
    leastDryS: seconds(Number(dry)),
  };
}

export function readCycleNeeds(text: string, style: NumberStyle): Result<readonly CycleNeed[], 'not-a-cycle'> {
  const needs: CycleNeed[] = [];
  for (const part of text.split('|')) {
    const need = readOne(part.trim(), style);
    if (need === null) {
      return refuse(
        'not-a-cycle',
        `“${shorten(part.trim())}” is not a cycle. Write it like “dynamic-air-removal 132 C 240 s dry 1800 s”.`,
      );
    }
    needs.push(need);
  }
  return accept(needs);
}

export function writeCycleNeeds(needs: readonly CycleNeed[]): string {
  return needs
    .map((need) => {
      const exposure =
        need.greatestExposureS === null ? `${need.leastExposureS}` : `${need.leastExposureS}-${need.greatestExposureS}`;
      return `${need.type} ${need.temperatureC} C ${exposure} s dry ${need.leastDryS} s`;
    })
    .join(' | ');
}
