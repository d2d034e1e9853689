import type { CycleNeed, ItemKind, Packaging } from '../load/model';
import type { FieldProblem } from './csv-column';
import { readDeviceIdentifier } from './device-identifier';
import type { ItemFields } from './item-fields';

/** What a kind may be packed in. The trade's own meaning of the words; common practice, no source. */
const packagingOf: Readonly<Record<ItemKind, readonly Packaging[]>> = {
  pouch: ['paper-film-pouch', 'double-pouch'],
  'rigid-container': ['rigid-container'],
  'wrapped-tray': ['wrap'],
  basin: ['wrap', 'none'],
  'textile-pack': ['wrap'],
  'challenge-device': ['paper-film-pouch', 'wrap', 'none'],
};

const leastMassDifferenceKg = 0.000_5;

function checkPackaging(item: ItemFields): FieldProblem[] {
  const allowed = packagingOf[item.kind];
  if (allowed.includes(item.packaging)) return [];
  return [{ field: 'packaging', sentence: `Something of the kind ${item.kind} is packed in: ${allowed.join(', ')}.` }];
}

function checkSize(item: ItemFields): FieldProblem[] {
  if (item.widthMm <= item.lengthMm) return [];
  return [{ field: 'widthMm', sentence: 'The short side is longer than the long side. Swap the two.' }];
}

function checkMass(item: ItemFields): FieldProblem[] {
  const parts = item.metalMassKg + item.textileMassKg;
  if (parts <= item.massKg + leastMassDifferenceKg) return [];
  const field = item.metalMassKg >= item.textileMassKg ? 'metalMassKg' : 'textileMassKg';
  return [{ field, sentence: 'Metal and textile together are heavier than the whole.' }];
}

function checkFilterZones(item: ItemFields): FieldProblem[] {
  if (item.packaging !== 'rigid-container') {
    if (item.filterZones.length === 0) return [];
    return [{ field: 'filterZones', sentence: 'Only a rigid container has filters.' }];
  }
  if (item.filterZones.length === 0) {
    return [{ field: 'filterZones', sentence: 'Say where its filters or valves are, on the lid or the base.' }];
  }
  const outside = item.filterZones.find(
    (zone) => zone.xMm + zone.lengthMm > item.lengthMm || zone.yMm + zone.widthMm > item.widthMm,
  );
  if (outside === undefined) return [];
  return [{ field: 'filterZones', sentence: `A filter on the ${outside.face} reaches over its edge.` }];
}

function isSameCycle(one: CycleNeed, other: CycleNeed): boolean {
  return (
    one.type === other.type && one.temperatureC === other.temperatureC && one.leastExposureS === other.leastExposureS
  );
}

function checkCycleNeeds(item: ItemFields): FieldProblem[] {
  const { cycleNeeds } = item;
  if (cycleNeeds.length === 0) {
    return [{ field: 'cycleNeeds', sentence: 'Name at least one cycle that its instructions for use permit.' }];
  }
  const backwards = cycleNeeds.some(
    (need) => need.greatestExposureS !== null && need.greatestExposureS < need.leastExposureS,
  );
  if (backwards)
    return [{ field: 'cycleNeeds', sentence: 'The greatest exposure of a cycle is shorter than the least.' }];
  const doubled = cycleNeeds.some((need, at) => cycleNeeds.findIndex((other) => isSameCycle(need, other)) !== at);
  if (doubled) return [{ field: 'cycleNeeds', sentence: 'The same cycle is named twice.' }];
  return [];
}

function checkExpiry(item: ItemFields): FieldProblem[] {
  if (item.expiryRule === 'dated' && item.expiryDays === null) {
    return [{ field: 'expiryDays', sentence: 'Say after how many days a package expires.' }];
  }
  if (item.expiryRule === 'event-related' && item.expiryDays !== null) {
    return [{ field: 'expiryDays', sentence: 'A package whose expiry is event-related has no number of days.' }];
  }
  return [];
}

function checkReferences(item: ItemFields): FieldProblem[] {
  const problems: FieldProblem[] = [];
  if (item.deviceIdentifier !== null) {
    const read = readDeviceIdentifier(item.deviceIdentifier);
    if (!read.ok) problems.push({ field: 'deviceIdentifier', sentence: read.refusal.sentence });
  }
  if (item.ifuRevision !== null && item.ifuReference === null) {
    problems.push({
      field: 'ifuReference',
      sentence: 'There is a revision of the instructions, but no reference to them.',
    });
  }
  if (item.preferredHolder !== null && item.kind !== 'pouch') {
    problems.push({ field: 'preferredHolder', sentence: 'Only a pouch stands in a holder.' });
  }
  if (item.facing !== null && item.kind !== 'pouch') {
    problems.push({ field: 'facing', sentence: 'Only a pouch has a paper side that faces somewhere.' });
  }
  if (item.pose === 'tilted' && item.kind === 'pouch') {
    problems.push({ field: 'pose', sentence: 'A pouch stands on edge or lies flat.' });
  }
  return problems;
}

/** What does not hold together in one item by itself; empty when all does. */
export function checkItem(item: ItemFields): FieldProblem[] {
  return [
    ...checkPackaging(item),
    ...checkSize(item),
    ...checkMass(item),
    ...checkFilterZones(item),
    ...checkCycleNeeds(item),
    ...checkExpiry(item),
    ...checkReferences(item),
  ];
}

/** What an item refers to: the codes there are, and who else carries which device identifier. */
export type CatalogueReferences = {
  readonly itemCodes: ReadonlySet<string>;
  readonly holderKindCodes: ReadonlySet<string>;
  /** Device identifier to the code of the item that carries it. */
  readonly deviceIdentifiers: ReadonlyMap<string, string>;
};

/** What an item refers to that is not there, or belongs to another. */
export function checkItemReferences(item: ItemFields, references: CatalogueReferences): FieldProblem[] {
  const problems: FieldProblem[] = [];
  const unknown = item.standsOn.filter((code) => !references.itemCodes.has(code));
  if (unknown.length > 0) {
    problems.push({ field: 'standsOn', sentence: `There is no item with the code ${unknown.join(', ')}.` });
  }
  if (item.preferredHolder !== null && !references.holderKindCodes.has(item.preferredHolder)) {
    problems.push({
      field: 'preferredHolder',
      sentence: `There is no kind of holder with the code ${item.preferredHolder}.`,
    });
  }
  const owner = item.deviceIdentifier === null ? undefined : references.deviceIdentifiers.get(item.deviceIdentifier);
  if (owner !== undefined && owner !== item.code) {
    problems.push({ field: 'deviceIdentifier', sentence: `${owner} already carries this device identifier.` });
  }
  return problems;
}
