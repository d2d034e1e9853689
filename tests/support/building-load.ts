import type {
  CatalogueItem,
  HolderKind,
  LoadHolder,
  LoadPackage,
  LoadView,
  PaperSide,
  Placement,
  Pose,
  Program,
  Shelf,
  Turn,
} from '#domain/load/model';
import { celsius, kg, mm, seconds } from '#domain/units/quantity';

/*
 * A load on an invented cart, to build tests on: two wire shelves of 560 x 1150 mm, three kinds of racks, a basket. The
 * measures are those of the demonstration hospital.
 */

export const program: Program = {
  id: 'program-w4-30',
  code: 'W4-30',
  name: '132 °C, 4 min, dry 30 min',
  type: 'dynamic-air-removal',
  temperatureC: celsius(132),
  exposureS: seconds(240),
  dryS: seconds(1800),
  greatestLoadMassKg: kg(100),
};

export const longDrying: Program = {
  ...program,
  id: 'program-w4-50',
  code: 'W4-50',
  name: '132 °C, 4 min, dry 50 min',
  dryS: seconds(3000),
};

export function aShelf(changes: Partial<Shelf> = {}): Shelf {
  return {
    id: 'shelf-lower',
    level: 1,
    name: 'Lower shelf',
    placeCode: 'S-LOWER',
    widthMm: mm(560),
    depthMm: mm(1150),
    clearHeightMm: mm(340),
    surface: 'wire',
    greatestMassKg: kg(60),
    isUsable: true,
    ...changes,
  };
}

export const lowerShelf = aShelf();
export const upperShelf = aShelf({
  id: 'shelf-upper',
  level: 2,
  name: 'Upper shelf',
  placeCode: 'S-UPPER',
  clearHeightMm: mm(270),
});

function aRack(
  code: string,
  slots: number,
  pitch: number,
  [height, length, thick]: number[],
  [across, along]: number[],
) {
  return {
    id: `kind-${code}`,
    code,
    name: `Rack ${code}`,
    form: 'rack',
    slots,
    pitchMm: mm(pitch),
    greatestHeightMm: mm(height ?? 0),
    greatestLengthMm: mm(length ?? 0),
    greatestThicknessMm: mm(thick ?? 0),
    acrossMm: mm(across ?? 0),
    alongMm: mm(along ?? 0),
    massKg: kg(1),
  } satisfies HolderKind;
}

export const smallRack: HolderKind = aRack('RS', 8, 28, [130, 340, 18], [240, 350]);
export const mediumRack: HolderKind = aRack('RM', 5, 40, [210, 410, 30], [220, 420]);
export const largeRack: HolderKind = aRack('RL', 3, 70, [210, 460, 55], [230, 470]);
export const basket: HolderKind = {
  ...aRack('TB', 0, 0, [], [480, 250]),
  form: 'basket',
  slots: null,
  pitchMm: null,
  greatestHeightMm: null,
  greatestLengthMm: null,
  greatestThicknessMm: null,
};

export function anItem(changes: Partial<CatalogueItem> & { readonly code: string }): CatalogueItem {
  return {
    id: `item-${changes.code}`,
    name: `Item ${changes.code}`,
    kind: 'wrapped-tray',
    packaging: 'wrap',
    lengthMm: mm(500),
    widthMm: mm(260),
    heightMm: mm(90),
    massKg: kg(3.2),
    metalMassKg: kg(3),
    textileMassKg: kg(0),
    metal: 'stainless-steel',
    isImplant: false,
    pose: 'flat',
    isPerforated: true,
    clearanceMm: mm(25),
    standsOn: [],
    greatestStackHeightMm: null,
    filterZones: [],
    cycleNeeds: [
      {
        type: 'dynamic-air-removal',
        temperatureC: celsius(132),
        leastExposureS: seconds(240),
        greatestExposureS: seconds(1080),
        leastDryS: seconds(1200),
      },
    ],
    preferredHolder: null,
    facing: null,
    massLimitKg: null,
    ifuReference: 'IFU-1',
    isRetired: false,
    ...changes,
  };
}

function aPouch(code: string, name: string, [length, width, thick]: [number, number, number], holder: string) {
  return anItem({
    code,
    name,
    kind: 'pouch',
    packaging: 'paper-film-pouch',
    lengthMm: mm(length),
    widthMm: mm(width),
    heightMm: mm(thick),
    massKg: kg(0.15),
    metalMassKg: kg(0.14),
    pose: 'on-edge',
    clearanceMm: mm(10),
    preferredHolder: holder,
  });
}

