import type { CatalogueItem } from '../../../../src/domain/load/model';
import { mm, percent } from '../../../../src/domain/units/quantity';
import { clearanceOf } from '../block';
import {
  added,
  changeItemOf,
  changeShelf,
  itemWithCode,
  pickPlaced,
  recounted,
  shelfWithId,
  standing,
  standsFree,
} from '../change';
import { onHolder, onPackage, onShelf, type Fault, type Host, type Place, type Planted } from '../fault';
import { distanceOf, footprintsOn, sizeOf, type Placed, type Rect } from '../geometry';
import type { Random } from '../random';
import { holderRect, onDeck, slid } from '../space';

/* Too near to a neighbour, too high for the shelf, and no way left for steam. */

function nearestGap(host: Host, placed: Placed): number {
  const others = footprintsOn(host.view, placed.shelfId).filter((rect) => !isSame(rect, placed.rect));
  return others.reduce((least, rect) => Math.min(least, distanceOf(rect, placed.rect)), Infinity);
}

function isSame(one: Rect, other: Rect): boolean {
  return one.left === other.left && one.front === other.front && one.right === other.right && one.back === other.back;
}

/** Its nearest neighbour on the deck is a package, with no holder between. */
function besidesPackage(host: Host, random: Random): { readonly placed: Placed; readonly gap: number } | null {
  const placed = pickPlaced(host, random, (each) => onDeck(each) && standsFree(host, each));
  if (!placed) return null;
  const gaps = host.placed
    .filter((each) => each !== placed && onDeck(each) && each.shelfId === placed.shelfId)
    .map((each) => distanceOf(each.rect, placed.rect));
  const gap = Math.min(...gaps, Infinity);
  return gap < 150 && gap === nearestGap(host, placed) ? { placed, gap } : null;
}

function asksForMore(host: Host, random: Random): Planted | null {
  const found = besidesPackage(host, random);
  if (!found) return null;
  const clearanceMm = mm(Math.floor(found.gap) + random.whole(1, 10));
  return {
    view: changeItemOf(host.view, found.placed, { clearanceMm }),
    at: [onPackage(found.placed.one.packageId)],
    measured: found.gap,
  };
}

function houseAsksForMore(host: Host, random: Random): Planted | null {
  const found = besidesPackage(host, random);
  if (!found) return null;
  return {
    view: changeItemOf(host.view, found.placed, { clearanceMm: null }),
    policy: { ...host.policy, packageClearanceMm: mm(Math.floor(found.gap) + random.whole(1, 10)) },
    at: [onPackage(found.placed.one.packageId)],
    measured: found.gap,
  };
}

function slidNear(host: Host, random: Random): Planted | null {
  const stays = pickPlaced(host, random, (each) => onDeck(each) && standsFree(host, each));
  const slides = pickPlaced(
    host,
    random,
    (each) => standsFree(host, each) && each !== stays && each.shelfId === stays?.shelfId,
  );
  if (!stays || !slides) return null;
  const least = Math.max(clearanceOf(stays.item, host.policy), clearanceOf(slides.item, host.policy));
  if (least < 3) return null;
  const x = Math.ceil(stays.rect.right) + random.whole(0, Math.floor(least) - 2);
  return {
    view: slid(host.view, slides, x, stays.rect.front),
    at: [onPackage(slides.one.packageId)],
  };
}

/** A tray pushed against a rack, so that a pouch in it is nearer than the tray's instructions ask for. */
function trayAgainstRack(host: Host, random: Random): Planted | null {
  const pouch = pickPlaced(host, random, (each) => each.one.placement?.at === 'slot');
  const tray = pickPlaced(host, random, (each) => standsFree(host, each) && each.shelfId === pouch?.shelfId);
  if (!pouch?.holder || !tray) return null;
  const rack = holderRect(host, pouch.holder);
  const nearest = host.placed
    .filter((each) => each.holder === pouch.holder)
    .reduce((near, each) => (each.rect.right > near.rect.right ? each : near));
  const least = Math.max(clearanceOf(tray.item, host.policy), clearanceOf(nearest.item, host.policy));
  if (Math.ceil(rack.right) - nearest.rect.right > least - 3) return null;
  const view = slid(host.view, tray, Math.ceil(rack.right), Math.ceil(nearest.rect.front));
  return {
    view,
    at: [onPackage(tray.one.packageId), onPackage(nearest.one.packageId), onHolder(pouch.holder.holderId)],
  };
}

/** The upper of a permitted stack hangs over its base towards something as high, and comes too near to it. */
function stackTooNear(host: Host, random: Random): Planted | null {
  const base = pickPlaced(host, random, (each) => standsFree(host, each) && each.item.pose === 'flat');
  const isBeside = (each: Placed, { rect, top }: Placed) =>
    each.rect.left - rect.right >= 3 &&
    each.rect.left - rect.right < 100 &&
    each.top >= top + 20 &&
    Math.min(each.rect.back, rect.back) - Math.max(each.rect.front, rect.front) > 100;
  const tall = pickPlaced(
    host,
    random,
    (each) => base !== null && standsFree(host, each) && each.shelfId === base.shelfId && isBeside(each, base),
  );
  if (!base || !tall) return null;
  const upper: CatalogueItem = {
    ...itemWithCode(host.view, 'W-08'),
    id: 'planted item',
    code: 'W-99',
    standsOn: [base.item.code],
    greatestStackHeightMm: null,
    clearanceMm: mm(20),
    pose: 'flat',
    isPerforated: true,
  };
  const gap = random.whole(1, 15);
  const x = tall.rect.left - gap - sizeOf(upper, 'flat', 90).dx;
  const placement = standing(base.one.packageId, x, Math.max(tall.rect.front, base.rect.front), 90);
  return {
    view: added(host.view, random, 'planted package', upper, placement),
    at: [onPackage('planted package')],
    measured: gap,
  };
}

