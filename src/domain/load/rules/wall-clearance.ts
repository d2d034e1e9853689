/*
 * Nothing is close to a wall of the chamber. The shelf is taken to stand in the middle of the chamber.
 * Source: general practice, several manuals (nothing touching chamber walls); the distance is the facility's to set.
 */
import { mm } from '../../units/quantity';
import type { Body } from '../layout';
import { limitOf } from '../policy';
import { elsewhere, moveHolder } from './moves';
import { onHolder, onPackage } from './places';
import type { Draft, Rule } from './rule';
import { slackMm } from './slack';
import type { OnShelf, Scene } from './scene';
import { generalPractice } from './sources';
import { figureWords } from './words';

export const wallClearance: Rule = {
  id: 'wall-clearance',
  about: 'shelf',
  name: 'Clear of the chamber walls',
  reason: 'Water runs down the chamber walls, and what touches them stays wet or scorches.',
  source: generalPractice,
  severity: 'accept',
  parameters: ['wallClearanceMm'],
  find,
};

type Wall = { readonly measured: number; readonly words: string; readonly axis: 'x' | 'y'; readonly sign: 1 | -1 };

function find(scene: Scene, { bodies }: OnShelf): readonly Draft[] {
  const limit = limitOf(null, scene.policy, 'wallClearanceMm');
  const nearest = new Map<string, { body: Body; wall: Wall }>();
  for (const body of bodies) {
    const wall = nearestWall(scene, body);
    if (wall.measured >= limit.limit - slackMm) continue;
    const unit = body.holder?.holder.holderId ?? body.packageId;
    const known = nearest.get(unit);
    if (!known || wall.measured < known.wall.measured) nearest.set(unit, { body, wall });
  }
  return [...nearest].map(([unit, { body, wall }]) => {
    const figure = { measured: wall.measured, unit: 'mm', want: 'at-least', ...limit } as const;
    const words = figureWords(figure);
    const { holder } = body;
    const name = holder ? `A pouch in ${scene.holderName(holder.holder)}` : scene.nameOf(body.package);
    return {
      subjects: [unit],
      title: `${name} is ${words.measured} from the ${wall.words}, want ${words.limit}`,
      remedy: `Move ${holder ? 'the holder' : 'it'} away from the ${wall.words}.`,
      places: holder ? [onHolder(holder.holder, body.slot)] : onPackage(body),
      figure,
      fixes: (scene) => fixesFor(scene, body, wall, limit.limit - wall.measured),
    };
  });
}

function nearestWall(scene: Scene, { box, shelf }: Body): Wall {
  const { sterilizer } = scene.view;
  const across = Math.max((sterilizer.chamberWidthMm - shelf.widthMm) / 2, 0);
  const along = Math.max((sterilizer.chamberDepthMm - shelf.depthMm) / 2, 0);
  const walls: readonly Wall[] = [
    { measured: across + box.left, words: 'left wall', axis: 'x', sign: 1 },
    { measured: across + shelf.widthMm - box.right, words: 'right wall', axis: 'x', sign: -1 },
    { measured: along + box.front, words: 'door', axis: 'y', sign: 1 },
    { measured: along + shelf.depthMm - box.back, words: 'far end', axis: 'y', sign: -1 },
  ];
  return walls.reduce((least, wall) => (wall.measured < least.measured ? wall : least));
}

function* fixesFor(scene: Scene, body: Body, { axis, sign, words }: Wall, byMm: number) {
  const shift = (at: { readonly xMm: number; readonly yMm: number }) => ({
    xMm: mm(at.xMm + (axis === 'x' ? sign * byMm : 0)),
    yMm: mm(at.yMm + (axis === 'y' ? sign * byMm : 0)),
  });
  const { holder, placement, package: one, item } = body;
  if (holder) {
    yield moveHolder(`Move the holder away from the ${words}`, holder.holder, shift(holder.holder));
    return;
  }
  if (placement.at === 'shelf') {
    const moved = { ...placement, ...shift(placement) };
    const label = `Move it away from the ${words}`;
    yield { label, edits: [{ edit: 'place', packageId: one.packageId, placement: moved }] } as const;
  }
  yield* elsewhere(scene, { one, item, body });
}
