import { footprintOf } from '../geometry/footprint';
import { accept, refuse, type Result } from '../result';
import { mm } from '../units/quantity';
import type { LoadEdit } from './finding';
import {
  findHolder,
  findHolderKind,
  findItem,
  findPackage,
  findShelf,
  hasPaperSide,
  idsAbove,
  nameOf,
  paperSidesOf,
  shelfIdOf,
} from './look-up';
import type { CatalogueItem, LoadHolder, LoadPackage, LoadView, PaperSide, Placement, Pose, Turn } from './model';

export type EditRefusal =
  | 'load.package-not-here'
  | 'load.package-not-scanned'
  | 'load.package-not-placed'
  | 'load.shelf-not-here'
  | 'load.holder-not-here'
  | 'load.no-such-slot'
  | 'load.not-a-basket'
  | 'load.stands-on-itself'
  | 'load.nothing-to-stand-on'
  | 'load.no-paper-side'
  | 'load.paper-side-not-possible'
  | 'load.program-not-qualified';

/** A holder of the facility that is free to be put on this cart. */
export type SpareHolder = Pick<LoadHolder, 'holderId' | 'name' | 'placeCode' | 'kindId'>;

/**
 * One change of a load, or a plain sentence why it cannot be. It refuses only what makes no sense (an unknown package, a
 * package standing on itself); what is merely wrong is taken, for the rules to find.
 *
 * Nothing is ever lost: what stands on a package moves with it where it can, and otherwise, as when its base is taken off
 * or put into a holder, it keeps its scan and has no place until somebody gives it one. Taking a holder off leaves its
 * pouches without a place in the same way. Taking a package off takes it off the list too: it goes back to the staged
 * ones. Counts of shelves whose contents changed are void and gone.
 * @param spare holders not yet on this cart that a place-holder edit may put on it.
 */
export function applyEdit(
  view: LoadView,
  edit: LoadEdit,
  spare: readonly SpareHolder[] = [],
): Result<LoadView, EditRefusal> {
  return applyEdits(view, [edit], spare);
}

/**
 * All of the edits, one after the other, or none of them and the sentence of the first that cannot be. Counts are void
 * where the contents of a shelf differ at the end, not where they differed on the way.
 */
export function applyEdits(
  view: LoadView,
  edits: readonly LoadEdit[],
  spare: readonly SpareHolder[] = [],
): Result<LoadView, EditRefusal> {
  let after = view;
  for (const edit of edits) {
    const result = change(after, edit, spare);
    if (!result.ok) return result;
    after = result.value;
  }
  return accept(withoutVoidCounts(view, after));
}

/** Shelves that hold other packages than before: what was counted there says nothing any more. */
export function affectedShelves(before: LoadView, after: LoadView): readonly string[] {
  const contents = (view: LoadView) => {
    const byShelf = new Map<string, string[]>();
    for (const one of view.packages) {
      const shelfId = shelfIdOf(view, one.placement);
      if (shelfId !== undefined) byShelf.set(shelfId, [...(byShelf.get(shelfId) ?? []), one.packageId]);
    }
    return byShelf;
  };
  const [was, is] = [contents(before), contents(after)];
  return [...new Set([...before.cart.shelves, ...after.cart.shelves].map((shelf) => shelf.id))].filter(
    (shelfId) => (was.get(shelfId) ?? []).sort().join() !== (is.get(shelfId) ?? []).sort().join(),
  );
}

/** The load without the counts that are void since it was as `before` shows. */
export function withoutVoidCounts(before: LoadView, after: LoadView): LoadView {
  const isVoid = new Set(affectedShelves(before, after));
  const counts = after.counts.filter((count) => !isVoid.has(count.shelfId));
  return counts.length === after.counts.length ? after : { ...after, counts };
}

function change(view: LoadView, edit: LoadEdit, spare: readonly SpareHolder[]): Result<LoadView, EditRefusal> {
  switch (edit.edit) {
    case 'place':
      return place(view, edit.packageId, edit.placement);
    case 'turn-paper':
      return turnPaper(view, edit.packageId, edit.paper);
    case 'set-pose':
      return setPose(view, edit.packageId, edit.pose);
    case 'take-off':
      return takeOff(view, edit.packageId);
    case 'place-holder':
      return placeHolder(view, edit, spare);
    case 'take-holder-off':
      return takeHolderOff(view, edit.holderId);
    case 'change-program': {
      const program = view.qualifiedPrograms.find((one) => one.id === edit.programId);
      if (program) return accept({ ...view, program });
      return refuse('load.program-not-qualified', `${view.sterilizer.name} is not qualified for that program.`);
    }
  }
}

