import type { CatalogueItem, LoadView, Placement, Turn } from '../../../../src/domain/load/model';
import { mm } from '../../../../src/domain/units/quantity';
import {
  changeItemOf,
  changePackage,
  freeSpot,
  freeSpotFor,
  moved,
  deck,
  pickPlaced,
  recounted,
  standing,
  standsFree,
  without,
} from '../change';
import { onHolder, onPackage, type Fault, type Host, type Planted } from '../fault';
import { holderSize, kindOf, leanDegrees, sizeOf, type Placed } from '../geometry';
import type { Random } from '../random';

/* Pouches: how they stand, what holds them, and which slot they are in. */

export function isInSlot(placed: Placed): boolean {
  return placed.one.placement?.at === 'slot';
}

export function isPouchInBasket(placed: Placed): boolean {
  return placed.one.placement?.at === 'basket' && placed.item.kind === 'pouch';
}

function withPlacement(view: LoadView, placed: Placed, changes: Partial<Placement>): LoadView {
  const placement = placed.one.placement;
  return placement === null
    ? view
    : changePackage(view, placed.one.packageId, { placement: { ...placement, ...changes } as Placement });
}

function posed(fits: (placed: Placed) => boolean, pose: 'flat' | 'tilted') {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, fits);
    if (!placed) return null;
    return { view: withPlacement(host.view, placed, { pose }), at: [onPackage(placed.one.packageId)] };
  };
}

/** Takes a pouch out of its holder and puts it on the deck. */
function onTheShelf(pose: 'flat' | 'on-edge') {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, (each) => each.item.kind === 'pouch');
    if (!placed) return null;
    const turn = random.pick<Turn>([0, 90]);
    const spot = freeSpotFor(host, random, placed.item, pose, turn);
    if (!spot) return null;
    const placement = {
      ...deck(spot.shelf.id, spot.x, spot.y, turn, pose),
      paper: pose === 'flat' ? 'down' : 'left',
    } as const;
    return { view: moved(host.view, placed.one.packageId, placement), at: [onPackage(placed.one.packageId)] };
  };
}

export function onALid(pose: 'flat' | 'on-edge', isContainer: (item: CatalogueItem) => boolean) {
  return (host: Host, random: Random): Planted | null => {
    const container = pickPlaced(host, random, (each) => isContainer(each.item) && standsFree(host, each));
    const pouch = pickPlaced(host, random, (each) => each.item.kind === 'pouch');
    if (!container || !pouch) return null;
    const turn = container.one.placement?.at === 'shelf' ? container.one.placement.turn : 0;
    const size = sizeOf(pouch.item, pose, turn);
    const { left, right, front, back } = container.rect;
    const [x, y] = [Math.round((left + right - size.dx) / 2), Math.round((front + back - size.dy) / 2)];
    const placement = standing(container.one.packageId, x, y, turn, pose);
    return {
      view: moved(host.view, pouch.one.packageId, pose === 'flat' ? { ...placement, paper: 'up' } : placement),
      at: [onPackage(pouch.one.packageId)],
    };
  };
}

const isContainer = (item: CatalogueItem) => item.kind === 'rigid-container';

/** One pouch alone in the middle of a basket, which cannot hold it upright. */
function aloneInBasket(host: Host, random: Random): Planted | null {
  const { view, policy } = host;
  const kind = random.pick(view.holderKinds.filter((each) => each.form === 'basket'));
  const pouch = pickPlaced(host, random, (each) => each.item.kind === 'pouch' && each.item.lengthMm <= kind.alongMm);
  if (!pouch) return null;
  const { widthMm, heightMm } = pouch.item;
  const free = (kind.acrossMm - heightMm) / 2;
  const turn = random.pick<Turn>([0, 90]);
  const spot = freeSpot(host, random, { ...holderSize(kind, turn), dz: widthMm, clearanceMm: 40 });
  if (!spot || leanDegrees(widthMm, heightMm, free, widthMm) <= policy.greatestLeanDeg + 3) return null;
  const holderId = 'planted basket';
  const holder = {
    holderId,
    name: holderId,
    placeCode: holderId,
    kindId: kind.id,
    shelfId: spot.shelf.id,
    xMm: mm(spot.x),
    yMm: mm(spot.y),
    turn,
  };
  const placement = {
    at: 'basket',
    holderId,
    xMm: mm(free),
    yMm: mm(0),
    turn: 0,
    pose: 'on-edge',
    paper: 'left',
  } as const;
  return {
    view: moved({ ...view, holders: [...view.holders, holder] }, pouch.one.packageId, placement),
    at: [onPackage(pouch.one.packageId)],
  };
}

