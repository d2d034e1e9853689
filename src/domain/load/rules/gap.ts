/*
 * Between the faces of neighbouring pouches on edge there is a gap: in a rack the pitch of the slots less half of each thickness.
 * Source: the pouch's instructions for use, else the facility; that pouches stand apart is common practice without a distance.
 */
import type { Body } from '../layout';
import type { LoadPolicy } from '../policy';
import { moveNamed } from './moves';
import { clearanceBetween, clearanceMmOf, reachIntoEachOther } from './near-pairs';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import { slackMm } from './slack';
import type { OnShelf, Scene } from './scene';
import { generalPractice } from './sources';
import { figureWords, sourceOf } from './words';

export const gap: Rule = {
  id: 'gap',
  about: 'shelf',
  name: 'Pouches stand apart',
  reason: 'Where pouches touch, steam does not reach the paper between them and it does not dry.',
  source: generalPractice,
  severity: 'accept',
  parameters: ['pouchGapMm'],
  find,
};

function find(scene: Scene, on: OnShelf): readonly Draft[] {
  return [...inRacks(on, scene.policy), ...loose(on)].flatMap(({ a, b, measured }) => {
    const wanted = Math.max(clearanceMmOf(a, scene.policy), clearanceMmOf(b, scene.policy));
    if (measured >= wanted - slackMm) return [];
    const { askedBy, ...limit } = clearanceBetween(a, b, scene.policy);
    const figure = { measured, unit: 'mm', want: 'at-least', ...limit } as const;
    const words = figureWords(figure);
    const names = `${scene.thing(a)} and ${scene.thing(b)}`;
    return {
      subjects: [a.packageId, b.packageId],
      title:
        measured <= slackMm
          ? `${names} touch, want ${words.limit} between`
          : `${names} are ${words.measured} apart, want ${words.limit}`,
      remedy: 'Give them more room: leave a slot free between them or use a holder with a wider pitch.',
      places: onPackage(a, b),
      figure,
      source: sourceOf(limit.limitFrom, askedBy.item, generalPractice),
      *fixes(scene) {
        yield* moveNamed(scene, b);
        yield* moveNamed(scene, a);
      },
    };
  });
}

type Pair = { readonly a: Body; readonly b: Body; readonly measured: number };

/** Between slots that are taken one after the other. Of several in one slot, a finding of its own, the one that asks for most room. */
function inRacks({ bodies }: OnShelf, policy: LoadPolicy): readonly Pair[] {
  const roomOf = (body: Body) => body.item.heightMm / 2 + clearanceMmOf(body, policy);
  const byRack = new Map<string, Map<number, Body>>();
  for (const body of bodies) {
    if (!body.holder || body.slot === null || body.thinAxis === null) continue;
    const { holderId } = body.holder.holder;
    const slots = byRack.get(holderId) ?? new Map<number, Body>();
    byRack.set(holderId, slots);
    const other = slots.get(body.slot);
    if (!other || roomOf(body) > roomOf(other)) slots.set(body.slot, body);
  }
  const pairs: Pair[] = [];
  for (const slots of byRack.values()) {
    const taken = [...slots].sort(([a], [b]) => a - b);
    for (const [index, [after, b]] of taken.entries()) {
      const last = taken[index - 1];
      if (!last) continue;
      const [before, a] = last;
      const pitch = a.holder?.kind.pitchMm ?? 0;
      pairs.push({ a, b, measured: (after - before) * pitch - (a.item.heightMm + b.item.heightMm) / 2 });
    }
  }
  return pairs;
}

/** Face to face without a slot each; a pair with a third pouch between is no pair. */
function loose({ nearPairs }: OnShelf): readonly Pair[] {
  const facing = nearPairs.filter(
    (pair) =>
      pair.a.thinAxis !== null &&
      pair.a.thinAxis === pair.b.thinAxis &&
      !reachIntoEachOther(pair) &&
      (pair.a.thinAxis === 'x' ? pair.alongMm : pair.acrossMm) < -slackMm,
  );
  const neighbours = new Map<Body, Body[]>();
  for (const { a, b } of facing) {
    neighbours.set(a, [...(neighbours.get(a) ?? []), b]);
    neighbours.set(b, [...(neighbours.get(b) ?? []), a]);
  }
  return facing.flatMap(({ a, b, acrossMm, alongMm }) => {
    const between = neighbours
      .get(a)
      ?.some((third) => third !== b && isBetween(third, a, b) && neighbours.get(b)?.includes(third));
    return between ? [] : [{ a, b, measured: a.thinAxis === 'x' ? acrossMm : alongMm }];
  });
}

function isBetween(third: Body, a: Body, b: Body): boolean {
  const middle = ({ box, thinAxis }: Body) => (thinAxis === 'x' ? box.left + box.right : box.front + box.back);
  const at = middle(third);
  return at > Math.min(middle(a), middle(b)) && at < Math.max(middle(a), middle(b));
}
