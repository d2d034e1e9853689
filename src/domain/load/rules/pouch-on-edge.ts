/*
 * A pouch stands on its edge.
 * Source: CDC guideline (2008), loading: peel packs on edge in perforated or mesh racks, as restated. For pouches lying flat
 * sources contradict each other about which side is up; on edge is what they share.
 */
import { elsewhere, setPose } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { OnShelf, Scene } from './scene';
import { cdcLoading } from './sources';

export const pouchOnEdge: Rule = {
  id: 'pouch-on-edge',
  about: 'shelf',
  name: 'Pouches stand on edge',
  reason: 'Steam passes only through the paper side, and lying flat water stays in the pouch.',
  source: cdcLoading,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene, { bodies }: OnShelf): readonly Draft[] {
  return bodies.flatMap((body) => {
    const { item, placement, package: one } = body;
    if (item.kind !== 'pouch' || placement.pose === 'on-edge') return [];
    // Some instructions ask for flat: as they say, and no other way, it may lie.
    if (item.pose === 'flat' && placement.pose === 'flat') return [];
    const how = placement.pose === 'flat' ? 'lies flat' : 'is tilted';
    return {
      subjects: [body.packageId],
      title: `${scene.thing(body)} ${how}, want it on edge`,
      remedy: 'Stand it on its long edge in a holder that takes it.',
      places: onPackage(body),
      *fixes(scene) {
        const known = { one, item, body };
        if (body.holder) yield* setPose(scene, known, 'on-edge');
        yield* elsewhere(scene, known);
      },
    };
  });
}
