import type { CatalogueItem, LoadView, Turn } from '../../../../src/domain/load/model';
import { kg, mm } from '../../../../src/domain/units/quantity';
import {
  added,
  changeItem,
  changeItemOf,
  changePackage,
  changeShelf,
  itemWithCode,
  moved,
  pickPlaced,
  shelfWithId,
  standing,
  standsFree,
} from '../change';
import { onPackage, onShelf, type Fault, type Host, type Planted } from '../fault';
import { gapOf, sizeOf, type Placed, type Rect } from '../geometry';
import type { Random } from '../random';
import { hasLidFilter } from '../set-blocks';
import { onALid } from './pouches';

/* What stands on what, and what stands or hangs over the filters of a container's lid. */

const planted = 'planted package';

/** A filter of a flat container in the frame of its shelf. Turned, its length lies along x and its width along y. */
function filterRect(container: Placed): Rect {
  const zone = container.item.filterZones.find((each) => each.face === 'lid');
  const placement = container.one.placement;
  if (!zone || (placement?.at !== 'shelf' && placement?.at !== 'package')) throw new Error('no filter in this lid');
  const { left, front } = container.rect;
  return placement.turn === 90
    ? {
        left: left + zone.xMm,
        right: left + zone.xMm + zone.lengthMm,
        front: front + zone.yMm,
        back: front + zone.yMm + zone.widthMm,
      }
    : {
        left: left + zone.yMm,
        right: left + zone.yMm + zone.widthMm,
        front: front + zone.xMm,
        back: front + zone.xMm + zone.lengthMm,
      };
}

/** A tray of just this footprint. */
function trayOf(view: LoadView, rect: Pick<Rect, 'left' | 'right' | 'front' | 'back'>, heightMm = 60) {
  const dx = Math.round(rect.right - rect.left);
  const dy = Math.round(rect.back - rect.front);
  const turn: Turn = dy >= dx ? 0 : 90;
  const item: CatalogueItem = {
    ...itemWithCode(view, 'W-08'),
    id: 'planted item',
    code: 'W-99',
    pose: 'flat',
    isPerforated: true,
    lengthMm: mm(Math.max(dx, dy)),
    widthMm: mm(Math.min(dx, dy)),
    heightMm: mm(heightMm),
    massKg: kg(0.8),
    standsOn: [],
  };
  return { item, turn };
}

function lidFilterContainer(host: Host, random: Random): Placed | null {
  return pickPlaced(
    host,
    random,
    (each) => hasLidFilter(each.item) && each.item.pose === 'flat' && standsFree(host, each),
  );
}

/** The upper of a stack, which has a filter in its lid and nothing on it. */
function stackedFilterContainer(host: Host, random: Random): Placed | null {
  return pickPlaced(
    host,
    random,
    (each) => hasLidFilter(each.item) && each.one.placement?.at === 'package' && !carries(host, each),
  );
}

function carries(host: Host, placed: Placed): boolean {
  return host.view.packages.some(
    ({ placement }) => placement?.at === 'package' && placement.belowPackageId === placed.one.packageId,
  );
}

function onTheFilter(rectFor: (filter: Rect, lid: Rect, random: Random) => Rect, containerOf = lidFilterContainer) {
  return (host: Host, random: Random): Planted | null => {
    const container = containerOf(host, random);
    if (!container) return null;
    const rect = rectFor(filterRect(container), container.rect, random);
    const { item, turn } = trayOf(host.view, rect);
    const placement = standing(container.one.packageId, Math.round(rect.left), Math.round(rect.front), turn);
    return {
      view: added(host.view, random, planted, item, placement),
      at: [onPackage(planted), onPackage(container.one.packageId)],
    };
  };
}

/** A tray on one corner of the lid that reaches a few millimetres into the filter. */
function cornerOver(filter: Rect, lid: Rect, random: Random): Rect {
  const by = random.whole(4, 12);
  const isLeft = random.chance(0.5);
  const isFront = random.chance(0.5);
  return {
    left: isLeft ? lid.left : filter.right - by,
    right: isLeft ? filter.left + by : lid.right,
    front: isFront ? lid.front : filter.back - by,
    back: isFront ? filter.front + by : lid.back,
  };
}

