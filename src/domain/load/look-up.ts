import type {
  CatalogueItem,
  HolderKind,
  LoadHolder,
  LoadPackage,
  LoadView,
  PaperSide,
  Placement,
  Pose,
  Shelf,
} from './model';

export function findPackage(view: LoadView, packageId: string): LoadPackage | undefined {
  return view.packages.find((one) => one.packageId === packageId);
}

export function findItem(view: LoadView, itemId: string): CatalogueItem | undefined {
  return view.items.find((item) => item.id === itemId);
}

export function findHolder(view: LoadView, holderId: string): LoadHolder | undefined {
  return view.holders.find((holder) => holder.holderId === holderId);
}

export function findHolderKind(view: LoadView, holder: { readonly kindId: string }): HolderKind | undefined {
  return view.holderKinds.find((kind) => kind.id === holder.kindId);
}

export function findShelf(view: LoadView, shelfId: string): Shelf | undefined {
  return view.cart.shelves.find((shelf) => shelf.id === shelfId);
}

/** Shelves from the lowest to the highest. */
export function shelvesUpward(view: LoadView): readonly Shelf[] {
  return [...view.cart.shelves].sort((a, b) => a.level - b.level);
}

/** What a person calls a package: its item's name, or its code where the catalogue entry is missing. */
export function nameOf(view: LoadView, one: { readonly itemId: string; readonly code: string }): string {
  return findItem(view, one.itemId)?.name ?? one.code;
}

/**
 * The shelf a placement comes down on, through holders and stacks. Undefined where the chain is broken or circular:
 * such data is a finding elsewhere, never a crash here.
 */
export function shelfIdOf(view: LoadView, placement: Placement | null): string | undefined {
  const seen = new Set<string>();
  let at = placement;
  while (at !== null) {
    if (at.at === 'shelf') return findShelf(view, at.shelfId)?.id;
    if (at.at !== 'package') return findHolder(view, at.holderId)?.shelfId;
    if (seen.has(at.belowPackageId)) return undefined;
    seen.add(at.belowPackageId);
    at = findPackage(view, at.belowPackageId)?.placement ?? null;
  }
  return undefined;
}

/** Ids of everything that stands on these packages, directly or further up. */
export function idsAbove(view: LoadView, packageIds: Iterable<string>): ReadonlySet<string> {
  const below = new Set(packageIds);
  const above = new Set<string>();
  let found = true;
  while (found) {
    found = false;
    for (const one of view.packages) {
      if (one.placement?.at !== 'package' || above.has(one.packageId)) continue;
      if (!below.has(one.placement.belowPackageId) && !above.has(one.placement.belowPackageId)) continue;
      above.add(one.packageId);
      found = true;
    }
  }
  return above;
}

export function hasPaperSide(item: CatalogueItem | undefined): boolean {
  return item?.kind === 'pouch';
}

/** Where the paper side of a pouch can look in a pose. */
export function paperSidesOf(pose: Pose): readonly PaperSide[] {
  return pose === 'on-edge' ? ['left', 'right'] : ['up', 'down'];
}
