import type { CatalogueItem, LoadHolder, LoadView } from '../../../../src/domain/load/model';
import { mm, percent } from '../../../../src/domain/units/quantity';
import { clearanceOf } from '../block';
import {
  added,
  changeItemOf,
  changePackage,
  changeShelf,
  itemWithCode,
  pickPlaced,
  recounted,
  shelfWithId,
  standing,
  standsFree,
} from '../change';
import { onHolder, onPackage, onShelf, type Fault, type Host, type Place, type Planted } from '../fault';
import { distanceOf, footprintsOn, holderSize, kindOf, rectOf, sizeOf, type Placed, type Rect } from '../geometry';
import type { Random } from '../random';

/* Edge, walls, neighbours, headroom, and the way left for steam. */

function onDeck(each: Placed): boolean {
  return each.one.placement?.at === 'shelf';
}

function slid(view: LoadView, placed: Placed, x: number, y: number): LoadView {
  const placement = placed.one.placement;
  if (placement?.at !== 'shelf') return view;
  return changePackage(view, placed.one.packageId, { placement: { ...placement, xMm: mm(x), yMm: mm(y) } });
}

/** A place that reaches over one of the four edges by a little or by much. */
function overTheEdge(host: Host, random: Random, shelfId: string, rect: Rect): { x: number; y: number } {
  const shelf = shelfWithId(host.view, shelfId);
  const by = random.pick([1, 5, 40]);
  const [dx, dy] = [rect.right - rect.left, rect.back - rect.front];
  return random.pick([
    { x: -by, y: rect.front },
    { x: shelf.widthMm - dx + by, y: rect.front },
    { x: rect.left, y: -by },
    { x: rect.left, y: shelf.depthMm - dy + by },
  ]);
}

function packageOverEdge(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(host, random, onDeck);
  if (!placed) return null;
  const { x, y } = overTheEdge(host, random, placed.shelfId, placed.rect);
  return { view: slid(host.view, placed, x, y), at: [onPackage(placed.one.packageId)] };
}

function placesOf(host: Host, holder: LoadHolder): readonly Place[] {
  const inside = host.placed.filter((each) => each.holder?.holderId === holder.holderId);
  return [onHolder(holder.holderId), ...inside.map((each) => onPackage(each.one.packageId))];
}

function holderRect(host: Host, holder: LoadHolder): Rect {
  return rectOf(holder.xMm, holder.yMm, holderSize(kindOf(host.view, holder), holder.turn));
}

function heldHolders(host: Host): readonly LoadHolder[] {
  return host.view.holders.filter((holder) => host.placed.some((each) => each.holder === holder));
}

function withHolderAt(host: Host, holder: LoadHolder, x: number, y: number): LoadView {
  const changed = { ...holder, xMm: mm(x), yMm: mm(y) };
  return { ...host.view, holders: host.view.holders.map((each) => (each === holder ? changed : each)) };
}

function holderOverEdge(host: Host, random: Random): Planted | null {
  const holders = heldHolders(host);
  if (holders.length === 0) return null;
  const holder = random.pick(holders);
  const { x, y } = overTheEdge(host, random, holder.shelfId, holderRect(host, holder));
  return { view: withHolderAt(host, holder, x, y), at: placesOf(host, holder) };
}

function stackOverEdge(host: Host, random: Random): Planted | null {
  const upper = pickPlaced(host, random, (each) => each.one.placement?.at === 'package');
  if (upper?.one.placement?.at !== 'package') return null;
  const { x, y } = overTheEdge(host, random, upper.shelfId, upper.rect);
  const placement = { ...upper.one.placement, xMm: mm(x), yMm: mm(y) };
  return { view: changePackage(host.view, upper.one.packageId, { placement }), at: [onPackage(upper.one.packageId)] };
}

