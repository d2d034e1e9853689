import { holderWords } from '../describe-place';
import { layOut, type Body, type Layout, type ShelfLayout } from '../layout';
import { shelfIdOf } from '../look-up';
import type { CatalogueItem, LoadHolder, LoadPackage, LoadView } from '../model';
import type { LoadPolicy } from '../policy';
import { findNearPairs, type NearPair } from './near-pairs';

/** A package on the list of the load, with its catalogue entry and its place where it has them. */
export type Listed = {
  readonly one: LoadPackage;
  readonly item: CatalogueItem | undefined;
  readonly body: Body | undefined;
  /** "Minor set", with the code where the load holds several of them. */
  readonly name: string;
};

/** A shelf with what stands on it. */
export type OnShelf = ShelfLayout & {
  /** Things that are near enough to matter to each other. */
  readonly nearPairs: readonly NearPair[];
};

/** Everything the rules share: worked out once per evaluation. */
export type Scene = {
  readonly view: LoadView;
  readonly policy: LoadPolicy;
  readonly layout: Layout;
  /** Each package once, sorted by id. */
  readonly listed: readonly Listed[];
  /** From the lowest up. */
  readonly shelves: readonly OnShelf[];
  /** What a person calls it, with the code where the load holds several of them. */
  readonly nameOf: (one: LoadPackage) => string;
  /** "Minor set" or "Mayo scissors in Holder RS-1, slot 7". */
  readonly thing: (body: Body) => string;
  readonly holderName: (holder: LoadHolder) => string;
  /** The shelf a package is on, drawable or not. */
  readonly shelfIdOf: (listed: Listed) => string | undefined;
};

/**
 * @param before the scene of a moment ago: packages and shelves that look the same as then are the very same objects again.
 *   Where anything changed that all of them have in common, it counts for nothing.
 */
export function sceneOf(view: LoadView, policy: LoadPolicy, before?: Scene): Scene {
  const old = before && hasSameFrame(before, view, policy) ? before : undefined;
  const layout = layOut(view, old?.layout);
  const itemOf = new Map<string, CatalogueItem>();
  for (const item of view.items) if (!itemOf.has(item.id)) itemOf.set(item.id, item);
  const kindOf = new Map(view.holderKinds.map((kind) => [kind.id, kind]));
  const timesOf = new Map<string, number>();
  for (const one of layout.packages) timesOf.set(one.itemId, (timesOf.get(one.itemId) ?? 0) + 1);

  const nameOf = (one: LoadPackage) => {
    const name = itemOf.get(one.itemId)?.name;
    if (name === undefined) return one.code;
    return timesOf.get(one.itemId) === 1 ? name : `${name} ${one.code}`.trimEnd();
  };
  const renamed = new Set<string>();
  // Both lists are sorted by id, so they are walked side by side.
  let next = 0;
  const listed = layout.packages.map((one): Listed => {
    let known = old?.listed[next];
    while (known && known.one.packageId < one.packageId) known = old?.listed[(next += 1)];
    const now = { one, item: itemOf.get(one.itemId), body: layout.bodyOf.get(one.packageId), name: nameOf(one) };
    if (known?.one.packageId !== one.packageId) return now;
    if (known.name !== now.name) renamed.add(one.packageId);
    const isSame = known.one === one && known.item === now.item && known.body === now.body;
    return isSame && known.name === now.name ? known : now;
  });

  const oldShelves = new Map(old?.shelves.map((on) => [on.shelf, on]));
  const shelves = layout.shelves.map((now, index): OnShelf => {
    const known = oldShelves.get(now.shelf);
    const isSame = known !== undefined && old?.layout.shelves[index] === now;
    if (isSame && !(renamed.size > 0 && now.bodies.some((body) => renamed.has(body.packageId)))) return known;
    let pairs: readonly NearPair[] | undefined;
    return {
      ...now,
      get nearPairs() {
        pairs ??= findNearPairs(now.bodies, policy);
        return pairs;
      },
    };
  });

  const holderName = (holder: LoadHolder) => holderWords(holder, kindOf.get(holder.kindId));
  return {
    view,
    policy,
    layout,
    listed,
    shelves,
    nameOf,
    holderName,
    thing: (body) => {
      const name = nameOf(body.package);
      if (!body.holder) return name;
      const holder = holderName(body.holder.holder);
      return body.slot === null ? `${name} in ${holder}` : `${name} in ${holder}, slot ${body.slot}`;
    },
    shelfIdOf: ({ one, body }) => {
      if (body) return body.shelf.id;
      return layout.nowhere.get(one.packageId) === 'circular' ? undefined : shelfIdOf(view, one.placement);
    },
  };
}

/** Whether everything is as it was that any rule may look at besides packages and what stands on a shelf. */
function hasSameFrame({ view: was, policy: old }: Scene, now: LoadView, policy: LoadPolicy): boolean {
  return (
    old === policy &&
    was.sterilizer === now.sterilizer &&
    was.program === now.program &&
    was.qualifiedPrograms === now.qualifiedPrograms &&
    was.cart === now.cart &&
    was.holderKinds === now.holderKinds &&
    was.today === now.today
  );
}