export const forceps = aPouch('P-01', 'Adson forceps pair', [250, 75, 10], 'RS');
export const cable = aPouch('P-11', 'Light cable', [400, 200, 25], 'RM');
export const speculum = aPouch('P-05', 'Speculum medium', [330, 200, 45], 'RL');
export const tray = anItem({ code: 'W-03', name: 'D&C set' });
export const container = anItem({
  code: 'C-01',
  name: 'General container set A',
  kind: 'rigid-container',
  packaging: 'rigid-container',
  lengthMm: mm(580),
  widthMm: mm(280),
  heightMm: mm(150),
  massKg: kg(8.9),
  metalMassKg: kg(8),
  metal: 'aluminium',
});
/** Its instructions let it stand on the container, whose lid filter it would cover only where that has one. */
export const stacker = anItem({
  code: 'C-14',
  name: 'Eye micro set',
  kind: 'rigid-container',
  packaging: 'rigid-container',
  lengthMm: mm(300),
  widthMm: mm(200),
  heightMm: mm(60),
  massKg: kg(0.9),
  metalMassKg: kg(0.8),
  standsOn: ['C-01', 'C-14'],
  greatestStackHeightMm: mm(320),
});
export const drapes = anItem({
  code: 'W-12',
  name: 'Drape pack',
  kind: 'textile-pack',
  lengthMm: mm(380),
  widthMm: mm(180),
  heightMm: mm(240),
  massKg: kg(4.6),
  metalMassKg: kg(0),
  textileMassKg: kg(4.6),
  pose: 'on-edge',
});
export const basin = anItem({
  code: 'W-10',
  name: 'Basin set nested',
  kind: 'basin',
  lengthMm: mm(380),
  widthMm: mm(380),
  heightMm: mm(120),
  massKg: kg(3.6),
  pose: 'tilted',
  isPerforated: false,
});
export const challengePack = anItem({
  code: 'PCD-1',
  name: 'Challenge pack',
  kind: 'challenge-device',
  lengthMm: mm(130),
  widthMm: mm(130),
  heightMm: mm(60),
  massKg: kg(0.6),
  metalMassKg: kg(0),
});

export const items = [forceps, cable, speculum, tray, container, stacker, drapes, basin, challengePack];

export function aPackage(packageId: string, item: CatalogueItem, changes: Partial<LoadPackage> = {}): LoadPackage {
  return {
    packageId,
    code: packageId.toUpperCase(),
    itemId: item.id,
    isScanned: true,
    placement: null,
    state: 'in-load',
    heldReason: null,
    expiresOn: null,
    hasExternalIndicator: true,
    hasInternalIndicator: true,
    ...changes,
  };
}

export function aHolder(holderId: string, kind: HolderKind, changes: Partial<LoadHolder> = {}): LoadHolder {
  return {
    holderId,
    name: holderId.toUpperCase(),
    placeCode: `H-${holderId.toUpperCase()}`,
    kindId: kind.id,
    shelfId: upperShelf.id,
    xMm: mm(40),
    yMm: mm(40),
    turn: 0,
    ...changes,
  };
}

export function aView(changes: Partial<LoadView> = {}): LoadView {
  return {
    loadId: 'load-1',
    sterilizer: {
      id: 'sterilizer-2',
      code: 'ST-2',
      number: '2',
      name: 'Sterilizer 2',
      chamberWidthMm: mm(660),
      chamberDepthMm: mm(1250),
      chamberHeightMm: mm(950),
      drainXMm: mm(280),
      drainYMm: mm(150),
      greatestLoadMassKg: kg(100),
      needsAirRemovalTest: true,
      serviceState: 'in-service',
    },
    program,
    qualifiedPrograms: [program, longDrying],
    cart: { id: 'cart-3', code: 'C3', name: 'Cart 3', shelves: [lowerShelf, upperShelf] },
    holders: [],
    holderKinds: [smallRack, mediumRack, largeRack, basket],
    items,
    packages: [],
    counts: [],
    acceptances: [],
    airRemoval: { result: 'passed', testedAt: '2026-03-17T05:48:00Z' },
    today: '2026-03-17',
    ...changes,
  };
}

export function onShelf(
  shelf: Shelf,
  x: number,
  y: number,
  more: { readonly turn?: Turn; readonly pose?: Pose; readonly paper?: PaperSide | null } = {},
): Placement {
  return { at: 'shelf', shelfId: shelf.id, xMm: mm(x), yMm: mm(y), turn: 0, pose: 'flat', paper: null, ...more };
}

export function inSlot(
  holderId: string,
  slot: number,
  paper: PaperSide | null = 'left',
  pose: Pose = 'on-edge',
): Placement {
  return { at: 'slot', holderId, slot, pose, paper };
}

export function inBasket(holderId: string, x: number, y: number): Placement {
  return { at: 'basket', holderId, xMm: mm(x), yMm: mm(y), turn: 0, pose: 'flat', paper: null };
}

export function onTopOf(belowPackageId: string, x: number, y: number, turn: Turn = 0): Placement {
  return { at: 'package', belowPackageId, xMm: mm(x), yMm: mm(y), turn, pose: 'flat', paper: null };
}
