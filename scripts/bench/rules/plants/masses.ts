import type { CatalogueItem, LoadView, Turn } from '../../../../src/domain/load/model';
import { kg, kilogramsPerMinute, mm, percent } from '../../../../src/domain/units/quantity';
import {
  added,
  changeItemOf,
  changeShelf,
  freeSpot,
  itemWithCode,
  pickPlaced,
  shelfWithId,
  standing,
  standsFree,
  deck,
} from '../change';
import { onLoad, onPackage, onShelf, type Fault, type Host, type Planted } from '../fault';
import { gapOf, itemOf, kindOf, type Placed, type Rect } from '../geometry';
import type { Random } from '../random';

/* Masses of packages, shelves and loads; metal over textiles; more water than the drying takes. */

type Limit = 'greatestSetMassKg' | 'greatestTextilePackMassKg' | 'greatestPouchMassKg';

function tooHeavy(kinds: readonly CatalogueItem['kind'][], limit: Limit, whose: 'house' | 'instructions') {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, (each) => kinds.includes(each.item.kind));
    if (!placed) return null;
    const over = random.pick([0.01, 0.2, 1]);
    const massLimitKg = whose === 'house' ? null : kg(placed.item.massKg);
    const massKg = kg((massLimitKg ?? host.policy[limit]) + over);
    return {
      view: changeItemOf(host.view, placed, { massKg, massLimitKg }),
      at: [onPackage(placed.one.packageId)],
      measured: massKg,
    };
  };
}

function packagesMass(host: Host, shelfId: string | null): number {
  return host.placed
    .filter((each) => shelfId === null || each.shelfId === shelfId)
    .reduce((sum, each) => sum + each.item.massKg, 0);
}

function holdersMass(host: Host, shelfId: string | null): number {
  return host.view.holders
    .filter((holder) => shelfId === null || holder.shelfId === shelfId)
    .reduce((sum, holder) => sum + kindOf(host.view, holder).massKg, 0);
}

/** A limit below what stands there: below the packages alone, or only below packages and holders together. */
function massLimit(host: Host, shelfId: string | null, random: Random, counts: 'packages' | 'holders'): number | null {
  const packages = packagesMass(host, shelfId);
  const holders = holdersMass(host, shelfId);
  if (packages === 0) return null;
  if (counts === 'packages') return packages * (1 - random.pick([0.01, 0.2]));
  return holders < 0.5 ? null : packages + holders / 2;
}

function shelfOverloaded(counts: 'packages' | 'holders') {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, () => true);
    if (!placed) return null;
    const limit = massLimit(host, placed.shelfId, random, counts);
    if (limit === null) return null;
    return {
      view: changeShelf(host.view, placed.shelfId, { greatestMassKg: kg(limit) }),
      policy: { ...host.policy, massMarginPercent: percent(0) },
      at: [onShelf(placed.shelfId)],
      measured: packagesMass(host, placed.shelfId) + holdersMass(host, placed.shelfId),
    };
  };
}

/** Within the limit itself, and over the share of it that the house leaves. */
function shelfOverMargin(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(host, random, () => true);
  if (!placed) return null;
  const all = packagesMass(host, placed.shelfId) + holdersMass(host, placed.shelfId);
  return {
    view: changeShelf(host.view, placed.shelfId, { greatestMassKg: kg(all * 1.05) }),
    policy: { ...host.policy, massMarginPercent: percent(10) },
    at: [onShelf(placed.shelfId)],
    measured: all,
  };
}

function loadOverloaded(by: 'program' | 'sterilizer', counts: 'packages' | 'holders') {
  return (host: Host, random: Random): Planted | null => {
    const limit = massLimit(host, null, random, counts);
    if (limit === null) return null;
    const { view } = host;
    const greatestLoadMassKg = kg(limit);
    return {
      view:
        by === 'program'
          ? { ...view, program: { ...view.program, greatestLoadMassKg } }
          : { ...view, sterilizer: { ...view.sterilizer, greatestLoadMassKg } },
      policy: { ...host.policy, massMarginPercent: percent(0) },
      at: [onLoad],
      measured: packagesMass(host, null) + holdersMass(host, null),
    };
  };
}

function loadOverMargin(host: Host): Planted {
  const all = packagesMass(host, null) + holdersMass(host, null);
  const sterilizer = { ...host.view.sterilizer, greatestLoadMassKg: kg(all * 1.05) };
  return {
    view: { ...host.view, sterilizer },
    policy: { ...host.policy, massMarginPercent: percent(10) },
    at: [onLoad],
    measured: all,
  };
}

const planted = 'planted package';

/** A tray with enough metal in it not to be above a textile pack. */
function metalTray(
  host: Host,
  random: Random,
  dx: number,
  dy: number,
): { readonly item: CatalogueItem; readonly turn: Turn } {
  // From just that mass on it may not be there.
  const metalMassKg = kg(random.pick([host.policy.metalOverTextileKg, host.policy.metalOverTextileKg + 0.2]));
  const item: CatalogueItem = {
    ...itemWithCode(host.view, 'W-08'),
    id: 'planted item',
    code: 'W-99',
    lengthMm: mm(Math.max(dx, dy)),
    widthMm: mm(Math.min(dx, dy)),
    metalMassKg,
    massKg: kg(metalMassKg + 0.2),
    pose: 'flat',
    isPerforated: true,
    standsOn: [],
  };
  return { item, turn: dy >= dx ? 0 : 90 };
}