function tallest(host: Host, random: Random, fits: (each: Placed) => boolean): Placed | null {
  const one = pickPlaced(host, random, fits);
  if (!one) return null;
  return host.placed
    .filter((each) => each.shelfId === one.shelfId)
    .reduce((high, each) => (each.top > high.top ? each : high));
}

/** Everything on the shelf of this one that is as high as that, by itself or by its holder. */
function tooHigh(host: Host, placed: Placed, greatestMm: number): readonly Place[] {
  return host.placed
    .filter((each) => each.shelfId === placed.shelfId && each.top > greatestMm)
    .map((each) => (each.holder ? onHolder(each.holder.holderId) : onPackage(each.one.packageId)));
}

function lowShelf(fits: (each: Placed) => boolean) {
  return (host: Host, random: Random): Planted | null => {
    const placed = tallest(host, random, fits);
    if (!placed || !fits(placed)) return null;
    const clearHeightMm = mm(Math.ceil(placed.top) - random.pick([1, 2, 15]));
    return {
      view: changeShelf(host.view, placed.shelfId, { clearHeightMm }),
      at: tooHigh(host, placed, clearHeightMm),
      measured: placed.top,
    };
  };
}

function headroomAsked(host: Host, random: Random): Planted | null {
  const placed = tallest(host, random, () => true);
  if (!placed) return null;
  const left = shelfWithId(host.view, placed.shelfId).clearHeightMm - placed.top;
  if (left < 0 || left > 190) return null;
  const headroomMm = mm(Math.floor(left) + random.whole(1, 8));
  const greatest = shelfWithId(host.view, placed.shelfId).clearHeightMm - headroomMm;
  return {
    view: host.view,
    policy: { ...host.policy, headroomMm },
    at: tooHigh(host, placed, greatest),
    measured: placed.top,
  };
}

/** The share of a shelf in per cent that packages on its deck cover, holders left out. */
function coveredByPackages(host: Host, random: Random): { readonly shelfId: string; readonly share: number } | null {
  const placed = pickPlaced(host, random, (each) => onDeck(each) && each.item.pose === 'flat');
  if (!placed) return null;
  const shelf = shelfWithId(host.view, placed.shelfId);
  const area = host.placed
    .filter((each) => each.shelfId === placed.shelfId && onDeck(each))
    .reduce((sum, { rect }) => sum + (rect.right - rect.left) * (rect.back - rect.front), 0);
  return { shelfId: placed.shelfId, share: (100 * area) / (shelf.widthMm * shelf.depthMm) };
}

function shelfCovered(host: Host, random: Random): Planted | null {
  const covered = coveredByPackages(host, random);
  if (!covered || covered.share < 13) return null;
  const policy = { ...host.policy, greatestShelfCoverPercent: percent(Math.ceil(covered.share) - random.whole(1, 3)) };
  return { view: host.view, policy, at: [onShelf(covered.shelfId)] };
}

function shelfCoveredWhole(host: Host, random: Random): Planted | null {
  const empty = host.view.cart.shelves.filter((shelf) => footprintsOn(host.view, shelf.id).length === 0);
  if (empty.length === 0 || host.policy.greatestShelfCoverPercent > 97) return null;
  const shelf = random.pick(empty);
  const sides = [shelf.widthMm, shelf.depthMm].sort((a, b) => a - b);
  const item: CatalogueItem = {
    ...itemWithCode(host.view, 'W-08'),
    id: 'planted item',
    code: 'W-99',
    widthMm: sides[0] ?? mm(0),
    lengthMm: sides[1] ?? mm(0),
    pose: 'flat',
    isPerforated: true,
  };
  const turn = shelf.widthMm <= shelf.depthMm ? 0 : 90;
  const size = sizeOf(item, 'flat', turn);
  if (size.dz > shelf.clearHeightMm) return null;
  const placement = {
    at: 'shelf',
    shelfId: shelf.id,
    xMm: mm(0),
    yMm: mm(0),
    turn,
    pose: 'flat',
    paper: null,
  } as const;
  return {
    view: recounted(added(host.view, random, 'planted package', item, placement)),
    at: [onShelf(shelf.id), onPackage('planted package')],
  };
}

export const clearanceFaults: readonly Fault[] = [
  { name: 'clearance-under-instructions', rule: 'package-clearance', plant: asksForMore },
  { name: 'clearance-under-house-rule', rule: 'package-clearance', plant: houseAsksForMore },
  { name: 'slid-too-near', rule: 'package-clearance', plant: slidNear },
  { name: 'stack-too-near-neighbour', rule: 'package-clearance', plant: stackTooNear },
  { name: 'tray-against-rack', rule: 'package-clearance', orRules: ['gap'], plant: trayAgainstRack },
  { name: 'shelf-too-low', rule: 'headroom', plant: lowShelf(onDeck) },
  { name: 'rack-under-low-shelf', rule: 'headroom', plant: lowShelf((each) => each.holder !== null) },
  { name: 'stack-under-low-shelf', rule: 'headroom', plant: lowShelf((each) => each.one.placement?.at === 'package') },
  { name: 'headroom-house-rule', rule: 'headroom', plant: headroomAsked },
  { name: 'shelf-covered-house-rule', rule: 'steam-path', plant: shelfCovered },
  { name: 'shelf-covered-wholly', rule: 'steam-path', plant: shelfCoveredWhole },
];
