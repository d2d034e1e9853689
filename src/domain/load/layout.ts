import { boxAt, rectAt, type ShelfBox, type ShelfRect } from '../geometry/box';
import { footprintOf, type Footprint } from '../geometry/footprint';
import { mm } from '../units/quantity';
import type {
  CatalogueItem,
  FilterZone,
  HolderKind,
  LoadHolder,
  LoadPackage,
  LoadView,
  PaperSide,
  Placement,
  Pose,
  Shelf,
} from './model';
import { isSensibleLength, isSensiblePosition } from './sensible';

/** A direction in the shelf frame: left is towards x = 0, front is towards the door. */
export type Side = 'left' | 'right' | 'front' | 'back' | 'up' | 'down';

/** A holder in its place. */
export type HolderBody = {
  readonly holder: LoadHolder;
  readonly kind: HolderKind;
  readonly shelf: Shelf;
  readonly box: ShelfBox;
};

/** A package in its place, as a box in the frame of the shelf it is on. */
export type Body = {
  readonly packageId: string;
  readonly package: LoadPackage;
  readonly item: CatalogueItem;
  readonly placement: Placement;
  readonly shelf: Shelf;
  readonly box: ShelfBox;
  /** The rack or basket it is in. */
  readonly holder: HolderBody | null;
  /** Of a rack, counted from 1. */
  readonly slot: number | null;
  /** What it stands on. */
  readonly below: Body | null;
  /** Where the paper side of a pouch looks; null where nobody said. */
  readonly paperLooks: Side | null;
  /** The axis its long side lies along. */
  readonly lengthAxis: 'x' | 'y';
  /** The axis across the faces of a pouch on edge; null for everything else. */
  readonly thinAxis: 'x' | 'y' | null;
};

export type WhyNowhere =
  | 'not-placed'
  | 'shelf-not-here'
  | 'holder-not-here'
  | 'not-a-basket'
  | 'holder-without-slots'
  | 'no-such-slot'
  | 'nothing-below'
  | 'circular'
  /** What it stands on has no place itself; the finding is about that one. */
  | 'base-is-nowhere'
  | 'item-not-known'
  | 'size-makes-no-sense'
  | 'position-makes-no-sense';

export type ShelfLayout = {
  readonly shelf: Shelf;
  readonly bodies: readonly Body[];
  readonly holders: readonly HolderBody[];
};

export type Layout = {
  /** Every package of the list once, sorted by id, placed or not. */
  readonly packages: readonly LoadPackage[];
  /** Sorted by package id, so that nothing depends on the order of scanning. */
  readonly bodies: readonly Body[];
  readonly holders: readonly HolderBody[];
  /** From the lowest up. */
  readonly shelves: readonly ShelfLayout[];
  readonly bodyOf: ReadonlyMap<string, Body>;
  readonly holderOf: ReadonlyMap<string, HolderBody>;
  /** Packages that cannot be drawn, and why. */
  readonly nowhere: ReadonlyMap<string, WhyNowhere>;
};

/** How high a holder is drawn whose kind does not say. Ours, no source. */
const drawnHolderHeightMm = 60;

/**
 * Where everything stands, in millimetres: the drawn cart, the rules and the suggestions all read from here.
 *
 * A pouch in a rack is centred on its slot and along the holder; a thing on another one starts at its top. What cannot be
 * placed (no such shelf, a stack that runs in a circle, a size that is no number) is listed instead of drawn.
 *
 * @param before where things stood a moment ago: what has not changed since is the very same object again, down to the
 *   shelf with all that is on it, so that whoever looked at it before need not look again.
 */
