import type {
  CatalogueItem,
  HolderKind,
  LoadHolder,
  LoadPackage,
  LoadView,
  Pose,
  Turn,
} from '../../../src/domain/load/model';

/*
 * Where things stand, worked out here from the frames that the model describes and from nothing of the rules: x to the right,
 * y away from the door, z up, in mm.
 */

export type Rect = {
  readonly left: number;
  readonly right: number;
  readonly front: number;
  readonly back: number;
};

export type Size = { readonly dx: number; readonly dy: number; readonly dz: number };

type Sized = Pick<CatalogueItem, 'lengthMm' | 'widthMm' | 'heightMm'>;

/** The wedges of the demonstration tilt by 15 degrees. */
const tilt = (15 * Math.PI) / 180;

/** On edge a thing stands on its long side; tilted it is raised along its short side. */
export function sizeOf(item: Sized, pose: Pose, turn: Turn): Size {
  const { lengthMm: long, widthMm: short, heightMm: thick } = item;
  const [across, dz] =
    pose === 'flat'
      ? [short, thick]
      : pose === 'on-edge'
        ? [thick, short]
        : [short * Math.cos(tilt) + thick * Math.sin(tilt), short * Math.sin(tilt) + thick * Math.cos(tilt)];
  return turn === 0 ? { dx: across, dy: long, dz } : { dx: long, dy: across, dz };
}

export function rectOf(x: number, y: number, { dx, dy }: Pick<Size, 'dx' | 'dy'>): Rect {
  return { left: x, right: x + dx, front: y, back: y + dy };
}

export function holderSize(kind: HolderKind, turn: Turn): Size {
  return turn === 0 ? { dx: kind.acrossMm, dy: kind.alongMm, dz: 0 } : { dx: kind.alongMm, dy: kind.acrossMm, dz: 0 };
}

/** The larger of the free ways between two rectangles along x and along y; below zero where they reach into each other. */
export function gapOf(one: Rect, other: Rect): number {
  const alongX = Math.max(one.left, other.left) - Math.min(one.right, other.right);
  const alongY = Math.max(one.front, other.front) - Math.min(one.back, other.back);
  return Math.max(alongX, alongY);
}

/** The shortest way between two rectangles; 0 where they touch or reach into each other. */
export function distanceOf(one: Rect, other: Rect): number {
  const alongX = Math.max(one.left, other.left) - Math.min(one.right, other.right);
  const alongY = Math.max(one.front, other.front) - Math.min(one.back, other.back);
  return Math.hypot(Math.max(alongX, 0), Math.max(alongY, 0));
}

/** Middle of a slot, measured across the holder from its edge: the slots stand in the middle of the frame. */
export function slotMiddle(kind: HolderKind, slot: number): number {
  const pitch = kind.pitchMm ?? 0;
  const slots = kind.slots ?? 0;
  return (kind.acrossMm - slots * pitch) / 2 + (slot - 0.5) * pitch;
}

export type Placed = {
  readonly one: LoadPackage;
  readonly item: CatalogueItem;
  readonly shelfId: string;
  readonly holder: LoadHolder | null;
  readonly rect: Rect;
  readonly bottom: number;
  readonly top: number;
};

export function itemOf(view: LoadView, one: LoadPackage): CatalogueItem {
  const item = view.items.find((each) => each.id === one.itemId);
  if (!item) throw new Error(`no item ${one.itemId}`);
  return item;
}

export function kindOf(view: LoadView, holder: LoadHolder): HolderKind {
  const kind = view.holderKinds.find((each) => each.id === holder.kindId);
  if (!kind) throw new Error(`no kind of holder ${holder.kindId}`);
  return kind;
}

