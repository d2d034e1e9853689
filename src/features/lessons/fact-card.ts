import { findItem, nameOf } from '#domain/load/look-up';
import { placeWords } from '#domain/load/describe-place';
import { layOut } from '#domain/load/layout';
import { reckon } from '#domain/load/reckoning';
import { serviceStateWords } from '#domain/catalogue/service-state-words';
import type { CatalogueItem, LoadPackage, LoadView, Program } from '#domain/load/model';
import type { LessonCard } from '#domain/lessons/lesson';
import { stateInWords } from '#domain/package/state-words';
import { formatDay, formatDuration, formatMass, formatSize, formatTemperature, listInWords } from '../../lib/format';
import type { UnitSystem } from '../../lib/facility';

export type Fact = {
  readonly key: string;
  readonly label: string;
  readonly value: string;
  /** Id of the package or shelf it is about; 'load' for all of it. Without one it is about what the card is about. */
  readonly subject?: string;
};

/** A small card of what no drawing shows, filled from the same load that is drawn. */
export type FactCard = {
  readonly heading: string;
  readonly subject: string | null;
  readonly facts: readonly Fact[];
};

export function factCardOf(view: LoadView, card: LessonCard, unitSystem: UnitSystem): FactCard {
  switch (card.shows) {
    case 'label':
      return labelCard(view, card.packageId);
    case 'size':
      return sizeCard(view, card.packageId, unitSystem);
    case 'codes':
      return cardOfPackages(view, 'The labels', (one) => one.code || 'no code');
    case 'states':
      return cardOfPackages(view, 'What the scans said', (one) => stateInWords(one.state));
    case 'places':
      return placeCard(view);
    case 'masses':
      return massCard(view, unitSystem);
    case 'counts':
      return countCard(view);
    case 'sterilizer':
      return sterilizerCard(view);
    case 'program':
      return programCard(view, unitSystem);
  }
}

function cardOfPackages(view: LoadView, heading: string, say: (one: LoadPackage) => string): FactCard {
  return {
    heading,
    subject: null,
    facts: view.packages.map((one) => ({
      key: one.packageId,
      label: nameOf(view, one),
      value: say(one),
      subject: one.packageId,
    })),
  };
}

/** Numbered, because two of one name may stand on each other. */
function placeCard(view: LoadView): FactCard {
  const card = cardOfPackages(view, 'Where things are said to be', (one) => placeOf(view, one));
  return { ...card, facts: card.facts.map((fact, index) => ({ ...fact, label: `${index + 1}. ${fact.label}` })) };
}

function placeOf(view: LoadView, one: LoadPackage): string {
  if (one.placement === null) return one.isScanned ? 'scanned, no place' : 'not scanned';
  const { placement } = one;
  if (placement.at !== 'package') return placeWords(view, placement, findItem(view, one.itemId));
  const below = view.packages.findIndex(({ packageId }) => packageId === placement.belowPackageId) + 1;
  return `on top of number ${below}`;
}

const packagingWords: Readonly<Record<CatalogueItem['packaging'], string>> = {
  'paper-film-pouch': 'paper-film pouch',
  'double-pouch': 'double pouch',
  wrap: 'wrap',
  'rigid-container': 'rigid container',
  none: 'none',
};

function labelCard(view: LoadView, packageId: string): FactCard {
  const one = view.packages.find((known) => known.packageId === packageId);
  const item = one && findItem(view, one.itemId);
  if (!one || !item) return { heading: 'No label', subject: packageId, facts: [] };
  const yes = (isThere: boolean, where: string) => (isThere ? where : 'none');
  return {
    heading: `${item.name}, ${one.code}`,
    subject: packageId,
    facts: [
      { key: 'packaging', label: 'Packaging', value: packagingWords[item.packaging] },
      { key: 'outside', label: 'External CI', value: yes(one.hasExternalIndicator, 'on it') },
      { key: 'inside', label: 'Internal CI', value: yes(one.hasInternalIndicator, 'packed in') },
      { key: 'expiry', label: 'Expires', value: one.expiresOn === null ? 'no day named' : formatDay(one.expiresOn) },
      { key: 'ifu', label: 'Instructions', value: item.ifuReference === null ? 'not on file' : 'on file' },
    ],
  };
}

