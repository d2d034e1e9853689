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
import { shelfIdOf } from '#domain/load/look-up';
import { celsius, kg, mm, seconds } from '#domain/units/quantity';
import { demonstrationItems } from './demonstration-items';

/*
 * A load to be built up in a test: a two-shelf cart of the demonstration hospital's large sterilizers, empty and with
 * nothing to find fault with. Whatever is put on it is scanned, and its shelves are counted.
 */

type Spot = {
  readonly turn?: Turn;
  readonly pose?: Pose;
  readonly paper?: PaperSide | null;
};

/** Where a package goes; its pose is the one its catalogue entry asks for unless the test says otherwise. */
export type Where = (item: CatalogueItem) => Placement | null;

function free(item: CatalogueItem, xMm: number, yMm: number, { turn = 0, pose = item.pose, paper = null }: Spot) {
  return { xMm: mm(xMm), yMm: mm(yMm), turn, pose, paper };
}

export const onShelf =
  (shelfId: string, xMm: number, yMm: number, spot: Spot = {}): Where =>
  (item) => ({ at: 'shelf', shelfId, ...free(item, xMm, yMm, spot) });

export const onLower = (xMm: number, yMm: number, spot: Spot = {}): Where => onShelf('lower', xMm, yMm, spot);
export const onUpper = (xMm: number, yMm: number, spot: Spot = {}): Where => onShelf('upper', xMm, yMm, spot);

export const inSlot =
  (holderId: string, slot: number, paper: PaperSide | null = 'left', pose: Pose = 'on-edge'): Where =>
  () => ({ at: 'slot', holderId, slot, pose, paper });

export const inBasket =
  (holderId: string, xMm: number, yMm: number, spot: Spot = {}): Where =>
  (item) => ({ at: 'basket', holderId, ...free(item, xMm, yMm, spot) });

export const onTopOf =
  (belowPackageId: string, xMm: number, yMm: number, spot: Spot = {}): Where =>
  (item) => ({ at: 'package', belowPackageId, ...free(item, xMm, yMm, spot) });

export const nowhere: Where = () => null;

export function aShelf(id: string, level: number, clearHeightMm: number, changes: Partial<Shelf> = {}): Shelf {
  return {
    id,
    level,
    name: level === 1 ? 'Lower shelf' : 'Upper shelf',
    placeCode: `shelf ${id}`,
    widthMm: mm(560),
    depthMm: mm(1150),
    clearHeightMm: mm(clearHeightMm),
    surface: 'wire',
    greatestMassKg: kg(60),
    isUsable: true,
    ...changes,
  };
}

export function aProgram(code: string, changes: Partial<Program>): Program {
  return {
    id: `program ${code}`,
    code,
    name: code,
    type: 'dynamic-air-removal',
    temperatureC: celsius(132),
    exposureS: seconds(240),
    dryS: seconds(1800),
    greatestLoadMassKg: null,
    ...changes,
  };
}

/** The programs of the demonstration's second sterilizer. */
export const programs: readonly Program[] = [
  aProgram('W4-20', { dryS: seconds(1200) }),
  aProgram('W4-30', {}),
  aProgram('W4-40', { dryS: seconds(2400) }),
  aProgram('W4-50', { dryS: seconds(3000) }),
  aProgram('T4-20', { dryS: seconds(1200) }),
  aProgram('P18-30', { temperatureC: celsius(134), exposureS: seconds(1080) }),
];

export const gravityProgram = aProgram('G121-30', {
  type: 'gravity',
  temperatureC: celsius(121),
  exposureS: seconds(1800),
});

function aRack(
  code: string,
  slots: number,
  pitchMm: number,
  takes: readonly number[],
  frame: readonly number[],
): HolderKind {
  const [height = 0, length = 0, thickness = 0] = takes;
  const [across = 0, along = 0] = frame;
  return {
    id: `kind ${code}`,
    code,
    name: `upright pouch rack ${code}`,
    form: 'rack',
    slots,
    pitchMm: mm(pitchMm),
    greatestHeightMm: mm(height),
    greatestLengthMm: mm(length),
    greatestThicknessMm: mm(thickness),
    acrossMm: mm(across),
    alongMm: mm(along),
    massKg: kg(1),
  };
}

/** The demonstration's holders: three racks and an open basket. */
export const holderKinds: readonly HolderKind[] = [
  aRack('RS', 8, 28, [130, 340, 18], [240, 350]),
  aRack('RM', 5, 40, [210, 410, 30], [220, 420]),
  aRack('RL', 3, 70, [210, 460, 55], [230, 470]),
  {
    ...aRack('TB', 0, 0, [], [480, 250]),
    form: 'basket',
    slots: null,
    pitchMm: null,
    greatestHeightMm: null,
    greatestLengthMm: null,
    greatestThicknessMm: null,
  },
];

