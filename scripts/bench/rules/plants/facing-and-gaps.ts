import type { FacingRule } from '../../../../src/domain/load/policy';
import type { CatalogueItem, PaperSide, Turn } from '../../../../src/domain/load/model';
import { mm } from '../../../../src/domain/units/quantity';
import { clearanceOf } from '../block';
import { changeItemOf, changePackage, deck, freeSpot, moved, pickPlaced, without } from '../change';
import { onHolder, onPackage, type Fault, type Host, type Place, type Planted } from '../fault';
import { distanceOf, kindOf, sizeOf, type Placed } from '../geometry';
import type { Random } from '../random';
import { isInSlot, isPouchInBasket } from './pouches';

/* Pouches among their neighbours: which way they face, how far apart they stand, whether their labels can be read. */

function turnedPaper(host: Host, placed: Placed): Host['view'] {
  const placement = placed.one.placement;
  if (placement === null) return host.view;
  const paper: PaperSide = placement.paper === 'left' ? 'right' : 'left';
  return changePackage(host.view, placed.one.packageId, { placement: { ...placement, paper } });
}

function besides(host: Host, placed: Placed): readonly Placed[] {
  return host.placed.filter((each) => each.holder !== null && each.holder === placed.holder && each !== placed);
}

/** By its instructions for use, else by the house. */
function facingOf(host: Host, placed: Placed): FacingRule {
  return placed.item.facing ?? host.policy.facing;
}

function oneTurned(facing: FacingRule, fits: (placed: Placed) => boolean) {
  return (host: Host, random: Random): Planted | null => {
    const isAsked = (each: Placed) => facingOf(host, each) === facing;
    const placed = pickPlaced(
      host,
      random,
      (each) => fits(each) && isAsked(each) && besides(host, each).filter(isAsked).length >= 2,
    );
    if (!placed) return null;
    return { view: turnedPaper(host, placed), at: [onPackage(placed.one.packageId)] };
  };
}

/** Across an empty slot two pouches hardly face each other: the next slot has to be taken. */
function nextSlotTaken(host: Host, placed: Placed): boolean {
  const slotOf = (each: Placed) => (each.one.placement?.at === 'slot' ? each.one.placement.slot : NaN);
  return besides(host, placed).some(
    (each) => Math.abs(slotOf(each) - slotOf(placed)) === 1 && facingOf(host, each) === facingOf(host, placed),
  );
}

function alternationBroken(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(
    host,
    random,
    (each) => isInSlot(each) && facingOf(host, each) === 'alternating' && nextSlotTaken(host, each),
  );
  return placed && { view: turnedPaper(host, placed), at: besideIt(host, placed) };
}

/** It and those beside it: which of two that face wrongly is the wrong one is anybody's choice. */
function besideIt(host: Host, placed: Placed): readonly Place[] {
  return [placed, ...besides(host, placed)].map((each) => onPackage(each.one.packageId));
}

/** Which way the faces of a pouch look: across x or across y. */
function axisOf(placed: Placed): 'x' | 'y' {
  const { left, right, front, back } = placed.rect;
  return right - left < back - front ? 'x' : 'y';
}

/** All pouches of one rack turned against the more numerous rest of their shelf. */
function rackTurned(host: Host, random: Random): Planted | null {
  if (!host.placed.every((each) => each.item.kind !== 'pouch' || facingOf(host, each) === 'one-way')) return null;
  const placed = pickPlaced(host, random, isInSlot);
  if (!placed?.holder) return null;
  const { holder } = placed;
  const inside = host.placed.filter((each) => each.holder === holder);
  const rest = host.placed.filter(
    (each) =>
      each.item.kind === 'pouch' &&
      each.shelfId === placed.shelfId &&
      each.holder !== holder &&
      axisOf(each) === axisOf(placed),
  );
  if (rest.length <= inside.length) return null;
  const view = inside.reduce((so, each) => ({ ...so, view: turnedPaper(so, each) }), host).view;
  return { view, at: [onHolder(holder.holderId), ...inside.map((each) => onPackage(each.one.packageId))] };
}

