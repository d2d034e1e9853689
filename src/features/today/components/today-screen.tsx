import { roleWords } from '#domain/access/role-words';
import { useSuspenseQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Icon } from '../../../components/icon';
import { PageHead } from '../../../components/ui/heading';
import { Clock, DateText } from '../../../components/ui/time';
import { countOf } from '../../../lib/format';
import { useMay, useSession } from '../../../lib/session';
import { useNow } from '../../../lib/use-now';
import { todayQueries } from '../queries';
import { Lanes } from './lanes';
import { AskedForNext, CartsPanel } from './side-panels';
import { SterilizersInWords } from './sterilizers-in-words';
import { WaitsPanel } from './waits-panel';

/** What is open, what waits for whom, and what comes next. */
export function TodayScreen({ onOpenLoad }: { onOpenLoad: (runId: string) => void }) {
  const { data: today } = useSuspenseQuery(todayQueries.day());
  const { person, facility } = useSession();
  const mayPack = useMay('package.pack');
  const now = useNow();
  const open = today.sterilizers.flatMap((one) => one.loads).filter((load) => load.state === 'building').length;

  const waits = (
    <WaitsPanel waits={today.waits} as={`as ${roleWords[person.role].toLowerCase()}`} onOpenLoad={onOpenLoad} />
  );
  const carts = <CartsPanel carts={today.carts} />;
  const runs = <AskedForNext runs={today.runs} isLinked={mayPack} />;
  const facts = (
    <>
      {today.shift !== null && (
        <span>
          {today.shift.name} shift to {today.shift.endsAt}
        </span>
      )}
      <span>{open === 0 ? 'No load is being built' : `${countOf(open, 'load')} being built`}</span>
      <span className="max-desk:hidden">{facility.name}</span>
    </>
  );

  return (
    <div className="grid content-start tablet:min-h-full tablet:grid-rows-[auto_auto_minmax(0,1fr)]">
      <title>Today · Paperside</title>
      <div className="px-6 pt-4 max-tablet:px-4 max-tablet:pt-5 max-tablet:pb-3">
        <PageHead title={<DateText at={now} form="weekday" />} facts={facts} aside={<Aside />} />
      </div>
      <div className="px-6 pt-3 max-tablet:hidden">
        {today.sterilizers.length === 0 ? <NoSterilizer /> : <Lanes today={today} />}
      </div>
      <div className="mt-4 grid tablet:grid-cols-[minmax(0,44%)_minmax(0,1fr)] max-tablet:mt-0">
        {waits}
        <div className="grid content-start gap-x-10 gap-y-6 px-6 pt-5 pb-6 desk:grid-cols-2 max-tablet:px-4">
          <div className="tablet:hidden">
            <SterilizersInWords sterilizers={today.sterilizers} />
          </div>
          {runs}
          {carts}
        </div>
      </div>
    </div>
  );
}

function Aside() {
  return (
    <>
      <span className="tablet:hidden">
        <Clock className="text-head" />
      </span>
      <ul aria-hidden="true" className="flex items-center gap-5 text-small max-desk:hidden">
        <Key mark={<i className="weld grid h-3.5 w-6 place-items-center" />}>air removal passed</Key>
        <Key mark={<i className="h-3.5 w-6 border-[1.5px] border-dashed border-paper-edge" />}>being loaded</Key>
        <Key mark={<i className="h-3.5 w-6 border-[1.5px] border-ink-1 bg-paper-0" />}>closed</Key>
        <Key mark={<i className="h-3.5 w-0 border-l-2 border-dashed border-film-4" />}>wanted for</Key>
      </ul>
    </>
  );
}

function Key({ mark, children }: { mark: ReactNode; children: ReactNode }) {
  return (
    <li className="flex items-center gap-2">
      {mark}
      {children}
    </li>
  );
}

function NoSterilizer() {
  return (
    <p className="flex items-center gap-2 border border-paper-edge px-5 py-4.5 text-head">
      <Icon name="stock" />
      No sterilizer is on file here yet.
    </p>
  );
}