function textilePack(host: Host, random: Random): Placed | null {
  return pickPlaced(host, random, (each) => each.item.kind === 'textile-pack' && standsFree(host, each));
}

function metalOnTextile(host: Host, random: Random): Planted | null {
  const textile = textilePack(host, random);
  if (!textile) return null;
  const { left, front } = textile.rect;
  const { item, turn } = metalTray(host, random, 160, 200);
  return {
    view: added(host.view, random, planted, item, standing(textile.one.packageId, left, front, turn)),
    at: [onPackage(planted), onPackage(textile.one.packageId)],
  };
}

/** On the textile pack stands something without metal, and on that the metal. */
function metalHigherOnTextile(host: Host, random: Random): Planted | null {
  const textile = textilePack(host, random);
  if (!textile) return null;
  const { left, front } = textile.rect;
  const { item, turn } = metalTray(host, random, 160, 200);
  const soft: CatalogueItem = { ...item, id: 'planted soft item', code: 'W-98', metalMassKg: kg(0) };
  const soften = added(host.view, random, 'planted soft', soft, standing(textile.one.packageId, left, front, turn));
  return {
    view: added(soften, random, planted, item, standing('planted soft', left, front, turn)),
    at: [onPackage(planted), onPackage(textile.one.packageId)],
  };
}

/** Metal on the box beside a textile pack, hanging over it. */
function metalHangsOver(host: Host, random: Random): Planted | null {
  const textile = textilePack(host, random);
  const box = pickPlaced(
    host,
    random,
    (each) =>
      each.shelfId === textile?.shelfId &&
      each.item.kind === 'wrapped-tray' &&
      each.item.pose === 'flat' &&
      standsFree(host, each) &&
      Math.min(each.rect.back, textile.rect.back) - Math.max(each.rect.front, textile.rect.front) > 100 &&
      gapOf(each.rect, textile.rect) < 120,
  );
  if (!textile || !box) return null;
  const isLeft = box.rect.right <= textile.rect.left;
  const left = isLeft ? box.rect.right - 150 : textile.rect.right - 60;
  const right = isLeft ? textile.rect.left + 60 : box.rect.left + 150;
  const front = Math.max(box.rect.front, textile.rect.front);
  const { item, turn } = metalTray(host, random, Math.round(right - left), 100);
  const raised = changeItemOf(host.view, box, { heightMm: mm(Math.ceil(textile.top)) });
  const placement = standing(box.one.packageId, Math.round(left), Math.round(front), turn);
  return {
    view: added(raised, random, planted, item, placement),
    at: [onPackage(planted), onPackage(textile.one.packageId)],
  };
}

/** Metal on a higher shelf, above a textile pack wholly or by a corner. */
function metalOnHigherShelf(levelsUp: (levels: number) => boolean) {
  return (host: Host, random: Random): Planted | null => {
    const textile = textilePack(host, random);
    if (!textile) return null;
    const below = shelfWithId(host.view, textile.shelfId);
    const { item } = metalTray(host, random, 200, 260);
    const spot = freeSpot(host, random, {
      dx: 200,
      dy: 260,
      dz: item.heightMm,
      clearanceMm: 20,
      isGood: (rect: Rect, shelf) =>
        levelsUp(shelf.level - below.level) && shelf.widthMm === below.widthMm && gapOf(rect, textile.rect) < -10,
    });
    if (!spot) return null;
    const { shelf, x, y } = spot;
    return {
      view: added(host.view, random, planted, item, deck(shelf.id, x, y, 0, 'flat')),
      at: [onPackage(planted), onPackage(textile.one.packageId)],
    };
  };
}

/** A small set with enough metal in it, in a basket on a higher shelf above a textile pack. */
function metalInBasketAbove(host: Host, random: Random): Planted | null {
  const textile = textilePack(host, random);
  const kind = host.view.holderKinds.find((each) => each.form === 'basket');
  if (!textile || !kind) return null;
  const below = shelfWithId(host.view, textile.shelfId);
  const { item } = metalTray(host, random, 200, 240);
  const middleX = (textile.rect.left + textile.rect.right) / 2;
  const middleY = (textile.rect.front + textile.rect.back) / 2;
  const isAbove = ({ left, front }: Rect) =>
    left < middleX && middleX < left + 200 && front < middleY && middleY < front + 240;
  const spot = freeSpot(host, random, {
    dx: kind.acrossMm,
    dy: kind.alongMm,
    dz: item.heightMm,
    clearanceMm: 20,
    isGood: (rect, shelf) => shelf.level > below.level && shelf.widthMm === below.widthMm && isAbove(rect),
  });
  if (!spot) return null;
  const holderId = 'planted basket';
  const holder = { holderId, name: holderId, placeCode: holderId, kindId: kind.id, shelfId: spot.shelf.id };
  const holders = [...host.view.holders, { ...holder, xMm: mm(spot.x), yMm: mm(spot.y), turn: 0 as const }];
  const placement = { at: 'basket', holderId, xMm: mm(0), yMm: mm(0), turn: 0, pose: 'flat', paper: null } as const;
  return {
    view: added({ ...host.view, holders }, random, planted, item, placement),
    at: [onPackage(planted), onPackage(textile.one.packageId)],
  };
}

