import type { LoadDetail } from '#contract/loads';
import type { Program } from '#domain/load/model';
import { memo } from 'react';
import { Code } from '../../../components/ui/code';
import { Clock, Moment } from '../../../components/ui/time';
import { ProofStripe, type Stretch } from '../../../components/proof-stripe';
import { useFacility } from '../../../lib/facility';
import { formatDuration, formatTemperature, formatTime } from '../../../lib/format';
import type { LoadJudgement } from '../hooks/use-load-judgement';

function useProgramWords(program: Program): string {
  const { unitSystem } = useFacility();
  return `${program.code}: ${formatTemperature(program.temperatureC, unitSystem)}, ${formatDuration(program.exposureS)}, dry ${formatDuration(program.dryS)}`;
}

function stretchesOf(detail: LoadDetail, { decision, reckoning }: LoadJudgement, timeZone: string): Stretch[] {
  const { view, summary } = detail;
  const { airRemoval } = view;
  const itemById = new Map(view.items.map((item) => [item.id, item]));
  const implants = view.packages.filter((entry) => itemById.get(entry.itemId)?.isImplant).length;
  const isBuilding = summary.state === 'building';
  const air: Stretch = !view.sterilizer.needsAirRemovalTest
    ? { label: 'Air removal', state: 'not-asked', words: 'not asked' }
    : airRemoval === null
      ? { label: 'Air removal', state: 'not-yet', words: 'no test today' }
      : airRemoval.result === 'passed'
        ? { label: 'Air removal', state: 'proven', words: `passed ${formatTime(airRemoval.testedAt, timeZone)}` }
        : { label: 'Air removal', state: 'failed', words: `failed ${formatTime(airRemoval.testedAt, timeZone)}` };
  const loading: Stretch = isBuilding
    ? decision.mayClose
      ? {
          label: 'Loading',
          state: 'waiting',
          words: `${reckoning.scanned} of ${reckoning.listed}, close it`,
          share: 1.5,
        }
      : { label: 'Loading', state: 'waiting', words: `${reckoning.scanned} of ${reckoning.listed} scanned`, share: 1.5 }
    : summary.state === 'abandoned'
      ? { label: 'Loading', state: 'failed', words: 'given up' }
      : { label: 'Loading', state: 'proven', words: `${reckoning.scanned} of ${reckoning.listed}` };
  const later = ['Cycle', 'External CI', 'Internal CI', 'PCD', 'BI', 'Dry'].map((label): Stretch => ({
    label,
    state: 'not-yet',
  }));
  const implantStretch: Stretch =
    implants === 0
      ? { label: 'Implants', state: 'not-asked', words: 'none listed' }
      : { label: 'Implants', state: 'not-yet', words: `${implants} wait for BI` };
  return [air, loading, ...later, implantStretch, { label: 'Signed', state: 'not-yet' }];
}

/** The load's name, what it is built on, and its proof stripe. */
export const LoadHead = memo(function LoadHead({
  detail,
  judgement,
}: {
  detail: LoadDetail;
  judgement: LoadJudgement;
}) {
  const { timeZone } = useFacility();
  const { summary, view } = detail;
  const program = useProgramWords(view.program);
  const stretches = stretchesOf(detail, judgement, timeZone);
  return (
    <header className="px-4 pt-1.5">
      <div className="flex min-h-9 flex-wrap items-baseline gap-x-3.5 tablet:flex-nowrap tablet:overflow-hidden tablet:whitespace-nowrap">
        <h1 className="text-[1.4375rem]/[2rem] font-medium tracking-tight">
          Load <Code>{summary.number}</Code>
        </h1>
        <p className="min-w-0 truncate text-body text-ink-2 max-tablet:text-row">
          {view.sterilizer.name}
          <span className="mx-2" />
          {program}
          <span className="mx-2" />
          {view.cart.name}
        </p>
        <p className="ml-auto flex-none text-body text-ink-2 max-tablet:hidden">
          Opened <Moment at={summary.openedAt} /> by {summary.openedBy} <Clock className="ml-2 text-ink-1" />
        </p>
      </div>
      <div className="max-tablet:hidden">
        <ProofStripe stretches={stretches} />
      </div>
    </header>
  );
});
