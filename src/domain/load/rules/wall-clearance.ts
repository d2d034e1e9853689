/*
 * Nothing is close to a wall of the chamber. The shelf is taken to stand in the middle of the chamber.
 * Source: general practice, several manuals (nothing touching chamber walls); the distance is the facility's to set.
 */
import type { ShelfBox } from '../../geometry/box';
import { mm } from '../../units/quantity';
import type { Fix } from '../finding';
import type { Body } from '../layout';
import type { LoadHolder, Shelf } from '../model';
import { limitOf } from '../policy';
import { hasFrame } from './holder-fit';
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

/** What stands too near a wall: a package on the shelf, or a holder, itself or by what is in it. */
type Thing =
  | { readonly is: 'package'; readonly body: Body }
  | { readonly is: 'holder'; readonly holder: LoadHolder; readonly slot: number | null; readonly isItself: boolean };

type Near = { readonly wall: Wall; readonly thing: Thing };

function find(scene: Scene, { shelf, bodies, holders }: OnShelf): readonly Draft[] {
  const limit = limitOf(null, scene.policy, 'wallClearanceMm');
  const nearest = new Map<string, Near>();
  const look = (unit: string, box: ShelfBox, thing: Thing) => {
    const wall = nearestWall(scene, box, shelf);
    // The frame of a holder may be near a wall as long as it does not touch it: steam passes through it.
    const isItself = thing.is === 'holder' && thing.isItself;
    if (isItself ? wall.measured > slackMm : wall.measured >= limit.limit - slackMm) return;
    const known = nearest.get(unit);
    if (!known || wall.measured < known.wall.measured) nearest.set(unit, { wall, thing });
  };
  for (const one of holders) {
    const { holder } = one;
    if (hasFrame(one)) look(holder.holderId, one.box, { is: 'holder', holder, slot: null, isItself: true });
  }
  for (const body of bodies) {
    const holder = body.holder?.holder;
    if (!holder) look(body.packageId, body.box, { is: 'package', body });
    else look(holder.holderId, body.box, { is: 'holder', holder, slot: body.slot, isItself: false });
  }
  return [...nearest].map(([unit, { wall, thing }]) => {
    const figure = { measured: wall.measured, unit: 'mm', want: 'at-least', ...limit } as const;
    const words = figureWords(figure);
    return {
      subjects: [unit],
      title: `${nameIn(scene, thing)} is ${words.measured} from the ${wall.words}, want ${words.limit}`,
      remedy: `Move ${thing.is === 'holder' ? 'the holder' : 'it'} away from the ${wall.words}.`,
      places: thing.is === 'holder' ? [onHolder(thing.holder, thing.slot)] : onPackage(thing.body),
      figure,
      fixes: (now) => fixesFor(now, { wall, thing }, limit.limit - wall.measured),
    };
  });
}

function nameIn(scene: Scene, thing: Thing): string {
  if (thing.is === 'package') return scene.nameOf(thing.body.package);
  const name = scene.holderName(thing.holder);
  return thing.isItself ? name : `A pouch in ${name}`;
}

function nearestWall(scene: Scene, box: ShelfBox, shelf: Shelf): Wall {
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

function* fixesFor(scene: Scene, { thing, wall: { axis, sign, words } }: Near, byMm: number): Iterable<Fix> {
  const shift = (at: { readonly xMm: number; readonly yMm: number }) => ({
    xMm: mm(at.xMm + (axis === 'x' ? sign * byMm : 0)),
    yMm: mm(at.yMm + (axis === 'y' ? sign * byMm : 0)),
  });
  if (thing.is === 'holder') {
    yield moveHolder(`Move the holder away from the ${words}`, thing.holder, shift(thing.holder));
    return;
  }
  const { placement, package: one, item } = thing.body;
  if (placement.at === 'shelf') {
    const moved = { ...placement, ...shift(placement) };
    const label = `Move it away from the ${words}`;
    yield { label, edits: [{ edit: 'place', packageId: one.packageId, placement: moved }] };
  }
  yield* elsewhere(scene, { one, item, body: thing.body });
}
