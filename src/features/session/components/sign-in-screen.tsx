import type { SessionResponse } from '#contract/session';
import { Mark } from '../../../components/mark';
import { FilmPanel } from '../../../components/ui/film-panel';
import { Clock, DateText } from '../../../components/ui/time';
import { useNow } from '../../../lib/use-now';
import { IdentifyPerson } from './identify-person';
import { LeavesArt } from './leaves-art';

/** Paper with what it is about; film with what to do. */
export function SignInScreen({ onSignedIn }: { onSignedIn: (session: SessionResponse) => void }) {
  return (
    <div className="grid h-dvh overflow-auto max-tablet:grid-rows-[15.625rem_1fr] tablet:grid-cols-[minmax(0,1fr)_33rem] tablet:overflow-hidden max-desk:tablet:grid-cols-[minmax(0,1fr)_min(33rem,60%)]">
      <title>Sign in · Paperside</title>
      <header className="bg-fibre relative overflow-hidden bg-paper-1">
        <LeavesArt className="absolute bottom-0 left-0 h-full w-full max-tablet:h-[190%]" />
        <div className="absolute top-8 left-10 flex items-center gap-3.5 max-tablet:inset-x-0 max-tablet:top-0 max-tablet:bg-fibre max-tablet:bg-paper-1 max-tablet:px-5 max-tablet:py-2.5">
          <Mark size={44} />
          <h1 className="text-[1.875rem]/[2.25rem] font-medium tracking-[-0.018em] max-tablet:text-[1.5625rem]">
            Paperside
          </h1>
        </div>
        <p className="absolute top-24 left-10 max-w-110 text-say font-normal text-ink-2 max-tablet:hidden">
          Every pouch has a paper side and a film side. Know which way it faces, and prove what it went through.
        </p>
      </header>
      <FilmPanel seal="left" className="tablet:overflow-auto">
        <main className="flex min-h-full flex-col gap-5 px-5 py-6 tablet:pt-12 tablet:pr-14 tablet:pb-8 tablet:pl-16">
          <p className="flex justify-between text-small text-ink-2">
            <DateText at={useNow()} form="weekday" />
            <Clock className="font-normal" />
          </p>
          <IdentifyPerson layer="screen" onSignedIn={onSignedIn} />
          <p className="mt-auto pt-4 text-small text-ink-2">
            Signs you out when nothing has been scanned or touched for a while. The open load stays on the tablet for
            the next person, in your name up to here.
          </p>
        </main>
      </FilmPanel>
    </div>
  );
}
