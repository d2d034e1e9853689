import type { Finding, FindingPlace, RuleId, Severity } from '../finding';
import { ruleIds } from '../finding';
import { rules } from './all-rules';
import { keyOf } from './finding-key';
import type { Draft } from './rule';
import type { Scene } from './scene';

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

/** All that the rules find, heaviest first, then by rule, then by place: never by the order in which things were scanned. */
export function judge(scene: Scene): readonly Judged[] {
  const judged = rules.flatMap((rule) =>
    rule.find(scene).map((draft): Judged => {
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
    }),
  );
  if (judged.length < 2) return judged;
  const spots = new Map(judged.map((one) => [one, spotOf(scene, one.finding.places[0])]));
  return judged.sort(
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
