import type { CatalogueItem, CycleNeed, FilterZone, HolderKind, Program, Shelf, Sterilizer } from '../model';
import { policyParameters, type LoadPolicy } from '../policy';
import {
  isSensibleDuration,
  isSensibleLength,
  isSensibleMass,
  isSensiblePosition,
  isSensibleTemperature,
} from '../sensible';

/*
 * What cannot be true of the things a load is judged by, as words that follow "has": "a length of -5 mm". Null where all
 * of it can be. Only the first is told: whoever mends it looks at the entry as a whole.
 */

type Measure = readonly [what: string, value: number | null, unit: string, isSensible: (value: number) => boolean];

const isDistance = (value: number) => value >= 0 && (value === 0 || isSensibleLength(value));

function firstWrong(measures: readonly Measure[]): string | null {
  for (const [what, value, unit, isSensible] of measures) {
    if (value !== null && !isSensible(value)) return `${what} of ${value} ${unit}`;
  }
  return null;
}

export function wrongOfItem(item: CatalogueItem): string | null {
  return (
    firstWrong([
      ['a length', item.lengthMm, 'mm', isSensibleLength],
      ['a width', item.widthMm, 'mm', isSensibleLength],
      ['a height', item.heightMm, 'mm', isSensibleLength],
      ['a mass', item.massKg, 'kg', isSensibleMass],
      ['a metal mass', item.metalMassKg, 'kg', isSensibleMass],
      ['a textile mass', item.textileMassKg, 'kg', isSensibleMass],
      ['a free space around it', item.clearanceMm, 'mm', isDistance],
      ['a greatest height of the stack', item.greatestStackHeightMm, 'mm', isSensibleLength],
      ['a mass limit', item.massLimitKg, 'kg', isSensibleMass],
    ]) ??
    firstOf(item.filterZones, (zone) => wrongOfFilter(zone, item)) ??
    firstOf(item.cycleNeeds, wrongOfNeed)
  );
}

function wrongOfFilter({ face, xMm, yMm, lengthMm, widthMm }: FilterZone, item: CatalogueItem): string | null {
  const wrong = firstWrong([
    [`a ${face} filter with a length`, lengthMm, 'mm', isSensibleLength],
    [`a ${face} filter with a width`, widthMm, 'mm', isSensibleLength],
    [`a ${face} filter at a distance`, xMm, 'mm', isDistance],
    [`a ${face} filter at a distance`, yMm, 'mm', isDistance],
  ]);
  const isInside = xMm + lengthMm <= item.lengthMm && yMm + widthMm <= item.widthMm;
  return wrong ?? (isInside ? null : `a ${face} filter that reaches beyond its edge`);
}

function wrongOfNeed({ temperatureC, leastExposureS, greatestExposureS, leastDryS }: CycleNeed): string | null {
  return firstWrong([
    ['a cycle with a temperature', temperatureC, '°C', isSensibleTemperature],
    ['a cycle with an exposure', leastExposureS, 's', isSensibleDuration],
    ['a cycle with an exposure', greatestExposureS, 's', isSensibleDuration],
    ['a cycle with a drying time', leastDryS, 's', isSensibleDuration],
  ]);
}

export function wrongOfHolderKind(kind: HolderKind): string | null {
  return firstWrong([
    ['a width', kind.acrossMm, 'mm', isSensibleLength],
    ['a depth', kind.alongMm, 'mm', isSensibleLength],
    ['a mass', kind.massKg, 'kg', isSensibleMass],
    ['a pitch', kind.form === 'rack' ? kind.pitchMm : null, 'mm', isSensibleLength],
    ['a greatest height', kind.greatestHeightMm, 'mm', isSensibleLength],
    ['a greatest length', kind.greatestLengthMm, 'mm', isSensibleLength],
    ['a greatest thickness', kind.greatestThicknessMm, 'mm', isSensibleLength],
  ]);
}

export function wrongOfShelf(shelf: Shelf, sterilizer: Sterilizer): string | null {
  const wrong = firstWrong([
    ['a width', shelf.widthMm, 'mm', isSensibleLength],
    ['a depth', shelf.depthMm, 'mm', isSensibleLength],
    ['a clear height', shelf.clearHeightMm, 'mm', isSensibleLength],
    ['a greatest mass', shelf.greatestMassKg, 'kg', isSensibleMass],
  ]);
  if (wrong !== null) return wrong;
  return shelf.widthMm > sterilizer.chamberWidthMm || shelf.depthMm > sterilizer.chamberDepthMm
    ? `a size of ${shelf.widthMm} × ${shelf.depthMm} mm, more than the chamber of ${sterilizer.name}`
    : null;
}

export function wrongOfSterilizer(sterilizer: Sterilizer): string | null {
  return firstWrong([
    ['a chamber width', sterilizer.chamberWidthMm, 'mm', isSensibleLength],
    ['a chamber depth', sterilizer.chamberDepthMm, 'mm', isSensibleLength],
    ['a chamber height', sterilizer.chamberHeightMm, 'mm', isSensibleLength],
    ['a drain at a distance', sterilizer.drainXMm, 'mm', isSensiblePosition],
    ['a drain at a distance', sterilizer.drainYMm, 'mm', isSensiblePosition],
    ['a load limit', sterilizer.greatestLoadMassKg, 'kg', isSensibleMass],
  ]);
}

export function wrongOfProgram(program: Program): string | null {
  return firstWrong([
    ['a temperature', program.temperatureC, '°C', isSensibleTemperature],
    ['an exposure', program.exposureS, 's', isSensibleDuration],
    ['a drying time', program.dryS, 's', isSensibleDuration],
    ['a load limit', program.greatestLoadMassKg, 'kg', isSensibleMass],
  ]);
}

/** The names of the house rules that are set to something they cannot be. */
export function wrongOfPolicy(policy: LoadPolicy): readonly string[] {
  return policyParameters.flatMap((parameter) => {
    if (parameter.form === 'choice') {
      return parameter.choices.some(({ value }) => value === policy[parameter.id]) ? [] : [parameter.label];
    }
    const value = policy[parameter.id];
    return value >= parameter.range.least && value <= parameter.range.greatest ? [] : [parameter.label];
  });
}

function firstOf<Value>(values: readonly Value[], wrongOf: (value: Value) => string | null): string | null {
  for (const value of values) {
    const wrong = wrongOf(value);
    if (wrong !== null) return wrong;
  }
  return null;
}
