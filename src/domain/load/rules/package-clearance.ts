/*
 * Around each package there is the free space its instructions for use ask for, or the facility does.
 * Source: instructions for use; else about 2.5 cm between trays: general practice, several manuals, no single standard.
 */
import { planDistance } from '../../geometry/box';
import type { FindingPlace } from '../finding';
import type { Body } from '../layout';
import { moveNamed } from './moves';
import { clearanceBetween, clearanceMmOf, reachIntoEachOther } from './near-pairs';
import { onHolder, onPackage } from './places';
import type { Draft, Rule } from './rule';
import { slackMm } from './slack';
import type { OnShelf, Scene } from './scene';
import { generalPractice } from './sources';
import { figureWords, sourceOf } from './words';

export const packageClearance: Rule = {
  id: 'package-clearance',
  about: 'shelf',
  name: 'Packages stand clear of each other',
  reason: 'Steam comes and water leaves between packages; where they stand close, both stop.',
  source: generalPractice,
  severity: 'accept',
  parameters: ['packageClearanceMm', 'pouchGapMm'],
  find,
};

type Close = {
  readonly a: Body;
  readonly b: Body;
  readonly measured: number;
  readonly limit: ReturnType<typeof clearanceBetween>;
};

function find(scene: Scene, { nearPairs }: OnShelf): readonly Draft[] {
  // A rack too near is one finding and not one for each of its pouches.
  const worst = new Map<string, Close>();
  for (const pair of nearPairs) {
    const { a, b } = pair;
    if (a.item.kind === 'pouch' && b.item.kind === 'pouch') continue;
    if (reachIntoEachOther(pair)) continue;
    const measured = planDistance(a.box, b.box);
    const wanted = Math.max(clearanceMmOf(a, scene.policy), clearanceMmOf(b, scene.policy));
    if (measured >= wanted - slackMm) continue;
    const limit = clearanceBetween(a, b, scene.policy);
    const key = [unitOf(a), unitOf(b)].sort().join(' ');
    const known = worst.get(key);
    if (!known || isWorse({ measured, limit }, known)) worst.set(key, { a, b, measured, limit });
  }
  return [...worst.values()].map((close) => draftOf(scene, close));
}

/** By how much is missing; with as much missing the nearer one, so that no order of looking decides. */
function isWorse(one: Pick<Close, 'measured' | 'limit'>, other: Close): boolean {
  const difference = other.limit.limit - other.measured - (one.limit.limit - one.measured);
  return difference === 0 ? one.measured < other.measured : difference < 0;
}

function unitOf(body: Body): string {
  return body.holder?.holder.holderId ?? body.packageId;
}

function draftOf(scene: Scene, { a, b, measured, limit: { askedBy, ...limit } }: Close): Draft {
  const figure = { measured, unit: 'mm', want: 'at-least', ...limit } as const;
  const words = figureWords(figure);
  const [first, second] = [nameIn(scene, a), nameIn(scene, b)];
  return {
    subjects: [unitOf(a), unitOf(b)],
    title:
      measured <= slackMm
        ? `${first} touches ${second}, want ${words.limit} between`
        : `${first} is ${words.measured} from ${second}, want ${words.limit}`,
    remedy: 'Move one of them away.',
    // The holder is where the pin goes, and the package in it is what stands too near.
    places: [placeOf(a), placeOf(b), ...onPackage(...[a, b].filter((body) => body.holder))],
    figure,
    source: sourceOf(limit.limitFrom, askedBy.item, generalPractice),
    *fixes(scene) {
      for (const body of [b, a]) {
        if (!body.holder) yield* moveNamed(scene, body);
      }
    },
  };
}

function nameIn(scene: Scene, body: Body): string {
  return body.holder ? scene.holderName(body.holder.holder) : scene.nameOf(body.package);
}

function placeOf(body: Body): FindingPlace {
  return body.holder ? onHolder(body.holder.holder, body.slot) : { on: 'package', packageId: body.packageId };
}