/** Everything that has a place: what stands on itself, or on what has none, has none. */
export function placedOn(view: LoadView): readonly Placed[] {
  const items = new Map(view.items.map((item) => [item.id, item]));
  const holders = new Map(view.holders.map((holder) => [holder.holderId, holder]));
  const byId = new Map(view.packages.map((one) => [one.packageId, one]));
  const done = new Map<string, Placed>();
  const open = new Set<string>();

  function place(one: LoadPackage): Placed | null {
    const known = done.get(one.packageId);
    if (known) return known;
    const item = items.get(one.itemId);
    if (!item || one.placement === null || open.has(one.packageId)) return null;
    open.add(one.packageId);
    const placed = placeAt(one, item);
    open.delete(one.packageId);
    if (placed) done.set(one.packageId, placed);
    return placed;
  }

  function placeAt(one: LoadPackage, item: CatalogueItem): Placed | null {
    const at = one.placement;
    if (at === null) return null;
    if (at.at === 'shelf') {
      const size = sizeOf(item, at.pose, at.turn);
      return {
        one,
        item,
        shelfId: at.shelfId,
        holder: null,
        rect: rectOf(at.xMm, at.yMm, size),
        bottom: 0,
        top: size.dz,
      };
    }
    if (at.at === 'package') {
      const below = byId.get(at.belowPackageId);
      const base = below ? place(below) : null;
      if (!base) return null;
      const size = sizeOf(item, at.pose, at.turn);
      const rect = rectOf(at.xMm, at.yMm, size);
      return { one, item, shelfId: base.shelfId, holder: null, rect, bottom: base.top, top: base.top + size.dz };
    }
    const holder = holders.get(at.holderId);
    if (!holder) return null;
    const kind = kindOf(view, holder);
    if (at.at === 'slot') {
      const size = sizeOf(item, at.pose, 0);
      const across = slotMiddle(kind, at.slot) - size.dx / 2;
      const along = (kind.alongMm - size.dy) / 2;
      return {
        one,
        item,
        shelfId: holder.shelfId,
        holder,
        rect: inHolder(holder, across, along, size),
        bottom: 0,
        top: size.dz,
      };
    }
    const size = sizeOf(item, at.pose, at.turn);
    return {
      one,
      item,
      shelfId: holder.shelfId,
      holder,
      rect: inHolder(holder, at.xMm, at.yMm, size),
      bottom: 0,
      top: size.dz,
    };
  }

  return view.packages.map(place).filter((placed) => placed !== null);
}

function inHolder(holder: LoadHolder, across: number, along: number, size: Size): Rect {
  return holder.turn === 0
    ? rectOf(holder.xMm + across, holder.yMm + along, size)
    : rectOf(holder.xMm + along, holder.yMm + across, { dx: size.dy, dy: size.dx });
}

/** What stands on the deck of a shelf itself: holders, and packages that are in none. */
export function footprintsOn(view: LoadView, shelfId: string): readonly Rect[] {
  const holders = view.holders
    .filter((holder) => holder.shelfId === shelfId)
    .map((holder) => rectOf(holder.xMm, holder.yMm, holderSize(kindOf(view, holder), holder.turn)));
  const packages = placedOn(view)
    .filter((placed) => placed.shelfId === shelfId && placed.holder === null)
    .map((placed) => placed.rect);
  return [...holders, ...packages];
}

/**
 * How far a pouch on edge can fall, in degrees, before the thing beside it stops it: it turns about its lower edge until its
 * corner meets an upright face, or, where that face is lower, until it rests on that face's upper edge.
 */
export function leanDegrees(heightMm: number, thicknessMm: number, freeMm: number, stopHeightMm: number): number {
  if (freeMm <= 0) return 0;
  for (let angle = 0; angle < 90; angle += 0.05) {
    const radians = (angle * Math.PI) / 180;
    const reach = heightMm * Math.sin(radians) - thicknessMm * (1 - Math.cos(radians));
    if (heightMm * Math.cos(radians) <= stopHeightMm && reach >= freeMm) return angle;
    if (Math.tan(radians) * stopHeightMm >= freeMm && freeMm * freeMm + stopHeightMm * stopHeightMm <= heightMm ** 2) {
      return angle;
    }
  }
  return 90;
}