export function layOut(view: LoadView, before?: Layout): Layout {
  const shelfOf = firstById(view.cart.shelves, (shelf) => shelf.id);
  const kindOf = firstById(view.holderKinds, (kind) => kind.id);
  const itemOf = firstById(view.items, (item) => item.id);
  const packageOf = firstById(view.packages, (one) => one.packageId);

  const holderOf = new Map<string, HolderBody>();
  for (const holder of sortedById(view.holders, (one) => one.holderId)) {
    const kind = kindOf.get(holder.kindId);
    const shelf = shelfOf.get(holder.shelfId);
    if (kind && shelf && !holderOf.has(holder.holderId) && isDrawable(holder, kind)) {
      const old = before?.holderOf.get(holder.holderId);
      const isSame = old?.holder === holder && old.kind === kind && old.shelf === shelf;
      holderOf.set(holder.holderId, isSame ? old : { holder, kind, shelf, box: holderBox(holder, kind) });
    }
  }

  const bodyOf = new Map<string, Body>();
  const nowhere = new Map<string, WhyNowhere>();
  const settle = (one: LoadPackage) => {
    const answer = bodyFor(one);
    if (typeof answer === 'string') nowhere.set(one.packageId, answer);
    else bodyOf.set(one.packageId, answer);
  };

  const bodyFor = (one: LoadPackage): Body | WhyNowhere => {
    const { placement } = one;
    const item = itemOf.get(one.itemId);
    if (placement === null) return 'not-placed';
    if (!item) return 'item-not-known';
    const old = before?.bodyOf.get(one.packageId);
    if (old?.package === one && old.item === item && standsAsBefore(old)) return old;
    if (![item.lengthMm, item.widthMm, item.heightMm].every(isSensibleLength)) return 'size-makes-no-sense';
    if (placement.at === 'slot') {
      const holder = holderOf.get(placement.holderId);
      return holder ? inSlot(one, item, placement, holder) : 'holder-not-here';
    }
    if (!isSensiblePosition(placement.xMm) || !isSensiblePosition(placement.yMm)) return 'position-makes-no-sense';
    if (placement.at === 'basket') {
      const holder = holderOf.get(placement.holderId);
      if (!holder) return 'holder-not-here';
      return holder.kind.form === 'basket' ? inBasket(one, item, placement, holder) : 'not-a-basket';
    }
    const size = footprintOf(item, placement.pose, placement.turn);
    const quarters = placement.turn / 90;
    if (placement.at === 'shelf') {
      const shelf = shelfOf.get(placement.shelfId);
      if (!shelf) return 'shelf-not-here';
      const box = boxAt({ x: placement.xMm, y: placement.yMm, z: 0 }, size);
      return bodyIn({ one, item, placement, shelf, box, quarters });
    }
    if (!packageOf.has(placement.belowPackageId)) return 'nothing-below';
    const below = bodyOf.get(placement.belowPackageId);
    if (!below) return 'base-is-nowhere';
    const box = boxAt({ x: placement.xMm, y: placement.yMm, z: below.box.top }, size);
    return bodyIn({ one, item, placement, shelf: below.shelf, box, quarters, below });
  };

  function standsAsBefore({ placement, shelf, holder, below }: Body): boolean {
    if (placement.at === 'shelf') return shelfOf.get(placement.shelfId) === shelf;
    if (placement.at === 'package') return below !== null && bodyOf.get(placement.belowPackageId) === below;
    return holder !== null && holderOf.get(placement.holderId) === holder;
  }

  const isSettled = (packageId: string) => bodyOf.has(packageId) || nowhere.has(packageId);
  const packages = inOrder(packageOf, before?.packages ?? []);
  for (const one of packages) {
    // Down the stack and then up again, without recursion: a stack may be as high as the data say.
    const stack = new Map<string, LoadPackage>();
    let lower: LoadPackage | undefined = one;
    while (lower && !isSettled(lower.packageId) && !stack.has(lower.packageId)) {
      stack.set(lower.packageId, lower);
      lower = lower.placement?.at === 'package' ? packageOf.get(lower.placement.belowPackageId) : undefined;
    }
    const members = [...stack.values()];
    if (lower && stack.has(lower.packageId)) {
      const circle = members.splice(members.indexOf(lower));
      for (const member of circle) nowhere.set(member.packageId, 'circular');
    }
    for (const member of members.reverse()) settle(member);
  }

  const bodies: Body[] = [];
  const bodiesOn = new Map<Shelf, Body[]>();
  for (const one of packages) {
    const body = bodyOf.get(one.packageId);
    if (!body) continue;
    bodies.push(body);
    const others = bodiesOn.get(body.shelf);
    if (others) others.push(body);
    else bodiesOn.set(body.shelf, [body]);
  }
  const holders = [...holderOf.values()];
  const shelves = sortedById(shelfOf.values(), (shelf) => shelf.id)
    .sort((a, b) => a.level - b.level)
    .map((shelf): ShelfLayout => {
      const now = {
        shelf,
        bodies: bodiesOn.get(shelf) ?? [],
        holders: holders.filter((holder) => holder.shelf === shelf),
      };
      const old = before?.shelves.find((one) => one.shelf === shelf);
      return old && isSameList(old.bodies, now.bodies) && isSameList(old.holders, now.holders) ? old : now;
    });
  return { packages, bodies, holders, shelves, bodyOf, holderOf, nowhere };
}

