import type { SessionResponse } from '#contract/session';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { Icon } from '../components/icon';
import { Button } from '../components/ui/button';
import { ConfirmDialog } from '../components/ui/confirm-dialog';
import { Dialog } from '../components/ui/dialog';
import { LinkButton } from '../components/ui/link-button';
import { ChangePinDialog } from '../features/session/components/change-pin-dialog';
import { sentenceOf } from '../lib/errors';
import { useSoundSwitch } from '../lib/sounds';
import type { Place } from './places';
import { roleWords } from '#domain/access/role-words';

type StationSheetProps = {
  isOpen: boolean;
  onClose: () => void;
  session: SessionResponse;
  /** On the phone: the places that have no room in the bar. */
  otherPlaces: readonly Place[];
  onChangePerson: () => void;
  onChooseFacility: (facilityId: string) => Promise<void>;
  onSignOut: (where: 'here' | 'everywhere') => Promise<void>;
};

/** Who is here, and what can be done about it. On the phone also the rest of the places. */
export function StationSheet({
  isOpen,
  onClose,
  session,
  otherPlaces,
  onChangePerson,
  onChooseFacility,
  onSignOut,
}: StationSheetProps) {
  const [over, setOver] = useState<'nothing' | 'leave-everywhere' | 'pin'>('nothing');
  const [refusal, setRefusal] = useState<string | null>(null);
  const { person, facility, facilities } = session;

  /** What went wrong is told here; the sheet stays. */
  function attempt(act: Promise<void>) {
    setRefusal(null);
    act.catch((error: unknown) => {
      setRefusal(sentenceOf(error));
    });
  }
  function closeOver() {
    setOver('nothing');
  }

  return (
    <>
      <Dialog isOpen={isOpen && over === 'nothing'} onClose={onClose} title={person.displayName}>
        <p className="text-ink-2">
          {roleWords[person.role]}, staff number <span className="code">{person.staffNumber}</span>, {facility.name}
        </p>
        <OtherPlaces places={otherPlaces} onGo={onClose} />
        <div className="mt-5 grid gap-2.5">
          <Button icon="person" onPress={onChangePerson}>
            Change person
          </Button>
          <Button
            kind="quiet"
            icon="out"
            onPress={() => {
              attempt(onSignOut('here'));
            }}
          >
            Sign out
          </Button>
          {facilities
            .filter((other) => other.id !== facility.id)
            .map((other) => (
              <Button
                key={other.id}
                kind="quiet"
                icon="right"
                onPress={() => {
                  attempt(onChooseFacility(other.id));
                }}
              >
                Work at {other.name}
              </Button>
            ))}
          <p role="alert" className={refusal === null ? 'sr-only' : 'font-semibold text-madder-3'}>
            {refusal}
          </p>
          <div className="-mx-3 grid grid-cols-2 justify-items-start pt-1">
            <LinkButton kind="plain" size="small" to="/new-password">
              Change my password
            </LinkButton>
            {person.hasBadge && (
              <Button
                kind="plain"
                size="small"
                onPress={() => {
                  setOver('pin');
                }}
              >
                {person.hasPin ? 'Change my PIN' : 'Choose my PIN'}
              </Button>
            )}
            <Button
              kind="plain"
              size="small"
              onPress={() => {
                setOver('leave-everywhere');
              }}
            >
              Sign out everywhere
            </Button>
            <SoundSwitch />
          </div>
        </div>
      </Dialog>
      <ChangePinDialog isOpen={isOpen && over === 'pin'} onClose={closeOver} />
      <ConfirmDialog
        isOpen={isOpen && over === 'leave-everywhere'}
        onClose={closeOver}
        title="Sign out everywhere?"
        confirmWords="Sign out everywhere"
        waitingWords="Signing out"
        onConfirm={() => onSignOut('everywhere')}
      >
        <p>
          This tablet and every other station where you are signed in will ask for a sign-in. Open loads stay as they
          are.
        </p>
      </ConfirmDialog>
    </>
  );
}

function OtherPlaces({ places, onGo }: { places: readonly Place[]; onGo: () => void }) {
  if (places.length === 0) return null;
  return (
    <nav aria-label="More" className="mt-4 border-t border-paper-3 tablet:hidden">
      <ul>
        {places.map((place) => (
          <li key={place.to} className="border-b border-paper-3">
            <Link
              to={place.to}
              onClick={onGo}
              className="flex min-h-13 items-center gap-3 font-semibold text-ink-1 no-underline"
            >
              <Icon name={place.icon} size={24} />
              {place.label}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}

/** On the phone there is no rail for it. */
function SoundSwitch() {
  const { isOn, setOn } = useSoundSwitch();
  return (
    <span className="tablet:hidden">
      <Button
        kind="plain"
        size="small"
        icon={isOn ? 'sound' : 'soundOff'}
        aria-pressed={isOn}
        aria-label="Sound"
        onPress={() => {
          setOn(!isOn);
        }}
      >
        {isOn ? 'Sound on' : 'Sound off'}
      </Button>
    </span>
  );
}
