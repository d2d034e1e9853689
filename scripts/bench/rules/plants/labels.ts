import type { LoadPackage, PackageState } from '../../../../src/domain/load/model';
import { carries, changePackage, changeShelf, pickPlaced, recounted } from '../change';
import { onHolder, onPackage, onShelf, type Fault, type Host, type Planted } from '../fault';
import type { Placed } from '../geometry';
import type { Random } from '../random';

/* Labels and the packages they name; what is scanned, placed and counted; shelves and holders that are none. */

function packageWith(changesFor: (random: Random, placed: Placed) => Partial<LoadPackage>) {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, () => true);
    if (!placed) return null;
    const { packageId } = placed.one;
    const view = changePackage(host.view, packageId, changesFor(random, placed));
    return { view, at: [onPackage(packageId)] };
  };
}

function labelTwice(host: Host, random: Random): Planted | null {
  const one = pickPlaced(host, random, () => true);
  const other = pickPlaced(host, random, (each) => each !== one);
  if (!one || !other) return null;
  return {
    view: changePackage(host.view, other.one.packageId, { code: one.one.code }),
    at: [onPackage(one.one.packageId), onPackage(other.one.packageId)],
  };
}

function listedTwice(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(host, random, (each) => each.item.kind !== 'challenge-device');
  if (!placed) return null;
  const packages = [...host.view.packages, { ...placed.one }];
  return { view: { ...host.view, packages }, at: [onPackage(placed.one.packageId)] };
}

const goneStates: readonly PackageState[] = [
  'processed',
  'sterile',
  'quarantined',
  'stored',
  'on-case-cart',
  'used',
  'returned',
  'discarded',
];

/** Scanned, placed nowhere, and every shelf counted without it. */
function nowhere(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(host, random, (each) => each.one.placement?.at !== 'package' && !carries(host, each));
  if (!placed) return null;
  const view = recounted(changePackage(host.view, placed.one.packageId, { placement: null }));
  return { view, at: [onPackage(placed.one.packageId)] };
}

function inMissingHolder(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(host, random, (each) => each.one.placement?.at === 'slot');
  if (placed?.one.placement?.at !== 'slot') return null;
  const placement = { ...placed.one.placement, holderId: 'no such holder' };
  const view = recounted(changePackage(host.view, placed.one.packageId, { placement }));
  return { view, at: [onPackage(placed.one.packageId)] };
}

function onMissingShelf(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(host, random, (each) => each.one.placement?.at === 'shelf' && !carries(host, each));
  if (placed?.one.placement?.at !== 'shelf') return null;
  const placement = { ...placed.one.placement, shelfId: 'no such shelf' };
  const view = changePackage(host.view, placed.one.packageId, { placement });
  return { view: recounted(view), at: [onPackage(placed.one.packageId)] };
}

function unscanned(isPlaced: boolean) {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, (each) => isPlaced || !carries(host, each));
    if (!placed) return null;
    const changes = isPlaced ? { isScanned: false } : { isScanned: false, placement: null };
    return {
      view: recounted(changePackage(host.view, placed.one.packageId, changes)),
      at: [onPackage(placed.one.packageId)],
    };
  };
}

function counts(change: (host: Host, random: Random) => readonly (readonly [shelfId: string, by: number | null])[]) {
  return (host: Host, random: Random): Planted | null => {
    const changes = change(host, random);
    if (changes.length === 0) return null;
    const byShelf = new Map(changes);
    const changed = host.view.counts.flatMap((count) => {
      const by = byShelf.get(count.shelfId);
      if (by === undefined) return [count];
      return by === null ? [] : [{ ...count, counted: count.counted + by }];
    });
    return { view: { ...host.view, counts: changed }, at: [...byShelf.keys()].map(onShelf) };
  };
}

function someShelf(host: Host, random: Random): string {
  return random.pick(host.view.cart.shelves).id;
}

function filledShelf(host: Host, random: Random): string | null {
  return pickPlaced(host, random, () => true)?.shelfId ?? null;
}

function swappedCounts(host: Host, random: Random): readonly (readonly [string, number])[] {
  const from = filledShelf(host, random);
  const to = host.view.cart.shelves.find((shelf) => shelf.id !== from)?.id;
  if (from === null || to === undefined) return [];
  return [
    [from, -1],
    [to, 1],
  ];
}