/** Sorted by id. A list that was in order a moment ago is nearly so still, and nearly sorted is quick to sort. */
function inOrder(packageOf: ReadonlyMap<string, LoadPackage>, before: readonly LoadPackage[]): readonly LoadPackage[] {
  const left = new Map(packageOf);
  const packages: LoadPackage[] = [];
  for (const { packageId } of before) {
    const one = left.get(packageId);
    if (!one) continue;
    packages.push(one);
    left.delete(packageId);
  }
  packages.push(...left.values());
  return packages.sort((a, b) => (a.packageId < b.packageId ? -1 : 1));
}

function isSameList<Value>(a: readonly Value[], b: readonly Value[]): boolean {
  return a.length === b.length && a.every((value, index) => value === b[index]);
}

/** The direction the film side of a pouch looks: away from its paper side. */
export function filmLooks(body: Body): Side | null {
  return body.paperLooks === null ? null : opposite[body.paperLooks];
}

/**
 * The open filters of a rigid container as they lie on the shelf. In the item frame x runs along the length; turned so that
 * the length is across, both frames look the same way, and with the length away from the door it is a quarter turn to the left.
 */
export function filterRects(body: Body, face: FilterZone['face']): readonly ShelfRect[] {
  if (body.placement.pose !== 'flat') return [];
  const { left, front, right } = body.box;
  return body.item.filterZones
    .filter((zone) => zone.face === face && [zone.xMm, zone.yMm, zone.lengthMm, zone.widthMm].every(Number.isFinite))
    .map((zone) =>
      body.lengthAxis === 'x'
        ? rectAt({ x: left + zone.xMm, y: front + zone.yMm }, { widthMm: zone.lengthMm, depthMm: zone.widthMm })
        : rectAt(
            { x: right - zone.yMm - zone.widthMm, y: front + zone.xMm },
            { widthMm: zone.widthMm, depthMm: zone.lengthMm },
          ),
    );
}

/** Where the middle of a rack's slot lies across the holder, in mm from its left. */
export function slotMiddle(kind: HolderKind, slot: number): number {
  const pitch = kind.pitchMm ?? 0;
  return (kind.acrossMm - (kind.slots ?? 0) * pitch) / 2 + (slot - 0.5) * pitch;
}

function inSlot(
  one: LoadPackage,
  item: CatalogueItem,
  placement: Extract<Placement, { at: 'slot' }>,
  holder: HolderBody,
): Body | WhyNowhere {
  const { kind, box: frame, shelf } = holder;
  const { slots, pitchMm } = kind;
  if (slots === null || pitchMm === null || !(slots > 0) || !isSensibleLength(pitchMm)) return 'holder-without-slots';
  const { slot, pose } = placement;
  if (!Number.isInteger(slot) || slot < 1 || slot > slots) return 'no-such-slot';
  const { turn } = holder.holder;
  const size = footprintOf(item, pose, turn);
  const [across, along] = turn === 0 ? [size.widthMm, size.depthMm] : [size.depthMm, size.widthMm];
  const acrossFrom = slotMiddle(kind, slot) - across / 2;
  const alongFrom = (kind.alongMm - along) / 2;
  const corner =
    turn === 0
      ? { x: frame.left + acrossFrom, y: frame.front + alongFrom, z: 0 }
      : { x: frame.left + alongFrom, y: frame.front + acrossFrom, z: 0 };
  return bodyIn({ one, item, placement, shelf, box: boxAt(corner, size), quarters: turn / 90, holder, slot });
}