const emptyLoad: LoadView = {
  loadId: 'load',
  sterilizer: {
    id: 'ST-2',
    code: 'ST-2',
    number: '2',
    name: 'Sterilizer 2',
    chamberWidthMm: mm(620),
    chamberDepthMm: mm(1250),
    chamberHeightMm: mm(700),
    drainXMm: mm(280),
    drainYMm: mm(90),
    greatestLoadMassKg: kg(100),
    needsAirRemovalTest: true,
    serviceState: 'in-service',
  },
  program: aProgram('W4-30', {}),
  qualifiedPrograms: programs,
  cart: { id: 'C3', code: 'C3', name: 'Cart 3', shelves: [aShelf('lower', 1, 340), aShelf('upper', 2, 270)] },
  holders: [],
  holderKinds,
  items: demonstrationItems,
  packages: [],
  counts: [],
  acceptances: [],
  airRemoval: { result: 'passed', testedAt: '2026-03-10T05:48:00Z' },
  today: '2026-03-10',
};

export class LoadBuilder {
  readonly #view: LoadView;
  readonly #isCounted: boolean;

  constructor(view: LoadView, isCounted: boolean) {
    this.#view = view;
    this.#isCounted = isCounted;
  }

  /** Any part of the load, replaced. */
  with(changes: Partial<LoadView>): LoadBuilder {
    return new LoadBuilder({ ...this.#view, ...changes }, this.#isCounted);
  }

  withSterilizer(changes: Partial<LoadView['sterilizer']>): LoadBuilder {
    return this.with({ sterilizer: { ...this.#view.sterilizer, ...changes } });
  }

  withShelf(id: string, changes: Partial<Shelf>): LoadBuilder {
    const { cart } = this.#view;
    const shelves = cart.shelves.map((shelf) => (shelf.id === id ? { ...shelf, ...changes } : shelf));
    return this.with({ cart: { ...cart, shelves } });
  }

  withItem(item: CatalogueItem): LoadBuilder {
    return this.with({ items: [...this.#view.items.filter((one) => one.code !== item.code), item] });
  }

  withItemChanged(code: string, changes: Partial<CatalogueItem>): LoadBuilder {
    return this.with({ items: this.#view.items.map((item) => (item.code === code ? { ...item, ...changes } : item)) });
  }

  onProgram(code: string): LoadBuilder {
    const program = programs.find((one) => one.code === code);
    if (!program) throw new Error(`No program ${code}`);
    return this.with({ program });
  }

  withHolder(
    holderId: string,
    kindCode: string,
    at: { readonly shelf?: string; readonly x: number; readonly y: number; readonly turn?: Turn },
  ): LoadBuilder {
    const holder: LoadHolder = {
      holderId,
      name: holderId,
      placeCode: `holder ${holderId}`,
      kindId: `kind ${kindCode}`,
      shelfId: at.shelf ?? 'upper',
      xMm: mm(at.x),
      yMm: mm(at.y),
      turn: at.turn ?? 0,
    };
    return this.with({ holders: [...this.#view.holders, holder] });
  }

  /** A scanned package. Its id is its item's code, with a number where there are several of them. */
  withPackage(code: string, where: Where, changes: Partial<LoadPackage> = {}): LoadBuilder {
    const item = this.#view.items.find((one) => one.code === code);
    if (!item) throw new Error(`No item ${code}`);
    const before = this.#view.packages.filter((one) => one.itemId === item.id).length;
    const packageId = before === 0 ? code : `${code} no. ${before + 1}`;
    const one: LoadPackage = {
      packageId,
      code: `label ${packageId}`,
      itemId: item.id,
      isScanned: true,
      placement: where(item),
      state: 'in-load',
      heldReason: null,
      expiresOn: null,
      hasExternalIndicator: true,
      hasInternalIndicator: true,
      ...changes,
    };
    return this.with({ packages: [...this.#view.packages, one] });
  }

  /** Nobody has counted the shelves yet. */
  uncounted(): LoadBuilder {
    return new LoadBuilder(this.#view, false);
  }

  build(): LoadView {
    return this.#isCounted ? counted(this.#view) : this.#view;
  }
}

/** The load with every shelf counted right. */
export function counted(view: LoadView): LoadView {
  const counts = view.cart.shelves.map((shelf) => ({
    shelfId: shelf.id,
    counted: view.packages.filter((one) => one.isScanned && shelfIdOf(view, one.placement) === shelf.id).length,
  }));
  return { ...view, counts };
}

export function aLoad(): LoadBuilder {
  return new LoadBuilder(emptyLoad, true);
}