/** Takes pouches out of the middle of a basket's row, so that those beside the hole can fall into it. */
function holeInARow(host: Host, random: Random): Planted | null {
  const { view, policy } = host;
  const inside = pickPlaced(host, random, isPouchInBasket);
  if (!inside?.holder) return null;
  const row = host.placed.filter((each) => each.holder === inside.holder);
  const axis = row.every((each) => each.rect.left === row[0]?.rect.left) ? 'y' : 'x';
  const from = (each: Placed) => (axis === 'x' ? each.rect.left : each.rect.front);
  const to = (each: Placed) => (axis === 'x' ? each.rect.right : each.rect.back);
  const sorted = [...row].sort((a, b) => from(a) - from(b));
  for (let first = 1; first + 1 < sorted.length; first += 1) {
    for (let last = first; last + 1 < sorted.length; last += 1) {
      const [before, after] = [sorted[first - 1], sorted[last + 1]];
      if (!before || !after) continue;
      const free = from(after) - to(before);
      const lean = (each: Placed) => leanDegrees(each.item.widthMm, each.item.heightMm, free, each.item.widthMm);
      if (lean(before) <= policy.greatestLeanDeg + 3 || lean(after) <= policy.greatestLeanDeg + 3) continue;
      const gone = sorted.slice(first, last + 1).map((each) => each.one.packageId);
      return { view: without(view, gone), at: [onPackage(before.one.packageId), onPackage(after.one.packageId)] };
    }
  }
  return null;
}

/** Makes a pouch larger than its rack takes, in one measure. */
function outgrown(measure: 'heightMm' | 'widthMm' | 'lengthMm') {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, isInSlot);
    if (!placed?.holder) return null;
    const kind = kindOf(host.view, placed.holder);
    const by = random.pick([1, 5, 20]);
    const greatest = {
      heightMm: kind.greatestThicknessMm,
      widthMm: kind.greatestHeightMm,
      lengthMm: kind.greatestLengthMm,
    };
    const value = (greatest[measure] ?? 0) + by;
    const lengthMm = mm(Math.max(placed.item.lengthMm, measure === 'widthMm' ? value : 0));
    const view = changeItemOf(host.view, placed, { lengthMm, [measure]: mm(value) });
    return { view, at: [onPackage(placed.one.packageId), onHolder(placed.holder.holderId)] };
  };
}

/** A low, thin pouch in a rack made for thick ones: its slot leaves it room to lie over. */
function lostInItsSlot(host: Host, random: Random): Planted | null {
  const { policy } = host;
  const wide = pickPlaced(host, random, (each) => isInSlot(each) && slotWidth(host, each) >= 50);
  const small = pickPlaced(
    host,
    random,
    ({ item }) =>
      item.kind === 'pouch' && wide !== null && leansIn(item, slotWidth(host, wide)) > policy.greatestLeanDeg + 5,
  );
  if (!wide || !small || wide === small || wide.one.placement?.at !== 'slot') return null;
  const placement = wide.one.placement;
  const emptied = without(host.view, [wide.one.packageId]);
  return {
    view: moved(emptied, small.one.packageId, placement),
    at: [onPackage(small.one.packageId), onHolder(placement.holderId)],
  };
}

function slotWidth(host: Host, placed: Placed): number {
  return placed.holder ? (kindOf(host.view, placed.holder).greatestThicknessMm ?? 0) : 0;
}

function leansIn(item: CatalogueItem, widthMm: number): number {
  return leanDegrees(item.widthMm, item.heightMm, widthMm - item.heightMm, item.widthMm);
}

function trayInASlot(host: Host, random: Random): Planted | null {
  const tray = pickPlaced(host, random, (each) => each.item.kind === 'wrapped-tray' && standsFree(host, each));
  const pouch = pickPlaced(host, random, isInSlot);
  if (!tray || pouch?.one.placement?.at !== 'slot') return null;
  const view = without(host.view, [pouch.one.packageId]);
  const placement = { ...pouch.one.placement, pose: 'flat', paper: null } as const;
  return { view: moved(view, tray.one.packageId, placement), at: [onPackage(tray.one.packageId)] };
}

function outOfTheBasket(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(host, random, (each) => each.one.placement?.at === 'basket');
  if (!placed?.holder || placed.one.placement?.at !== 'basket') return null;
  const kind = kindOf(host.view, placed.holder);
  const size = sizeOf(placed.item, placed.one.placement.pose, placed.one.placement.turn);
  const by = random.whole(5, 40);
  const change = random.chance(0.5)
    ? { xMm: mm(kind.acrossMm - size.dx + by) }
    : { yMm: mm(kind.alongMm - size.dy + by) };
  return { view: withPlacement(host.view, placed, change), at: [onPackage(placed.one.packageId)] };
}

