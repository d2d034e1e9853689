import { footprintOf } from '../geometry/footprint';
import { freeSpots, type Obstacle, type Spot } from '../geometry/free-spot';
import { mm } from '../units/quantity';
import { freeSlots, insideOf, paperForSlot } from './free-slots';
import type { Body, HolderBody, Layout, ShelfLayout } from './layout';
import type { CatalogueItem, LoadView, Placement, Turn } from './model';
import { limitOf, type LoadPolicy } from './policy';
import { racksFor } from './rules/holder-fit';
import { hasMetal } from './rules/metal';
import { clearanceOf } from './rules/near-pairs';
import { massOrNothing } from './sensible';

/** The place packages go to until another one is scanned. */
export type WithinPlace =
  { readonly kind: 'shelf'; readonly shelfId: string } | { readonly kind: 'holder'; readonly holderId: string };

export type Suggestion = {
  readonly placement: Placement;
  /** Why there, in one short sentence. */
  readonly why: string;
};

export type PlaceSearch = {
  readonly view: LoadView;
  /** Of the load without the thing that is to be placed. */
  readonly layout: Layout;
  readonly policy: LoadPolicy;
  readonly item: CatalogueItem;
  readonly within: WithinPlace | null;
};

/** Spots tried on one shelf: the first ones are the best packed, and later ones mostly fail for the same reason. */
const spotsPerShelf = 4;

/**
 * Places where a thing could go by its measures, the best first. Whether a place is good is for the rules to say.
 *
 * A pouch goes into a slot, of the holder kind it belongs in before others that fit, in a rack that is begun before an
 * empty one. Textiles go onto shelves from the highest down and everything else from the lowest up (textiles above metal,
 * heavy and rigid below: general practice of several guides, no single standard), packed from the door and the left.
 */
export function* placeCandidates(search: PlaceSearch): Iterable<Suggestion> {
  const { item, within, layout } = search;
  if (within?.kind === 'holder') {
    const holder = layout.holderOf.get(within.holderId);
    if (!holder) return;
    if (holder.kind.form === 'basket') yield* inBasket(search, holder);
    else yield* inSlots(search, holder);
    return;
  }
  if (item.kind === 'pouch') {
    for (const holder of racksInOrder(search)) yield* inSlots(search, holder);
    return;
  }
  const shelves = shelvesInOrder(search);
  for (const shelf of shelves) yield* onShelf(search, shelf);
  for (const shelf of shelves) yield* onTop(search, shelf);
}

function racksInOrder({ layout, item, policy, within }: PlaceSearch): readonly HolderBody[] {
  const gapMm = limitOf(item.clearanceMm, policy, 'pouchGapMm').limit;
  const usable = layout.holders.filter(
    ({ shelf }) => shelf.isUsable && (within?.kind !== 'shelf' || within.shelfId === shelf.id),
  );
  const byKind = racksFor(item, usable, gapMm);
  const kinds = [...new Set(byKind.map((holder) => holder.kind))];
  const inside = new Map(byKind.map((holder) => [holder, insideOf(layout, holder.holder.holderId).length]));
  return [...byKind].sort(
    (a, b) =>
      kinds.indexOf(a.kind) - kinds.indexOf(b.kind) ||
      (inside.get(b) ?? 0) - (inside.get(a) ?? 0) ||
      b.shelf.level - a.shelf.level,
  );
}

function* inSlots({ layout, item, policy }: PlaceSearch, holder: HolderBody): Iterable<Suggestion> {
  const { holderId } = holder.holder;
  const why =
    holder.kind.code === item.preferredHolder
      ? 'This is the kind of holder it belongs in.'
      : 'It fits this holder, and none of its own kind has a slot left.';
  for (const slot of freeSlots(layout, holder, item, policy)) {
    const paper = paperForSlot({ layout, item, policy }, holder, slot);
    yield { placement: { at: 'slot', holderId, slot, pose: 'on-edge', paper }, why };
  }
}

