/*
 * Enough of each shelf stays open for steam to come through.
 * Source: the facility's own; published limits are for the volume of the chamber, not the area of a shelf.
 */
import { areaOf, coveredArea } from '../../geometry/box';
import { limitOf } from '../policy';
import { onShelf } from './places';
import type { Draft, Rule } from './rule';
import type { OnShelf, Scene } from './scene';
import { commonPractice } from './sources';
import { figureWords } from './words';

export const steamPath: Rule = {
  id: 'steam-path',
  about: 'shelf',
  name: 'Steam has a way through each shelf',
  reason: 'Air leaves downwards and steam follows it; a covered shelf keeps both from what is below.',
  source: commonPractice,
  severity: 'advice',
  parameters: ['greatestShelfCoverPercent'],
  find,
};

function find(scene: Scene, { shelf, bodies }: OnShelf): readonly Draft[] {
  const limit = limitOf(null, scene.policy, 'greatestShelfCoverPercent');
  const area = shelf.widthMm * shelf.depthMm;
  // The plain sum is never less than what is covered, and much quicker to have.
  const sum = bodies.reduce((whole, body) => whole + areaOf(body.box), 0);
  if (!((sum / area) * 100 > limit.limit)) return [];
  const measured = (coveredArea(bodies.map((body) => body.box)) / area) * 100;
  if (!(measured > limit.limit)) return [];
  const figure = { measured, unit: '%', want: 'at-most', ...limit } as const;
  const words = figureWords(figure);
  return [
    {
      subjects: [shelf.id],
      title: `${words.measured} of ${shelf.name} is covered, want at most ${words.limit}`,
      remedy: 'Move something to another shelf or another load.',
      places: onShelf(shelf),
      figure,
    },
  ];
}
