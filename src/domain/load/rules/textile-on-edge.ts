/*
 * A textile pack stands on edge, its folds upright.
 * Source: general practice, several manuals (textile folds vertical).
 */
import { wrongPose } from './poses';
import type { Draft, Rule } from './rule';
import type { OnShelf, Scene } from './scene';
import { generalPractice } from './sources';

export const textileOnEdge: Rule = {
  id: 'textile-on-edge',
  about: 'shelf',
  name: 'Textile packs stand on edge',
  reason: 'Air leaves and steam comes in between upright folds; lying flat the layers press each other shut.',
  source: generalPractice,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene, { bodies }: OnShelf): readonly Draft[] {
  return wrongPose(
    scene,
    bodies,
    ({ item, placement }) => item.kind === 'textile-pack' && item.pose === 'on-edge' && placement.pose !== 'on-edge',
    {
      says: (body) => (body.placement.pose === 'flat' ? 'lies flat, want it on edge' : 'is tilted, want it on edge'),
      remedy: 'Stand it on edge so that its folds are upright.',
      want: 'on-edge',
    },
  );
}
