/*
 * A stack is not higher than the instructions for use of anything in it permit.
 * Source: instructions for use.
 */
import type { Body } from '../layout';
import { elsewhere } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import { slackMm } from './slack';
import type { OnShelf, Scene } from './scene';
import { instructions } from './sources';
import { figureWords, sourceOf } from './words';

export const stackTooHigh: Rule = {
  id: 'stack-too-high',
  about: 'shelf',
  name: 'Stacks are not too high',
  reason: 'The instructions permit stacks up to a height that was tested; above it steam and drying were never shown.',
  source: instructions,
  severity: 'stop',
  parameters: [],
  find,
};

function find(scene: Scene, { bodies }: OnShelf): readonly Draft[] {
  const isUnder = new Set(bodies.map((body) => body.below));
  return bodies.flatMap((top) => {
    if (!top.below || isUnder.has(top)) return [];
    const strictest = strictestOf(top);
    if (!strictest || top.box.top <= strictest.limit + slackMm) return [];
    const figure = {
      measured: top.box.top,
      limit: strictest.limit,
      unit: 'mm',
      want: 'at-most',
      limitFrom: 'ifu',
    } as const;
    const words = figureWords(figure);
    return {
      subjects: [top.packageId],
      title: `The stack under ${scene.nameOf(top.package)} is ${words.measured} high, ${scene.nameOf(strictest.body.package)} permits ${words.limit}`,
      remedy: 'Take the top one off the stack.',
      places: onPackage(top),
      figure,
      source: sourceOf('ifu', strictest.body.item, instructions),
      fixes: (scene) => elsewhere(scene, { one: top.package, item: top.item, body: top }),
    };
  });
}

function strictestOf(top: Body): { readonly body: Body; readonly limit: number } | null {
  let strictest: { body: Body; limit: number } | null = null;
  for (let body: Body | null = top; body; body = body.below) {
    const limit = body.item.greatestStackHeightMm;
    if (limit !== null && limit > 0 && (!strictest || limit < strictest.limit)) strictest = { body, limit };
  }
  return strictest;
}
