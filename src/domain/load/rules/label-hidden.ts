/*
 * The label of a pouch that no slot keeps apart can be read: nothing stands close in front of its film side.
 * Source: labels go on the plastic side (dental safety association answers and label guides, restated); how much room reading
 * takes is common practice, no source. In a slot each pouch can be tipped by itself, so its label counts as readable.
 */
import { gapAcross, gapAlong, type ShelfBox } from '../../geometry/box';
import { filmLooks, type Body } from '../layout';
import { limitOf } from '../policy';
import { elsewhere } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import { slackMm } from './slack';
import type { OnShelf, Scene } from './scene';
import { commonPractice } from './sources';
import { figureWords } from './words';

/** Share of the film side from which on the label counts as hidden: where on it the label is, nobody knows. */
const hiddenShare = 0.5;

export const labelHidden: Rule = {
  id: 'label-hidden',
  about: 'shelf',
  name: 'Labels can be read',
  reason: 'A pouch whose label cannot be seen cannot be proved to be in the load.',
  source: commonPractice,
  severity: 'accept',
  parameters: ['labelReadingGapMm'],
  find,
};

function find(scene: Scene, { bodies }: OnShelf): readonly Draft[] {
  const limit = limitOf(null, scene.policy, 'labelReadingGapMm');
  return bodies.flatMap((body) => {
    if (body.thinAxis === null || body.slot !== null) return [];
    const nearest = nearestInFront(bodies, body);
    if (!nearest || nearest.gapMm >= limit.limit - slackMm) return [];
    const figure = { measured: nearest.gapMm, unit: 'mm', want: 'at-least', ...limit } as const;
    return {
      subjects: [body.packageId],
      title: `The label of ${scene.nameOf(body.package)} is hidden by ${scene.nameOf(nearest.other.package)}, ${figureWords(figure).measured} in front of it`,
      remedy: 'Put it into a holder, or leave room in front of its film side.',
      places: onPackage(body, nearest.other),
      figure,
      fixes: (scene) => elsewhere(scene, { one: body.package, item: body.item, body }),
    };
  });
}

function nearestInFront(bodies: readonly Body[], body: Body): { readonly other: Body; readonly gapMm: number } | null {
  let nearest: { other: Body; gapMm: number } | null = null;
  for (const other of bodies) {
    if (other === body) continue;
    const gapMm = gapInFront(body, other.box);
    if (gapMm === null || shareHidden(body, other.box) < hiddenShare) continue;
    if (!nearest || gapMm < nearest.gapMm) nearest = { other, gapMm };
  }
  return nearest;
}

function gapInFront(body: Body, other: ShelfBox): number | null {
  const { box } = body;
  switch (filmLooks(body)) {
    case 'right':
      return other.right > box.right ? Math.max(other.left - box.right, 0) : null;
    case 'left':
      return other.left < box.left ? Math.max(box.left - other.right, 0) : null;
    case 'back':
      return other.back > box.back ? Math.max(other.front - box.back, 0) : null;
    case 'front':
      return other.front < box.front ? Math.max(box.front - other.back, 0) : null;
    default:
      return null;
  }
}

function shareHidden({ box, thinAxis }: Body, other: ShelfBox): number {
  const beside = thinAxis === 'x' ? -gapAlong(box, other) : -gapAcross(box, other);
  const length = thinAxis === 'x' ? box.back - box.front : box.right - box.left;
  const up = Math.min(box.top, other.top) - Math.max(box.bottom, other.bottom);
  return (Math.max(beside, 0) * Math.max(up, 0)) / (length * (box.top - box.bottom));
}