function twoInASlot(host: Host, random: Random): Planted | null {
  const stays = pickPlaced(host, random, isInSlot);
  const moves = pickPlaced(
    host,
    random,
    (each) => isInSlot(each) && each.one !== stays?.one && each.item.widthMm <= 130,
  );
  if (stays?.one.placement?.at !== 'slot' || !moves) return null;
  return {
    view: moved(host.view, moves.one.packageId, stays.one.placement),
    at: [onPackage(moves.one.packageId), onPackage(stays.one.packageId), onHolder(stays.one.placement.holderId)],
  };
}

function inSlotNumber(slotOf: (slots: number) => number) {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, isInSlot);
    if (!placed?.holder) return null;
    const slot = slotOf(kindOf(host.view, placed.holder).slots ?? 0);
    return {
      view: recounted(withPlacement(host.view, placed, { slot })),
      at: [onPackage(placed.one.packageId), onHolder(placed.holder.holderId)],
    };
  };
}

function looseInARack(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(host, random, isInSlot);
  if (placed?.one.placement?.at !== 'slot') return null;
  const { holderId, paper } = placed.one.placement;
  const placement = { at: 'basket', holderId, xMm: mm(5), yMm: mm(0), turn: 0, pose: 'on-edge', paper } as const;
  return {
    view: changePackage(host.view, placed.one.packageId, { placement }),
    at: [onPackage(placed.one.packageId), onHolder(holderId)],
  };
}

function slotOfABasket(host: Host, random: Random): Planted | null {
  const inside = pickPlaced(host, random, isPouchInBasket);
  if (!inside?.holder) return null;
  const { holderId } = inside.holder;
  const placement = { at: 'slot', holderId, slot: 1, pose: 'on-edge', paper: 'left' } as const;
  return {
    view: changePackage(host.view, inside.one.packageId, { placement }),
    at: [onPackage(inside.one.packageId), onHolder(holderId)],
  };
}

export const pouchFaults: readonly Fault[] = [
  { name: 'pouch-flat-in-rack', rule: 'pouch-on-edge', plant: posed(isInSlot, 'flat') },
  { name: 'pouch-tilted-in-rack', rule: 'pouch-on-edge', plant: posed(isInSlot, 'tilted') },
  { name: 'pouch-flat-in-basket', rule: 'pouch-on-edge', plant: posed(isPouchInBasket, 'flat') },
  { name: 'pouch-flat-on-shelf', rule: 'pouch-on-edge', plant: onTheShelf('flat') },
  { name: 'pouch-flat-on-container', rule: 'pouch-on-edge', plant: onALid('flat', isContainer) },
  { name: 'pouch-on-edge-on-shelf', rule: 'pouch-in-holder', plant: onTheShelf('on-edge') },
  { name: 'pouch-on-edge-on-container', rule: 'pouch-in-holder', plant: onALid('on-edge', isContainer) },
  { name: 'pouch-alone-in-basket', rule: 'pouch-in-holder', plant: aloneInBasket },
  { name: 'hole-in-basket-row', rule: 'pouch-in-holder', plant: holeInARow },
  { name: 'pouch-too-thick-for-rack', rule: 'holder-fits', plant: outgrown('heightMm') },
  { name: 'pouch-too-high-for-rack', rule: 'holder-fits', plant: outgrown('widthMm') },
  { name: 'pouch-too-long-for-rack', rule: 'holder-fits', plant: outgrown('lengthMm') },
  { name: 'pouch-lost-in-wide-slot', rule: 'holder-fits', orRules: ['pouch-in-holder'], plant: lostInItsSlot },
  { name: 'tray-in-slot', rule: 'holder-fits', plant: trayInASlot },
  { name: 'reaches-out-of-basket', rule: 'holder-fits', plant: outOfTheBasket },
  { name: 'two-in-one-slot', rule: 'slot-shared', plant: twoInASlot },
  { name: 'slot-after-the-last', rule: 'slot-unknown', plant: inSlotNumber((slots) => slots + 1) },
  { name: 'slot-zero', rule: 'slot-unknown', plant: inSlotNumber(() => 0) },
  { name: 'slot-between-two', rule: 'slot-unknown', plant: inSlotNumber(() => 1.5) },
  { name: 'slot-not-a-number', rule: 'slot-unknown', plant: inSlotNumber(() => NaN) },
  {
    name: 'loose-in-a-rack',
    rule: 'slot-unknown',
    orRules: ['holder-fits', 'pouch-in-holder', 'holder-usable', 'unplaced'],
    plant: looseInARack,
  },
  { name: 'slot-of-a-basket', rule: 'slot-unknown', plant: slotOfABasket },
];
