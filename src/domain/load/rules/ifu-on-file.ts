/*
 * The instructions for use of every item are on file and name at least one cycle.
 * Source: common practice; surveyors ask for them (inspection worksheets and teaching texts, restated).
 */
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { Listed, Scene } from './scene';
import { commonPractice } from './sources';

export const ifuOnFile: Rule = {
  id: 'ifu-on-file',
  about: 'package',
  name: 'Instructions for use are on file',
  reason: 'Without the instructions nobody can say which cycle, place and spacing the item was validated for.',
  source: commonPractice,
  severity: 'accept',
  parameters: [],
  find,
};

function find(scene: Scene, { one, item }: Listed): Draft | null {
  if (!item || item.kind === 'challenge-device') return null;
  const isMissing = item.ifuReference === null || item.ifuReference.trim() === '';
  if (!isMissing && item.cycleNeeds.length > 0) return null;
  const name = scene.nameOf(one);
  return {
    subjects: [one.packageId],
    title: isMissing
      ? `No instructions for use on file for ${name}`
      : `The instructions for use of ${name} name no cycle`,
    remedy: 'Have the instructions for use entered in the catalogue.',
    places: onPackage(one),
  };
}
