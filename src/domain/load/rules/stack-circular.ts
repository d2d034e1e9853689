/*
 * Nothing stands on itself, not even by way of others.
 * Source: our own check of the drawn cart.
 */
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { Scene } from './scene';
import { drawing } from './sources';
import { listWords } from './words';

export const stackCircular: Rule = {
  id: 'stack-circular',
  about: 'load',
  name: 'Stacks start on a shelf',
  reason: 'Things that stand on each other in a circle have no place on the cart, so nothing can be said about them.',
  source: drawing,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene): readonly Draft[] {
  const left = new Map(
    scene.listed
      .filter(({ one }) => scene.layout.nowhere.get(one.packageId) === 'circular')
      .map(({ one }) => [one.packageId, one]),
  );
  const drafts: Draft[] = [];
  for (const first of [...left.values()]) {
    const circle = [];
    for (let one = left.get(first.packageId); one;) {
      circle.push(one);
      left.delete(one.packageId);
      one = one.placement?.at === 'package' ? left.get(one.placement.belowPackageId) : undefined;
    }
    if (circle.length === 0) continue;
    const names = listWords(circle.map(scene.nameOf));
    drafts.push({
      subjects: circle.map((one) => one.packageId),
      title:
        circle.length === 1
          ? `${names} is said to stand on itself`
          : `${names} are said to stand on each other in a circle`,
      remedy: 'Say again what they stand on.',
      places: onPackage(...circle),
    });
  }
  return drafts;
}
