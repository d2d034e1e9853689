import { gs1CheckDigit } from '../src/domain/label/gs1-check-digit';
import type { ItemFields } from '../src/domain/catalogue/item-fields';
import type { CycleNeed, FilterZone } from '../src/domain/load/model';
import { celsius, kg, mm, seconds } from '../src/domain/units/quantity';

/*
 * An invented catalogue for the demonstration and for tests. Sizes, masses, cycles and instructions are plausible and
 * nobody's: never for real use.
 */

type Size = readonly [lengthMm: number, widthMm: number, heightMm: number];

/** Everything of an item but its code and name, filled up by what kind of thing it is. */
type Particulars = Partial<Omit<ItemFields, 'code' | 'name'>>;

/** Air removed by pulses, 132 °C for 4 minutes or more, dried so many minutes: the programs W4-20 to W4-50. */
export function wrappedCycle(dryMin: number, greatestMin: number | null = 18): CycleNeed {
  return {
    type: 'dynamic-air-removal',
    temperatureC: celsius(132),
    leastExposureS: seconds(240),
    greatestExposureS: greatestMin === null ? null : seconds(greatestMin * 60),
    leastDryS: seconds(dryMin * 60),
  };
}

/** 135 °C for 3 minutes, dried 16: on a panel here, and no sterilizer is qualified for it. */
const shortCycle: CycleNeed = {
  type: 'dynamic-air-removal',
  temperatureC: celsius(135),
  leastExposureS: seconds(180),
  greatestExposureS: seconds(600),
  leastDryS: seconds(960),
};

export const longCycle: CycleNeed = {
  type: 'dynamic-air-removal',
  temperatureC: celsius(134),
  leastExposureS: seconds(1_080),
  greatestExposureS: seconds(1_260),
  leastDryS: seconds(1_800),
};

export const gravityCycle: CycleNeed = {
  type: 'gravity',
  temperatureC: celsius(121),
  leastExposureS: seconds(1_800),
  greatestExposureS: seconds(2_700),
  leastDryS: seconds(1_800),
};

/**
 * A GTIN out of the numbers that GS1 leaves to everyone's own use and gives to no company (prefixes 20 to 29, restricted
 * circulation; GS1 General Specifications, section on GS1 Prefixes).
 */
function ownGtin(serial: number): string {
  const body = `02${String(serial).padStart(11, '0')}`;
  return `${body}${gs1CheckDigit(body)}`;
}

/** A HIBC identifier with the labeler code that the standard's own examples carry, A999, which is no company's. */
export function exampleHibc(product: string): string {
  return `A999${product}0`;
}

let serial = 1_000;

function item(
  code: string,
  name: string,
  [lengthMm, widthMm, heightMm]: Size,
  massKg: number,
  own: Particulars,
): ItemFields {
  serial += 1;
  return {
    code,
    name,
    kind: 'pouch',
    packaging: 'paper-film-pouch',
    lengthMm: mm(lengthMm),
    widthMm: mm(widthMm),
    heightMm: mm(heightMm),
    massKg: kg(massKg),
    metalMassKg: kg(0),
    textileMassKg: kg(0),
    metal: 'stainless-steel',
    isImplant: false,
    pose: 'on-edge',
    isPerforated: true,
    clearanceMm: null,
    standsOn: [],
    greatestStackHeightMm: null,
    filterZones: [],
    cycleNeeds: [wrappedCycle(20)],
    preferredHolder: null,
    facing: null,
    massLimitKg: null,
    coolS: seconds(1_800),
    expiryRule: 'event-related',
    expiryDays: null,
    deviceIdentifier: ownGtin(serial),
    ifuReference: `IFU-${code}`,
    ifuRevision: '2',
    service: 'OR',
    note: '',
    isRetired: false,
    ...own,
  };
}

/** The height of a pouch is its thickness when full. */
export function pouch(code: string, name: string, size: Size, massKg: number, own: Particulars): ItemFields {
  return item(code, name, size, massKg, {
    metalMassKg: kg(Math.round(massKg * 90) / 100),
    clearanceMm: mm(10),
    preferredHolder: 'RM',
    cycleNeeds: [wrappedCycle(20), shortCycle],
    ...own,
  });
}

/** Instruments in a tray with a perforated floor, in two sheets of wrap. */
export function wrappedTray(code: string, name: string, size: Size, massKg: number, own: Particulars): ItemFields {
  const textileMassKg = kg(Math.round(massKg * 4) / 100);
  return item(code, name, size, massKg, {
    kind: 'wrapped-tray',
    packaging: 'wrap',
    pose: 'flat',
    clearanceMm: mm(25),
    metalMassKg: kg(Math.round(massKg * 92) / 100),
    textileMassKg,
    coolS: seconds(3_600),
    ...own,
  });
}

function middleZone(face: FilterZone['face'], [itemLength, itemWidth]: Size, share: number): FilterZone {
  const lengthMm = Math.round((itemLength * share) / 10) * 10;
  const widthMm = Math.round((itemWidth * share * 1.5) / 10) * 10;
  return {
    face,
    xMm: mm((itemLength - lengthMm) / 2),
    yMm: mm((itemWidth - widthMm) / 2),
    lengthMm: mm(lengthMm),
    widthMm: mm(widthMm),
  };
}

/** `filters` says where the open filters are: most have one in the lid and one in the base. */
export function container(
  code: string,
  name: string,
  size: Size,
  massKg: number,
  { filters = ['lid', 'base'], ...own }: Particulars & { readonly filters?: readonly FilterZone['face'][] },
): ItemFields {
  return item(code, name, size, massKg, {
    kind: 'rigid-container',
    packaging: 'rigid-container',
    pose: 'flat',
    clearanceMm: mm(25),
    metalMassKg: kg(Math.round(massKg * 95) / 100),
    filterZones: filters.map((face) => middleZone(face, size, face === 'lid' ? 0.4 : 0.3)),
    cycleNeeds: [wrappedCycle(30)],
    ifuRevision: '3',
    coolS: seconds(5_400),
    ...own,
  });
}

export function basin(code: string, name: string, size: Size, massKg: number, own: Particulars): ItemFields {
  return item(code, name, size, massKg, {
    kind: 'basin',
    packaging: 'wrap',
    pose: 'tilted',
    isPerforated: false,
    clearanceMm: mm(25),
    cycleNeeds: [wrappedCycle(30)],
    ...own,
  });
}

export function textilePack(code: string, name: string, size: Size, massKg: number, own: Particulars): ItemFields {
  return item(code, name, size, massKg, {
    kind: 'textile-pack',
    packaging: 'wrap',
    pose: 'on-edge',
    clearanceMm: mm(25),
    textileMassKg: kg(massKg),
    ...own,
  });
}

export function challengeDevice(code: string, name: string, size: Size, massKg: number, own: Particulars): ItemFields {
  return item(code, name, size, massKg, {
    kind: 'challenge-device',
    packaging: 'wrap',
    pose: 'flat',
    // It is opened for its indicator, never used on anyone: it asks for no drying.
    cycleNeeds: [wrappedCycle(0, null), shortCycle, longCycle],
    ...own,
  });
}