function* inBasket({ layout, item, policy }: PlaceSearch, holder: HolderBody): Iterable<Suggestion> {
  const { acrossMm, alongMm } = holder.kind;
  const obstacles: Obstacle[] = [];
  for (const body of insideOf(layout, holder.holder.holderId)) {
    const { placement } = body;
    if (placement.at !== 'basket') continue;
    const size = footprintOf(body.item, placement.pose, placement.turn);
    const { xMm, yMm } = placement;
    const rect = { left: xMm, right: mm(xMm + size.widthMm), front: yMm, back: mm(yMm + size.depthMm) };
    obstacles.push({ rect, clearanceMm: clearanceOf(body, policy).limit });
  }
  const paper = item.kind !== 'pouch' ? null : item.pose === 'on-edge' ? 'left' : 'up';
  const spots = turnedSpots(item, (size) =>
    freeSpots({
      shelf: { widthMm: acrossMm, depthMm: alongMm },
      size,
      clearanceMm: clearanceMmOf(item, policy),
      marginAcrossMm: 0,
      marginAlongMm: 0,
      obstacles,
    }),
  );
  for (const { turn, xMm, yMm } of spots.slice(0, spotsPerShelf)) {
    const { holderId } = holder.holder;
    yield {
      placement: { at: 'basket', holderId, xMm, yMm, turn, pose: item.pose, paper },
      why: 'There is room in it.',
    };
  }
}

function shelvesInOrder({ layout, item, policy, within }: PlaceSearch): readonly ShelfLayout[] {
  const upward = layout.shelves.filter(({ shelf }) => {
    if (within?.kind === 'shelf' && within.shelfId !== shelf.id) return false;
    const carried = massOn(layout, shelf.id) + massOrNothing(item.massKg);
    return shelf.isUsable && carried <= shelf.greatestMassKg * (1 - policy.massMarginPercent / 100);
  });
  return item.kind === 'textile-pack' ? [...upward].reverse() : upward;
}

function massOn(layout: Layout, shelfId: string): number {
  const of = (masses: readonly number[]) => masses.reduce((sum, mass) => sum + massOrNothing(mass), 0);
  const bodies = layout.bodies.filter((body) => body.shelf.id === shelfId);
  const holders = layout.holders.filter((holder) => holder.shelf.id === shelfId);
  return of(bodies.map((body) => body.item.massKg)) + of(holders.map((holder) => holder.kind.massKg));
}

function* onShelf(search: PlaceSearch, on: ShelfLayout): Iterable<Suggestion> {
  const { view, layout, item, policy } = search;
  const { shelf } = on;
  const spots = turnedSpots(item, (size) => {
    if (size.heightMm + policy.headroomMm > shelf.clearHeightMm) return [];
    return freeSpots({
      shelf,
      size,
      clearanceMm: clearanceMmOf(item, policy),
      ...marginsOf(view, policy, shelf),
      obstacles: [...obstaclesOn(on, policy), ...metalAndTextiles(layout, item, policy, shelf.level)],
    });
  });
  const isDevice = item.kind === 'challenge-device';
  const { drainXMm, drainYMm } = view.sterilizer;
  const fromDrain = ({ xMm, yMm, size }: TurnedSpot) =>
    Math.hypot(xMm + size.widthMm / 2 - drainXMm, yMm + size.depthMm / 2 - drainYMm);
  const ordered = isDevice ? [...spots].sort((a, b) => fromDrain(a) - fromDrain(b)) : spots;
  const why = isDevice
    ? 'As near to the drain as there is room: the coldest place.'
    : item.kind === 'textile-pack'
      ? 'Textiles go above metal.'
      : 'Heavy and rigid things go low.';
  for (const { turn, xMm, yMm } of ordered.slice(0, spotsPerShelf)) {
    yield { placement: { at: 'shelf', shelfId: shelf.id, xMm, yMm, turn, pose: item.pose, paper: null }, why };
  }
}

