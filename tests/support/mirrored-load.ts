import { footprintOf } from '#domain/geometry/footprint';
import type { CatalogueItem, HolderKind, LoadPackage, LoadView, PaperSide, Placement } from '#domain/load/model';
import { mm } from '#domain/units/quantity';

/*
 * The whole cart as in a mirror standing to its right: left is right, and everything else stays. Written from the frames in
 * the model and not from the code that lays a cart out. Filters have to lie symmetrically on their lid.
 */
export function mirrored(view: LoadView): LoadView {
  const widest = Math.max(...view.cart.shelves.map((shelf) => shelf.widthMm));
  const { sterilizer } = view;
  return {
    ...view,
    sterilizer: { ...sterilizer, drainXMm: mm(widest - sterilizer.drainXMm) },
    holders: view.holders.map((holder) => {
      const kind = kindOf(view, holder.kindId);
      const width = holder.turn === 0 ? kind.acrossMm : kind.alongMm;
      const shelf = view.cart.shelves.find((one) => one.id === holder.shelfId);
      return { ...holder, xMm: mm((shelf?.widthMm ?? widest) - holder.xMm - width) };
    }),
    packages: view.packages.map((one) => ({
      ...one,
      placement: one.placement && placementOf(view, one, one.placement),
    })),
  };
}

function placementOf(view: LoadView, one: LoadPackage, placement: Placement): Placement {
  const item = view.items.find((each) => each.id === one.itemId);
  if (!item) return placement;
  switch (placement.at) {
    case 'shelf':
    case 'package': {
      const { widthMm } = footprintOf(item, placement.pose, placement.turn);
      const paper = paperOf(item, placement.paper, placement.turn === 0);
      // All shelves of the carts in these tests are equally wide.
      const shelfWidth = view.cart.shelves[0]?.widthMm ?? 0;
      return { ...placement, xMm: mm(shelfWidth - placement.xMm - widthMm), paper };
    }
    case 'slot': {
      const holder = view.holders.find((each) => each.holderId === placement.holderId);
      const slots = holder ? (kindOf(view, holder.kindId).slots ?? 0) : 0;
      if (holder?.turn !== 0) return placement;
      return { ...placement, slot: slots + 1 - placement.slot, paper: paperOf(item, placement.paper, true) };
    }
    case 'basket': {
      const holder = view.holders.find((each) => each.holderId === placement.holderId);
      if (!holder) return placement;
      const kind = kindOf(view, holder.kindId);
      const { widthMm, depthMm } = footprintOf(item, placement.pose, placement.turn);
      const paper = paperOf(item, placement.paper, placement.turn === holder.turn);
      return holder.turn === 0
        ? { ...placement, xMm: mm(kind.acrossMm - placement.xMm - widthMm), paper }
        : { ...placement, yMm: mm(kind.alongMm - placement.yMm - depthMm), paper };
    }
  }
}

function paperOf(item: CatalogueItem, paper: PaperSide | null, isAcross: boolean): PaperSide | null {
  if (item.kind !== 'pouch' || !isAcross) return paper;
  if (paper === 'left') return 'right';
  return paper === 'right' ? 'left' : paper;
}

function kindOf(view: LoadView, kindId: string): HolderKind {
  const kind = view.holderKinds.find((each) => each.id === kindId);
  if (!kind) throw new Error(`No holder kind ${kindId}`);
  return kind;
}