function wallDistance(host: Host, shelfId: string, rect: Rect): number {
  const shelf = shelfWithId(host.view, shelfId);
  const { chamberWidthMm, chamberDepthMm } = host.view.sterilizer;
  const [besideX, besideY] = [(chamberWidthMm - shelf.widthMm) / 2, (chamberDepthMm - shelf.depthMm) / 2];
  return Math.min(
    besideX + Math.min(rect.left, shelf.widthMm - rect.right),
    besideY + Math.min(rect.front, shelf.depthMm - rect.back),
  );
}

function wallsAskForMore(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(host, random, (each) => onDeck(each) && wallDistance(host, each.shelfId, each.rect) < 150);
  if (!placed) return null;
  const distance = wallDistance(host, placed.shelfId, placed.rect);
  const policy = { ...host.policy, wallClearanceMm: mm(Math.floor(distance) + random.whole(1, 10)) };
  return { view: host.view, policy, at: [onPackage(placed.one.packageId)], measured: distance };
}

/** Shelves as wide as their chamber, and something at the edge. */
function narrowChamber(host: Host, random: Random): Planted | null {
  if (host.policy.wallClearanceMm < 10) return null;
  const placed = pickPlaced(host, random, onDeck);
  if (!placed) return null;
  const { widthMm } = shelfWithId(host.view, placed.shelfId);
  const sterilizer = { ...host.view.sterilizer, chamberWidthMm: mm(widthMm + 4) };
  return {
    view: { ...slid(host.view, placed, 0, placed.rect.front), sterilizer },
    at: [onPackage(placed.one.packageId)],
  };
}

/** A holder against the wall with something in it that is too near: the frame itself may touch. */
function holderAtWall(host: Host, random: Random): Planted | null {
  const holders = heldHolders(host);
  if (holders.length === 0) return null;
  const holder = random.pick(holders);
  const inside = host.placed.filter((each) => each.holder === holder).map((each) => each.rect.left - holder.xMm);
  if (Math.min(...inside) > host.policy.wallClearanceMm - 2) return null;
  const { widthMm } = shelfWithId(host.view, holder.shelfId);
  const view = withHolderAt(host, holder, 0, holder.yMm);
  return {
    view: { ...view, sterilizer: { ...view.sterilizer, chamberWidthMm: mm(widthMm) } },
    at: placesOf(host, holder),
  };
}

/** Slides one package into another, a little or wholly. */
function intoAnother(share: (random: Random) => number) {
  return (host: Host, random: Random): Planted | null => {
    const stays = pickPlaced(host, random, (each) => onDeck(each) && standsFree(host, each));
    const slides = pickPlaced(
      host,
      random,
      (each) => standsFree(host, each) && each !== stays && each.shelfId === stays?.shelfId,
    );
    if (!stays || !slides) return null;
    const deep = share(random);
    const x = stays.rect.right - Math.max(3, deep * (stays.rect.right - stays.rect.left));
    return {
      view: slid(host.view, slides, Math.floor(x), stays.rect.front),
      at: [onPackage(slides.one.packageId), onPackage(stays.one.packageId)],
    };
  };
}

function holderOverHolder(host: Host, random: Random): Planted | null {
  const holders = random.shuffled(heldHolders(host));
  const [stays] = holders;
  const slides = holders.find((each) => each !== stays && each.shelfId === stays?.shelfId);
  if (!stays || !slides) return null;
  const view = withHolderAt(host, slides, stays.xMm + random.whole(-40, 40), stays.yMm + random.whole(-40, 40));
  return { view, at: [onHolder(slides.holderId), onHolder(stays.holderId)] };
}

function packageOverHolder(host: Host, random: Random): Planted | null {
  const holders = heldHolders(host);
  if (holders.length === 0) return null;
  const holder = random.pick(holders);
  const placed = pickPlaced(host, random, (each) => standsFree(host, each) && each.shelfId === holder.shelfId);
  if (!placed) return null;
  const rect = holderRect(host, holder);
  return {
    view: slid(host.view, placed, rect.left + random.whole(10, 60), rect.front + random.whole(10, 60)),
    at: [onPackage(placed.one.packageId)],
  };
}

