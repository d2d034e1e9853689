import type { RuleId, Severity } from './finding';
import type { LoadView } from './model';
import type { LoadPolicy } from './policy';
import { rules } from './rules/all-rules';
import { keyOf } from './rules/finding-key';
import { draftsOf } from './rules/rule';
import { sceneOf } from './rules/scene';

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

/** What the rules have against how a load is arranged: each finding by its key, with its weight. Advice is none. */
export type Trouble = ReadonlyMap<string, Exclude<Severity, 'advice'>>;

/** As `evaluateLoad` would find it, with only the rules that a place can break: placing asks many times in a blink. */
export function troubleOf(view: LoadView, policy: LoadPolicy): Trouble {
  const scene = sceneOf(view, policy);
  const trouble = new Map<string, Exclude<Severity, 'advice'>>();
  for (const rule of rules) {
    if (!rulesOfPlace.has(rule.id)) continue;
    for (const draft of draftsOf(rule, scene)) {
      const severity = draft.severity ?? rule.severity;
      if (severity !== 'advice') trouble.set(keyOf(rule.id, draft.subjects, draft.figure ?? null), severity);
    }
  }
  return trouble;
}

/** The worst that an arrangement has against it and that the one before had not: null when there is nothing new. */
export function worstAdded(before: Trouble, after: Trouble): 'stop' | 'accept' | null {
  let worst: 'accept' | null = null;
  for (const [key, severity] of after) {
    if (before.has(key)) continue;
    if (severity === 'stop') return 'stop';
    worst = severity;
  }
  return worst;
}