/** A rack as another house would want it. */
function otherHouse(from: FacingRule, to: FacingRule) {
  return (host: Host, random: Random): Planted | null => {
    if (host.policy.facing !== from) return null;
    const isFree = (each: Placed) => isInSlot(each) && each.item.facing === null;
    const placed = pickPlaced(host, random, (each) => isFree(each) && nextSlotTaken(host, each));
    if (!placed?.holder) return null;
    return {
      view: host.view,
      policy: { ...host.policy, facing: to },
      at: [onHolder(placed.holder.holderId), ...besideIt(host, placed)],
    };
  };
}

/** A rack that is loaded as the house wants it, of pouches whose instructions turn out to want it the other way. */
function otherInstructions(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(host, random, (each) => isInSlot(each) && nextSlotTaken(host, each));
  if (!placed?.holder) return null;
  const from = facingOf(host, placed);
  if (from === 'not-set') return null;
  const facing = from === 'one-way' ? 'alternating' : 'one-way';
  const inside = [placed, ...besides(host, placed)];
  return {
    view: inside.reduce((view, each) => changeItemOf(view, each, { facing }), host.view),
    at: [onHolder(placed.holder.holderId), ...inside.map((each) => onPackage(each.one.packageId))],
  };
}

type Pair = { readonly placed: Placed; readonly gap: number; readonly slotsApart: number };

/** A pouch in a rack and the free way to the nearest one in the same rack. */
function inRackWithNeighbour(host: Host, random: Random): Pair | null {
  const placed = pickPlaced(host, random, (each) => isInSlot(each) && besides(host, each).length > 0);
  if (!placed?.holder || placed.one.placement?.at !== 'slot') return null;
  const { slot } = placed.one.placement;
  const pitch = kindOf(host.view, placed.holder).pitchMm ?? 0;
  const pairs = besides(host, placed).map((each) => {
    const slotsApart = Math.abs((each.one.placement?.at === 'slot' ? each.one.placement.slot : 0) - slot);
    return { placed, slotsApart, gap: slotsApart * pitch - (each.item.heightMm + placed.item.heightMm) / 2 };
  });
  return pairs.reduce((nearest, pair) => (pair.gap < nearest.gap ? pair : nearest));
}

function asksForMore(fits: (pair: Pair) => boolean) {
  return (host: Host, random: Random): Planted | null => {
    const pair = inRackWithNeighbour(host, random);
    if (!pair || !fits(pair)) return null;
    const clearanceMm = mm(Math.floor(pair.gap) + random.whole(1, 8));
    return {
      view: changeItemOf(host.view, pair.placed, { clearanceMm }),
      at: [onPackage(pair.placed.one.packageId)],
      measured: pair.gap,
    };
  };
}

function houseAsksForMore(host: Host, random: Random): Planted | null {
  const pair = inRackWithNeighbour(host, random);
  if (!pair || pair.gap > 90) return null;
  return {
    view: changeItemOf(host.view, pair.placed, { clearanceMm: null }),
    policy: { ...host.policy, pouchGapMm: mm(Math.floor(pair.gap) + random.whole(1, 8)) },
    at: [onPackage(pair.placed.one.packageId)],
    measured: pair.gap,
  };
}

/** Racks side by side whose nearest pouches stand closer than their instructions ask for. */
function besideTheNextRack(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(host, random, (each) => isInSlot(each) && each.holder?.turn === 0);
  if (!placed) return null;
  const gaps = host.placed
    .filter((each) => isInSlot(each) && each.holder?.turn === 0 && each.holder !== placed.holder)
    .filter((each) => each.shelfId === placed.shelfId && facesAcrossX(each, placed))
    .map((each) => ({ each, gap: distanceOf(each.rect, placed.rect) }))
    .sort((a, b) => a.gap - b.gap);
  const [nearest] = gaps;
  if (!nearest || nearest.gap > 60) return null;
  const view = without(
    host.view,
    [...besides(host, placed), ...besides(host, nearest.each)].map((each) => each.one.packageId),
  );
  return {
    view: changeItemOf(view, placed, { clearanceMm: mm(Math.floor(nearest.gap) + random.whole(2, 8)) }),
    at: [onPackage(placed.one.packageId)],
    measured: nearest.gap,
  };
}

