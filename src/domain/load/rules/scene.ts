import { holderWords } from '../describe-place';
import { layOut, type Body, type Layout } from '../layout';
import { shelfIdOf } from '../look-up';
import type { CatalogueItem, LoadHolder, LoadPackage, LoadView } from '../model';
import type { LoadPolicy } from '../policy';
import { findNearPairs, type NearPair } from './near-pairs';

/** A package on the list of the load, with its catalogue entry and its place where it has them. */
export type Listed = {
  readonly one: LoadPackage;
  readonly item: CatalogueItem | undefined;
  readonly body: Body | undefined;
};

/** Everything the rules share: worked out once per evaluation. */
export type Scene = {
  readonly view: LoadView;
  readonly policy: LoadPolicy;
  readonly layout: Layout;
  /** Each package once, sorted by id. */
  readonly listed: readonly Listed[];
  /** Things on one shelf that are near enough to matter to each other. */
  readonly nearPairs: readonly NearPair[];
  /** "Minor set", with the code where the load holds several of them. */
  readonly nameOf: (one: LoadPackage) => string;
  /** "Minor set" or "Mayo scissors in Holder RS-1, slot 7". */
  readonly thing: (body: Body) => string;
  readonly holderName: (holder: LoadHolder) => string;
  /** The shelf a package is on, drawable or not. */
  readonly shelfIdOf: (listed: Listed) => string | undefined;
};

export function sceneOf(view: LoadView, policy: LoadPolicy): Scene {
  const layout = layOut(view);
  const itemOf = new Map<string, CatalogueItem>();
  for (const item of view.items) if (!itemOf.has(item.id)) itemOf.set(item.id, item);
  const kindOf = new Map(view.holderKinds.map((kind) => [kind.id, kind]));
  const once = new Map<string, LoadPackage>();
  const timesOf = new Map<string, number>();
  for (const one of view.packages) {
    if (once.has(one.packageId)) continue;
    once.set(one.packageId, one);
    timesOf.set(one.itemId, (timesOf.get(one.itemId) ?? 0) + 1);
  }
  const listed = [...once.values()]
    .sort((a, b) => (a.packageId < b.packageId ? -1 : 1))
    .map((one) => ({ one, item: itemOf.get(one.itemId), body: layout.bodyOf.get(one.packageId) }));

  const nameOf = (one: LoadPackage) => {
    const name = itemOf.get(one.itemId)?.name;
    if (name === undefined) return one.code;
    return timesOf.get(one.itemId) === 1 ? name : `${name} ${one.code}`;
  };
  const holderName = (holder: LoadHolder) => holderWords(holder, kindOf.get(holder.kindId));
  let pairs: readonly NearPair[] | undefined;
  return {
    view,
    policy,
    layout,
    listed,
    get nearPairs() {
      pairs ??= findNearPairs(layout, policy);
      return pairs;
    },
    nameOf,
    holderName,
    thing: (body) => {
      const name = nameOf(body.package);
      if (!body.holder) return name;
      const holder = holderName(body.holder.holder);
      return body.slot === null ? `${name} in ${holder}` : `${name} in ${holder}, slot ${body.slot}`;
    },
    shelfIdOf: ({ one, body }) => body?.shelf.id ?? shelfIdOf(view, one.placement),
  };
}
