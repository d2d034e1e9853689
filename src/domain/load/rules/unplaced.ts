/*
 * Every scanned package has a place on the cart.
 * Source: our own check; the rules about places can judge only what is placed.
 */
import type { Fix } from '../finding';
import type { WhyNowhere } from '../layout';
import { elsewhere } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { Listed, Scene } from './scene';
import { drawing } from './sources';
import { countWords, listWords } from './words';

export const unplaced: Rule = {
  id: 'unplaced',
  about: 'load',
  name: 'Everything scanned has a place',
  reason: 'Nothing can be said about how a package stands as long as nobody has said where.',
  source: drawing,
  severity: 'stop',
  parameters: [],
  find,
};

/** The other reasons to have no place are findings of their own. */
const isHere: ReadonlySet<WhyNowhere> = new Set<WhyNowhere>([
  'not-placed',
  'shelf-not-here',
  'holder-not-here',
  'not-a-basket',
  'nothing-below',
  'base-is-nowhere',
]);

function find(scene: Scene): readonly Draft[] {
  const without = scene.listed.filter(({ one }) => {
    const why = scene.layout.nowhere.get(one.packageId);
    return one.isScanned && why !== undefined && isHere.has(why);
  });
  if (without.length === 0) return [];
  const names = listWords(without.map(({ one }) => scene.nameOf(one)));
  return [
    {
      subjects: without.map(({ one }) => one.packageId),
      title:
        without.length === 1
          ? `${names} is scanned and has no place`
          : `${countWords(without.length, 'package', 'packages')} are scanned and have no place: ${names}`,
      remedy: 'Scan the holder or shelf they are in, then the packages.',
      places: onPackage(...without.map(({ one }) => one)),
      figure: { measured: without.length, limit: 0, unit: 'count', want: 'exactly', limitFrom: 'default' },
      fixes: (scene) => placeIt(scene, without),
    },
  ];
}

function placeIt(scene: Scene, [first, ...others]: readonly Listed[]): Iterable<Fix> {
  if (!first?.item || others.length > 0) return [];
  return elsewhere(scene, { one: first.one, item: first.item, body: undefined });
}