function facesAcrossX(one: Placed, other: Placed): boolean {
  return Math.min(one.rect.back, other.rect.back) - Math.max(one.rect.front, other.rect.front) > 100;
}

/** A pouch in a basket pushed against the one beside it. */
function pushedInBasket(closerThan: (host: Host, placed: Placed) => number, filmTowards: boolean) {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, (each) => isPouchInBasket(each) && besides(host, each).length > 0);
    if (placed?.one.placement?.at !== 'basket') return null;
    const { placement } = placed.one;
    const across = placement.turn === 0 ? placement.xMm : placement.yMm;
    const ahead = besides(host, placed)
      .filter((each) => !filmTowards || hides(each.item, placed.item))
      .map((each) => each.one.placement)
      .filter((each) => each?.at === 'basket')
      .map((each) => (each.turn === 0 ? each.xMm : each.yMm))
      .filter((each) => each > across);
    const want = closerThan(host, placed);
    if (ahead.length === 0 || want < 3) return null;
    const gap = random.whole(1, want - 1);
    const to = mm(Math.min(...ahead) - placed.item.heightMm - gap);
    const paper = filmTowards ? 'left' : placement.paper;
    const changed = { ...placement, paper, ...(placement.turn === 0 ? { xMm: to } : { yMm: to }) };
    return {
      view: changePackage(host.view, placed.one.packageId, { placement: changed }),
      at: [onPackage(placed.one.packageId)],
      ...(filmTowards ? {} : { measured: gap }),
    };
  };
}

/** Another pouch as large as this one, or nearly: in front of it, it leaves nothing of its label to be read. */
function hides(other: CatalogueItem, item: CatalogueItem): boolean {
  return other.kind === 'pouch' && other.widthMm >= item.widthMm * 0.9 && other.lengthMm >= item.lengthMm * 0.9;
}

/** Two pouches side by side on the deck, in no holder, across x or across y. */
function bunched(gapFor: (host: Host, random: Random, clearanceMm: number) => number | null) {
  return (host: Host, random: Random): Planted | null => {
    const one = pickPlaced(host, random, (each) => each.item.kind === 'pouch');
    const other = pickPlaced(host, random, (each) => one !== null && each !== one && hides(each.item, one.item));
    if (!one || !other) return null;
    const gap = gapFor(host, random, Math.max(...[one, other].map((each) => clearanceOf(each.item, host.policy))));
    if (gap === null) return null;
    const turn = random.pick<Turn>([0, 90]);
    const [first, second] = [sizeOf(one.item, 'on-edge', turn), sizeOf(other.item, 'on-edge', turn)];
    const thick = one.item.heightMm + gap + other.item.heightMm;
    const long = Math.max(one.item.lengthMm, other.item.lengthMm);
    const [dx, dy] = turn === 0 ? [thick, long] : [long, thick];
    const spot = freeSpot(host, random, { dx, dy, dz: Math.max(first.dz, second.dz), clearanceMm: 50 });
    if (!spot) return null;
    const { shelf, x, y } = spot;
    const put = moved(host.view, one.one.packageId, deck(shelf.id, x, y, turn, 'on-edge'));
    const next = turn === 0 ? { x: x + first.dx + gap, y } : { x, y: y + first.dy + gap };
    const view = moved(put, other.one.packageId, deck(shelf.id, next.x, next.y, turn, 'on-edge'));
    // Paper looks left or to the door, so the film of the first looks at the second.
    return { view, at: [onPackage(one.one.packageId)], ...(gap === 0 ? { measured: 0 } : {}) };
  };
}