/** A tray on the box beside a container, as high as it or higher, that hangs over the container's filter. */
function overhangFromNeighbour(host: Host, random: Random): Planted | null {
  const container = lidFilterContainer(host, random);
  if (!container) return null;
  const isBox = (each: Placed) =>
    each !== container &&
    each.shelfId === container.shelfId &&
    (each.item.kind === 'wrapped-tray' || each.item.kind === 'rigid-container') &&
    each.item.pose === 'flat' &&
    standsFree(host, each) &&
    gapOf(each.rect, container.rect) < 100;
  const box = pickPlaced(host, random, isBox);
  if (!box) return null;
  const filter = filterRect(container);
  const rect = bridge(box.rect, filter, container.rect);
  if (!rect) return null;
  const heightMm = mm(Math.max(box.top, container.top));
  const raised = changeItemOf(host.view, box, { heightMm });
  const { item, turn } = trayOf(host.view, rect);
  const placement = standing(box.one.packageId, Math.round(rect.left), Math.round(rect.front), turn);
  return {
    view: added(raised, random, planted, item, placement),
    at: [onPackage(planted), onPackage(container.one.packageId)],
  };
}

/** From the nearer part of a box to 25 mm into a filter beside it. */
function bridge(box: Rect, filter: Rect, container: Rect): Rect | null {
  const front = Math.max(box.front, filter.front);
  const back = Math.min(box.back, filter.back);
  const left = Math.max(box.left, filter.left);
  const right = Math.min(box.right, filter.right);
  if (back - front >= 60) {
    if (box.right <= container.left) return { left: box.right - 150, right: filter.left + 25, front, back };
    if (box.left >= container.right) return { left: filter.right - 25, right: box.left + 150, front, back };
  }
  if (right - left >= 60) {
    if (box.back <= container.front) return { left, right, front: box.back - 150, back: filter.front + 25 };
    if (box.front >= container.back) return { left, right, front: filter.back - 25, back: box.front + 150 };
  }
  return null;
}

/** On the lid beside the filter stands something small, and on that something that hangs over the filter. */
function overhangOfHigherMember(host: Host, random: Random): Planted | null {
  const container = lidFilterContainer(host, random);
  if (!container) return null;
  const filter = filterRect(container);
  const lid = container.rect;
  const isLong = lid.back - lid.front > lid.right - lid.left;
  const foot: Rect = isLong
    ? { left: lid.left + 20, right: lid.right - 20, front: lid.front + 5, back: filter.front - 5 }
    : { left: lid.left + 5, right: filter.left - 5, front: lid.front + 20, back: lid.back - 20 };
  if (foot.right - foot.left < 40 || foot.back - foot.front < 40) return null;
  const roof: Rect = isLong ? { ...foot, back: filter.front + 40 } : { ...foot, right: filter.left + 40 };
  const [low, high] = [trayOf(host.view, foot), trayOf(host.view, roof)];
  const lowId = 'planted foot';
  const lowItem = { ...low.item, id: 'planted foot item', code: 'W-98' };
  const withFoot = added(
    host.view,
    random,
    lowId,
    lowItem,
    standing(container.one.packageId, Math.round(foot.left), Math.round(foot.front), low.turn),
  );
  const placement = standing(lowId, Math.round(roof.left), Math.round(roof.front), high.turn);
  return {
    view: added(withFoot, random, planted, high.item, placement),
    at: [onPackage(planted), onPackage(container.one.packageId)],
  };
}

function flatSet(each: Placed): boolean {
  return (each.item.kind === 'wrapped-tray' || each.item.kind === 'rigid-container') && each.item.pose === 'flat';
}

/** Something on a set whose instructions for use do not name it. */
function onAnother(upperOf: (host: Host, below: Placed, random: Random) => CatalogueItem | null) {
  return (host: Host, random: Random): Planted | null => {
    const below = pickPlaced(host, random, (each) => flatSet(each) && standsFree(host, each));
    const upper = below && upperOf(host, below, random);
    if (!below || !upper || upper.standsOn.includes(below.item.code)) return null;
    const turn = below.one.placement?.at === 'shelf' ? below.one.placement.turn : 0;
    const size = sizeOf(upper, 'flat', turn);
    const x = Math.round((below.rect.left + below.rect.right - size.dx) / 2);
    const y = Math.round((below.rect.front + below.rect.back - size.dy) / 2);
    return {
      view: added(host.view, random, planted, upper, standing(below.one.packageId, x, y, turn)),
      at: [onPackage(planted), onPackage(below.one.packageId)],
    };
  };
}

