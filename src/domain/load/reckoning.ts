import { nameOf, shelfIdOf, shelvesUpward } from './look-up';
import type { LoadView } from './model';

/** A package by the words a person knows it by. */
export type NamedPackage = { readonly packageId: string; readonly code: string; readonly name: string };

export type ShelfReckoning = {
  readonly shelfId: string;
  readonly shelfName: string;
  /** Scanned onto this shelf, and not scanned yet but expected on it. */
  readonly listed: number;
  readonly scanned: number;
  /** null while nobody has counted. */
  readonly counted: number | null;
  readonly isEven: boolean;
  /** What is the matter, or "all scanned", or "count later". */
  readonly difference: string;
  /** Expected on this shelf and not scanned yet. */
  readonly missing: readonly NamedPackage[];
};

export type Reckoning = {
  readonly shelves: readonly ShelfReckoning[];
  readonly listed: number;
  readonly scanned: number;
  /** null until every shelf has been counted. */
  readonly counted: number | null;
  /** Listed, scanned and counted agree for every shelf and for the load. */
  readonly isEven: boolean;
  readonly difference: string;
  /** On the list and not scanned, wherever it may be. */
  readonly missing: readonly NamedPackage[];
  /** Scanned and in nobody's place yet: on no shelf, so in no shelf's figures. */
  readonly unplaced: readonly NamedPackage[];
};

/**
 * The three numbers, shelf by shelf and for the load: listed, scanned, counted.
 * @param expectedShelf shelf on which each package that is not scanned yet is expected, by package id, where somebody
 *   knows it; `arrangeRest` with `includeUnscanned` tells. Packages it does not name are missing from the load only.
 */
export function reckon(view: LoadView, expectedShelf: ReadonlyMap<string, string> = new Map()): Reckoning {
  const named = (one: LoadView['packages'][number]): NamedPackage => ({
    packageId: one.packageId,
    code: one.code,
    name: nameOf(view, one),
  });
  const missing = view.packages.filter((one) => !one.isScanned);
  const scanned = view.packages.filter((one) => one.isScanned);
  const shelfOf = new Map(scanned.map((one) => [one.packageId, shelfIdOf(view, one.placement)]));

  const shelves = shelvesUpward(view).map((shelf): ShelfReckoning => {
    const scannedHere = scanned.filter((one) => shelfOf.get(one.packageId) === shelf.id).length;
    const missingHere = missing.filter((one) => expectedShelf.get(one.packageId) === shelf.id);
    const counted = view.counts.find((count) => count.shelfId === shelf.id)?.counted ?? null;
    return {
      shelfId: shelf.id,
      shelfName: shelf.name,
      listed: scannedHere + missingHere.length,
      scanned: scannedHere,
      counted,
      isEven: missingHere.length === 0 && counted === scannedHere,
      difference: differenceWords(missingHere.length, scannedHere, counted),
      missing: missingHere.map(named),
    };
  });

  const unplaced = scanned.filter((one) => shelfOf.get(one.packageId) === undefined);
  const counted = shelves.every((shelf) => shelf.counted !== null)
    ? shelves.reduce((sum, shelf) => sum + (shelf.counted ?? 0), 0)
    : null;
  return {
    shelves,
    listed: view.packages.length,
    scanned: scanned.length,
    counted,
    isEven: missing.length === 0 && unplaced.length === 0 && shelves.every((shelf) => shelf.isEven),
    difference: differenceWords(missing.length, scanned.length, counted),
    missing: missing.map(named),
    unplaced: unplaced.map(named),
  };
}

function differenceWords(missing: number, scanned: number, counted: number | null): string {
  const words: string[] = [];
  // More pieces than scans: what is too many has not been scanned, whether or not it is on the list.
  if (counted !== null && counted > scanned) words.push(`${counted - scanned} counted but not scanned`);
  if (counted !== null && counted < scanned) words.push(`${scanned - counted} scanned but not counted`);
  if (missing > 0) words.push(`${missing} on the list not scanned`);
  if (words.length > 0) return words.join(', ');
  return counted === null ? 'count later' : 'all scanned and counted';
}