function intoAnotherInBasket(host: Host, random: Random): Planted | null {
  const inBasket = (each: Placed) => each.one.placement?.at === 'basket';
  const stays = pickPlaced(host, random, inBasket);
  const slides = pickPlaced(host, random, (each) => inBasket(each) && each !== stays && each.holder === stays?.holder);
  if (stays?.one.placement?.at !== 'basket' || slides?.one.placement?.at !== 'basket') return null;
  const { xMm, yMm } = stays.one.placement;
  const placement = { ...slides.one.placement, xMm: mm(xMm + 3), yMm: mm(yMm + 3) };
  return {
    view: changePackage(host.view, slides.one.packageId, { placement }),
    at: [onPackage(slides.one.packageId), onPackage(stays.one.packageId)],
  };
}

/** The upper of a stack slid into something beside the stack that is taller than the lower. */
function stackIntoTall(host: Host, random: Random): Planted | null {
  const lower = pickPlaced(
    host,
    random,
    (each) => standsFree(host, each) && each.item.pose === 'flat' && each.top <= 130,
  );
  const tall = pickPlaced(
    host,
    random,
    (each) => standsFree(host, each) && each !== lower && each.shelfId === lower?.shelfId && each.top >= lower.top + 20,
  );
  if (!lower || !tall) return null;
  const upper = itemWithCode(host.view, 'W-07');
  const [x, y] = [Math.round(tall.rect.left + 15), Math.round(tall.rect.front + 15)];
  return {
    view: added(host.view, random, 'planted package', upper, standing(lower.one.packageId, x, y, 0)),
    at: [onPackage('planted package'), onPackage(tall.one.packageId)],
  };
}

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
  const policy = { ...host.policy, greatestShelfCoverPercent: percent(Math.floor(covered.share) - random.whole(0, 2)) };
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

export const spaceFaults: readonly Fault[] = [
  { name: 'package-over-edge', rule: 'shelf-edge', plant: packageOverEdge },
  { name: 'holder-over-edge', rule: 'shelf-edge', plant: holderOverEdge },
  { name: 'stack-over-edge', rule: 'shelf-edge', plant: stackOverEdge },
  { name: 'wall-house-rule', rule: 'wall-clearance', plant: wallsAskForMore },
  { name: 'wall-narrow-chamber', rule: 'wall-clearance', plant: narrowChamber },
  { name: 'wall-holder', rule: 'wall-clearance', plant: holderAtWall },
  { name: 'overlap-slightly', rule: 'overlap', plant: intoAnother(() => 0) },
  { name: 'overlap-wholly', rule: 'overlap', plant: intoAnother(() => 1) },
  { name: 'holder-over-holder', rule: 'overlap', plant: holderOverHolder },
  { name: 'package-over-holder', rule: 'overlap', plant: packageOverHolder },
  { name: 'overlap-in-basket', rule: 'overlap', plant: intoAnotherInBasket },
  { name: 'stack-into-tall-neighbour', rule: 'overlap', plant: stackIntoTall },
  { name: 'clearance-under-instructions', rule: 'package-clearance', plant: asksForMore },
  { name: 'clearance-under-house-rule', rule: 'package-clearance', plant: houseAsksForMore },
  { name: 'slid-too-near', rule: 'package-clearance', plant: slidNear },
  { name: 'tray-against-rack', rule: 'package-clearance', orRules: ['gap'], plant: trayAgainstRack },
  { name: 'shelf-too-low', rule: 'headroom', plant: lowShelf(onDeck) },
  { name: 'rack-under-low-shelf', rule: 'headroom', plant: lowShelf((each) => each.holder !== null) },
  { name: 'stack-under-low-shelf', rule: 'headroom', plant: lowShelf((each) => each.one.placement?.at === 'package') },
  { name: 'headroom-house-rule', rule: 'headroom', plant: headroomAsked },
  { name: 'shelf-covered-house-rule', rule: 'steam-path', plant: shelfCovered },
  { name: 'shelf-covered-wholly', rule: 'steam-path', plant: shelfCoveredWhole },
];
