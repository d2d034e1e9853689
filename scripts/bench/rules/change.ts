import type {
  CatalogueItem,
  HolderKind,
  LoadPackage,
  LoadView,
  Placement,
  Pose,
  Shelf,
  Turn,
} from '../../../src/domain/load/model';
import type { LoadPolicy } from '../../../src/domain/load/policy';
import { mm } from '../../../src/domain/units/quantity';
import type { Host } from './fault';
import { footprintsOn, gapOf, placedOn, rectOf, sizeOf, type Placed, type Rect } from './geometry';
import { loadPackage } from './legal-cart';
import type { Random } from './random';

/* Changes of a load that leave the one they start from as it was. */

export function changePackage(view: LoadView, packageId: string, changes: Partial<LoadPackage>): LoadView {
  return {
    ...view,
    packages: view.packages.map((one) => (one.packageId === packageId ? { ...one, ...changes } : one)),
  };
}

/** Gives one package a catalogue entry of its own that differs in this. */
export function changeItemOf(view: LoadView, placed: Placed, changes: Partial<CatalogueItem>): LoadView {
  const item = { ...placed.item, ...changes, id: `${placed.item.id} of ${placed.one.packageId}` };
  return changePackage({ ...view, items: [...view.items, item] }, placed.one.packageId, { itemId: item.id });
}

export function changeItem(view: LoadView, itemId: string, changes: Partial<CatalogueItem>): LoadView {
  return { ...view, items: view.items.map((item) => (item.id === itemId ? { ...item, ...changes } : item)) };
}

export function changeShelf(view: LoadView, shelfId: string, changes: Partial<Shelf>): LoadView {
  const shelves = view.cart.shelves.map((shelf) => (shelf.id === shelfId ? { ...shelf, ...changes } : shelf));
  return { ...view, cart: { ...view.cart, shelves } };
}

export function changeHolderKind(view: LoadView, kindId: string, changes: Partial<HolderKind>): LoadView {
  return {
    ...view,
    holderKinds: view.holderKinds.map((kind) => (kind.id === kindId ? { ...kind, ...changes } : kind)),
  };
}

/** Everything counted right again after packages have moved. */
export function recounted(view: LoadView): LoadView {
  const placed = placedOn(view);
  const counts = view.cart.shelves.map((shelf) => ({
    shelfId: shelf.id,
    counted: placed.filter((each) => each.shelfId === shelf.id && each.one.isScanned).length,
  }));
  return { ...view, counts };
}

export function without(view: LoadView, packageIds: readonly string[]): LoadView {
  return recounted({ ...view, packages: view.packages.filter((one) => !packageIds.includes(one.packageId)) });
}

export function moved(view: LoadView, packageId: string, placement: Placement): LoadView {
  return recounted(changePackage(view, packageId, { placement }));
}

/** Adds a package of an item, of the catalogue or not, in this place. */
export function added(
  view: LoadView,
  random: Random,
  packageId: string,
  item: CatalogueItem,
  placement: Placement,
): LoadView {
  const items = view.items.some((each) => each.id === item.id) ? view.items : [...view.items, item];
  const one = loadPackage({ packageId, item, placement }, random);
  return recounted({ ...view, items, packages: [...view.packages, one] });
}

export function deck(shelfId: string, x: number, y: number, turn: Turn, pose: Pose): Placement {
  return { at: 'shelf', shelfId, xMm: mm(x), yMm: mm(y), turn, pose, paper: pose === 'on-edge' ? 'left' : null };
}

export function standing(belowPackageId: string, x: number, y: number, turn: Turn, pose: Pose = 'flat'): Placement {
  const paper = pose === 'on-edge' ? 'left' : null;
  return { at: 'package', belowPackageId, xMm: mm(x), yMm: mm(y), turn, pose, paper };
}

export function itemWithCode(view: LoadView, code: string): CatalogueItem {
  const item = view.items.find((each) => each.code === code);
  if (!item) throw new Error(`the demonstration has no item ${code}`);
  return item;
}

export function shelfWithId(view: LoadView, shelfId: string): Shelf {
  const shelf = view.cart.shelves.find((each) => each.id === shelfId);
  if (!shelf) throw new Error(`no shelf ${shelfId}`);
  return shelf;
}

export function pickPlaced(host: Host, random: Random, fits: (placed: Placed) => boolean): Placed | null {
  const fitting = host.placed.filter(fits);
  return fitting.length > 0 ? random.pick(fitting) : null;
}

/** On the deck itself, with nothing standing on it. */
export function standsFree(host: Host, placed: Placed): boolean {
  return placed.one.placement?.at === 'shelf' && !carries(host, placed);
}

/** Something stands on it. */
export function carries(host: Host, placed: Placed): boolean {
  return host.view.packages.some(
    ({ placement }) => placement?.at === 'package' && placement.belowPackageId === placed.one.packageId,
  );
}

/** Chamber walls and edge leave this much of a shelf. */
export function clearArea(view: LoadView, policy: LoadPolicy, shelf: Shelf): Rect {
  const x = Math.max(0, policy.wallClearanceMm - (view.sterilizer.chamberWidthMm - shelf.widthMm) / 2);
  const y = Math.max(0, policy.wallClearanceMm - (view.sterilizer.chamberDepthMm - shelf.depthMm) / 2);
  return { left: Math.ceil(x), right: shelf.widthMm - x, front: Math.ceil(y), back: shelf.depthMm - y };
}

export type Spot = { readonly shelf: Shelf; readonly x: number; readonly y: number };

export type SpotWanted = {
  readonly dx: number;
  readonly dy: number;
  readonly dz: number;
  readonly clearanceMm: number;
  readonly isGood?: (rect: Rect, shelf: Shelf) => boolean;
};

/** A free place somewhere on the cart, clear of everything; null where thirty tries on each shelf find none. */
export function freeSpot(host: Host, random: Random, wanted: SpotWanted): Spot | null {
  const { view, policy } = host;
  for (const shelf of random.shuffled(view.cart.shelves)) {
    if (wanted.dz + policy.headroomMm > shelf.clearHeightMm) continue;
    const area = clearArea(view, policy, shelf);
    const standing = footprintsOn(view, shelf.id);
    const right = Math.floor(area.right - wanted.dx);
    const back = Math.floor(area.back - wanted.dy);
    if (right < area.left || back < area.front) continue;
    for (let attempt = 0; attempt < 30; attempt += 1) {
      const x = random.whole(area.left, right);
      const y = random.whole(area.front, back);
      const rect = rectOf(x, y, wanted);
      if (wanted.isGood && !wanted.isGood(rect, shelf)) continue;
      if (standing.every((other) => gapOf(other, rect) >= wanted.clearanceMm)) return { shelf, x, y };
    }
  }
  return null;
}

export function freeSpotFor(host: Host, random: Random, item: CatalogueItem, pose: Pose, turn: Turn): Spot | null {
  return freeSpot(host, random, { ...sizeOf(item, pose, turn), clearanceMm: 50 });
}