function place(view: LoadView, packageId: string, wanted: Placement): Result<LoadView, EditRefusal> {
  const moving = findScanned(view, packageId);
  if (!moving.ok) return moving;
  const one = moving.value;
  const refusal = refusePlacement(view, one, wanted);
  if (refusal) return refusal;

  const item = findItem(view, one.itemId);
  const placement = {
    ...wanted,
    paper: hasPaperSide(item) && wanted.paper !== null ? paperAfterTipping(wanted.paper, wanted.pose) : null,
  };
  const above = idsAbove(view, [packageId]);
  const from = one.placement;
  const carried =
    item && from && isInShelfFrame(from) && isInShelfFrame(placement)
      ? carry(view, above, frameOf(from, item), frameOf(placement, item))
      : unplace(view, above);
  return accept(withPackage(carried, { ...one, placement }));
}

function refusePlacement(view: LoadView, one: LoadPackage, wanted: Placement) {
  const name = nameOf(view, one);
  switch (wanted.at) {
    case 'shelf':
      if (findShelf(view, wanted.shelfId)) return null;
      return refuse('load.shelf-not-here', 'That shelf is not on this cart.');
    case 'slot':
      if (!findHolder(view, wanted.holderId)) return refuseHolder();
      if (Number.isInteger(wanted.slot) && wanted.slot >= 1) return null;
      return refuse('load.no-such-slot', 'Slots are counted from 1.');
    case 'basket': {
      const holder = findHolder(view, wanted.holderId);
      if (!holder) return refuseHolder();
      if (findHolderKind(view, holder)?.form === 'basket') return null;
      return refuse('load.not-a-basket', `${holder.name} is not a basket. Say which slot.`);
    }
    case 'package': {
      if (wanted.belowPackageId === one.packageId) {
        return refuse('load.stands-on-itself', `${name} cannot stand on itself.`);
      }
      const below = findPackage(view, wanted.belowPackageId);
      if (!below) return refuse('load.package-not-here', 'The package to stand it on is not on this load.');
      if (idsAbove(view, [one.packageId]).has(below.packageId)) {
        return refuse('load.stands-on-itself', `${nameOf(view, below)} already stands on ${name}.`);
      }
      if (below.placement) return null;
      return refuse('load.nothing-to-stand-on', `${nameOf(view, below)} has no place yet. Place it first.`);
    }
  }
}

function turnPaper(view: LoadView, packageId: string, paper: PaperSide): Result<LoadView, EditRefusal> {
  const found = findPlaced(view, packageId);
  if (!found.ok) return found;
  const { one, placement } = found.value;
  const name = nameOf(view, one);
  if (!hasPaperSide(findItem(view, one.itemId))) {
    return refuse('load.no-paper-side', `${name} has no paper side to turn.`);
  }
  if (!paperSidesOf(placement.pose).includes(paper)) {
    const sentence =
      placement.pose === 'on-edge'
        ? `${name} stands on edge: its paper side looks left or right.`
        : `${name} lies flat: its paper side looks up or down.`;
    return refuse('load.paper-side-not-possible', sentence);
  }
  return accept(withPackage(view, { ...one, placement: { ...placement, paper } }));
}

function setPose(view: LoadView, packageId: string, pose: Pose): Result<LoadView, EditRefusal> {
  const found = findPlaced(view, packageId);
  if (!found.ok) return found;
  const { one, placement } = found.value;
  const paper = placement.paper === null ? null : paperAfterTipping(placement.paper, pose);
  return accept(withPackage(view, { ...one, placement: { ...placement, pose, paper } }));
}

/**
 * Where the paper side looks after a pouch is laid down or stood up. It is taken to tip to the right, so that its left
 * face becomes the upper one, and to be stood up the same way back: never unknown, and undone by the opposite act.
 */
function paperAfterTipping(paper: PaperSide, pose: Pose): PaperSide {
  if (paperSidesOf(pose).includes(paper)) return paper;
  const tipped = { left: 'up', right: 'down', up: 'left', down: 'right' } as const;
  return tipped[paper];
}

function takeOff(view: LoadView, packageId: string): Result<LoadView, EditRefusal> {
  if (!findPackage(view, packageId)) return refusePackage();
  const after = unplace(view, idsAbove(view, [packageId]));
  return accept({ ...after, packages: after.packages.filter((one) => one.packageId !== packageId) });
}

