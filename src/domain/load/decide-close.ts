import { evaluateLoad } from './evaluate-load';
import type { Finding, RuleId } from './finding';
import type { LoadView } from './model';
import type { LoadPolicy } from './policy';
import { reckon, type NamedPackage } from './reckoning';

/** One thing that holds a load open. `label` is what the gate shows: short, and an act where there is one. */
export type Block = { readonly label: string } & (
  | { readonly kind: 'finding'; readonly finding: Finding }
  | { readonly kind: 'empty' }
  | { readonly kind: 'unscanned'; readonly packages: readonly NamedPackage[] }
  | { readonly kind: 'count-missing'; readonly shelfId: string }
  | { readonly kind: 'count-differs'; readonly shelfId: string; readonly scanned: number; readonly counted: number }
);

export type CloseDecision = {
  readonly mayClose: boolean;
  /** "4 things hold this load open" */
  readonly heading: string;
  readonly blocks: readonly Block[];
};

/** What these rules find stands at the gate as a difference between listed, scanned and counted, once and not twice. */
const reckonedRules: ReadonlySet<RuleId> = new Set<RuleId>(['unscanned', 'count-missing', 'count-differs']);

/**
 * Whether a load may be closed, and everything that speaks against it. Findings that hold the load block until they are
 * fixed; findings a lead may accept block until the same key, and so the same measured figure, has been accepted.
 * @param findings of `evaluateLoad` for this view and policy, where the caller has them already.
 */
export function decideClose(
  view: LoadView,
  policy: LoadPolicy,
  findings: readonly Finding[] = evaluateLoad(view, policy),
): CloseDecision {
  const accepted = new Set(view.acceptances.map((acceptance) => acceptance.findingKey));
  const blocks: Block[] = findings
    .filter((finding) => !reckonedRules.has(finding.ruleId))
    .filter((finding) => finding.severity === 'stop' || (finding.severity === 'accept' && !accepted.has(finding.key)))
    .map((finding) => ({
      kind: 'finding',
      finding,
      // Only when it is read: working out a fix means judging the load anew.
      get label() {
        return findingLabel(finding);
      },
    }));

  const reckoning = reckon(view);
  if (reckoning.scanned === 0) blocks.push({ kind: 'empty', label: 'Nothing scanned yet' });
  for (const { shelfId, shelfName, scanned, counted } of reckoning.shelves) {
    if (counted === null) {
      blocks.push({ kind: 'count-missing', shelfId, label: `${shelfName}: count it` });
    } else if (counted !== scanned) {
      const label = `${shelfName}: counted ${counted}, scanned ${scanned}`;
      blocks.push({ kind: 'count-differs', shelfId, scanned, counted, label });
    }
  }
  const { missing } = reckoning;
  if (missing.length > 0) {
    const [only] = missing;
    const what = missing.length === 1 && only ? only.name : `${missing.length} packages`;
    blocks.push({ kind: 'unscanned', packages: missing, label: `${what}: scan or take off the list` });
  }
  return { mayClose: blocks.length === 0, heading: headingOf(blocks.length), blocks };
}

function findingLabel(finding: Finding): string {
  if (finding.fix) return finding.fix.label;
  return finding.severity === 'accept' ? `${finding.title}: fix it or have it accepted` : finding.title;
}

function headingOf(blocks: number): string {
  if (blocks === 0) return 'Nothing holds this load open';
  return blocks === 1 ? '1 thing holds this load open' : `${blocks} things hold this load open`;
}
