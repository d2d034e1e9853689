import type { CatalogueItem, CycleNeed, LoadPackage, Program } from './model';

export type ProgramMatch = {
  readonly program: Program;
  /** Packages whose instructions do not permit this program: exactly these have to go for it to fit. */
  readonly takeOut: readonly LoadPackage[];
};

export type CycleMatch = {
  /** Programs that fit every package, the best first: the longest drying asked for wins, and no longer than that. */
  readonly fitting: readonly Program[];
  /** Every program with what it would leave out, the fewest packages first. */
  readonly matches: readonly ProgramMatch[];
};

/** Whether a program is one of the discrete cycles an item's instructions permit. Longer drying is always permitted. */
export function fits(program: Program, needs: readonly CycleNeed[]): boolean {
  return needs.some(
    (need) =>
      need.type === program.type &&
      need.temperatureC === program.temperatureC &&
      program.exposureS >= need.leastExposureS &&
      (need.greatestExposureS === null || program.exposureS <= need.greatestExposureS) &&
      program.dryS >= need.leastDryS,
  );
}

/**
 * Which programs fit all packages; where none does, the smallest set of packages to take out and the program that buys.
 *
 * A program judges each package by itself, so the set it leaves out is exact, and the smallest over all programs is the
 * smallest there is. Packages whose instructions name no cycle are not judged here: that they name none is its own finding.
 */
export function matchCycle(
  packages: readonly LoadPackage[],
  items: readonly CatalogueItem[],
  programs: readonly Program[],
): CycleMatch {
  const itemOf = new Map(items.map((item) => [item.id, item]));
  const judged = packages.flatMap((one) => {
    const needs = itemOf.get(one.itemId)?.cycleNeeds ?? [];
    return needs.length > 0 ? [{ one, needs }] : [];
  });
  // Many packages share an item, and with it the verdict.
  const matches = programs.map((program) => {
    const verdictOf = new Map<readonly CycleNeed[], boolean>();
    const takeOut = judged.flatMap(({ one, needs }) => {
      const verdict = verdictOf.get(needs) ?? fits(program, needs);
      verdictOf.set(needs, verdict);
      return verdict ? [] : [one];
    });
    return { program, takeOut };
  });
  matches.sort(
    (a, b) =>
      a.takeOut.length - b.takeOut.length ||
      a.program.dryS - b.program.dryS ||
      a.program.exposureS - b.program.exposureS ||
      (a.program.code < b.program.code ? -1 : 1),
  );
  return {
    fitting: matches.filter((match) => match.takeOut.length === 0).map((match) => match.program),
    matches,
  };
}
