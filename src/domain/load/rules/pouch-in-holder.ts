/*
 * A pouch on edge is held by something: a rack, or an open basket in which it cannot fall over.
 * Source: CDC guideline (2008), loading: peel packs on edge in racks, small items loose in wire baskets, as restated. How far it
 * may lean is the facility's to set; no published angle.
 */
import { degrees, type Degree } from '../../units/quantity';
import { gapAcross, gapAlong, gapUpward, type ShelfBox } from '../../geometry/box';
import { leanOf } from '../../geometry/lean';
import type { Body, HolderBody } from '../layout';
import { limitOf } from '../policy';
import { elsewhere } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import { slackMm } from './slack';
import type { OnShelf, Scene } from './scene';
import { cdcLoading } from './sources';
import { figureWords } from './words';

export const pouchInHolder: Rule = {
  id: 'pouch-in-holder',
  about: 'shelf',
  name: 'Pouches on edge are held',
  reason: 'A pouch that nothing holds falls over during the cycle and lies flat or against its neighbour.',
  source: cdcLoading,
  severity: 'stop',
  parameters: ['greatestLeanDeg'],
  find,
};

function find(scene: Scene, on: OnShelf): readonly Draft[] {
  const limit = limitOf(null, scene.policy, 'greatestLeanDeg');
  return on.bodies.flatMap((body) => {
    if (body.thinAxis === null) return [];
    const measured = leanAngle(on, body);
    const leansTooFar = measured > limit.limit;
    if (body.holder && !leansTooFar) return [];
    const figure = { measured, unit: 'deg', want: 'at-most', ...limit } as const;
    const words = figureWords(figure);
    const name = scene.thing(body);
    const falls = figure.measured > 89 ? 'can fall over' : `can lean ${words.measured}`;
    return {
      subjects: [body.packageId],
      title: body.holder
        ? `${name} ${falls}, want at most ${words.limit}`
        : `${name} stands in no holder${leansTooFar ? ` and ${falls}` : ''}`,
      remedy: 'Put it into a holder that takes it.',
      places: onPackage(body),
      ...(leansTooFar ? { figure } : {}),
      // In a slot wider than it needs a pouch leans but stays: worth a note, no more.
      ...(body.slot !== null ? { severity: 'advice' as const } : {}),
      fixes: (scene) => elsewhere(scene, { one: body.package, item: body.item, body }),
    };
  });
}

/** With more than this on one shelf nobody measures what might catch a loose pouch: it counts as able to fall. */
const mostMeasured = 500;

function leanAngle(on: OnShelf, body: Body): Degree {
  const { widthMm: heightMm, heightMm: thicknessMm } = body.item;
  if (body.slot !== null) {
    const gapMm = (body.holder?.kind.pitchMm ?? 0) - thicknessMm;
    return leanOf({ heightMm, thicknessMm, gapMm, supportHeightMm: Infinity });
  }
  if (on.bodies.length > mostMeasured) return degrees(90);
  const supports = body.holder ? supportsInBasket(on, body, body.holder) : supportsOnShelf(on, body);
  return degrees(Math.max(...supports.map((support) => leanOf({ heightMm, thicknessMm, ...support }))));
}

type Support = { readonly gapMm: number; readonly supportHeightMm: number };

/** In a basket the neighbour or the basket's side catches it, whichever comes first. */
function supportsInBasket(on: OnShelf, body: Body, basket: HolderBody): readonly Support[] {
  const others = on.bodies.filter((other) => other.holder === basket && other !== body);
  const sideHeightMm = basket.kind.greatestHeightMm ?? Infinity;
  return ends.map((end) => {
    let nearest: Support = { gapMm: Math.max(roomTo(basket.box, body, end), 0), supportHeightMm: sideHeightMm };
    for (const other of others) {
      const gapMm = gapTowards(other.box, body, end);
      if (gapMm !== null && gapMm < nearest.gapMm)
        nearest = { gapMm, supportHeightMm: other.box.top - body.box.bottom };
    }
    return nearest;
  });
}

/** On a shelf other loose pouches are no support, they fall with it: only what is between them and something firm counts. */
function supportsOnShelf({ bodies, holders }: OnShelf, body: Body): readonly Support[] {
  const isLoosePouch = (other: Body) => other.item.kind === 'pouch' && other.holder === null;
  const level = bodies.filter((other) => other !== body && gapUpward(other.box, body.box) < -slackMm);
  return ends.map((end) => {
    let firm: Support = { gapMm: Infinity, supportHeightMm: 0 };
    for (const box of [...level.filter((other) => !isLoosePouch(other)), ...holders].map((other) => other.box)) {
      const gapMm = gapTowards(box, body, end);
      if (gapMm !== null && gapMm < firm.gapMm) firm = { gapMm, supportHeightMm: box.top - body.box.bottom };
    }
    let taken = 0;
    for (const other of level.filter(isLoosePouch)) {
      const gapMm = gapTowards(other.box, body, end);
      if (gapMm !== null && gapMm < firm.gapMm) taken += thickness(other.box, body);
    }
    return { ...firm, gapMm: Math.max(firm.gapMm - taken, 0) };
  });
}

type End = 'lower' | 'upper';

const ends: readonly End[] = ['lower', 'upper'];

/** How far another thing is away from a pouch's face on that end of its thin axis; null where it is not in front of it. */
function gapTowards(box: ShelfBox, body: Body, end: End): number | null {
  const isAcross = body.thinAxis === 'x';
  const beside = isAcross ? gapAlong(box, body.box) : gapAcross(box, body.box);
  if (beside >= -slackMm) return null;
  const [low, high] = isAcross ? [box.left, box.right] : [box.front, box.back];
  const [ownLow, ownHigh] = isAcross ? [body.box.left, body.box.right] : [body.box.front, body.box.back];
  const middle = (low + high) / 2;
  const ownMiddle = (ownLow + ownHigh) / 2;
  if (end === 'upper') return middle > ownMiddle ? Math.max(low - ownHigh, 0) : null;
  return middle < ownMiddle ? Math.max(ownLow - high, 0) : null;
}

function roomTo(frame: ShelfBox, body: Body, end: End): number {
  if (body.thinAxis === 'x') return end === 'lower' ? body.box.left - frame.left : frame.right - body.box.right;
  return end === 'lower' ? body.box.front - frame.front : frame.back - body.box.back;
}

function thickness(box: ShelfBox, body: Body): number {
  return body.thinAxis === 'x' ? box.right - box.left : box.back - box.front;
}
