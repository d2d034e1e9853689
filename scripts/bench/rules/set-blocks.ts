import type { CatalogueItem, HolderKind, Placement, Turn } from '../../../src/domain/load/model';
import { mm } from '../../../src/domain/units/quantity';
import { clearanceOf, onDeck, putHolder, singleBlock, turnOf, type Block, type Site } from './block';
import { sizeOf } from './geometry';

/* Trays, containers, basins and textile packs on the deck: single, stacked, spaced, on a wedge. */

export function oneOf(site: Site, kinds: readonly CatalogueItem['kind'][]): Block | null {
  const fitting = site.items.filter((item) => kinds.includes(item.kind));
  if (fitting.length === 0) return null;
  const item = site.random.pick(fitting);
  const turn = turnOf(site.random);
  if (item.pose !== 'tilted') return singleBlock(site, item, turn);
  return onWedge(site, item, turn) ?? singleBlock(site, item, turn);
}

/** A stack that the instructions of every member permit, with no filter in the lid of a member below. */
export function stackBlock(site: Site): Block | null {
  const { random, policy, shelf } = site;
  const items = site.items.filter((item) => item.pose === 'flat' && item.kind !== 'pouch');
  const lowers = items.filter(
    (item) => !hasLidFilter(item) && items.some((other) => other.standsOn.includes(item.code)),
  );
  if (lowers.length === 0) return null;
  const members = [random.pick(lowers)];
  while (members.length < 3) {
    const below = members.at(-1);
    if (!below || hasLidFilter(below)) break;
    const uppers = items.filter((item) => item.standsOn.includes(below.code) && isWithin(item, below));
    const upper = uppers.length > 0 ? random.pick(uppers) : null;
    if (!upper) break;
    const height = [...members, upper].reduce((sum, item) => sum + item.heightMm, 0);
    const limits = [...members, upper].map((item) => item.greatestStackHeightMm ?? Infinity);
    if (height > Math.min(...limits) || height + policy.headroomMm > shelf.clearHeightMm) break;
    members.push(upper);
  }
  return members.length < 2 || members.length > site.wanted ? null : stackOf(site, members, turnOf(random));
}

function stackOf(site: Site, members: readonly CatalogueItem[], turn: Turn): Block {
  const [lowest] = members;
  if (!lowest) throw new Error('a stack of nothing');
  const base = sizeOf(lowest, 'flat', turn);
  let dx = 0;
  let dy = 0;
  let room = base;
  const steps = members.map((item) => {
    const size = sizeOf(item, 'flat', turn);
    dx += site.random.whole(0, room.dx - size.dx);
    dy += site.random.whole(0, room.dy - size.dy);
    room = size;
    return { item, packageId: site.nextId('package'), dx, dy };
  });
  return {
    ...base,
    dz: members.reduce((sum, item) => sum + item.heightMm, 0),
    clearanceMm: Math.max(...members.map((item) => clearanceOf(item, site.policy))),
    insetMm: null,
    items: members,
    holderKinds: [],
    put: (shelfId, x, y) => ({
      holders: [],
      packages: steps.map((step, index) => ({
        packageId: step.packageId,
        item: step.item,
        placement:
          index === 0
            ? onDeck(step.item, shelfId, x, y, turn)
            : standingOn(steps[index - 1]?.packageId ?? '', x + step.dx, y + step.dy, turn),
      })),
    }),
  };
}

function standingOn(belowPackageId: string, x: number, y: number, turn: Turn): Placement {
  return { at: 'package', belowPackageId, xMm: mm(x), yMm: mm(y), turn, pose: 'flat', paper: null };
}

export function hasLidFilter(item: CatalogueItem): boolean {
  return item.filterZones.some((zone) => zone.face === 'lid');
}

function isWithin(upper: CatalogueItem, lower: CatalogueItem): boolean {
  return upper.lengthMm <= lower.lengthMm && upper.widthMm <= lower.widthMm;
}

/** Two trays with a spacer standing between them, which keeps them exactly its width apart. */
export function spacedTrays(site: Site): Block | null {
  const { random, policy } = site;
  const kind = kindOfForm(site, 'spacer');
  const trays = site.items.filter(
    (item) =>
      item.pose === 'flat' &&
      (item.kind === 'wrapped-tray' || item.kind === 'rigid-container') &&
      clearanceOf(item, policy) <= kind.acrossMm,
  );
  if (trays.length === 0 || site.wanted < 2) return null;
  const turn = turnOf(random);
  const [one, other] = [random.pick(trays), random.pick(trays)];
  const [first, second] = [sizeOf(one, 'flat', turn), sizeOf(other, 'flat', turn)];
  const holderId = site.nextId('holder');
  const [oneId, otherId] = [site.nextId('package'), site.nextId('package')];
  const along = (x: number, y: number, by: number) => (turn === 0 ? ([x + by, y] as const) : ([x, y + by] as const));
  const width = one.widthMm + kind.acrossMm + other.widthMm;
  const length = Math.max(one.lengthMm, other.lengthMm, kind.alongMm);
  return {
    dx: turn === 0 ? width : length,
    dy: turn === 0 ? length : width,
    dz: Math.max(first.dz, second.dz),
    clearanceMm: Math.max(clearanceOf(one, policy), clearanceOf(other, policy)),
    insetMm: null,
    items: [one, other],
    holderKinds: [kind],
    put: (shelfId, x, y) => ({
      holders: [putHolder(holderId, kind, ...along(x, y, one.widthMm), turn)],
      packages: [
        { packageId: oneId, item: one, placement: onDeck(one, shelfId, x, y, turn) },
        {
          packageId: otherId,
          item: other,
          placement: onDeck(other, shelfId, ...along(x, y, one.widthMm + kind.acrossMm), turn),
        },
      ],
    }),
  };
}

/** Something tilted with a wedge under its raised side; null where it stands tilted with nothing of ours under it. */
function onWedge(site: Site, item: CatalogueItem, turn: Turn): Block | null {
  const kind = kindOfForm(site, 'wedge');
  const size = sizeOf(item, 'tilted', turn);
  if (!site.random.chance(0.6) || size.dx < kind.acrossMm || size.dy < kind.alongMm) return null;
  const block = singleBlock(site, item, turn);
  const holderId = site.nextId('holder');
  const aside = Math.floor((size.dx - kind.acrossMm) / 2);
  return {
    ...block,
    holderKinds: [kind],
    put: (shelfId, x, y) => ({
      holders: [putHolder(holderId, kind, x + aside, y + 10, 0)],
      packages: block.put(shelfId, x, y).packages,
    }),
  };
}

function kindOfForm(site: Site, form: HolderKind['form']): HolderKind {
  const kind = site.holderKinds.find((each) => each.form === form);
  if (!kind) throw new Error(`no ${form} among the kinds of holders`);
  return kind;
}
