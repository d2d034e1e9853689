/*
 * Paper sides face the way the house rule says: all one way on a shelf, or paper to paper and film to film, or no rule.
 * Source: the facility's own; makers of pouches contradict each other (some ask for paper to film all one way, others for
 * paper to paper and film to film), so there is no right default.
 */
import type { Body } from '../layout';
import { facingGroups, majoritySide, otherPaper } from './facing-groups';
import { turnPaper } from './moves';
import { onPackage } from './places';
import type { Draft, Rule } from './rule';
import type { OnShelf, Scene } from './scene';

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
  switch (scene.policy.facing) {
    case 'not-set':
      return [];
    case 'one-way':
      return facingGroups(bodies).flatMap((group) => {
        const side = majoritySide(group);
        return group.filter((body) => body.paperLooks !== side).map((body) => draftOf(scene, body));
      });
    case 'alternating':
      return runsInRacks(bodies).flatMap((run) => misfaced(run).map((body) => draftOf(scene, body)));
  }
}

function draftOf(scene: Scene, body: Body): Draft {
  const { paper } = body.placement;
  const right = paper === null ? null : otherPaper(paper);
  const wanted =
    scene.policy.facing === 'one-way' ? 'faces the other way than the rest' : 'faces the same way as its neighbour';
  return {
    subjects: [body.packageId],
    title: `${scene.thing(body)} ${wanted}`,
    remedy: right === null ? 'Turn it.' : `Turn it so that its paper side is ${right}.`,
    places: onPackage(body),
    fixes: () => (right === null ? [] : [turnPaper(body.package, right)]),
  };
}

/**
 * Pouches in neighbouring slots. Across an empty slot nothing is asked: what is taken out never makes the others wrong.
 */
function runsInRacks(bodies: readonly Body[]): readonly (readonly Body[])[] {
  const inRack = new Map<string, Body[]>();
  for (const body of bodies) {
    if (!body.holder || body.slot === null || body.paperLooks === null) continue;
    const { holderId } = body.holder.holder;
    const others = inRack.get(holderId);
    if (others) others.push(body);
    else inRack.set(holderId, [body]);
  }
  const runs: Body[][] = [];
  for (const members of inRack.values()) {
    let run: Body[] = [];
    for (const body of members.sort((a, b) => (a.slot ?? 0) - (b.slot ?? 0))) {
      const last = run.at(-1);
      // Two in one slot are a finding of their own.
      if (last?.slot === body.slot) continue;
      if (last && (last.slot ?? 0) + 1 === body.slot) run.push(body);
      else runs.push((run = [body]));
    }
  }
  return runs;
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
