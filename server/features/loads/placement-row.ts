import type { PaperSide, Placement, Pose, Turn } from '#domain/load/model';
import { mm } from '#domain/units/quantity';

/** The place columns of load_packages. */
export type PlacementRow = {
  readonly place_kind: 'shelf' | 'slot' | 'basket' | 'package' | null;
  readonly shelf_id: string | null;
  readonly holder_id: string | null;
  readonly slot: number | null;
  readonly below_package_id: string | null;
  readonly x_mm: number | null;
  readonly y_mm: number | null;
  readonly turn: number | null;
  readonly pose: Pose | null;
  readonly paper: PaperSide | null;
};

const noPlace: PlacementRow = {
  place_kind: null,
  shelf_id: null,
  holder_id: null,
  slot: null,
  below_package_id: null,
  x_mm: null,
  y_mm: null,
  turn: null,
  pose: null,
  paper: null,
};

export function placementToRow(placement: Placement | null): PlacementRow {
  if (placement === null) return noPlace;
  const common = { ...noPlace, place_kind: placement.at, pose: placement.pose, paper: placement.paper };
  if (placement.at === 'slot') return { ...common, holder_id: placement.holderId, slot: placement.slot };
  const spot = { ...common, x_mm: placement.xMm, y_mm: placement.yMm, turn: placement.turn };
  switch (placement.at) {
    case 'shelf':
      return { ...spot, shelf_id: placement.shelfId };
    case 'basket':
      return { ...spot, holder_id: placement.holderId };
    case 'package':
      return { ...spot, below_package_id: placement.belowPackageId };
  }
}

export function placementFromRow(row: PlacementRow): Placement | null {
  if (row.place_kind === null || row.pose === null) return null;
  const common = { pose: row.pose, paper: row.paper };
  if (row.place_kind === 'slot') {
    if (row.holder_id === null || row.slot === null) return null;
    return { at: 'slot', holderId: row.holder_id, slot: row.slot, ...common };
  }
  if (row.x_mm === null || row.y_mm === null) return null;
  const turn: Turn = row.turn === 90 ? 90 : 0;
  const spot = { xMm: mm(row.x_mm), yMm: mm(row.y_mm), turn, ...common };
  switch (row.place_kind) {
    case 'shelf':
      return row.shelf_id === null ? null : { at: 'shelf', shelfId: row.shelf_id, ...spot };
    case 'basket':
      return row.holder_id === null ? null : { at: 'basket', holderId: row.holder_id, ...spot };
    case 'package':
      return row.below_package_id === null ? null : { at: 'package', belowPackageId: row.below_package_id, ...spot };
  }
}