function placeHolder(
  view: LoadView,
  edit: Extract<LoadEdit, { edit: 'place-holder' }>,
  spare: readonly SpareHolder[],
): Result<LoadView, EditRefusal> {
  if (!findShelf(view, edit.shelfId)) return refuse('load.shelf-not-here', 'That shelf is not on this cart.');
  const before = findHolder(view, edit.holderId);
  const known = before ?? spare.find((one) => one.holderId === edit.holderId);
  const kind = known && findHolderKind(view, known);
  if (!known || !kind) return refuseHolder();
  const { holderId, name, placeCode, kindId } = known;
  const { shelfId, xMm, yMm, turn } = edit;
  const after: LoadHolder = { holderId, name, placeCode, kindId, shelfId, xMm, yMm, turn };
  if (!before) return accept({ ...view, holders: [...view.holders, after] });
  const frame = ({ xMm: x, yMm: y, turn: t }: LoadHolder): Frame => {
    const [widthMm, depthMm] = t === 0 ? [kind.acrossMm, kind.alongMm] : [kind.alongMm, kind.acrossMm];
    return { xMm: x, yMm: y, turn: t, widthMm, depthMm };
  };
  const carried = carry(view, idsAbove(view, idsInHolder(view, holderId)), frame(before), frame(after));
  return accept({ ...carried, holders: view.holders.map((one) => (one.holderId === holderId ? after : one)) });
}

function takeHolderOff(view: LoadView, holderId: string): Result<LoadView, EditRefusal> {
  if (!findHolder(view, holderId)) return refuseHolder();
  const inside = idsInHolder(view, holderId);
  const after = unplace(view, new Set([...inside, ...idsAbove(view, inside)]));
  return accept({ ...after, holders: after.holders.filter((one) => one.holderId !== holderId) });
}

function idsInHolder(view: LoadView, holderId: string): readonly string[] {
  return view.packages
    .filter((one) => one.placement && 'holderId' in one.placement && one.placement.holderId === holderId)
    .map((one) => one.packageId);
}

type OnShelf = Extract<Placement, { at: 'shelf' | 'package' }>;

function isInShelfFrame(placement: Placement): placement is OnShelf {
  return placement.at === 'shelf' || placement.at === 'package';
}

/** The lower corner, the turn and the size, seen from above, of what carries something. */
type Frame = {
  readonly xMm: number;
  readonly yMm: number;
  readonly turn: Turn;
  readonly widthMm: number;
  readonly depthMm: number;
};

function frameOf({ xMm, yMm, turn, pose }: OnShelf, item: CatalogueItem): Frame {
  return { xMm, yMm, turn, ...footprintOf(item, pose, turn) };
}

/** Moves what stands on something as one piece with it, by a quarter turn as well where that was turned. */
function carry(view: LoadView, above: ReadonlySet<string>, from: Frame, to: Frame): LoadView {
  if (above.size === 0) return view;
  const packages = view.packages.map((one) => {
    if (!above.has(one.packageId) || one.placement?.at !== 'package') return one;
    const { placement } = one;
    const [dxMm, dyMm] = [placement.xMm - from.xMm, placement.yMm - from.yMm];
    if (from.turn === to.turn) {
      return { ...one, placement: { ...placement, xMm: mm(to.xMm + dxMm), yMm: mm(to.yMm + dyMm) } };
    }
    const item = findItem(view, one.itemId);
    const size = item ? footprintOf(item, placement.pose, placement.turn) : { widthMm: 0, depthMm: 0 };
    const turn: Turn = placement.turn === 0 ? 90 : 0;
    // From 0 to 90 it turns to the left seen from above, from 90 to 0 back to the right.
    const [xMm, yMm] =
      to.turn === 90 ? [from.depthMm - dyMm - size.depthMm, dxMm] : [dyMm, from.widthMm - dxMm - size.widthMm];
    return { ...one, placement: { ...placement, turn, xMm: mm(to.xMm + xMm), yMm: mm(to.yMm + yMm) } };
  });
  return { ...view, packages };
}

function unplace(view: LoadView, ids: ReadonlySet<string>): LoadView {
  if (ids.size === 0) return view;
  return {
    ...view,
    packages: view.packages.map((one) => (ids.has(one.packageId) ? { ...one, placement: null } : one)),
  };
}

function withPackage(view: LoadView, changed: LoadPackage): LoadView {
  return { ...view, packages: view.packages.map((one) => (one.packageId === changed.packageId ? changed : one)) };
}

function findScanned(view: LoadView, packageId: string): Result<LoadPackage, EditRefusal> {
  const one = findPackage(view, packageId);
  if (!one) return refusePackage();
  if (one.isScanned) return accept(one);
  return refuse('load.package-not-scanned', `${nameOf(view, one)} has not been scanned. Scan it, then place it.`);
}

function findPlaced(
  view: LoadView,
  packageId: string,
): Result<{ readonly one: LoadPackage; readonly placement: Placement }, EditRefusal> {
  const found = findScanned(view, packageId);
  if (!found.ok) return found;
  const { placement } = found.value;
  if (placement) return accept({ one: found.value, placement });
  return refuse('load.package-not-placed', `${nameOf(view, found.value)} has no place on the cart yet.`);
}

function refusePackage() {
  return refuse('load.package-not-here', 'That package is not on this load.');
}

function refuseHolder() {
  return refuse('load.holder-not-here', 'That holder is not on this cart.');
}