function bentShelf(host: Host, random: Random): Planted | null {
  const placed = pickPlaced(host, random, () => true);
  if (!placed) return null;
  const view = changeShelf(host.view, placed.shelfId, { isUsable: false });
  return { view, at: [onShelf(placed.shelfId), onPackage(placed.one.packageId)] };
}

function holderWith(changes: { readonly kindId: string } | { readonly shelfId: string }) {
  return (host: Host, random: Random): Planted | null => {
    const placed = pickPlaced(host, random, (each) => each.holder !== null);
    if (!placed?.holder) return null;
    const { holderId } = placed.holder;
    const holders = host.view.holders.map((each) => (each.holderId === holderId ? { ...each, ...changes } : each));
    return { view: { ...host.view, holders }, at: [onHolder(holderId), onPackage(placed.one.packageId)] };
  };
}

export const labelFaults: readonly Fault[] = [
  { name: 'item-not-in-catalogue', rule: 'label-known', plant: packageWith(() => ({ itemId: 'no such item' })) },
  {
    name: 'blank-label',
    rule: 'label-known',
    orRules: ['label-once'],
    plant: packageWith((random) => ({ code: random.pick(['', ' ']) })),
  },
  { name: 'label-twice', rule: 'label-once', plant: labelTwice },
  { name: 'package-listed-twice', rule: 'label-once', plant: listedTwice },
  {
    name: 'expired',
    rule: 'package-expired',
    plant: packageWith((random) => ({ expiresOn: random.pick(['2026-03-09', '2026-02-28', '2025-12-31']) })),
  },
  {
    name: 'called-back',
    rule: 'package-called-back',
    orRules: ['package-state'],
    plant: packageWith(() => ({ state: 'recalled' })),
  },
  {
    name: 'not-to-be-in-a-load',
    rule: 'package-state',
    orRules: ['package-called-back'],
    plant: packageWith((random) => ({ state: random.pick(goneStates) })),
  },
  {
    name: 'held',
    rule: 'package-state',
    orRules: ['package-called-back'],
    plant: packageWith(() => ({ heldReason: 'tip guard missing' })),
  },
  { name: 'scanned-and-nowhere', rule: 'unplaced', plant: nowhere },
  { name: 'in-a-holder-not-there', rule: 'unplaced', orRules: ['holder-usable'], plant: inMissingHolder },
  { name: 'on-a-shelf-not-there', rule: 'unplaced', orRules: ['shelf-usable'], plant: onMissingShelf },
  { name: 'placed-and-not-scanned', rule: 'unscanned', plant: unscanned(true) },
  { name: 'listed-and-not-scanned', rule: 'unscanned', plant: unscanned(false) },
  {
    name: 'shelf-not-counted',
    rule: 'count-missing',
    plant: counts((host, random) => [[someShelf(host, random), null]]),
  },
  {
    name: 'counted-more',
    rule: 'count-differs',
    plant: counts((host, random) => [[someShelf(host, random), random.pick([1, 2, 10])]]),
  },
  {
    name: 'counted-fewer',
    rule: 'count-differs',
    plant: counts((host, random) => {
      const shelfId = filledShelf(host, random);
      return shelfId === null ? [] : [[shelfId, -1]];
    }),
  },
  { name: 'counts-swapped', rule: 'count-differs', plant: counts(swappedCounts) },
  {
    name: 'counted-no-number',
    rule: 'count-differs',
    orRules: ['count-missing', 'size-makes-no-sense'],
    plant: counts((host, random) => [[someShelf(host, random), random.pick([NaN, -1000, 0.5, Infinity])]]),
  },
  { name: 'shelf-out-of-use', rule: 'shelf-usable', plant: bentShelf },
  { name: 'holder-of-no-kind', rule: 'holder-usable', plant: holderWith({ kindId: 'no such kind' }) },
  {
    name: 'holder-on-no-shelf',
    rule: 'holder-usable',
    orRules: ['shelf-usable'],
    plant: holderWith({ shelfId: 'no such shelf' }),
  },
];
