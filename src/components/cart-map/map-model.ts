import type { Finding } from '#domain/load/finding';
import { slotMiddle, type Body, type HolderBody, type Layout } from '#domain/load/layout';
import { boxAt, type ShelfBox } from '#domain/geometry/box';
import { footprintOf } from '#domain/geometry/footprint';
import type { CatalogueItem, Placement } from '#domain/load/model';
import { labelBox, type PixelBox } from './glyphs';

/** A finding with the letter it has on the map, in the list and in the gate. */
export type LetteredFinding = { readonly letter: string; readonly finding: Finding };

/** Where the next package goes, as a box on its shelf. */
export type NextPlace = { readonly shelfId: string; readonly box: ShelfBox; readonly placement: Placement };

type Painted = { readonly body: Body; readonly box: PixelBox; readonly label: string | undefined };

/**
 * Puts its item's code to each thing, in the order of painting, but where something painted later lies over the letters:
 * half a code is worse than none, and what stands in front has its own.
 */
export function withFreeLabels(painted: readonly Body[], toPixels: (body: Body) => PixelBox): Painted[] {
  const boxes = painted.map(toPixels);
  return painted.map((body, index) => {
    const box = toPixels(body);
    const letters = labelBox(body.item.code, box);
    const isCovered = boxes.slice(index + 1).some((later) => isOver(later, letters));
    return { body, box, label: isCovered ? undefined : body.item.code };
  });
}

function isOver(one: PixelBox, other: PixelBox): boolean {
  return (
    one.x < other.x + other.width &&
    other.x < one.x + one.width &&
    one.y < other.y + other.height &&
    other.y < one.y + one.height
  );
}

/** A slot of a rack as the box a pouch of the given height and length would fill. */
export function slotBox(
  { kind, box, holder }: HolderBody,
  slot: number,
  size: { readonly thicknessMm: number; readonly lengthMm: number; readonly heightMm: number },
): ShelfBox {
  const across = slotMiddle(kind, slot) - size.thicknessMm / 2;
  const along = (kind.alongMm - size.lengthMm) / 2;
  return holder.turn === 0
    ? boxAt(
        { x: box.left + across, y: box.front + along, z: 0 },
        { widthMm: size.thicknessMm, depthMm: size.lengthMm, heightMm: size.heightMm },
      )
    : boxAt(
        { x: box.left + along, y: box.front + across, z: 0 },
        { widthMm: size.lengthMm, depthMm: size.thicknessMm, heightMm: size.heightMm },
      );
}

/** An empty slot, drawn as a leaf a little smaller than the rack takes. */
export function ghostSlotBox(holder: HolderBody, slot: number): ShelfBox {
  const { kind } = holder;
  return slotBox(holder, slot, {
    thicknessMm: Math.min(10, (kind.pitchMm ?? 20) * 0.4),
    lengthMm: kind.alongMm * 0.82,
    heightMm: (kind.greatestHeightMm ?? 100) * 0.72,
  });
}

export function nextPlaceOf(
  layout: Layout,
  placement: Placement | null,
  item: CatalogueItem | undefined,
): NextPlace | null {
  if (placement === null || item === undefined) return null;
  if (placement.at === 'slot') {
    const holder = layout.holderOf.get(placement.holderId);
    if (!holder) return null;
    const size = { thicknessMm: Math.max(item.heightMm, 8), lengthMm: item.lengthMm, heightMm: item.widthMm };
    return { shelfId: holder.shelf.id, box: slotBox(holder, placement.slot, size), placement };
  }
  const size = footprintOf(item, placement.pose, placement.turn);
  if (placement.at === 'shelf') {
    return { shelfId: placement.shelfId, box: boxAt({ x: placement.xMm, y: placement.yMm, z: 0 }, size), placement };
  }
  if (placement.at === 'package') {
    const below = layout.bodyOf.get(placement.belowPackageId);
    return below
      ? {
          shelfId: below.shelf.id,
          box: boxAt({ x: placement.xMm, y: placement.yMm, z: below.box.top }, size),
          placement,
        }
      : null;
  }
  const basket = layout.holderOf.get(placement.holderId);
  if (!basket) return null;
  const corner = { x: basket.box.left + placement.xMm, y: basket.box.front + placement.yMm, z: 0 };
  return { shelfId: basket.shelf.id, box: boxAt(corner, size), placement };
}

export function freeSlots(holder: HolderBody, bodies: readonly Body[]): number[] {
  const taken = new Set(
    bodies.flatMap((body) =>
      body.holder?.holder.holderId === holder.holder.holderId && body.slot !== null ? [body.slot] : [],
    ),
  );
  return Array.from({ length: holder.kind.slots ?? 0 }, (_, index) => index + 1).filter((slot) => !taken.has(slot));
}

export type Anchor = { readonly shelfId: string; readonly box: ShelfBox } | null;

/** The box on the cart that a finding points at: its first place that can be drawn. */
export function anchorOf(layout: Layout, finding: Finding): Anchor {
  for (const place of finding.places) {
    if (place.on === 'package') {
      const body = layout.bodyOf.get(place.packageId);
      if (body) return { shelfId: body.shelf.id, box: body.box };
    }
    if (place.on === 'holder') {
      const holder = layout.holderOf.get(place.holderId);
      if (holder)
        return { shelfId: holder.shelf.id, box: place.slot === null ? holder.box : ghostSlotBox(holder, place.slot) };
    }
    if (place.on === 'shelf') {
      const shelf = layout.shelves.find((entry) => entry.shelf.id === place.shelfId)?.shelf;
      if (shelf) {
        return {
          shelfId: shelf.id,
          box: boxAt(
            { x: shelf.widthMm * 0.82, y: shelf.depthMm * 0.5, z: 0 },
            { widthMm: shelf.widthMm * 0.12, depthMm: 40, heightMm: shelf.clearHeightMm * 0.5 },
          ),
        };
      }
    }
  }
  return null;
}

/** Packages a finding is about, by id. */
export function subjectsOf(finding: Finding): string[] {
  return finding.places.flatMap((place) => (place.on === 'package' ? [place.packageId] : []));
}
