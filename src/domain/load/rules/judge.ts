import type { Finding, FindingPlace, RuleId, Severity } from '../finding';
import { ruleIds } from '../finding';
import { rules } from './all-rules';
import { keyOf } from './finding-key';
import type { Draft, Rule } from './rule';
import type { Listed, OnShelf, Scene } from './scene';

/** A finding with what the evaluation still needs to know of it. */
export type Judged = {
  readonly finding: Omit<Finding, 'fix'>;
  readonly draft: Draft;
};

const weightOf: Readonly<Record<Severity, number>> = { stop: 0, accept: 1, advice: 2 };
const orderOf = new Map<RuleId, number>(ruleIds.map((id, index) => [id, index]));

export function weighsAsMuchAs(a: Severity, b: Severity): boolean {
  return weightOf[a] <= weightOf[b];
}

/**
 * All that the rules find: heaviest first, then by rule, then by place, never by the order in which things were scanned.
 * What was said of a package or a shelf before still holds as long as it is the same object in the scene.
 */
export function judge(scene: Scene): readonly Judged[] {
  const judged: Judged[] = [];
  for (const listed of scene.listed) judged.push(...once(saidOfListed, listed, () => judgePackage(scene, listed)));
  for (const on of scene.shelves) judged.push(...once(saidOfShelf, on, () => judgeShelf(scene, on)));
  for (const rule of loadRules) for (const draft of rule.find(scene)) judged.push(judgedOf(rule, draft));
  return inOrder(scene, judged);
}

const saidOfListed = new WeakMap<Listed, readonly Judged[]>();
const saidOfShelf = new WeakMap<OnShelf, readonly Judged[]>();

function once<Thing extends object>(
  said: WeakMap<Thing, readonly Judged[]>,
  thing: Thing,
  look: () => readonly Judged[],
): readonly Judged[] {
  const known = said.get(thing);
  if (known) return known;
  const judged = look();
  said.set(thing, judged);
  return judged;
}

const packageRules = rules.filter((rule) => rule.about === 'package');
const shelfRules = rules.filter((rule) => rule.about === 'shelf');
const loadRules = rules.filter((rule) => rule.about === 'load');
const nothing: readonly Judged[] = [];

function judgePackage(scene: Scene, listed: Listed): readonly Judged[] {
  let judged: Judged[] | undefined;
  for (const rule of packageRules) {
    const draft = rule.find(scene, listed);
    if (draft) (judged ??= []).push(judgedOf(rule, draft));
  }
  return judged ?? nothing;
}

function judgeShelf(scene: Scene, on: OnShelf): readonly Judged[] {
  const judged: Judged[] = [];
  for (const rule of shelfRules) for (const draft of rule.find(scene, on)) judged.push(judgedOf(rule, draft));
  return judged;
}

function judgedOf(rule: Rule, draft: Draft): Judged {
  const figure = draft.figure ?? null;
  return {
    draft,
    finding: {
      key: keyOf(rule.id, draft.subjects, figure),
      ruleId: rule.id,
      severity: draft.severity ?? rule.severity,
      title: draft.title,
      reason: draft.reason ?? rule.reason,
      remedy: draft.remedy,
      source: draft.source ?? rule.source,
      places: draft.places,
      figure,
    },
  };
}

function inOrder(scene: Scene, judged: readonly Judged[]): readonly Judged[] {
  if (judged.length < 2) return judged;
  const spots = new Map(judged.map((one) => [one, spotOf(scene, one.finding.places[0])]));
  return [...judged].sort(
    (a, b) =>
      weightOf[a.finding.severity] - weightOf[b.finding.severity] ||
      (orderOf.get(a.finding.ruleId) ?? 0) - (orderOf.get(b.finding.ruleId) ?? 0) ||
      compare(spots.get(a) ?? [], spots.get(b) ?? []) ||
      (a.finding.key < b.finding.key ? -1 : 1),
  );
}

/** From the lowest shelf up, from the door inwards, from left to right. */
function spotOf({ layout }: Scene, place: FindingPlace | undefined): readonly number[] {
  switch (place?.on) {
    case 'package': {
      const body = layout.bodyOf.get(place.packageId);
      return body ? [body.shelf.level, body.box.front, body.box.left] : [];
    }
    case 'holder': {
      const holder = layout.holderOf.get(place.holderId);
      return holder ? [holder.shelf.level, holder.box.front, holder.box.left, place.slot ?? 0] : [];
    }
    case 'shelf':
      return [layout.shelves.find(({ shelf }) => shelf.id === place.shelfId)?.shelf.level ?? 0];
    default:
      return [];
  }
}

function compare(a: readonly number[], b: readonly number[]): number {
  for (let index = 0; index < Math.min(a.length, b.length); index += 1) {
    const difference = (a[index] ?? 0) - (b[index] ?? 0);
    if (difference !== 0) return difference;
  }
  return a.length - b.length;
}
