/*
 * Metal is below textiles: nothing metal stands on a textile pack or above it on a higher shelf.
 * Source: general practice, several manuals (textiles above metal); a sterilizer instruction sheet asks the same.
 */
import { moveAll, moveNamed } from './moves';
import { isMetalOver } from './metal';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';
import { generalPractice } from './sources';
import { waterOnMetal } from './water-on-metal';
import { listWords } from './words';

export const metalOverTextile: Rule = {
  id: 'metal-over-textile',
  about: 'load',
  name: 'Metal stays below textiles',
  reason: 'Water that condenses on metal drips down, and a wet textile pack is not sterile.',
  source: generalPractice,
  severity: 'stop',
  parameters: ['metalOverTextileKg'],
  find,
};

function find(scene: Scene): readonly Draft[] {
  const { bodies } = scene.layout;
  const textiles = bodies.filter((body) => body.item.kind === 'textile-pack');
  if (textiles.length === 0) return [];
  const { kgOn, working } = waterOnMetal(scene);
  return textiles.flatMap((textile) => {
    const metal = bodies.filter((body) => body !== textile && isMetalOver(body, textile, scene.policy));
    if (metal.length === 0) return [];
    const names = listWords(metal.map((body) => scene.nameOf(body.package)));
    const items = metal.map((body) => body.item);
    return {
      subjects: [textile.packageId, ...metal.map((body) => body.packageId)],
      title: `${scene.nameOf(textile.package)} is below metal: ${names}`,
      remedy: 'Put the textile pack above the metal, or the metal where nothing textile is under it.',
      reason: `Water that condenses on metal drips down, about ${kgOn(items).toFixed(2)} kg here (${working(items)}), and a wet textile pack is not sterile.`,
      places: onPackage(textile, ...metal),
      *fixes(scene) {
        yield* moveNamed(scene, textile);
        yield* moveAll(scene, metal);
      },
    };
  });
}
