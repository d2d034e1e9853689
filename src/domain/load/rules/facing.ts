/*
 * Paper sides face the way the pouch's instructions for use say, else the house rule: all one way on a shelf, or paper to paper
 * and film to film, or no rule. Source: instructions for use, else the facility's own; makers of pouches contradict each other (some ask for paper to film all one way, others for
 * paper to paper and film to film), so there is no right default.
 */
import { gapAcross, gapAlong } from '../../geometry/box';
import type { Body } from '../layout';
import type { PouchFacing } from '../model';
import { facingRuleOf } from '../policy';
import { facingGroups, majoritySide, otherPaper } from './facing-groups';
import { turnPaper } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { OnShelf, Scene } from './scene';
import { slackMm } from './slack';
import { sourceOf } from './words';

export const facing: Rule = {
  id: 'facing',
  about: 'shelf',
  name: 'Paper sides face as the house rule says',
  reason:
    'Steam passes only through paper: a pouch turned the wrong way can shut its own paper or its neighbour’s off.',
  source: {
    text: 'House rule. Instructions for use of pouches contradict each other about facing: paper to film all one way, or paper to paper and film to film.',
    provenance: 'house-rule',
  },
  severity: 'accept',
  parameters: ['facing'],
  find,
};

function find(scene: Scene, { bodies }: OnShelf): readonly Draft[] {
  const ruledBy = (rule: PouchFacing) => bodies.filter((body) => facingRuleOf(body.item, scene.policy) === rule);
  const against = facingGroups(ruledBy('one-way')).flatMap((group) => {
    const side = majoritySide(group);
    return group.filter((body) => body.paperLooks !== side);
  });
  const alike = runs(ruledBy('alternating')).flatMap(misfaced);
  return [
    ...against.map((body) => draftOf(scene, body, 'faces the other way than the rest')),
    ...alike.map((body) => draftOf(scene, body, 'faces the same way as its neighbour')),
  ];
}

function draftOf(scene: Scene, body: Body, wanted: string): Draft {
  const { paper } = body.placement;
  const right = paper === null ? null : otherPaper(paper);
  return {
    subjects: [body.packageId],
    title: `${scene.thing(body)} ${wanted}`,
    remedy: right === null ? 'Turn it.' : `Turn it so that its paper side is ${right}.`,
    places: onPackage(body),
    ...(body.item.facing === null ? {} : { source: sourceOf('ifu', body.item, facing.source) }),
    fixes: () => (right === null ? [] : [turnPaper(body.package, right)]),
  };
}

/** Pouches of one holder that stand one behind the other, each the neighbour of the next. */
function runs(bodies: readonly Body[]): readonly (readonly Body[])[] {
  const inHolder = new Map<string, Body[]>();
  for (const body of bodies) {
    if (!body.holder || body.thinAxis === null || body.paperLooks === null) continue;
    const key = `${body.holder.holder.holderId} ${body.thinAxis}`;
    const others = inHolder.get(key);
    if (others) others.push(body);
    else inHolder.set(key, [body]);
  }
  const found: Body[][] = [];
  for (const members of inHolder.values()) {
    let run: Body[] = [];
    for (const body of members.sort((a, b) => middleOf(a) - middleOf(b))) {
      const last = run.at(-1);
      // Two in one slot are a finding of their own.
      if (last && last.slot !== null && last.slot === body.slot) continue;
      if (last && areNeighbours(last, body)) run.push(body);
      else found.push((run = [body]));
    }
  }
  return found;
}

function middleOf({ box, thinAxis }: Body): number {
  return thinAxis === 'x' ? box.left + box.right : box.front + box.back;
}

/** In a rack across an empty slot nothing is asked: what is taken out never makes the others wrong. In a basket face to face. */
function areNeighbours(one: Body, next: Body): boolean {
  if (one.slot !== null) return one.slot + 1 === next.slot || one.slot - 1 === next.slot;
  return (one.thinAxis === 'x' ? gapAlong(one.box, next.box) : gapAcross(one.box, next.box)) < -slackMm;
}

/** The fewest to turn so that neighbours alternate; with as many either way, the first by package id stays. */
function misfaced(run: readonly Body[]): readonly Body[] {
  const first = run[0]?.paperLooks;
  const ofPattern = (isFirst: boolean) =>
    run.filter((body, index) => ((body.paperLooks === first) === isFirst) !== (index % 2 === 0));
  const [one, other] = [ofPattern(true), ofPattern(false)];
  if (one.length !== other.length) return one.length < other.length ? one : other;
  const firstById = [...run].sort((a, b) => (a.packageId < b.packageId ? -1 : 1))[0];
  return firstById && one.includes(firstById) ? other : one;
}
