import { accept, refuse, type Result } from '../result';
import type { LoadHolder, LoadPackage, LoadView, Program } from './model';

type Change<Thing> = { readonly id: string; readonly before: Thing | null; readonly after: Thing | null };

/** What an act changed of a load: enough to write it, to tell it, and to take it back. */
export type LoadDifference = {
  readonly packages: readonly Change<LoadPackage>[];
  readonly holders: readonly Change<LoadHolder>[];
  readonly program: { readonly before: Program; readonly after: Program } | null;
};

function isSame(one: unknown, other: unknown): boolean {
  if (Object.is(one, other)) return true;
  if (typeof one !== 'object' || typeof other !== 'object' || one === null || other === null) return false;
  const keys = new Set([...Object.keys(one), ...Object.keys(other)]);
  for (const key of keys) {
    if (!isSame((one as Record<string, unknown>)[key], (other as Record<string, unknown>)[key])) return false;
  }
  return true;
}

function changesOf<Thing>(
  before: readonly Thing[],
  after: readonly Thing[],
  idOf: (thing: Thing) => string,
): Change<Thing>[] {
  const was = new Map(before.map((thing) => [idOf(thing), thing]));
  const is = new Map(after.map((thing) => [idOf(thing), thing]));
  const changes: Change<Thing>[] = [];
  for (const id of new Set([...was.keys(), ...is.keys()])) {
    const change = { id, before: was.get(id) ?? null, after: is.get(id) ?? null };
    if (!isSame(change.before, change.after)) changes.push(change);
  }
  return changes;
}

export function differenceOf(before: LoadView, after: LoadView): LoadDifference {
  return {
    packages: changesOf(before.packages, after.packages, (entry) => entry.packageId),
    holders: changesOf(before.holders, after.holders, (entry) => entry.holderId),
    program: before.program.id === after.program.id ? null : { before: before.program, after: after.program },
  };
}

export function isEmptyDifference(difference: LoadDifference): boolean {
  return difference.packages.length === 0 && difference.holders.length === 0 && difference.program === null;
}

export function reverseDifference(difference: LoadDifference): LoadDifference {
  const turn = <Thing>({ id, before, after }: Change<Thing>): Change<Thing> => ({ id, before: after, after: before });
  return {
    packages: difference.packages.map(turn),
    holders: difference.holders.map(turn),
    program: difference.program ? { before: difference.program.after, after: difference.program.before } : null,
  };
}

function applyChanges<Thing>(
  things: readonly Thing[],
  changes: readonly Change<Thing>[],
  idOf: (thing: Thing) => string,
): readonly Thing[] | null {
  const kept = new Map(things.map((thing) => [idOf(thing), thing]));
  for (const { id, before, after } of changes) {
    if (!isSame(kept.get(id) ?? null, before)) return null;
    if (after === null) kept.delete(id);
    else kept.set(id, after);
  }
  return [...kept.values()];
}

/**
 * Applies a difference to a load that still is as the difference found it.
 * Refuses when anything it touches has changed since: taking back must never undo somebody else's later act.
 */
export function applyDifference(view: LoadView, difference: LoadDifference): Result<LoadView> {
  const packages = applyChanges(view.packages, difference.packages, (entry) => entry.packageId);
  const holders = applyChanges(view.holders, difference.holders, (entry) => entry.holderId);
  const isProgramAsFound = difference.program === null || difference.program.before.id === view.program.id;
  if (!packages || !holders || !isProgramAsFound) {
    return refuse('load.changed-since', 'This cannot be taken back any more: it was changed again since.');
  }
  return accept({ ...view, packages, holders, program: difference.program ? difference.program.after : view.program });
}
