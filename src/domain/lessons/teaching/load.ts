import { formatPackageCode } from '../../label/package-code';
import { shelfIdOf } from '../../load/look-up';
import type {
  CatalogueItem,
  HolderKind,
  LoadHolder,
  LoadPackage,
  LoadView,
  PaperSide,
  Placement,
  Pose,
  Shelf,
  Turn,
} from '../../load/model';
import { mm } from '../../units/quantity';
import { cart, dry20, dry40, rack, sterilizer, wideRack } from './catalogue';

/** A package on its way onto a teaching cart: its id and its label are given to it there, in order. */
export type Put = {
  readonly item: CatalogueItem;
  readonly placement: Placement | null;
  readonly changes: Partial<LoadPackage>;
};

type Spot = { readonly turn?: Turn; readonly pose?: Pose; readonly paper?: PaperSide };

function spotOf(item: CatalogueItem, xMm: number, yMm: number, { turn = 0, pose = item.pose, paper }: Spot) {
  const isUprightPouch = item.kind === 'pouch' && pose === 'on-edge';
  return { xMm: mm(xMm), yMm: mm(yMm), turn, pose, paper: paper ?? (isUprightPouch ? ('left' as const) : null) };
}

/** Its nearest left corner at x and y of a shelf, in mm. */
export function onShelf(item: CatalogueItem, shelfId: string, xMm: number, yMm: number, spot: Spot = {}): Put {
  return { item, placement: { at: 'shelf', shelfId, ...spotOf(item, xMm, yMm, spot) }, changes: {} };
}

/** In a slot of a rack, counted from 1 at the left. */
export function inSlot(item: CatalogueItem, holderId: string, slot: number, paper: PaperSide = 'left'): Put {
  return { item, placement: { at: 'slot', holderId, slot, pose: 'on-edge', paper }, changes: {} };
}

/** Standing on the package with that id; x and y are of the shelf, in mm. */
export function onTopOf(belowPackageId: string, item: CatalogueItem, xMm: number, yMm: number, spot: Spot = {}): Put {
  return { item, placement: { at: 'package', belowPackageId, ...spotOf(item, xMm, yMm, spot) }, changes: {} };
}

/** On the list and nowhere on the cart. */
export function onTheTable(item: CatalogueItem, changes: Partial<LoadPackage> = {}): Put {
  return { item, placement: null, changes };
}

/** The same package with something else on its label or in its history. */
export function but(put: Put, changes: Partial<LoadPackage>): Put {
  return { ...put, changes: { ...put.changes, ...changes } };
}

export function aRack(
  holderId: string,
  shelfId: string,
  xMm: number,
  yMm: number,
  kind: HolderKind = rack,
): LoadHolder {
  const at = { shelfId, xMm: mm(xMm), yMm: mm(yMm), turn: 0 as const };
  return { holderId, name: holderId, placeCode: holderId, kindId: kind.id, ...at };
}

type Contents = {
  readonly holders?: readonly LoadHolder[];
  readonly packages: readonly Put[];
  /** Counts by shelf; where they are left out every shelf is counted right. */
  readonly counts?: LoadView['counts'];
  readonly changes?: Partial<Omit<LoadView, 'holders' | 'packages' | 'items' | 'counts'>>;
};

/** From here on labels of teaching carts are numbered. */
const firstLabel = 40_000_000;

/**
 * A whole load of the teaching cart: everything scanned, placed, counted and ready for the sterilizer, but for what a lesson
 * changes. Packages have the ids '1', '2', '3' in the order given.
 */
export function aLoad({ holders = [], packages, counts, changes = {} }: Contents): LoadView {
  const view: LoadView = {
    loadId: 'teaching load',
    sterilizer,
    program: dry20,
    qualifiedPrograms: [dry20, dry40],
    cart,
    holders,
    holderKinds: [rack, wideRack],
    items: [...new Map(packages.map(({ item }) => [item.id, item])).values()],
    packages: packages.map(({ item, placement, changes: own }, index) => ({
      packageId: String(index + 1),
      code: formatPackageCode(item.kind, firstLabel + index),
      itemId: item.id,
      isScanned: true,
      placement,
      state: 'in-load',
      heldReason: null,
      expiresOn: null,
      hasExternalIndicator: true,
      hasInternalIndicator: true,
      ...own,
    })),
    counts: [],
    acceptances: [],
    airRemoval: { result: 'passed', testedAt: '2026-03-10T05:40:00Z' },
    today: '2026-03-10',
    ...changes,
  };
  return { ...view, counts: counts ?? countedRight(view) };
}

/** The cart with one of its shelves changed. */
export function withShelf(shelfId: string, changes: Partial<Shelf>): LoadView['cart'] {
  return { ...cart, shelves: cart.shelves.map((shelf) => (shelf.id === shelfId ? { ...shelf, ...changes } : shelf)) };
}

function countedRight(view: LoadView): LoadView['counts'] {
  return view.cart.shelves.map(({ id }) => ({
    shelfId: id,
    counted: view.packages.filter((one) => one.isScanned && shelfIdOf(view, one.placement) === id).length,
  }));
}
