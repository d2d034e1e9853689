import { challengePack, demonstrationItems, singleUseChallengeDevice } from '../../../seeds/demonstration-catalogue';
import type { ItemFields } from '../../../src/domain/catalogue/item-fields';
import type { CatalogueItem, CycleNeed, Program } from '../../../src/domain/load/model';
import { kg, mm } from '../../../src/domain/units/quantity';
import type { FacingRule } from '../../../src/domain/load/policy';
import type { Random } from './random';

/* The demonstration's catalogue, and how the instructions for use in it may differ from one hospital to the next. */

function catalogueItem(fields: ItemFields): CatalogueItem {
  const {
    coolS: _coolS,
    expiryRule: _expiryRule,
    expiryDays: _expiryDays,
    deviceIdentifier: _deviceIdentifier,
    ifuRevision: _ifuRevision,
    service: _service,
    note: _note,
    ...item
  } = fields;
  return { id: `item ${item.code}`, ...item };
}

const catalogue: readonly CatalogueItem[] = [...demonstrationItems, challengePack, singleUseChallengeDevice].map(
  catalogueItem,
);

/** The need that a program answers exactly. */
function needFor(program: Program): CycleNeed {
  return {
    type: program.type,
    temperatureC: program.temperatureC,
    leastExposureS: program.exposureS,
    greatestExposureS: null,
    leastDryS: program.dryS,
  };
}

export function permits(item: CatalogueItem, program: Program): boolean {
  return item.cycleNeeds.some(
    (need) =>
      need.type === program.type &&
      need.temperatureC === program.temperatureC &&
      need.leastExposureS <= program.exposureS &&
      (need.greatestExposureS === null || program.exposureS <= need.greatestExposureS) &&
      need.leastDryS <= program.dryS,
  );
}

/**
 * The catalogue of one hospital: where instructions for use speak and where they are silent, which trays have a solid floor,
 * what may stand on what, and which cycles are permitted besides those of the demonstration.
 */
export function variedCatalogue(random: Random, program: Program, house: FacingRule): readonly CatalogueItem[] {
  if (random.chance(0.2)) return catalogue;
  const facing = random.chance(0.2) ? random.pick(['one-way', 'alternating'] as const) : null;
  // Where the house asks for nothing, some pouches may ask for one way and others not.
  const isOfSome = facing === 'one-way' && house === 'not-set' && random.chance(0.5);
  const widening = random.pick([0, 0.3, 0.7]);
  return catalogue.map((item) => {
    let varied = item;
    if (random.chance(widening) && !permits(item, program) && program.type !== 'immediate-use') {
      varied = { ...varied, cycleNeeds: [...item.cycleNeeds, needFor(program)] };
    }
    if (random.chance(0.25)) varied = { ...varied, clearanceMm: clearanceFor(item, random) };
    if (random.chance(0.15)) varied = { ...varied, massLimitKg: massLimitFor(item, random) };
    if (item.kind === 'pouch' && !(isOfSome && random.chance(0.5))) varied = { ...varied, facing };
    if (item.kind === 'pouch' && random.chance(0.15)) varied = { ...varied, packaging: 'double-pouch' };
    varied = item.kind === 'wrapped-tray' ? asTray(varied, random) : asItsMakerWants(varied, random);
    if (item.standsOn.length > 0 && random.chance(0.3)) {
      varied = { ...varied, greatestStackHeightMm: random.pick([null, mm(450)]) };
    }
    return varied;
  });
}

function clearanceFor(item: CatalogueItem, random: Random): CatalogueItem['clearanceMm'] {
  if (random.chance(0.5)) return null;
  if (item.kind !== 'pouch') return mm(random.whole(10, 40));
  return mm(random.whole(5, 12));
}

/** What the pouches of a catalogue ask for, where any of them does, before what the house asks for. */
export function facingIn(items: readonly CatalogueItem[], house: FacingRule): FacingRule {
  return items.find((item) => item.facing !== null)?.facing ?? house;
}

/** Its own mass exactly, or something above it. */
function massLimitFor(item: CatalogueItem, random: Random): CatalogueItem['massLimitKg'] {
  return random.chance(0.3) ? item.massKg : kg(Math.ceil((item.massKg + random.next()) * 10) / 10);
}

/**
 * Makers contradict each other about pouches that lie flat and about basins on edge, and what their instructions say goes;
 * a challenge device that is bought comes in a pouch or in nothing.
 */
function asItsMakerWants(item: CatalogueItem, random: Random): CatalogueItem {
  if (item.code === 'P-10' && random.chance(0.15)) return { ...item, pose: 'flat', preferredHolder: null };
  if (item.code === 'W-11' && random.chance(0.3)) return { ...item, pose: 'on-edge' };
  if (item.code === 'PCD-02') return { ...item, packaging: random.pick(['wrap', 'none', 'paper-film-pouch']) };
  return item;
}

function asTray(item: CatalogueItem, random: Random): CatalogueItem {
  if (random.chance(0.06)) return { ...item, isPerforated: false, pose: 'tilted' };
  if (item.code === 'W-08' && random.chance(0.4)) {
    return { ...item, standsOn: ['W-03', 'W-06', 'W-09'], greatestStackHeightMm: mm(170) };
  }
  return item;
}
