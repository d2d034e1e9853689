/*
 * Two things are not in the same place.
 * Source: our own check of the drawn cart.
 */
import { gapAcross, gapAlong, gapUpward, type ShelfBox } from '../../geometry/box';
import { hasFrame } from './holder-fit';
import { moveNamed } from './moves';
import { reachIntoEachOther } from './near-pairs';
import { onHolder, onPackage } from './places';
import type { Draft, Rule } from './rule';
import { slackMm } from './slack';
import type { OnShelf, Scene } from './scene';
import { drawing } from './sources';
import { figureWords } from './words';

export const overlap: Rule = {
  id: 'overlap',
  about: 'shelf',
  name: 'One thing in one place',
  reason: 'What is drawn into the same place is squeezed together on the cart, or is not where the map says.',
  source: drawing,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene, on: OnShelf): readonly Draft[] {
  return [...ofPackages(scene, on), ...withHolders(scene, on), ...ofHolders(scene, on)];
}

function ofPackages(scene: Scene, { nearPairs }: OnShelf): readonly Draft[] {
  return nearPairs.filter(reachIntoEachOther).map(({ a, b }) => ({
    subjects: [a.packageId, b.packageId],
    ...told(`${scene.thing(b)} reaches ${depthWords(a.box, b.box)} into ${scene.thing(a)}`, a.box, b.box),
    places: onPackage(b, a),
    *fixes(scene) {
      yield* moveNamed(scene, b);
      yield* moveNamed(scene, a);
    },
  }));
}

function withHolders(scene: Scene, { bodies, holders }: OnShelf): readonly Draft[] {
  const outside = bodies.filter((body) => body.holder === null);
  return holders.filter(hasFrame).flatMap(({ holder, box }) =>
    outside
      .filter((body) => depthOf(body.box, box) > slackMm)
      .map((body) => ({
        subjects: [body.packageId, holder.holderId],
        ...told(
          `${scene.thing(body)} reaches ${depthWords(body.box, box)} into ${scene.holderName(holder)}`,
          body.box,
          box,
        ),
        places: [...onPackage(body), onHolder(holder)],
        fixes: (now: Scene) => moveNamed(now, body),
      })),
  );
}

function ofHolders(scene: Scene, { holders }: OnShelf): readonly Draft[] {
  const framed = holders.filter(hasFrame);
  return framed.flatMap((a, index) =>
    framed
      .slice(index + 1)
      .filter((b) => depthOf(a.box, b.box) > slackMm)
      .map((b) => ({
        subjects: [a.holder.holderId, b.holder.holderId],
        ...told(
          `${scene.holderName(b.holder)} reaches ${depthWords(a.box, b.box)} into ${scene.holderName(a.holder)}`,
          a.box,
          b.box,
        ),
        places: [onHolder(b.holder), onHolder(a.holder)],
      })),
  );
}

/** How far two boxes reach into each other, the shortest way out in plan; 0 or less where they do not. */
function depthOf(a: ShelfBox, b: ShelfBox): number {
  if (gapUpward(a, b) >= -slackMm) return 0;
  return Math.min(-gapAcross(a, b), -gapAlong(a, b));
}

function figureOf(a: ShelfBox, b: ShelfBox) {
  return { measured: depthOf(a, b), limit: 0, unit: 'mm', want: 'at-most', limitFrom: 'equipment' } as const;
}

function depthWords(a: ShelfBox, b: ShelfBox): string {
  return figureWords(figureOf(a, b)).measured;
}

function told(title: string, a: ShelfBox, b: ShelfBox): Pick<Draft, 'title' | 'remedy' | 'figure'> {
  return { title, remedy: 'Move one of them.', figure: figureOf(a, b) };
}
