import { evaluateLoad } from './evaluate-load';
import type { Finding, RuleId } from './finding';
import type { LoadView } from './model';
import type { LoadPolicy } from './policy';

/**
 * Rules that a place can break. The others look at the program, the labels, the day's test or the counting, and say the
 * same wherever the thing goes.
 */
const rulesOfPlace: ReadonlySet<RuleId> = new Set<RuleId>([
  'pouch-on-edge',
  'pouch-in-holder',
  'holder-fits',
  'slot-shared',
  'slot-unknown',
  'facing',
  'gap',
  'label-hidden',
  'lid-filter-covered',
  'stack-not-permitted',
  'stack-too-high',
  'stack-circular',
  'tray-flat',
  'basin-drains',
  'textile-on-edge',
  'shelf-edge',
  'wall-clearance',
  'overlap',
  'package-clearance',
  'headroom',
  'steam-path',
  'shelf-mass',
  'metal-over-textile',
  'challenge-device-placed',
  'shelf-usable',
  'holder-usable',
  'size-makes-no-sense',
]);

/** What the rules have against how a load is arranged. */
export type Trouble = readonly Finding[];

export function troubleOf(view: LoadView, policy: LoadPolicy): Trouble {
  return evaluateLoad(view, policy).filter(
    (finding) => rulesOfPlace.has(finding.ruleId) && finding.severity !== 'advice',
  );
}

/** The worst that an arrangement has against it and that the one before had not: null when there is nothing new. */
export function worstAdded(before: Trouble, after: Trouble): 'stop' | 'accept' | null {
  const known = new Set(before.map((finding) => finding.key));
  const added = after.filter((finding) => !known.has(finding.key));
  if (added.some((finding) => finding.severity === 'stop')) return 'stop';
  return added.length > 0 ? 'accept' : null;
}
