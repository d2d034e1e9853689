import type { LoadDetail } from '#contract/loads';
import { decideClose } from '#domain/load/decide-close';
import { createEvaluator, letterFindings } from '#domain/load/evaluate-load';
import { layOut } from '#domain/load/layout';
import { reckon } from '#domain/load/reckoning';
import { useMemo, useState } from 'react';
import { useExpectedShelves } from './use-expected-shelves';

/** What the gate counts by itself is not listed again as a finding. */
const atTheGate: ReadonlySet<string> = new Set(['unscanned', 'count-missing', 'count-differs']);

/** The same judgement the server makes when the load is closed, made here after each change so that it can be seen. */
export function useLoadJudgement({ view, policy }: Pick<LoadDetail, 'view' | 'policy'>) {
  const layout = useMemo(() => layOut(view), [view]);
  const [evaluate] = useState(createEvaluator);
  const findings = useMemo(() => evaluate(view, policy), [evaluate, view, policy]);
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
