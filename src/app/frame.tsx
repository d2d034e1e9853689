import { paths } from '#contract/paths';
import { parseBadgeCode } from '#domain/label/badge-code';
import { useQueryClient } from '@tanstack/react-query';
import { Suspense, useEffect, useMemo, useRef, useState } from 'react';
import { Outlet, useLocation, useNavigate } from 'react-router-dom';
import { z } from 'zod';
import { WaitingState } from '../components/ui/states';
import { ChangePersonSheet } from '../features/session/components/change-person-sheet';
import { leave, useChooseFacility, useSignOut } from '../features/session/mutations';
import { sessionQueries, useShownSession } from '../features/session/queries';
import { useIdleEnd } from '../features/session/use-idle-end';
import { api } from '../lib/api-client';
import { isProblem } from '../lib/errors';
import { FacilityContext } from '../lib/facility';
import { useScanWatcher } from '../lib/scanner-input';
import { SessionContext } from '../lib/session';
import { signedOutGate } from '../lib/signed-out-gate';
import { useStore } from '../lib/store';
import { IdleNotice } from './idle-notice';
import { OfflineBand } from './offline-band';
import { PhoneBar } from './phone-bar';
import { placesFor } from './places';
import { Rail } from './rail';
import { StationSheet } from './station-sheet';

const placesInBar = 3;

type Sheet = 'none' | 'station' | 'change-person';

/** Around every screen: the rail, who is at the station, and what happens when a sign-in ends. */
export function Frame() {
  const session = useShownSession();
  const queryClient = useQueryClient();
  const navigate = useNavigate();
  const signOut = useSignOut();
  const chooseFacility = useChooseFacility();
  const [sheet, setSheet] = useState<Sheet>('none');
  const [firstBadge, setFirstBadge] = useState<string | null>(null);
  const hasEnded = useStore(signedOutGate.isClosed);
  const places = useMemo(() => placesFor(session.permissions), [session.permissions]);
  const { person, facility } = session;

  useEffect(() => {
    signedOutGate.signedIn(person.id);
  }, [person.id]);

  useScanWatcher((scan) => {
    if (hasEnded || sheet === 'change-person') return false;
    const badge = parseBadgeCode(scan.text);
    if (!badge.ok) return false;
    setFirstBadge(badge.value.code);
    setSheet('change-person');
    return true;
  });

  const idle = useIdleEnd({
    timeoutSeconds: session.idleTimeoutSeconds,
    isWatching: !hasEnded,
    onStillHere: () => {
      void queryClient.query({ ...sessionQueries.current(), staleTime: 0 }).catch((error: unknown) => {
        if (isProblem(error) && error.httpStatus === 401) signedOutGate.close();
      });
    },
    onEnd: () => {
      api.delete(paths.session, undefined, z.unknown(), { whenSignedOut: 'throw' }).catch(() => undefined);
      signedOutGate.close();
    },
  });

  function close() {
    setSheet('none');
    setFirstBadge(null);
  }

  async function goToSignIn() {
    leave(queryClient);
    await navigate('/sign-in');
  }

  return (
    <SessionContext value={session}>
      <FacilityContext value={facility}>
        <div className="grid h-dvh overflow-hidden max-tablet:grid-rows-[minmax(0,1fr)_auto] tablet:grid-cols-[4.75rem_minmax(0,1fr)] print:block print:h-auto print:overflow-visible">
          <Rail
            places={places}
            person={person}
            onPerson={() => {
              setSheet('station');
            }}
          />
          <Screen key={facility.id} />
          <PhoneBar
            places={places.slice(0, placesInBar)}
            isMoreOpen={sheet === 'station'}
            onMore={() => {
              setSheet('station');
            }}
          />
        </div>
        {idle !== null && <IdleNotice secondsLeft={idle.secondsLeft} personName={person.displayName} />}
        <StationSheet
          isOpen={sheet === 'station' && !hasEnded}
          onClose={close}
          session={session}
          otherPlaces={places.slice(placesInBar)}
          onChangePerson={() => {
            setFirstBadge(null);
            setSheet('change-person');
          }}
          onChooseFacility={async (facilityId) => {
            await chooseFacility.mutateAsync({ facilityId });
            close();
            await navigate('/');
          }}
          onSignOut={async (where) => {
            await signOut.mutateAsync(where);
            await navigate('/sign-in');
          }}
        />
        <ChangePersonSheet
          isOpen={sheet === 'change-person' || hasEnded}
          because={hasEnded ? 'ended' : 'asked'}
          firstBadge={firstBadge}
          personBefore={person.displayName}
          onClose={close}
          onLeave={() => {
            close();
            void goToSignIn();
          }}
          onSignedIn={(next) => {
            close();
            if (next.person.mustChangePassword) void navigate('/new-password');
            else if (next.facility.id !== facility.id) void navigate('/');
          }}
        />
      </FacilityContext>
    </SessionContext>
  );
}

/** The part that changes with the address. A new address moves the focus here, so that readers start at its top. */
function Screen() {
  const { pathname } = useLocation();
  const place = useRef<HTMLElement>(null);
  const shownPath = useRef(pathname);
  useEffect(() => {
    if (shownPath.current === pathname) return;
    shownPath.current = pathname;
    place.current?.focus({ preventScroll: true });
    if (place.current) place.current.scrollTop = 0;
  }, [pathname]);
  return (
    <main ref={place} tabIndex={-1} className="bg-fibre flex min-h-0 flex-col overflow-auto bg-paper-1 outline-none">
      <OfflineBand />
      <div className="min-h-0 flex-1">
        <Suspense fallback={<WaitingState title="Fetching the screen" waitsFor="The server has not answered yet." />}>
          <Outlet />
        </Suspense>
      </div>
    </main>
  );
}