/** The basket's frame turns with the basket: a quarter turn to the left, as seen from above. */
function inBasket(
  one: LoadPackage,
  item: CatalogueItem,
  placement: Extract<Placement, { at: 'basket' }>,
  holder: HolderBody,
): Body {
  const { kind, box: frame, shelf } = holder;
  const inFrame = footprintOf(item, placement.pose, placement.turn);
  const isTurned = holder.holder.turn === 90;
  const size: Footprint = isTurned ? { ...inFrame, widthMm: inFrame.depthMm, depthMm: inFrame.widthMm } : inFrame;
  const corner = isTurned
    ? { x: frame.left + kind.alongMm - placement.yMm - inFrame.depthMm, y: frame.front + placement.xMm, z: 0 }
    : { x: frame.left + placement.xMm, y: frame.front + placement.yMm, z: 0 };
  const quarters = placement.turn / 90 + holder.holder.turn / 90;
  return bodyIn({ one, item, placement, shelf, box: boxAt(corner, size), quarters, holder });
}

type Placed = {
  readonly one: LoadPackage;
  readonly item: CatalogueItem;
  readonly placement: Placement;
  readonly shelf: Shelf;
  readonly box: ShelfBox;
  /** Quarter turns to the left, as seen from above. */
  readonly quarters: number;
  readonly holder?: HolderBody;
  readonly slot?: number;
  readonly below?: Body;
};

function bodyIn({ one, item, placement, shelf, box, quarters, holder, slot, below }: Placed): Body {
  const isUpright = item.kind === 'pouch' && placement.pose === 'on-edge';
  const [lengthAxis, crossAxis] = quarters % 2 === 0 ? (['y', 'x'] as const) : (['x', 'y'] as const);
  return {
    packageId: one.packageId,
    package: one,
    item,
    placement,
    shelf,
    box,
    holder: holder ?? null,
    slot: slot ?? null,
    below: below ?? null,
    paperLooks: item.kind === 'pouch' ? paperLooks(placement.pose, placement.paper, quarters) : null,
    lengthAxis,
    thinAxis: isUpright ? crossAxis : null,
  };
}

const quarterTurn = ['left', 'front', 'right', 'back'] as const satisfies readonly Side[];

const opposite: Readonly<Record<Side, Side>> = {
  left: 'right',
  right: 'left',
  front: 'back',
  back: 'front',
  up: 'down',
  down: 'up',
};

/** Where the paper looks once the pouch has been turned to the left by so many quarters. */
function paperLooks(pose: Pose, paper: PaperSide | null, quarters: number): Side | null {
  if (pose !== 'on-edge') return paper === 'up' || paper === 'down' ? paper : null;
  if (paper !== 'left' && paper !== 'right') return null;
  return quarterTurn[((paper === 'left' ? 0 : 2) + quarters) % 4] ?? null;
}

function isDrawable(holder: LoadHolder, kind: HolderKind): boolean {
  const isPlaced = isSensiblePosition(holder.xMm) && isSensiblePosition(holder.yMm);
  return isPlaced && isSensibleLength(kind.acrossMm) && isSensibleLength(kind.alongMm);
}

function holderBox(holder: LoadHolder, kind: HolderKind): ShelfBox {
  const [widthMm, depthMm] = holder.turn === 0 ? [kind.acrossMm, kind.alongMm] : [kind.alongMm, kind.acrossMm];
  const { greatestHeightMm } = kind;
  const heightMm =
    greatestHeightMm !== null && isSensibleLength(greatestHeightMm) ? greatestHeightMm : drawnHolderHeightMm;
  return boxAt({ x: holder.xMm, y: holder.yMm, z: 0 }, { widthMm, depthMm, heightMm: mm(heightMm) });
}

function firstById<Value>(values: readonly Value[], id: (value: Value) => string): ReadonlyMap<string, Value> {
  const map = new Map<string, Value>();
  for (const value of values) if (!map.has(id(value))) map.set(id(value), value);
  return map;
}

function sortedById<Value>(values: Iterable<Value>, id: (value: Value) => string): Value[] {
  return [...values].sort((a, b) => (id(a) < id(b) ? -1 : id(a) > id(b) ? 1 : 0));
}