type Stack = { readonly upper: Placed; readonly lower: Placed };

function stackOfTwo(host: Host, random: Random): Stack | null {
  const onTop = host.placed.filter(({ one }) => one.placement?.at === 'package');
  const upper = onTop.length > 0 ? random.pick(onTop) : null;
  if (upper?.one.placement?.at !== 'package') return null;
  const below = upper.one.placement.belowPackageId;
  const lower = host.placed.find((each) => each.one.packageId === below);
  return lower?.one.placement?.at === 'shelf' ? { upper, lower } : null;
}

function turnedOver(host: Host, random: Random): Planted | null {
  const stack = stackOfTwo(host, random);
  if (!stack || carries(host, stack.upper)) return null;
  const { upper, lower } = stack;
  if (lower.item.standsOn.includes(upper.item.code) || lower.one.placement?.at !== 'shelf') return null;
  const { xMm, yMm, turn } = lower.one.placement;
  const view = changePackage(host.view, upper.one.packageId, { placement: lower.one.placement });
  return {
    view: changePackage(view, lower.one.packageId, { placement: standing(upper.one.packageId, xMm, yMm, turn) }),
    at: [onPackage(upper.one.packageId), onPackage(lower.one.packageId)],
  };
}

/** The upper of a permitted stack far beside the one it is said to stand on. */
function besideItsBase(host: Host, random: Random): Planted | null {
  const stack = stackOfTwo(host, random);
  if (stack?.upper.one.placement?.at !== 'package' || carries(host, stack.upper)) return null;
  const { left, right, front, back } = stack.lower.rect;
  const away = random.pick([
    { xMm: mm(right + 30), yMm: mm(front) },
    { xMm: mm(left), yMm: mm(back + 30) },
  ]);
  const placement = { ...stack.upper.one.placement, ...away };
  return {
    view: changePackage(host.view, stack.upper.one.packageId, { placement }),
    at: [onPackage(stack.upper.one.packageId), onPackage(stack.lower.one.packageId)],
  };
}

function lowLimit(whose: 'upper' | 'lower') {
  return (host: Host, random: Random): Planted | null => {
    const stack = stackOfTwo(host, random);
    if (!stack) return null;
    const greatestStackHeightMm = mm(Math.ceil(stack.upper.top) - random.whole(1, 40));
    return {
      view: changeItem(host.view, stack[whose].item.id, { greatestStackHeightMm }),
      at: [onPackage(stack.upper.one.packageId), onPackage(stack.lower.one.packageId)],
      measured: stack.upper.top,
    };
  };
}

/** A third on top of two, each permitted on the next, and together too high. */
function oneMore(host: Host, random: Random): Planted | null {
  const stack = stackOfTwo(host, random);
  if (!stack || stack.upper.one.placement?.at !== 'package') return null;
  const { xMm, yMm, turn } = stack.upper.one.placement;
  const { item } = trayOf(host.view, stack.upper.rect, 80);
  const limit = mm(stack.upper.top + random.whole(10, 70));
  const upper = { ...item, standsOn: [stack.upper.item.code], greatestStackHeightMm: limit };
  return {
    view: added(host.view, random, planted, upper, standing(stack.upper.one.packageId, xMm, yMm, turn)),
    at: [onPackage(planted), onPackage(stack.upper.one.packageId), onPackage(stack.lower.one.packageId)],
  };
}

function ring(count: number) {
  return (host: Host, random: Random): Planted | null => {
    const members = random
      .shuffled(host.placed.filter((each) => flatSet(each) && standsFree(host, each)))
      .slice(0, count);
    if (members.length < count) return null;
    const view = members.reduce((so, each, index) => {
      const below = members[(index + 1) % count];
      const { left, front } = each.rect;
      return moved(so, each.one.packageId, standing(below?.one.packageId ?? '', left, front, 0));
    }, host.view);
    return { view, at: members.map((each) => onPackage(each.one.packageId)) };
  };
}

