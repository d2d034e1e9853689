/*
 * Everything fits under the shelf above, with the free height the facility asks for.
 * Source: the clear height of the shelf, as entered by the facility.
 */
import type { Body } from '../layout';
import { elsewhere } from './moves';
import { onHolder, onPackage } from './places';
import type { Draft, Rule } from './rule';
import { slackMm } from './slack';
import type { OnShelf, Scene } from './scene';
import { equipment } from './sources';
import { figureWords } from './words';

export const headroom: Rule = {
  id: 'headroom',
  about: 'shelf',
  name: 'Everything fits under the shelf above',
  reason: 'What is too high is crushed when the cart goes in, or shuts off the steam below the next shelf.',
  source: equipment,
  severity: 'stop',
  parameters: ['headroomMm'],
  find,
};

function find(scene: Scene, { bodies }: OnShelf): readonly Draft[] {
  const limitOf = ({ shelf }: Body) => shelf.clearHeightMm - scene.policy.headroomMm;
  const isTooHigh = (body: Body) => body.box.top > limitOf(body) + slackMm;
  const tooHigh = new Map<string, { highest: Body; readonly all: Body[] }>();
  for (const body of bodies) {
    // In a stack the first that is too high; in a holder the highest.
    if (!isTooHigh(body) || (body.below && isTooHigh(body.below))) continue;
    const unit = body.holder?.holder.holderId ?? body.packageId;
    const known = tooHigh.get(unit);
    if (!known) tooHigh.set(unit, { highest: body, all: [body] });
    else {
      known.all.push(body);
      if (body.box.top > known.highest.box.top) known.highest = body;
    }
  }
  return [...tooHigh].map(([unit, { highest: body, all }]) => {
    const { holder, shelf } = body;
    const limit = limitOf(body);
    const figure = { measured: body.box.top, limit, unit: 'mm', want: 'at-most', limitFrom: 'equipment' } as const;
    const words = figureWords(figure);
    const reaches = body.below ? 'reaches up to' : 'is';
    return {
      subjects: [unit],
      title: `${scene.thing(body)} ${reaches} ${words.measured} high, ${shelf.name} takes ${words.limit}`,
      remedy: body.below ? 'Take it off the stack.' : 'Put it on a shelf with more height.',
      places: [...(holder ? [onHolder(holder.holder, body.slot)] : []), ...onPackage(...all)],
      figure,
      fixes: (scene) => (holder ? [] : elsewhere(scene, { one: body.package, item: body.item, body })),
    };
  });
}
