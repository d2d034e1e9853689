/*
 * The sterilizer is qualified for the program of the load.
 * Source: FDA reprocessing guidance, criterion 4: discrete validated settings; that unused programs are a hazard is a trade
 * column's advice (remove cycles that are never validated).
 */
import { onLoad } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';

export const programQualified: Rule = {
  id: 'program-qualified',
  about: 'load',
  name: 'The sterilizer is qualified for the program',
  reason: 'A program that was never shown to work in this sterilizer proves nothing, whatever its panel offers.',
  source: {
    text: 'FDA reprocessing guidance, criterion 4: discrete validated cycle settings. Which programs a sterilizer is qualified for, as entered by this facility.',
    provenance: 'published',
  },
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene): readonly Draft[] {
  const { sterilizer, program, qualifiedPrograms } = scene.view;
  if (qualifiedPrograms.some((one) => one.id === program.id)) return [];
  const codes = qualifiedPrograms.map((one) => one.code).join(', ');
  return [
    {
      subjects: [program.id],
      title: `${sterilizer.name} is not qualified for ${program.code}`,
      remedy: codes === '' ? 'Build this load for another sterilizer.' : `Take one that it is qualified for: ${codes}.`,
      places: onLoad,
      fixes: () =>
        qualifiedPrograms.map((one) => ({
          label: `Change the program to ${one.code}`,
          edits: [{ edit: 'change-program', programId: one.id }],
        })),
    },
  ];
}
