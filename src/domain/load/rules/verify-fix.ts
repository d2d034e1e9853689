import { applyEdits } from '../apply-edit';
import type { Finding, Fix, RuleId } from '../finding';
import { judge, weighsAsMuchAs, type Judged } from './judge';
import { sceneOf, type Scene } from './scene';

/** Every change voids the count of the shelves it touches: that they have to be counted again is no fault of a fix. */
const aboutCounting: ReadonlySet<RuleId> = new Set<RuleId>(['count-missing', 'count-differs']);

/**
 * The first of the fixes a rule proposes that holds good: carried out on a copy of the load and judged again, the finding is
 * gone, and nothing of the same or greater weight is new or worse. Null where none does.
 */
export function verifiedFixOf(scene: Scene, before: readonly Judged[], { finding, draft }: Judged): Fix | null {
  for (const fix of draft.fixes?.(scene) ?? []) {
    const changed = applyEdits(scene.view, fix.edits);
    if (!changed.ok) continue;
    const after = judge(sceneOf(changed.value, scene.policy, scene));
    if (mends(finding, draft.subjects, before, after)) return fix;
  }
  return null;
}

function mends(
  finding: Omit<Finding, 'fix'>,
  subjects: readonly string[],
  before: readonly Judged[],
  after: readonly Judged[],
): boolean {
  return after.every((one) => {
    const isSame = one.finding.ruleId === finding.ruleId;
    if (isSame && isWithin(one.draft.subjects, subjects)) return false;
    if (aboutCounting.has(one.finding.ruleId) || !weighsAsMuchAs(one.finding.severity, finding.severity)) return true;
    return before.some((old) => isNoWorse(one, old));
  });
}

/** A finding that was there before, about the same things or more of them, and by no better a figure. */
function isNoWorse(now: Judged, old: Judged): boolean {
  if (now.finding.ruleId !== old.finding.ruleId || !isWithin(now.draft.subjects, old.draft.subjects)) return false;
  const [is, was] = [now.finding.figure, old.finding.figure];
  if (!is || !was || is.unit !== was.unit) return true;
  const byHowMuch = (figure: typeof is) =>
    figure.want === 'at-least' ? figure.limit - figure.measured : Math.abs(figure.measured - figure.limit);
  return byHowMuch(is) <= byHowMuch(was) + 0.5;
}

function isWithin(inner: readonly string[], outer: readonly string[]): boolean {
  return inner.every((id) => outer.includes(id));
}