/** A pouch on the deck whose film looks at a rack with something as high in it. */
function filmAgainstARack(host: Host, random: Random): Planted | null {
  const inside = pickPlaced(host, random, (each) => isInSlot(each) && each.holder?.turn === 0);
  const pouch = pickPlaced(
    host,
    random,
    (each) =>
      each.item.kind === 'pouch' && each.holder !== inside?.holder && inside !== null && hides(inside.item, each.item),
  );
  if (!inside?.holder || !pouch) return null;
  const { holder } = inside;
  const first = host.placed.filter((each) => each.holder === holder).map((each) => each.rect.left);
  const x = holder.xMm - pouch.item.heightMm - random.whole(0, 4);
  const gap = inside.rect.left - x - pouch.item.heightMm;
  if (x < 0 || inside.rect.left !== Math.min(...first) || gap > host.policy.labelReadingGapMm - 1) return null;
  const placement = deck(inside.shelfId, x, Math.round(inside.rect.front), 0, 'on-edge');
  return { view: moved(host.view, pouch.one.packageId, placement), at: [onPackage(pouch.one.packageId)] };
}

function filmAgainstATray(host: Host, random: Random): Planted | null {
  const gap = Math.floor(host.policy.labelReadingGapMm / 3);
  const pouch = pickPlaced(host, random, (each) => each.item.kind === 'pouch');
  const tray = pickPlaced(host, random, (each) => each.one.placement?.at === 'shelf');
  if (!pouch || !tray || gap < 2 || tray.top < pouch.item.widthMm * 0.9) return null;
  const size = sizeOf(pouch.item, 'on-edge', 0);
  const x = tray.rect.left - gap - size.dx;
  if (x < 0 || tray.rect.back - tray.rect.front < size.dy * 0.9) return null;
  const placement = deck(tray.shelfId, x, tray.rect.front, 0, 'on-edge');
  return { view: moved(host.view, pouch.one.packageId, placement), at: [onPackage(pouch.one.packageId)] };
}

const gapWanted = (host: Host, placed: Placed) => Math.floor(clearanceOf(placed.item, host.policy));
const readingGap = (host: Host) => Math.floor(host.policy.labelReadingGapMm);

export const facingAndGapFaults: readonly Fault[] = [
  { name: 'paper-turned-in-rack', rule: 'facing', plant: oneTurned('one-way', isInSlot) },
  { name: 'paper-turned-in-basket', rule: 'facing', plant: oneTurned('one-way', isPouchInBasket) },
  { name: 'rack-turned-against-shelf', rule: 'facing', plant: rackTurned },
  { name: 'alternation-broken', rule: 'facing', plant: alternationBroken },
  { name: 'one-way-where-alternating', rule: 'facing', plant: otherHouse('one-way', 'alternating') },
  { name: 'alternating-where-one-way', rule: 'facing', plant: otherHouse('alternating', 'one-way') },
  { name: 'against-facing-of-instructions', rule: 'facing', plant: otherInstructions },
  { name: 'gap-under-instructions', rule: 'gap', plant: asksForMore(({ slotsApart }) => slotsApart === 1) },
  { name: 'gap-across-empty-slot', rule: 'gap', plant: asksForMore(({ slotsApart }) => slotsApart > 1) },
  { name: 'gap-under-house-rule', rule: 'gap', plant: houseAsksForMore },
  { name: 'gap-to-next-rack', rule: 'gap', orRules: ['package-clearance'], plant: besideTheNextRack },
  { name: 'gap-in-basket', rule: 'gap', plant: pushedInBasket(gapWanted, false) },
  {
    name: 'gap-bunched-on-shelf',
    rule: 'gap',
    plant: bunched((_host, _random, clearanceMm) => (clearanceMm < 1 ? null : 0)),
  },
  {
    name: 'label-hidden-bunched',
    rule: 'label-hidden',
    plant: bunched(({ policy }, random) =>
      policy.labelReadingGapMm < 3 ? null : random.whole(0, policy.labelReadingGapMm - 2),
    ),
  },
  { name: 'label-hidden-in-basket', rule: 'label-hidden', plant: pushedInBasket(readingGap, true) },
  { name: 'label-hidden-by-rack', rule: 'label-hidden', plant: filmAgainstARack },
  { name: 'label-hidden-by-tray', rule: 'label-hidden', plant: filmAgainstATray },
];