function* onTop({ layout, item, policy }: PlaceSearch, { shelf, bodies }: ShelfLayout): Iterable<Suggestion> {
  if (item.standsOn.length === 0) return;
  for (const base of bodies) {
    const isTop = !layout.bodies.some((body) => body.below === base);
    if (base.holder || !isTop || !item.standsOn.includes(base.item.code)) continue;
    for (const turn of [0, 90] as const) {
      const size = footprintOf(item, item.pose, turn);
      const { left, right, front, back, top } = base.box;
      const isSteady = size.widthMm <= right - left && size.depthMm <= back - front;
      if (!isSteady || top + size.heightMm + policy.headroomMm > shelf.clearHeightMm) continue;
      yield {
        placement: {
          at: 'package',
          belowPackageId: base.packageId,
          xMm: mm((left + right - size.widthMm) / 2),
          yMm: mm((front + back - size.depthMm) / 2),
          turn,
          pose: item.pose,
          paper: null,
        },
        why: 'Its instructions for use let it stand there.',
      };
    }
  }
}

type Size = ReturnType<typeof footprintOf>;
type TurnedSpot = Spot & { readonly turn: Turn; readonly size: Size };

/** Free spots in both turns, best packed first: least deep into the shelf, then least far to the right. */
function turnedSpots(item: CatalogueItem, spotsFor: (size: Size) => readonly Spot[]): readonly TurnedSpot[] {
  const turns: readonly Turn[] = [0, 90];
  return turns
    .flatMap((turn) => {
      const size = footprintOf(item, item.pose, turn);
      return spotsFor(size).map((spot) => ({ ...spot, turn, size }));
    })
    .sort((a, b) => a.yMm + a.size.depthMm - (b.yMm + b.size.depthMm) || a.xMm - b.xMm || a.turn - b.turn);
}

export function clearanceMmOf(item: CatalogueItem, policy: LoadPolicy): number {
  return limitOf(item.clearanceMm, policy, item.kind === 'pouch' ? 'pouchGapMm' : 'packageClearanceMm').limit;
}

/** What is kept free along the sides of a shelf so that nothing comes too near to the chamber's walls. */
export function marginsOf(
  { sterilizer }: LoadView,
  policy: LoadPolicy,
  shelf: { readonly widthMm: number; readonly depthMm: number },
): { readonly marginAcrossMm: number; readonly marginAlongMm: number } {
  const margin = (chamberMm: number, shelfMm: number) =>
    Math.max(policy.wallClearanceMm - Math.max(chamberMm - shelfMm, 0) / 2, 0);
  return {
    marginAcrossMm: margin(sterilizer.chamberWidthMm, shelf.widthMm),
    marginAlongMm: margin(sterilizer.chamberDepthMm, shelf.depthMm),
  };
}

export function obstaclesOn({ bodies, holders }: ShelfLayout, policy: LoadPolicy): readonly Obstacle[] {
  return [
    ...holders
      .filter(({ kind }) => kind.form === 'rack' || kind.form === 'basket')
      .map((holder) => ({ rect: holder.box, clearanceMm: 0 })),
    ...bodies.map((body) => ({ rect: body.box, clearanceMm: clearanceOf(body, policy).limit })),
  ];
}

/** Seen from above, metal keeps off textiles on lower shelves, and textiles keep off metal on higher ones. */
function metalAndTextiles(layout: Layout, item: CatalogueItem, policy: LoadPolicy, level: number): readonly Obstacle[] {
  const isTextile = item.kind === 'textile-pack';
  const isMetal = !isTextile && item.metalMassKg >= policy.metalOverTextileKg;
  const isInTheWay = (body: Body) =>
    (isMetal && body.item.kind === 'textile-pack' && body.shelf.level < level) ||
    (isTextile && body.item.kind !== 'textile-pack' && hasMetal(body, policy) && body.shelf.level > level);
  return layout.bodies.filter(isInTheWay).map((body) => ({ rect: body.box, clearanceMm: 0 }));
}
