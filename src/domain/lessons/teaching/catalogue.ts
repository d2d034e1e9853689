import type {
  CatalogueItem,
  Cart,
  CycleNeed,
  HolderKind,
  ItemKind,
  Program,
  Shelf,
  Sterilizer,
} from '../../load/model';
import { celsius, kg, mm, seconds } from '../../units/quantity';

/*
 * A handful of invented things to teach with, on a cart that is smaller than real ones so that it can be drawn large.
 * Sizes, masses and instructions are made up: never use them for real goods.
 */

const prevacuum: CycleNeed = {
  type: 'dynamic-air-removal',
  temperatureC: celsius(132),
  leastExposureS: seconds(240),
  greatestExposureS: null,
  leastDryS: seconds(1200),
};

type Measures = readonly [lengthMm: number, widthMm: number, heightMm: number];

/** The code is the name: drawings show the code, and a person at the cart knows the name. */
export function named(name: string): Pick<CatalogueItem, 'id' | 'code' | 'name'> {
  return { id: name, code: name, name };
}

function anItem(
  name: string,
  kind: ItemKind,
  [lengthMm, widthMm, heightMm]: Measures,
  changes: Partial<CatalogueItem>,
): CatalogueItem {
  return {
    ...named(name),
    kind,
    packaging: 'wrap',
    lengthMm: mm(lengthMm),
    widthMm: mm(widthMm),
    heightMm: mm(heightMm),
    massKg: kg(1),
    metalMassKg: kg(0),
    textileMassKg: kg(0),
    metal: 'stainless-steel',
    isImplant: false,
    pose: 'flat',
    isPerforated: true,
    clearanceMm: null,
    standsOn: [],
    greatestStackHeightMm: null,
    filterZones: [],
    cycleNeeds: [prevacuum],
    preferredHolder: null,
    facing: null,
    massLimitKg: null,
    ifuReference: 'Teaching card',
    isRetired: false,
    ...changes,
  };
}

function aPouch(name: string, measures: Measures, massKg: number): CatalogueItem {
  return anItem(name, 'pouch', measures, {
    packaging: 'paper-film-pouch',
    pose: 'on-edge',
    massKg: kg(massKg),
    metalMassKg: kg(massKg * 0.9),
    preferredHolder: 'R8',
  });
}

export const scissors = aPouch('Scissors', [230, 110, 12], 0.12);
export const forceps = aPouch('Forceps', [250, 90, 10], 0.1);
export const clamps = aPouch('Clamps', [240, 100, 22], 0.3);
export const retractor = aPouch('Retractor', [300, 190, 26], 0.4);
export const boneScrews: CatalogueItem = { ...aPouch('Bone screws', [200, 90, 12], 0.2), isImplant: true };

/** Two filters in its lid, one at each end. */
export const basicSet = anItem('Basic set', 'rigid-container', [420, 260, 130], {
  packaging: 'rigid-container',
  massKg: kg(6.4),
  metalMassKg: kg(5.4),
  filterZones: [
    { face: 'lid', xMm: mm(40), yMm: mm(50), lengthMm: mm(130), widthMm: mm(160) },
    { face: 'lid', xMm: mm(250), yMm: mm(50), lengthMm: mm(130), widthMm: mm(160) },
  ],
});

export const smallTray = anItem('Suture tray', 'wrapped-tray', [250, 200, 80], {
  massKg: kg(2.2),
  metalMassKg: kg(2),
  standsOn: ['Basic set'],
});

/** May stand on its like, up to two high. */
export const drillTray = anItem('Drill tray', 'wrapped-tray', [260, 220, 80], {
  massKg: kg(2.6),
  metalMassKg: kg(2.3),
  standsOn: ['Drill tray'],
  greatestStackHeightMm: mm(170),
});

export const basin = anItem('Basin', 'basin', [300, 260, 90], {
  massKg: kg(0.6),
  metalMassKg: kg(0.6),
  pose: 'tilted',
  isPerforated: false,
});

export const drapes = anItem('Drapes', 'textile-pack', [300, 220, 160], {
  massKg: kg(1.1),
  textileMassKg: kg(1.1),
  pose: 'on-edge',
});

export const challengeDevice = anItem('Challenge device', 'challenge-device', [160, 120, 60], {
  massKg: kg(0.4),
});

export const rack: HolderKind = {
  id: 'R8',
  code: 'R8',
  name: 'rack with eight slots',
  form: 'rack',
  slots: 8,
  pitchMm: mm(28),
  greatestHeightMm: mm(130),
  greatestLengthMm: mm(280),
  greatestThicknessMm: mm(24),
  acrossMm: mm(240),
  alongMm: mm(290),
  massKg: kg(1),
};

export const wideRack: HolderKind = {
  ...rack,
  id: 'R4',
  code: 'R4',
  name: 'rack with four wide slots',
  slots: 4,
  pitchMm: mm(56),
  greatestHeightMm: mm(210),
  greatestLengthMm: mm(330),
  greatestThicknessMm: mm(40),
  alongMm: mm(340),
};

function aShelf(id: string, level: number, clearHeightMm: number): Shelf {
  return {
    id,
    level,
    name: level === 1 ? 'Lower shelf' : 'Upper shelf',
    placeCode: `S-${level}`,
    widthMm: mm(580),
    depthMm: mm(560),
    clearHeightMm: mm(clearHeightMm),
    surface: 'wire',
    greatestMassKg: kg(30),
    isUsable: true,
  };
}

export const lower = 'lower';
export const upper = 'upper';

export const cart: Cart = {
  id: 'cart',
  code: 'C1',
  name: 'Cart',
  shelves: [aShelf(lower, 1, 300), aShelf(upper, 2, 240)],
};

export const sterilizer: Sterilizer = {
  id: 'sterilizer',
  code: 'S1',
  number: '1',
  name: 'Sterilizer 1',
  chamberWidthMm: mm(640),
  chamberDepthMm: mm(620),
  chamberHeightMm: mm(640),
  drainXMm: mm(290),
  drainYMm: mm(80),
  greatestLoadMassKg: kg(60),
  needsAirRemovalTest: true,
  serviceState: 'in-service',
};

function aProgram(code: string, name: string, dryMinutes: number): Program {
  return {
    id: code,
    code,
    name,
    type: 'dynamic-air-removal',
    temperatureC: celsius(132),
    exposureS: seconds(240),
    dryS: seconds(dryMinutes * 60),
    greatestLoadMassKg: null,
  };
}

export const dry20 = aProgram('V4-20', 'Wrapped goods, 20 min dry', 20);
export const dry40 = aProgram('V4-40', 'Wrapped goods, 40 min dry', 40);
