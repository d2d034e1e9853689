import type { Finding, Fix } from './finding';
import type { LoadView } from './model';
import type { LoadPolicy } from './policy';
import { judge, type Judged } from './rules/judge';
import { sceneOf, type Scene } from './rules/scene';
import { verifiedFixOf } from './rules/verify-fix';

/**
 * Judges a load. Findings come in order of weight (what holds it, what a lead may accept, what is worth a note), then by
 * rule, then by place; the order of scanning makes no difference.
 *
 * The fix of a finding is worked out and verified when it is first read, because that means judging the load again, and
 * most findings are only listed.
 */
export function evaluateLoad(view: LoadView, policy: LoadPolicy): readonly Finding[] {
  return findingsOf(sceneOf(view, policy));
}

export type Evaluator = (view: LoadView, policy: LoadPolicy) => readonly Finding[];

/**
 * Judges one load again and again while it is being built, each time exactly as `evaluateLoad` does. It remembers the last
 * time and looks only at what has changed since: packages, holders and shelves that are the same objects have not.
 */
export function createEvaluator(): Evaluator {
  let last: Scene | undefined;
  return (view, policy) => {
    last = sceneOf(view, policy, last);
    return findingsOf(last);
  };
}

function findingsOf(scene: Scene): readonly Finding[] {
  const judged = judge(scene);
  return judged.map((one) => (one.draft.fixes ? withFixOnDemand(scene, judged, one) : { ...one.finding, fix: null }));
}

function withFixOnDemand(scene: Scene, judged: readonly Judged[], one: Judged): Finding {
  let known: Fix | null | undefined;
  return {
    ...one.finding,
    get fix() {
      if (known === undefined) known = verifiedFixOf(scene, judged, one);
      return known;
    },
  };
}

/** The letters shown for findings, in their order: A to Z, then AA, AB and so on. */
export function letterFindings(
  findings: readonly Finding[],
): readonly { readonly letter: string; readonly finding: Finding }[] {
  return findings.map((finding, index) => ({ letter: letterOf(index), finding }));
}

function letterOf(index: number): string {
  const last = String.fromCharCode(65 + (index % 26));
  return index < 26 ? last : letterOf(Math.floor(index / 26) - 1) + last;
}
