import { freeSpots } from '../geometry/free-spot';
import type { Millimetre } from '../units/quantity';
import { applyEdit } from './apply-edit';
import { freeSlots } from './free-slots';
import { layOut } from './layout';
import { findItem, findPackage } from './look-up';
import type { CatalogueItem, HolderKind, LoadPackage, LoadView, Turn } from './model';
import { marginsOf, obstaclesOn, placeCandidates, type Suggestion, type WithinPlace } from './place-candidates';
import { troubleOf, worstAdded, type Trouble } from './place-trouble';
import { defaultPolicy, type LoadPolicy } from './policy';

/** Places tried before giving up: a scan is answered within a blink, and the map takes any place a person wants. */
const mostTries = 24;
/** Places tried for a better one, once there is one that a lead would have to accept. */
const mostTriesForBetter = 4;

/**
 * Where a package should go, or null where no place is good. Never a place that adds a finding which holds the load; one
 * that a lead would have to accept only when there is no better.
 * @param subject id of a package on this load, or a catalogue item that is about to come onto it.
 * @param within only on this shelf (for a pouch: in a holder on it), or only in this holder.
 */
export function suggestPlace(
  view: LoadView,
  subject: string | CatalogueItem,
  policy: LoadPolicy,
  within: WithinPlace | null = null,
): Suggestion | null {
  return findPlace(view, subject, policy, { within })?.suggestion ?? null;
}

export type FoundPlace = {
  readonly suggestion: Suggestion;
  /** The load with the thing in its place. */
  readonly after: LoadView;
  readonly trouble: Trouble;
};

/** `suggestPlace` with what it worked out on the way, for those who place one thing after the other. */
export function findPlace(
  view: LoadView,
  subject: string | CatalogueItem,
  policy: LoadPolicy,
  { within = null, troubleBefore }: { readonly within?: WithinPlace | null; readonly troubleBefore?: Trouble } = {},
): FoundPlace | null {
  const asked = withSubject(view, subject);
  if (!asked) return null;
  const { one, item } = asked;
  const layout = layOut({ ...asked.view, packages: asked.view.packages.filter((each) => each !== one) });
  let before = troubleBefore;
  let acceptable: FoundPlace | null = null;
  let triesLeft = mostTries;
  for (const suggestion of placeCandidates({ view, layout, policy, item, within })) {
    if (triesLeft === 0) break;
    triesLeft -= 1;
    const edit = { edit: 'place', packageId: one.packageId, placement: suggestion.placement } as const;
    const placed = applyEdit(asked.view, edit);
    if (!placed.ok) continue;
    before ??= troubleOf(asked.view, policy);
    const trouble = troubleOf(placed.value, policy);
    const worst = worstAdded(before, trouble);
    if (worst === null) return { suggestion, after: placed.value, trouble };
    if (worst === 'accept' && !acceptable) {
      acceptable = { suggestion, after: placed.value, trouble };
      triesLeft = Math.min(triesLeft, mostTriesForBetter);
    }
  }
  return acceptable;
}

/** The load as if the thing had been scanned, so that the rules can be asked about it. */
function withSubject(
  view: LoadView,
  subject: string | CatalogueItem,
): { readonly view: LoadView; readonly one: LoadPackage; readonly item: CatalogueItem } | null {
  if (typeof subject === 'string') {
    const found = findPackage(view, subject);
    const item = found && findItem(view, found.itemId);
    if (!item) return null;
    const one = found.isScanned ? found : { ...found, isScanned: true };
    const packages = view.packages.map((each) => (each === found ? one : each));
    return { view: one === found ? view : { ...view, packages }, one, item };
  }
  const one: LoadPackage = {
    // No id of a package is empty.
    packageId: '',
    code: '',
    itemId: subject.id,
    isScanned: true,
    placement: null,
    state: 'in-load',
    heldReason: null,
    expiresOn: null,
    hasExternalIndicator: true,
    hasInternalIndicator: true,
  };
  const items = findItem(view, subject.id) ? view.items : [...view.items, subject];
  return { view: { ...view, items, packages: [...view.packages, one] }, one, item: subject };
}

/** The first slot of a holder that is free, fits and keeps the gaps, counted from 1; null where there is none. */
export function nextFreeSlot(
  view: LoadView,
  holderId: string,
  item: CatalogueItem,
  policy: LoadPolicy = defaultPolicy,
): number | null {
  const layout = layOut(view);
  const holder = layout.holderOf.get(holderId);
  return (holder && freeSlots(layout, holder, item, policy)[0]) ?? null;
}

export type HolderSpot = {
  readonly shelfId: string;
  readonly xMm: Millimetre;
  readonly yMm: Millimetre;
  readonly turn: Turn;
};

/**
 * A free spot for a holder on the cart, or null. It keeps the clearance that packages need to the pouches it will hold.
 * @param shelfId the only shelf to look at; null looks from the highest down, where pouches are above the heavy things.
 */
export function suggestHolderSpot(
  view: LoadView,
  kind: HolderKind,
  shelfId: string | null,
  policy: LoadPolicy = defaultPolicy,
): HolderSpot | null {
  const shelves = [...layOut(view).shelves].reverse();
  for (const on of shelves) {
    const { shelf } = on;
    if ((shelfId !== null && shelfId !== shelf.id) || !shelf.isUsable) continue;
    if ((kind.greatestHeightMm ?? 0) + policy.headroomMm > shelf.clearHeightMm) continue;
    const spots = ([0, 90] as const).flatMap((turn) => {
      const [widthMm, depthMm] = turn === 0 ? [kind.acrossMm, kind.alongMm] : [kind.alongMm, kind.acrossMm];
      return freeSpots({
        shelf,
        size: { widthMm, depthMm },
        clearanceMm: policy.pouchGapMm,
        ...marginsOf(view, policy, shelf),
        obstacles: obstaclesOn(on, policy),
      }).map(({ xMm, yMm }) => ({ xMm, yMm, turn, backMm: yMm + depthMm }));
    });
    const [best] = spots.sort((a, b) => a.turn - b.turn || a.backMm - b.backMm || a.xMm - b.xMm);
    if (best) return { shelfId: shelf.id, xMm: best.xMm, yMm: best.yMm, turn: best.turn };
  }
  return null;
}
