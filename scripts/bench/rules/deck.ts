import type { Shelf, Sterilizer } from '../../../src/domain/load/model';
import type { LoadPolicy } from '../../../src/domain/load/policy';
import type { Block } from './block';
import { gapOf, rectOf, type Rect } from './geometry';
import type { Random } from './random';

/** What the arithmetic of a computer may leave of an exact distance, in mm. */
const rounding = 1e-9;

type Standing = { readonly block: Block; readonly rect: Rect };

/** A shelf being filled: what stands on it, and where another block may go. */
export class Deck {
  readonly shelf: Shelf;
  readonly #area: Rect;
  readonly #policy: LoadPolicy;
  readonly #standing: Standing[] = [];
  /** Positions in whole millimetres, as people measure, or just as far as asked, however odd the figure. */
  readonly #isWhole: boolean;
  #massKg = 0;
  #coveredMm2 = 0;

  constructor(shelf: Shelf, sterilizer: Sterilizer, policy: LoadPolicy, isWhole: boolean) {
    this.shelf = shelf;
    this.#isWhole = isWhole;
    this.#policy = policy;
    this.#area = usableArea(shelf, sterilizer, policy);
  }

  get standing(): readonly Standing[] {
    return this.#standing;
  }

  /** Height, mass and covered share, whatever the place. */
  hasRoomFor(block: Block): boolean {
    const { shelf } = this;
    const policy = this.#policy;
    const area = shelf.widthMm * shelf.depthMm;
    const needsWire = block.items.some((item) => item.filterZones.some((zone) => zone.face === 'base'));
    return (
      block.dz + policy.headroomMm <= shelf.clearHeightMm &&
      this.#massKg + massOf(block) <= shelf.greatestMassKg * (1 - policy.massMarginPercent / 100) &&
      this.#coveredMm2 + block.dx * block.dy <= (area * policy.greatestShelfCoverPercent) / 100 &&
      (shelf.surface === 'wire' || !needsWire)
    );
  }

  /** A place that keeps every distance, and often keeps it exactly; null where there is none. */
  findSpot(block: Block, random: Random, mayGo: (rect: Rect) => boolean): { x: number; y: number } | null {
    const area = this.#area;
    const slack = random.pick([0, 0, 0, random.whole(1, 60)]);
    const xs = [area.left];
    const ys = [area.front];
    for (const one of this.#standing) {
      const apart = apartMm(one.block, block);
      xs.push(one.rect.right + apart + slack, one.rect.left - apart - block.dx);
      ys.push(one.rect.back + apart + slack, one.rect.front - apart - block.dy);
    }
    if (random.chance(0.2)) {
      xs.unshift(random.whole(0, Math.max(0, this.shelf.widthMm - Math.ceil(block.dx))));
      ys.unshift(random.whole(0, Math.max(0, this.shelf.depthMm - Math.ceil(block.dy))));
    }
    const order = random.chance(0.7) ? (values: number[]) => values.sort((a, b) => a - b) : random.shuffled;
    const exact = this.#isWhole ? wholes : (values: readonly number[]) => [...values];
    const [tryXs, tryYs] = [order(exact(xs)), order(exact(ys))];
    for (const y of tryYs) {
      for (const x of tryXs) if (this.isFree(block, x, y) && mayGo(rectOf(x, y, block))) return { x, y };
    }
    return null;
  }

  isFree(block: Block, x: number, y: number): boolean {
    const rect = rectOf(x, y, block);
    const area = this.#area;
    const outside = [area.left - rect.left, rect.right - area.right, area.front - rect.front, rect.back - area.back];
    if (outside.some((by) => by > rounding)) return false;
    return this.#standing.every((one) => gapOf(one.rect, rect) >= apartMm(one.block, block) - rounding);
  }

  add(block: Block, x: number, y: number): void {
    this.#standing.push({ block, rect: rectOf(x, y, block) });
    this.#massKg += massOf(block);
    this.#coveredMm2 += block.dx * block.dy;
  }
}

export function massOf(block: Block): number {
  const items = block.items.reduce((sum, item) => sum + item.massKg, 0);
  return items + block.holderKinds.reduce((sum, kind) => sum + kind.massKg, 0);
}

/** Inside the shelf's edge and clear of the walls of a chamber in whose middle the cart stands. */
function usableArea(shelf: Shelf, sterilizer: Sterilizer, policy: LoadPolicy): Rect {
  const inset = (chamberMm: number, shelfMm: number) =>
    Math.ceil(Math.max(0, policy.wallClearanceMm - (chamberMm - shelfMm) / 2));
  const x = inset(sterilizer.chamberWidthMm, shelf.widthMm);
  const y = inset(sterilizer.chamberDepthMm, shelf.depthMm);
  return { left: x, right: shelf.widthMm - x, front: y, back: shelf.depthMm - y };
}

/** Racks and baskets may touch: what has to be apart is what stands in them. */
function apartMm(one: Block, other: Block): number {
  const wanted = Math.max(one.clearanceMm, other.clearanceMm);
  if (one.insetMm === null || other.insetMm === null) return wanted;
  return Math.max(0, wanted - one.insetMm - other.insetMm);
}

function wholes(values: readonly number[]): number[] {
  return [...new Set(values.map(Math.ceil))];
}
