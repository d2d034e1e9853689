import type { CatalogueItem, LoadView, Turn } from '../../../../src/domain/load/model';
import { kg, mm } from '../../../../src/domain/units/quantity';
import {
  added,
  carries,
  changeItemOf,
  changeShelf,
  itemWithCode,
  pickPlaced,
  shelfWithId,
  standing,
  standsFree,
} from '../change';
import { onPackage, onShelf, type Fault, type Host, type Planted } from '../fault';
import { gapOf, type Placed, type Rect } from '../geometry';
import type { Random } from '../random';
import { hasLidFilter } from '../set-blocks';
import { onALid } from './pouches';

/* What stands or hangs over the filters of a container, or shuts them from below. */

export const planted = 'planted package';

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
export function trayOf(view: LoadView, rect: Pick<Rect, 'left' | 'right' | 'front' | 'back'>, heightMm = 60) {
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

export const filterFaults: readonly Fault[] = [
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
];
