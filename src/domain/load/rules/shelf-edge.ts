/*
 * Everything stands wholly on its shelf.
 * Source: general practice; what hangs over the edge meets the chamber wall or falls when the cart moves.
 */
import type { ShelfBox } from '../../geometry/box';
import { mm } from '../../units/quantity';
import type { Shelf } from '../model';
import { elsewhere, moveHolder } from './moves';
import { onHolder, onPackage } from './places';
import type { Draft, Rule } from './rule';
import { slackMm } from './slack';
import type { OnShelf, Scene } from './scene';
import { generalPractice } from './sources';
import { figureWords } from './words';

export const shelfEdge: Rule = {
  id: 'shelf-edge',
  about: 'shelf',
  name: 'Everything is on its shelf',
  reason: 'What hangs over the edge of a shelf scrapes the chamber or falls when the cart is moved.',
  source: generalPractice,
  severity: 'stop',
  parameters: [],
  find,
};

/** How far a thing hangs over the edge of its shelf, in mm, at the side where it does most. */
function overhangOf(box: ShelfBox, shelf: Shelf): number {
  return Math.max(0 - box.left, box.right - shelf.widthMm, 0 - box.front, box.back - shelf.depthMm, 0);
}

function find(scene: Scene, { bodies, holders }: OnShelf): readonly Draft[] {
  const ofHolders = holders.flatMap(({ holder, box, shelf }): Draft[] => {
    const measured = overhangOf(box, shelf);
    if (measured <= slackMm) return [];
    return [
      {
        subjects: [holder.holderId],
        ...told(scene.holderName(holder), shelf, measured),
        remedy: 'Move the holder onto the shelf.',
        places: [onHolder(holder)],
        fixes: () => [moveHolder('Move the holder onto the shelf', holder, clamped(box, shelf))],
      },
    ];
  });
  const ofPackages = bodies.flatMap((body): Draft[] => {
    // What is in a holder goes where the holder goes.
    const measured = body.holder ? 0 : overhangOf(body.box, body.shelf);
    if (measured <= slackMm) return [];
    const { package: one, item, placement } = body;
    return [
      {
        subjects: [body.packageId],
        ...told(scene.thing(body), body.shelf, measured),
        remedy: 'Move it onto the shelf, or to a shelf that is large enough.',
        places: onPackage(body),
        *fixes(scene) {
          if (placement.at === 'shelf') {
            const moved = { ...placement, ...clamped(body.box, body.shelf) };
            yield {
              label: 'Move it onto the shelf',
              edits: [{ edit: 'place', packageId: one.packageId, placement: moved }],
            };
          }
          yield* elsewhere(scene, { one, item, body });
        },
      },
    ];
  });
  return [...ofHolders, ...ofPackages];
}

function told(name: string, shelf: Shelf, measured: number): Pick<Draft, 'title' | 'figure'> {
  const figure = { measured, limit: 0, unit: 'mm', want: 'at-most', limitFrom: 'equipment' } as const;
  return { title: `${name} hangs ${figureWords(figure).measured} over the edge of ${shelf.name}`, figure };
}

function clamped(box: ShelfBox, shelf: Shelf) {
  const into = (from: number, size: number, whole: number) => Math.max(Math.min(from, whole - size), 0);
  return {
    xMm: mm(into(box.left, box.right - box.left, shelf.widthMm)),
    yMm: mm(into(box.front, box.back - box.front, shelf.depthMm)),
  };
}
