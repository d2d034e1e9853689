import { applyEdits } from './apply-edit';
import type { LoadEdit } from './finding';
import { findItem, nameOf, shelfIdOf } from './look-up';
import type { CatalogueItem, LoadPackage, LoadView } from './model';
import { troubleOf } from './place-trouble';
import type { LoadPolicy } from './policy';
import { findPlace } from './suggest-place';

export type Arrangement = {
  readonly edits: readonly LoadEdit[];
  readonly couldNotPlace: readonly { readonly packageId: string; readonly why: string }[];
};

/**
 * Places for everything scanned that has none, as edits that can be applied as they are. What is placed already stays.
 * Each step is judged by the rules and adds no finding that holds the load to what the step before left, so that the whole
 * adds none either.
 * @param includeUnscanned also for what is still on the table: a preview, whose edits for those packages can be applied
 *   only once they are scanned.
 */
export function arrangeRest(
  view: LoadView,
  policy: LoadPolicy,
  { includeUnscanned = false }: { readonly includeUnscanned?: boolean } = {},
): Arrangement {
  const start = includeUnscanned ? withEverythingScanned(view) : view;
  const rest = start.packages.filter((one) => one.isScanned && one.placement === null);
  const edits: LoadEdit[] = [];
  const couldNotPlace: { packageId: string; why: string }[] = [];
  let now = start;
  let trouble = troubleOf(start, policy);
  for (const one of inOrder(start, rest)) {
    const found = findPlace(now, one.packageId, policy, { troubleBefore: trouble });
    if (found) {
      edits.push({ edit: 'place', packageId: one.packageId, placement: found.suggestion.placement });
      ({ after: now, trouble } = found);
    } else {
      couldNotPlace.push({ packageId: one.packageId, why: whyNot(start, one) });
    }
  }
  return { edits, couldNotPlace };
}

/** The shelf on which each package that is not scanned yet would go, by package id. */
export function expectedShelves(view: LoadView, policy: LoadPolicy): ReadonlyMap<string, string> {
  const { edits } = arrangeRest(view, policy, { includeUnscanned: true });
  const all = applyEdits(withEverythingScanned(view), edits);
  const shelves = new Map<string, string>();
  if (!all.ok) return shelves;
  for (const { packageId, isScanned } of view.packages) {
    const one = all.value.packages.find((each) => each.packageId === packageId);
    const shelfId = isScanned ? undefined : shelfIdOf(all.value, one?.placement ?? null);
    if (shelfId !== undefined) shelves.set(packageId, shelfId);
  }
  return shelves;
}

function withEverythingScanned(view: LoadView): LoadView {
  return { ...view, packages: view.packages.map((one) => (one.isScanned ? one : { ...one, isScanned: true })) };
}

const kindOrder: readonly CatalogueItem['kind'][] = [
  'challenge-device',
  'rigid-container',
  'basin',
  'wrapped-tray',
  'textile-pack',
  'pouch',
];

/** What is hardest to place goes first: what has one right place, then the large before the small. */
function inOrder(view: LoadView, rest: readonly LoadPackage[]): readonly LoadPackage[] {
  const ranked = rest.map((one) => {
    const item = findItem(view, one.itemId);
    const size = item ? item.lengthMm * item.widthMm * item.heightMm : 0;
    return { one, kind: item ? kindOrder.indexOf(item.kind) : kindOrder.length, size };
  });
  return ranked
    .sort((a, b) => a.kind - b.kind || b.size - a.size || (a.one.packageId < b.one.packageId ? -1 : 1))
    .map(({ one }) => one);
}

function whyNot(view: LoadView, one: LoadPackage): string {
  const name = nameOf(view, one);
  const item = findItem(view, one.itemId);
  if (!item) return `${name} is not in the catalogue.`;
  if (item.kind === 'pouch') return `No holder on the cart has a free slot that fits ${name}.`;
  return `No shelf has a free place for ${name}.`;
}
