/*
 * Every package on the list has been scanned.
 * Source: New Jersey Administrative Code 8:43G-8.11(f): a load record lists its specific contents.
 */
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';
import { accountability } from './sources';
import { countWords, listWords } from './words';

export const unscanned: Rule = {
  id: 'unscanned',
  about: 'load',
  name: 'Nothing unscanned',
  reason: 'A package that was not scanned cannot be proved to be in the load, nor be found when the load fails.',
  source: accountability,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene): readonly Draft[] {
  const waiting = scene.listed.flatMap(({ one }) => (one.isScanned ? [] : [one]));
  if (waiting.length === 0) return [];
  const count = countWords(waiting.length, 'package', 'packages');
  return [
    {
      subjects: waiting.map((one) => one.packageId),
      title: `${count} not scanned: ${listWords(waiting.map(scene.nameOf))}`,
      remedy: 'Scan them, or take them off the list.',
      places: onPackage(...waiting),
      figure: { measured: waiting.length, limit: 0, unit: 'count', want: 'exactly', limitFrom: 'default' },
    },
  ];
}