function sizeCard(view: LoadView, packageId: string, unitSystem: UnitSystem): FactCard {
  const one = view.packages.find((known) => known.packageId === packageId);
  const item = one && findItem(view, one.itemId);
  if (!item) return { heading: 'No entry', subject: packageId, facts: [] };
  const size = (mm: number) => formatSize([mm], unitSystem);
  return {
    heading: `${item.name}, as entered`,
    subject: packageId,
    facts: [
      { key: 'length', label: 'Length', value: size(item.lengthMm) },
      { key: 'width', label: 'Width', value: size(item.widthMm) },
      { key: 'height', label: 'Height, lying flat', value: size(item.heightMm) },
    ],
  };
}

function massCard(view: LoadView, unitSystem: UnitSystem): FactCard {
  const mass = (kg: number) => formatMass(kg, unitSystem);
  const layout = layOut(view);
  const sum = (masses: readonly number[]) => masses.reduce((whole, one) => whole + one, 0);
  const shelves = layout.shelves
    .map(({ shelf, bodies, holders }) => ({
      shelf,
      kg: sum([...bodies.map((body) => body.item.massKg), ...holders.map(({ kind }) => kind.massKg)]),
    }))
    .filter(({ kg }) => kg > 0);
  const limit = Math.min(view.sterilizer.greatestLoadMassKg, view.program.greatestLoadMassKg ?? Infinity);
  return {
    heading: 'What it weighs',
    subject: null,
    facts: [
      ...cardOfPackages(view, '', (one) => mass(findItem(view, one.itemId)?.massKg ?? 0)).facts,
      ...shelves.map(({ shelf, kg }) => ({
        key: shelf.id,
        label: shelf.name,
        value: `${mass(kg)}, made for ${mass(shelf.greatestMassKg)}`,
        subject: shelf.id,
      })),
      {
        key: 'load',
        label: 'The load',
        value: `${mass(sum(shelves.map(({ kg }) => kg)))}, tested with ${mass(limit)}`,
        subject: 'load',
      },
    ],
  };
}

function countCard(view: LoadView): FactCard {
  const { shelves, missing } = reckon(view);
  return {
    heading: 'Scanned and counted',
    subject: null,
    facts: [
      ...[...shelves].reverse().map(({ shelfId, shelfName, scanned, counted }) => ({
        key: shelfId,
        label: shelfName,
        value: `${scanned} scanned, ${counted ?? 'not'} counted`,
        subject: shelfId,
      })),
      ...missing.map(({ packageId, name }) => ({
        key: packageId,
        label: name,
        value: 'on the list, not scanned',
        subject: packageId,
      })),
    ],
  };
}

function sterilizerCard({ sterilizer, airRemoval }: LoadView): FactCard {
  return {
    heading: sterilizer.name,
    subject: 'load',
    facts: [
      { key: 'service', label: 'Service', value: serviceStateWords[sterilizer.serviceState].toLowerCase() },
      {
        key: 'air-removal',
        label: 'Air-removal test today',
        value: airRemoval === null ? 'none' : airRemoval.result,
      },
    ],
  };
}

function programCard(view: LoadView, unitSystem: UnitSystem): FactCard {
  const { program, qualifiedPrograms, sterilizer } = view;
  const items = view.items.filter((item) => item.cycleNeeds.some(({ leastDryS }) => leastDryS !== shortestDry(view)));
  return {
    heading: `Program ${program.code}`,
    subject: 'load',
    facts: [
      {
        key: 'exposure',
        label: 'Exposure',
        value: `${formatDuration(program.exposureS)} at ${formatTemperature(program.temperatureC, unitSystem)}`,
      },
      { key: 'dry', label: 'Drying', value: formatDuration(program.dryS) },
      ...items.map((item) => ({
        key: item.id,
        label: `${item.name} asks for`,
        value: `${formatDuration(Math.min(...item.cycleNeeds.map(({ leastDryS }) => leastDryS)))} of drying`,
        subject: view.packages.find((one) => one.itemId === item.id)?.packageId ?? item.id,
      })),
      {
        key: 'qualified',
        label: `${sterilizer.name} is qualified for`,
        value: listInWords(qualifiedPrograms.map((one: Program) => one.code)),
      },
    ],
  };
}

function shortestDry(view: LoadView): number {
  return Math.min(...view.items.flatMap((item) => item.cycleNeeds.map(({ leastDryS }) => leastDryS)));
}
