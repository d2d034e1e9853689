import type { LoadHolder, LoadView } from '../../../../src/domain/load/model';
import { mm } from '../../../../src/domain/units/quantity';
import { added, changePackage, itemWithCode, pickPlaced, shelfWithId, standing, standsFree } from '../change';
import { onHolder, onPackage, onShelf, type Fault, type Host, type Planted } from '../fault';
import type { Placed, Rect } from '../geometry';
import type { Random } from '../random';
import { holderRect, onDeck, placesOf, slid } from '../space';

/* Over the edge, at the wall, and two things in one place. */

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

/** A cart whose shelf is wider than the chamber. */
function chamberTooNarrow(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(host, random, onDeck);
  if (!placed) return null;
  const { widthMm } = shelfWithId(host.view, placed.shelfId);
  const sterilizer = { ...host.view.sterilizer, chamberWidthMm: mm(widthMm - random.pick([4, 40])) };
  return {
    view: { ...slid(host.view, placed, 0, placed.rect.front), sterilizer },
    at: [onPackage(placed.one.packageId), onShelf(placed.shelfId)],
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

export const edgeFaults: readonly Fault[] = [
  { name: 'package-over-edge', rule: 'shelf-edge', plant: packageOverEdge },
  { name: 'holder-over-edge', rule: 'shelf-edge', plant: holderOverEdge },
  { name: 'stack-over-edge', rule: 'shelf-edge', plant: stackOverEdge },
  { name: 'wall-house-rule', rule: 'wall-clearance', plant: wallsAskForMore },
  { name: 'wall-narrow-chamber', rule: 'wall-clearance', plant: narrowChamber },
  {
    name: 'chamber-narrower-than-shelf',
    rule: 'wall-clearance',
    orRules: ['size-makes-no-sense'],
    plant: chamberTooNarrow,
  },
  { name: 'wall-holder', rule: 'wall-clearance', plant: holderAtWall },
  { name: 'overlap-slightly', rule: 'overlap', plant: intoAnother(() => 0) },
  { name: 'overlap-wholly', rule: 'overlap', plant: intoAnother(() => 1) },
  { name: 'holder-over-holder', rule: 'overlap', plant: holderOverHolder },
  { name: 'package-over-holder', rule: 'overlap', plant: packageOverHolder },
  { name: 'overlap-in-basket', rule: 'overlap', plant: intoAnotherInBasket },
  { name: 'stack-into-tall-neighbour', rule: 'overlap', plant: stackIntoTall },
];
