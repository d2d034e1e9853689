import type {
  CatalogueItem,
  HolderKind,
  LoadHolder,
  PaperSide,
  Placement,
  Program,
  Shelf,
  Turn,
} from '../../../src/domain/load/model';
import type { FacingRule, LoadPolicy } from '../../../src/domain/load/policy';
import { mm } from '../../../src/domain/units/quantity';
import type { Random } from './random';
import { sizeOf } from './geometry';

/** Where a block may go and what holds there. */
export type Site = {
  readonly random: Random;
  readonly policy: LoadPolicy;
  /** How pouches are to face here, by the house or by the instructions for use of the pouches. */
  readonly facing: FacingRule;
  readonly program: Program;
  /** What this load may hold: cycle, mass and instructions fit. */
  readonly items: readonly CatalogueItem[];
  readonly holderKinds: readonly HolderKind[];
  readonly shelf: Shelf;
  /** How many packages are still wanted. */
  readonly wanted: number;
  readonly nextId: (word: string) => string;
  /** The way paper looks on this shelf, for pouches that stand across x and for those that stand across y. */
  readonly paperTowards: { readonly x: 'left' | 'right'; readonly y: 'left' | 'right' };
};

export type PutPackage = { readonly packageId: string; readonly item: CatalogueItem; readonly placement: Placement };
export type PutHolder = Pick<LoadHolder, 'holderId' | 'kindId' | 'xMm' | 'yMm' | 'turn'>;

/** Something that takes one place on a shelf: a tray, a stack, a rack with its pouches. */
export type Block = {
  readonly dx: number;
  readonly dy: number;
  readonly dz: number;
  /** Free space its instructions ask for around it. */
  readonly clearanceMm: number;
  /** For a holder: how far its contents stay inside its frame. null: no holder. */
  readonly insetMm: number | null;
  readonly items: readonly CatalogueItem[];
  readonly holderKinds: readonly HolderKind[];
  readonly put: (
    shelfId: string,
    x: number,
    y: number,
  ) => {
    readonly holders: readonly PutHolder[];
    readonly packages: readonly PutPackage[];
  };
};

export function clearanceOf(item: CatalogueItem, policy: LoadPolicy): number {
  return item.clearanceMm ?? (item.kind === 'pouch' ? policy.pouchGapMm : policy.packageClearanceMm);
}

export function massLimitOf(item: CatalogueItem, policy: LoadPolicy): number {
  if (item.massLimitKg !== null) return item.massLimitKg;
  if (item.kind === 'pouch') return policy.greatestPouchMassKg;
  return item.kind === 'textile-pack' ? policy.greatestTextilePackMassKg : policy.greatestSetMassKg;
}

export function turnOf(random: Random): Turn {
  return random.chance(0.5) ? 0 : 90;
}

/** The paper sides of pouches that stand one behind another across x or across y, in that order. */
export function paperSides(site: Site, axis: 'x' | 'y', count: number): readonly PaperSide[] {
  const { random, facing, paperTowards } = site;
  const first = random.pick(['left', 'right'] as const);
  const second = first === 'left' ? 'right' : 'left';
  return Array.from({ length: count }, (_, index) => {
    if (facing === 'one-way') return paperTowards[axis];
    if (facing === 'alternating') return index % 2 === 0 ? first : second;
    return random.pick(['left', 'right'] as const);
  });
}

/** One package by itself on the deck, as its catalogue entry asks for. */
export function singleBlock(site: Site, item: CatalogueItem, turn: Turn): Block {
  const size = sizeOf(item, item.pose, turn);
  const packageId = site.nextId('package');
  return {
    ...size,
    clearanceMm: clearanceOf(item, site.policy),
    insetMm: null,
    items: [item],
    holderKinds: [],
    put: (shelfId, x, y) => ({
      holders: [],
      packages: [{ packageId, item, placement: onDeck(item, shelfId, x, y, turn) }],
    }),
  };
}

export function onDeck(item: CatalogueItem, shelfId: string, x: number, y: number, turn: Turn): Placement {
  const paper = item.kind === 'pouch' ? 'down' : null;
  return { at: 'shelf', shelfId, xMm: mm(x), yMm: mm(y), turn, pose: item.pose, paper };
}

export function putHolder(holderId: string, kind: HolderKind, x: number, y: number, turn: Turn): PutHolder {
  return { holderId, kindId: kind.id, xMm: mm(x), yMm: mm(y), turn };
}
