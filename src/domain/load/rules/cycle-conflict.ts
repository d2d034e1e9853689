/*
 * The program is one that the instructions for use of every package permit: type, temperature, exposure and least drying.
 * Source: instructions for use. FDA reprocessing guidance, criterion 4: they name discrete settings, never ranges to pick from.
 */
import type { Fix } from '../finding';
import { fits, matchCycle, type ProgramMatch } from '../cycle-match';
import type { LoadPackage, Program } from '../model';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';
import { countWords, listWords } from './words';

export const cycleConflict: Rule = {
  id: 'cycle-conflict',
  about: 'load',
  name: 'One program fits every package',
  reason:
    'Each item was validated with the cycles its instructions name; in any other it may stay unsterile or wet, or be damaged.',
  source: {
    text: 'Instructions for use of the items. FDA reprocessing guidance, criterion 4: discrete cycle settings, never ranges.',
    provenance: 'published',
  },
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene): readonly Draft[] {
  const { program, qualifiedPrograms, items } = scene.view;
  const unfit = scene.listed.flatMap(({ one, item }) =>
    item && item.cycleNeeds.length > 0 && !fits(program, item.cycleNeeds) ? [one] : [],
  );
  if (unfit.length === 0) return [];
  const packages = scene.listed.map(({ one }) => one);
  const { fitting, matches } = matchCycle(packages, items, qualifiedPrograms);
  const [best] = fitting;
  const [fewest] = matches;
  const names = listWords(unfit.map(scene.nameOf));
  const verb = unfit.length === 1 ? 'is' : 'are';
  return [
    {
      subjects: unfit.map((one) => one.packageId),
      title: `${names} ${verb} not permitted in ${program.code}`,
      remedy: best
        ? `Take ${best.code}: it fits every package${best.dryS > program.dryS ? ', with the longest drying that any of them asks for' : ''}.`
        : remedyWithout(scene, fewest, program.id),
      places: onPackage(...unfit),
      figure: { measured: unfit.length, limit: 0, unit: 'count', want: 'exactly', limitFrom: 'ifu' },
      fixes: () => fixesFor(best, { unfit, fewest, programId: program.id }),
    },
  ];
}

/** No program fits all: what the smallest set to take out is, and which program that buys. */
function remedyWithout(scene: Scene, fewest: ProgramMatch | undefined, programId: string): string {
  if (!fewest) return 'This sterilizer has no qualified program.';
  const { program, takeOut } = fewest;
  const names = listWords(takeOut.map(scene.nameOf), 6);
  const buys = program.id === programId ? `${program.code} can stay` : `${program.code} fits the rest`;
  return `No program fits all. Take ${countWords(takeOut.length, 'package', 'packages')} out and ${buys}: ${names}.`;
}

type Ways = {
  readonly unfit: readonly LoadPackage[];
  readonly fewest: ProgramMatch | undefined;
  readonly programId: string;
};

function fixesFor(best: Program | undefined, { unfit, fewest, programId }: Ways): readonly Fix[] {
  if (best) {
    return [{ label: `Change the program to ${best.code}`, edits: [{ edit: 'change-program', programId: best.id }] }];
  }
  const off = (packages: readonly LoadPackage[]) =>
    packages.map((one) => ({ edit: 'take-off', packageId: one.packageId }) as const);
  const stay: Fix = {
    label: `Take ${countWords(unfit.length, 'package', 'packages')} off the load`,
    edits: off(unfit),
  };
  // As few to take out and the program stays: the least change.
  if (!fewest || fewest.takeOut.length >= unfit.length) return [stay];
  const { program, takeOut } = fewest;
  const change: Fix = {
    label: `Take ${countWords(takeOut.length, 'package', 'packages')} off and change the program to ${program.code}`,
    edits: [
      ...off(takeOut),
      ...(program.id === programId ? [] : [{ edit: 'change-program', programId: program.id } as const]),
    ],
  };
  return [change, stay];
}
