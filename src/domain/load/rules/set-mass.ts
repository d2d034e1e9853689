/*
 * A set or a textile pack is not heavier than its instructions for use permit, or the facility does.
 * Source: 25 lb (11.3 kg) by secondary texts and a published hospital loaner policy, its origin in AAMI documents from memory;
 * textile packs 12 lb (5.4 kg) by a technician examination page. Others say 7, 8.5 or 10 kg for sets and 5 or 6 kg for textiles.
 */
import { limitOf } from '../policy';
import { takeOff } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import { slackKg } from './slack';
import type { Listed, Scene } from './scene';
import { figureWords, sourceOf } from './words';

export const setMass: Rule = {
  id: 'set-mass',
  about: 'package',
  name: 'Sets are not too heavy',
  reason: 'Much metal makes much water, which stays in the set, and a heavy set hurts the people who lift it.',
  source: {
    text: 'Sets: 25 lb (11.3 kg), secondary texts and a published hospital loaner policy. Textile packs: 12 lb (5.4 kg), a technician examination page. Other sources name other limits.',
    provenance: 'restated',
  },
  severity: 'stop',
  parameters: ['greatestSetMassKg', 'greatestTextilePackMassKg'],
  find,
};

function find(scene: Scene, { one, item }: Listed): Draft | null {
  if (!item || item.kind === 'pouch' || item.kind === 'challenge-device') return null;
  const id = item.kind === 'textile-pack' ? 'greatestTextilePackMassKg' : 'greatestSetMassKg';
  const limit = limitOf(item.massLimitKg, scene.policy, id);
  if (!(item.massKg > limit.limit + slackKg)) return null;
  const figure = { measured: item.massKg, unit: 'kg', want: 'at-most', ...limit } as const;
  const words = figureWords(figure);
  return {
    subjects: [one.packageId],
    title: `${scene.nameOf(one)} weighs ${words.measured}, want at most ${words.limit}`,
    remedy: 'Take it off the load and have it split into two.',
    places: onPackage(one),
    figure,
    source: sourceOf(limit.limitFrom, item, setMass.source),
    fixes: () => [takeOff(one)],
  };
}