/**
 * More water than drying removes. Whatever the metal, each kilogram leaves at least 0.50 kJ/kgK × 91 K / 2200 kJ/kg of it: the
 * least specific heat, the least rise and the greatest latent heat there is in these loads.
 */
function moreWater(host: Host): Planted | null {
  const { view } = host;
  const metalKg = view.packages.reduce((sum, one) => sum + itemOf(view, one).metalMassKg, 0);
  const leastWaterKg = (metalKg * 0.5 * 91) / 2200;
  const perMinute = 0.005;
  if (leastWaterKg < (perMinute * view.program.dryS * 1.05) / 60) return null;
  return { view, policy: { ...host.policy, waterPerDryMinute: kilogramsPerMinute(perMinute) }, at: [onLoad] };
}

/** The same with room to spare, from one set so heavy that it alone leaves more water than the drying takes. */
function oneWetSet(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(
    host,
    random,
    (each) => each.item.kind === 'wrapped-tray' || each.item.kind === 'rigid-container',
  );
  if (!placed) return null;
  const metalMassKg = kg((host.policy.waterPerDryMinute * (host.view.program.dryS / 60) * 2200 * 1.05) / (0.5 * 91));
  if (metalMassKg > 500) return null;
  const view: LoadView = changeItemOf(host.view, placed, { metalMassKg, massKg: kg(metalMassKg + 1) });
  return { view, at: [onLoad, onShelf(placed.shelfId), onPackage(placed.one.packageId)] };
}

const sets = ['wrapped-tray', 'basin'] as const;

export const massFaults: readonly Fault[] = [
  { name: 'set-over-house-mass', rule: 'set-mass', plant: tooHeavy(sets, 'greatestSetMassKg', 'house') },
  {
    name: 'container-over-house-mass',
    rule: 'set-mass',
    plant: tooHeavy(['rigid-container'], 'greatestSetMassKg', 'house'),
  },
  {
    name: 'set-over-its-mass',
    rule: 'set-mass',
    plant: tooHeavy([...sets, 'rigid-container'], 'greatestSetMassKg', 'instructions'),
  },
  {
    name: 'textile-over-house-mass',
    rule: 'set-mass',
    plant: tooHeavy(['textile-pack'], 'greatestTextilePackMassKg', 'house'),
  },
  {
    name: 'textile-over-its-mass',
    rule: 'set-mass',
    plant: tooHeavy(['textile-pack'], 'greatestTextilePackMassKg', 'instructions'),
  },
  { name: 'pouch-over-house-mass', rule: 'pouch-mass', plant: tooHeavy(['pouch'], 'greatestPouchMassKg', 'house') },
  {
    name: 'pouch-over-its-mass',
    rule: 'pouch-mass',
    plant: tooHeavy(['pouch'], 'greatestPouchMassKg', 'instructions'),
  },
  { name: 'shelf-overloaded', rule: 'shelf-mass', plant: shelfOverloaded('packages') },
  { name: 'shelf-overloaded-with-holders', rule: 'shelf-mass', plant: shelfOverloaded('holders') },
  { name: 'shelf-over-margin', rule: 'shelf-mass', plant: shelfOverMargin },
  { name: 'load-over-program', rule: 'load-mass', plant: loadOverloaded('program', 'packages') },
  { name: 'load-over-sterilizer', rule: 'load-mass', plant: loadOverloaded('sterilizer', 'packages') },
  { name: 'load-over-with-holders', rule: 'load-mass', plant: loadOverloaded('sterilizer', 'holders') },
  { name: 'load-over-margin', rule: 'load-mass', plant: loadOverMargin },
  { name: 'metal-on-textile', rule: 'metal-over-textile', plant: metalOnTextile },
  { name: 'metal-higher-on-textile', rule: 'metal-over-textile', plant: metalHigherOnTextile },
  { name: 'metal-hangs-over-textile', rule: 'metal-over-textile', plant: metalHangsOver },
  { name: 'metal-one-shelf-above', rule: 'metal-over-textile', plant: metalOnHigherShelf((levels) => levels === 1) },
  { name: 'metal-shelves-above', rule: 'metal-over-textile', plant: metalOnHigherShelf((levels) => levels > 1) },
  { name: 'metal-in-basket-above', rule: 'metal-over-textile', plant: metalInBasketAbove },
  { name: 'water-house-rule', rule: 'water', plant: moreWater },
  { name: 'water-of-one-set', rule: 'water', plant: oneWetSet },
];
