import type { CatalogueItem, LoadView } from '../../../../src/domain/load/model';
import { mm } from '../../../../src/domain/units/quantity';
import {
  added,
  carries,
  changeItem,
  changePackage,
  itemWithCode,
  moved,
  pickPlaced,
  standing,
  standsFree,
} from '../change';
import { onPackage, type Fault, type Host, type Planted } from '../fault';
import { sizeOf, type Placed } from '../geometry';
import type { Random } from '../random';
import { planted, trayOf } from './filters';

/* What stands on what. */

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

export const stackFaults: readonly Fault[] = [
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
