import { footprintOf } from '../geometry/footprint';
import { findHolder, findHolderKind, findPackage, findShelf, nameOf, shelfIdOf } from './look-up';
import type { CatalogueItem, HolderKind, LoadHolder, LoadView, PaperSide, Placement, Pose } from './model';

/**
 * Where something is, in words: "Holder RS-1, slot 5", "Lower shelf, left, at the door". Left and right are as seen from
 * the door. Pass the item where it is known: then its middle decides about left and right, and not its corner.
 */
export function placeWords(view: LoadView, placement: Placement, item?: CatalogueItem): string {
  const base = baseWords(view, placement);
  const spot = spotWords(view, placement, item);
  return base === null ? capitalised(spot) : `${base}, ${spot}`;
}

/** The part of `placeWords` that says where on the shelf or in the holder: "slot 5", "left, at the door". */
export function spotWords(view: LoadView, placement: Placement, item?: CatalogueItem): string {
  switch (placement.at) {
    case 'slot':
      return `slot ${placement.slot}`;
    case 'basket': {
      const holder = findHolder(view, placement.holderId);
      const kind = holder && findHolderKind(view, holder);
      return kind ? thirdsWords(middleOf(placement, item), kind.acrossMm, kind.alongMm) : 'loose inside';
    }
    case 'shelf': {
      const shelf = findShelf(view, placement.shelfId);
      return shelf
        ? thirdsWords(middleOf(placement, item), shelf.widthMm, shelf.depthMm)
        : 'on a shelf of another cart';
    }
    case 'package':
      return `on top of ${packageWords(view, placement.belowPackageId)}`;
  }
}

function baseWords(view: LoadView, placement: Placement): string | null {
  if (placement.at === 'slot' || placement.at === 'basket') {
    const holder = findHolder(view, placement.holderId);
    return holder ? holderWords(holder, findHolderKind(view, holder)) : 'A holder that is not on this cart';
  }
  return findShelf(view, shelfIdOf(view, placement) ?? '')?.name ?? null;
}

/** Place and facing in one line, as read out after a scan: "Holder RS-1, slot 5, paper side left". */
export function placementWords(view: LoadView, placement: Placement, item?: CatalogueItem): string {
  const place = placeWords(view, placement, item);
  if (placement.paper !== null) return `${place}, ${paperWords(placement.paper).toLowerCase()}`;
  return placement.pose === 'flat' ? place : `${place}, ${poseWords(placement.pose)}`;
}

export function paperWords(paper: PaperSide): string {
  return `Paper side ${paper}`;
}

export function poseWords(pose: Pose): string {
  const words = { flat: 'flat', 'on-edge': 'on edge', tilted: 'tilted to drain' } as const;
  return words[pose];
}

/** "Holder RS-1", "Basket TB-2": the kind of thing before its name, unless the name says it already. */
export function holderWords(holder: Pick<LoadHolder, 'name'>, kind: HolderKind | undefined): string {
  const noun = { rack: 'Holder', basket: 'Basket', wedge: 'Wedge', spacer: 'Spacer' }[kind?.form ?? 'rack'];
  return /^(holder|rack|basket|wedge|spacer)\b/i.test(holder.name) ? holder.name : `${noun} ${holder.name}`;
}

/** Where a holder stands on its shelf: "left, at the door". */
export function holderSpotWords(view: LoadView, holder: LoadHolder): string {
  const shelf = findShelf(view, holder.shelfId);
  const kind = findHolderKind(view, holder);
  if (!shelf || !kind) return 'on a shelf of another cart';
  const [widthMm, depthMm] = holder.turn === 0 ? [kind.acrossMm, kind.alongMm] : [kind.alongMm, kind.acrossMm];
  return thirdsWords({ xMm: holder.xMm + widthMm / 2, yMm: holder.yMm + depthMm / 2 }, shelf.widthMm, shelf.depthMm);
}

type Point = { readonly xMm: number; readonly yMm: number };

function middleOf(placement: Exclude<Placement, { at: 'slot' }>, item: CatalogueItem | undefined): Point {
  if (!item) return placement;
  const size = footprintOf(item, placement.pose, placement.turn);
  return { xMm: placement.xMm + size.widthMm / 2, yMm: placement.yMm + size.depthMm / 2 };
}

function thirdsWords(at: Point, widthMm: number, depthMm: number): string {
  const third = (middle: number, length: number) => (middle < length / 3 ? 0 : middle > (length * 2) / 3 ? 2 : 1);
  const across = third(at.xMm, widthMm);
  const along = third(at.yMm, depthMm);
  if (across === 1 && along === 1) return 'in the middle';
  return `${['left', 'middle', 'right'][across] ?? ''}, ${['at the door', 'halfway in', 'at the back'][along] ?? ''}`;
}

function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** The name of what an item is on this load, or the code of a package whose catalogue entry is missing. */
export function packageWords(view: LoadView, packageId: string): string {
  const one = findPackage(view, packageId);
  return one ? nameOf(view, one) : 'a package that is not on this load';
}