function onNothing(belowFor: (view: LoadView) => { readonly view: LoadView; readonly below: string } | null) {
  return (host: Host, random: Random): Planted | null => {
    const each = pickPlaced(host, random, (one) => flatSet(one) && standsFree(host, one));
    const base = belowFor(host.view);
    if (!each || !base || base.below === each.one.packageId) return null;
    const placement = standing(base.below, each.rect.left, each.rect.front, 0);
    return { view: moved(base.view, each.one.packageId, placement), at: [onPackage(each.one.packageId)] };
  };
}

function unplacedBase(view: LoadView) {
  const [first] = view.packages;
  if (first?.placement?.at !== 'slot') return null;
  return { view: changePackage(view, first.packageId, { placement: null }), below: first.packageId };
}

function hasBaseFilter(each: Placed): boolean {
  return each.item.filterZones.some((zone) => zone.face === 'base');
}

/** The shelf under a container with a filter in its base turns out to be solid. */
function onSolidShelf(host: Host, random: Random): Planted | null {
  const container = pickPlaced(host, random, (each) => hasBaseFilter(each) && each.one.placement?.at === 'shelf');
  if (!container || shelfWithId(host.view, container.shelfId).surface === 'solid') return null;
  return {
    view: changeShelf(host.view, container.shelfId, { surface: 'solid' }),
    at: [onPackage(container.one.packageId), onShelf(container.shelfId)],
  };
}

export const lidAndStackFaults: readonly Fault[] = [
  { name: 'tray-on-lid-filter', rule: 'lid-filter-covered', plant: onTheFilter((filter) => filter) },
  { name: 'tray-over-corner-of-filter', rule: 'lid-filter-covered', plant: onTheFilter(cornerOver) },
  {
    name: 'tray-on-filter-of-stacked',
    rule: 'lid-filter-covered',
    plant: onTheFilter((filter) => filter, stackedFilterContainer),
  },
  { name: 'overhang-from-neighbour', rule: 'lid-filter-covered', plant: overhangFromNeighbour },
  { name: 'overhang-of-higher-member', rule: 'lid-filter-covered', plant: overhangOfHigherMember },
  { name: 'pouch-flat-on-lid-filter', rule: 'lid-filter-covered', plant: onALid('flat', hasLidFilter) },
  { name: 'base-filter-on-solid-shelf', rule: 'base-filter-shut', plant: onSolidShelf },
  {
    name: 'base-filter-on-tray',
    rule: 'base-filter-shut',
    plant: onAnother(({ view }) => itemWithCode(view, 'C-15')),
  },
  {
    name: 'tray-on-tray',
    rule: 'stack-not-permitted',
    plant: onAnother(({ view }, _below, random) => itemWithCode(view, random.pick(['W-08', 'C-14', 'W-07']))),
  },
  { name: 'same-on-same', rule: 'stack-not-permitted', plant: onAnother((_host, below) => below.item) },
  { name: 'stack-upside-down', rule: 'stack-not-permitted', plant: turnedOver },
  {
    name: 'stack-member-in-the-air',
    rule: 'stack-not-permitted',
    orRules: ['overlap', 'unplaced', 'size-makes-no-sense'],
    plant: besideItsBase,
  },
  { name: 'stack-over-upper-limit', rule: 'stack-too-high', plant: lowLimit('upper') },
  { name: 'stack-over-lower-limit', rule: 'stack-too-high', plant: lowLimit('lower') },
  { name: 'third-on-a-stack', rule: 'stack-too-high', plant: oneMore },
  { name: 'stands-on-itself', rule: 'stack-circular', plant: ring(1) },
  { name: 'two-on-each-other', rule: 'stack-circular', plant: ring(2) },
  { name: 'ring-of-three', rule: 'stack-circular', plant: ring(3) },
  {
    name: 'stands-on-what-is-not-there',
    rule: 'unplaced',
    orRules: ['stack-not-permitted'],
    plant: onNothing((view) => ({ view, below: 'no such package' })),
  },
  {
    name: 'stands-on-what-has-no-place',
    rule: 'unplaced',
    orRules: ['stack-not-permitted'],
    plant: onNothing(unplacedBase),
  },
];
