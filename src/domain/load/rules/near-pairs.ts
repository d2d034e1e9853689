import { gapAcross, gapAlong, gapUpward } from '../../geometry/box';
import type { Body } from '../layout';
import { limitOf, type Limit, type LoadPolicy } from '../policy';
import { slackMm } from './slack';

/** Two things that share some of their height on one shelf. Gaps below zero say how far they reach into each other. */
export type NearPair = {
  readonly a: Body;
  readonly b: Body;
  readonly acrossMm: number;
  readonly alongMm: number;
};

/** With thousands of things on one spot the pairs would outgrow any memory; this many findings are beyond reading anyway. */
const greatestPairs = 20_000;

/** The free space a thing asks for around itself. */
export function clearanceOf(body: Body, policy: LoadPolicy): Limit {
  const { clearanceMm, kind } = body.item;
  return limitOf(clearanceMm, policy, kind === 'pouch' ? 'pouchGapMm' : 'packageClearanceMm');
}

/** The same as a bare number, for the many pairs that keep it. */
export function clearanceMmOf({ item }: Body, policy: LoadPolicy): number {
  const { clearanceMm } = item;
  if (clearanceMm !== null && clearanceMm >= 0) return clearanceMm;
  return item.kind === 'pouch' ? policy.pouchGapMm : policy.packageClearanceMm;
}

/** The greater of what two things ask for, and where it comes from. */
export function clearanceBetween(a: Body, b: Body, policy: LoadPolicy): Limit & { readonly askedBy: Body } {
  const [ofA, ofB] = [clearanceOf(a, policy), clearanceOf(b, policy)];
  return ofA.limit >= ofB.limit ? { ...ofA, askedBy: a } : { ...ofB, askedBy: b };
}

/** Pairs on one shelf within the greatest clearance anything asks for. Pouches in one rack are not here: their slots part them. */
export function findNearPairs(bodies: readonly Body[], policy: LoadPolicy): readonly NearPair[] {
  const pairs: NearPair[] = [];
  const reach = bodies.reduce((greatest, body) => Math.max(greatest, clearanceMmOf(body, policy)), 0);
  const sorted = [...bodies].sort((a, b) => a.box.left - b.box.left);
  for (let first = 0; first < sorted.length; first += 1) {
    const one = sorted[first];
    for (let second = first + 1; one && second < sorted.length; second += 1) {
      const other = sorted[second];
      if (!other || other.box.left > one.box.right + reach) break;
      const alongMm = gapAlong(one.box, other.box);
      if (alongMm > reach || gapUpward(one.box, other.box) > -slackMm || areInOneRack(one, other)) continue;
      const [a, b] = one.packageId < other.packageId ? [one, other] : [other, one];
      pairs.push({ a, b, acrossMm: gapAcross(one.box, other.box), alongMm });
      if (pairs.length === greatestPairs) return pairs;
    }
  }
  return pairs;
}

export function reachIntoEachOther(pair: NearPair): boolean {
  return pair.acrossMm < -slackMm && pair.alongMm < -slackMm;
}

function areInOneRack(a: Body, b: Body): boolean {
  return a.slot !== null && b.slot !== null && a.holder === b.holder;
}
