import type { JudgedAgain } from '#contract/judged-again';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Code } from '../../../components/ui/code';
import { PageHead, PanelHead } from '../../../components/ui/heading';
import { LinkButton } from '../../../components/ui/link-button';
import { WaitingState, WrongState } from '../../../components/ui/states';
import { Day, Moment } from '../../../components/ui/time';
import { countOf } from '../../../lib/format';
import { policyQueries } from '../queries';
import { ComparedFindings, FindingInWords } from './compared-findings';

/** A closed load beside what the rules and the policy of today would say of it. */
export function JudgedAgainScreen({ loadId }: { readonly loadId: string }) {
  const judged = useQuery(policyQueries.judgedAgain(loadId));
  if (judged.isPending) {
    return <WaitingState title="Judging the load again" waitsFor="The server has not answered yet." />;
  }
  if (judged.isError) {
    return (
      <div className="max-w-160 p-6">
        <WrongState
          title="The load could not be judged again"
          error={judged.error}
          onTryAgain={() => void judged.refetch()}
          other={
            <LinkButton kind="quiet" size="small" to={`/loads/${loadId}`}>
              Go to the load
            </LinkButton>
          }
        />
      </div>
    );
  }
  return <Judged judged={judged.data} />;
}

function Judged({ judged }: { readonly judged: JudgedAgain }) {
  const { load, then, now, comparison, whyNot } = judged;
  return (
    <div className="grid content-start gap-5 px-6 py-5 max-tablet:px-4">
      <title>{`Load ${load.number}, judged again · Paperside`}</title>
      <PageHead
        title={
          <>
            Load <Code>{load.number}</Code>, judged again
          </>
        }
        aside={
          <LinkButton kind="quiet" size="small" to={`/loads/${load.id}`}>
            Back to the load
          </LinkButton>
        }
      />
      <div className="seal-t bg-paper-0 px-4 pt-4 pb-3.5">
        <p className="text-say">The verdict of then stands.</p>
        <p className="mt-0.5 max-w-[80ch] text-row">
          {now === null ? (
            whyNot
          ) : (
            <>
              This only shows what today’s rules and policy would say of the same contents, as they were when the load
              was closed. It changes nothing about the load or its packages.
            </>
          )}
        </p>
      </div>
      <div className="grid gap-x-10 gap-y-4 tablet:grid-cols-2">
        <Measure title="As closed" measure={then}>
          <Moment at={load.closedAt} /> by {load.closedBy}
          <span className="mx-1.5" />
          {countOf(then.findings.length, 'finding')}
        </Measure>
        {now !== null && (
          <Measure title="By today’s rules" measure={now}>
            {countOf(now.findings.length, 'finding')}
            <span className="mx-1.5" />
            {now.holding === 0 ? 'nothing would hold it open' : `${countOf(now.holding, 'thing')} would hold it open`}
          </Measure>
        )}
      </div>
      {comparison === null ? (
        <section aria-labelledby="found-then">
          <PanelHead id="found-then" title={`What was found then, ${then.findings.length}`} />
          <ul>
            {then.findings.map((finding) => (
              <li key={finding.key} className="border-t border-paper-3 py-3">
                <FindingInWords finding={finding} acceptances={then.acceptances} />
              </li>
            ))}
          </ul>
        </section>
      ) : (
        <ComparedFindings comparison={comparison} acceptances={then.acceptances} />
      )}
    </div>
  );
}

type MeasureProps = {
  readonly title: string;
  readonly measure: Pick<JudgedAgain['then'], 'policyNumber' | 'policyEffectiveOn' | 'ruleSet'>;
  readonly children: ReactNode;
};

/** By what the load was judged, at the head of its column. */
function Measure({ title, measure, children }: MeasureProps) {
  return (
    <section aria-label={title}>
      <h2 className="text-head">{title}</h2>
      <p className="text-row">
        Policy version <b className="font-label">{measure.policyNumber}</b>, from{' '}
        <Day day={measure.policyEffectiveOn} />
        <span className="mx-1.5" />
        rule set <Code>{measure.ruleSet}</Code>
      </p>
      <p className="text-row text-ink-2">{children}</p>
    </section>
  );
}
