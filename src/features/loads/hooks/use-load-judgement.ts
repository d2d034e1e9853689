import type { LoadDetail } from '#contract/loads';
import { decideClose } from '#domain/load/decide-close';
import { createEvaluator, letterFindings } from '#domain/load/evaluate-load';
import type { Finding } from '#domain/load/finding';
import { layOut } from '#domain/load/layout';
import { reckon } from '#domain/load/reckoning';
import { useMemo, useState } from 'react';
import { useExpectedShelves } from './use-expected-shelves';

/** What the gate counts by itself is not listed again as a finding. */
const atTheGate: ReadonlySet<string> = new Set(['unscanned', 'count-missing', 'count-differs']);

/** What was found when a load was closed: by the rules of then, of which there may be some no more. Nothing of it is to be fixed. */
function findingsOfThen({ findings }: NonNullable<LoadDetail['closing']>): readonly Finding[] {
  return findings.map((finding) => ({ ...finding, fix: null }) as Finding);
}

/**
 * The same judgement the server makes when the load is closed, made here after each change so that it can be seen. A closed
 * load keeps the one it was closed with.
 */
export function useLoadJudgement({ view, policy, closing }: Pick<LoadDetail, 'view' | 'policy' | 'closing'>) {
  const layout = useMemo(() => layOut(view), [view]);
  const [evaluate] = useState(createEvaluator);
  const findings = useMemo(
    () => (closing === null ? evaluate(view, policy) : findingsOfThen(closing)),
    [evaluate, view, policy, closing],
  );
  const decision = useMemo(() => decideClose(view, policy, findings), [view, policy, findings]);
  const accepted = useMemo(() => new Set(view.acceptances.map((entry) => entry.findingKey)), [view.acceptances]);
  const expectedShelf = useExpectedShelves(view, policy);
  const reckoning = useMemo(() => reckon(view, expectedShelf), [view, expectedShelf]);
  const { open, settled } = useMemo(() => {
    const lettered = letterFindings(findings.filter((finding) => !atTheGate.has(finding.ruleId)));
    return {
      open: lettered.filter(({ finding }) => !accepted.has(finding.key)),
      settled: lettered.filter(({ finding }) => accepted.has(finding.key)),
    };
  }, [findings, accepted]);
  return useMemo(
    () => ({ layout, findings, open, settled, decision, reckoning }),
    [layout, findings, open, settled, decision, reckoning],
  );
}

export type LoadJudgement = ReturnType<typeof useLoadJudgement>;
