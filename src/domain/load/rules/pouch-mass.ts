/*
 * A pouch holds no more than its instructions for use permit, or the facility does.
 * Source: perioperative packaging guideline 2019 (summary): pouches only for small, light, low-profile items; it gives no mass.
 */
import { limitOf } from '../policy';
import { takeOff } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import { slackKg } from './slack';
import type { Listed, Scene } from './scene';
import { figureWords, sourceOf } from './words';

export const pouchMass: Rule = {
  id: 'pouch-mass',
  about: 'package',
  name: 'Pouches are not too heavy',
  reason: 'What is heavy works through the paper or the seal, and makes more water than a pouch lets go.',
  source: {
    text: 'Perioperative packaging guideline 2019 (summary): pouches only for small, light, low-profile items. It gives no mass.',
    provenance: 'restated',
  },
  severity: 'accept',
  parameters: ['greatestPouchMassKg'],
  find,
};

function find(scene: Scene, { one, item }: Listed): Draft | null {
  if (item?.kind !== 'pouch') return null;
  const limit = limitOf(item.massLimitKg, scene.policy, 'greatestPouchMassKg');
  if (!(item.massKg > limit.limit + slackKg)) return null;
  const figure = { measured: item.massKg, unit: 'kg', want: 'at-most', ...limit } as const;
  const words = figureWords(figure);
  return {
    subjects: [one.packageId],
    title: `${scene.nameOf(one)} weighs ${words.measured}, a pouch takes ${words.limit}`,
    remedy: 'Take it off the load and have it packed another way.',
    places: onPackage(one),
    figure,
    source: sourceOf(limit.limitFrom, item, pouchMass.source),
    fixes: () => [takeOff(one)],
  };
}
