import { useState } from 'react';
import { Link } from 'react-router-dom';
import { Icon } from '../components/icon';
import { Button } from '../components/ui/button';
import { ConfirmDialog } from '../components/ui/confirm-dialog';
import { Dialog } from '../components/ui/dialog';
import { LinkButton } from '../components/ui/link-button';
import { sentenceOf } from '../lib/errors';
import { useSoundSwitch } from '../lib/sounds';
import type { Session } from '../lib/session';
import type { Place } from './places';
import { roleWords } from './role-words';

type StationSheetProps = {
  isOpen: boolean;
  onClose: () => void;
  session: Session;
  /** On the phone: the places that have no room in the bar. */
  otherPlaces: readonly Place[];
  onChangePerson: () => void;
  onSignOut: (where: 'here' | 'everywhere') => Promise<void>;
};

/** Who is here, and what can be done about it. On the phone also the rest of the places. */
export function StationSheet({ isOpen, onClose, session, otherPlaces, onChangePerson, onSignOut }: StationSheetProps) {
  const [isLeavingAll, setIsLeavingAll] = useState(false);
  const [refusal, setRefusal] = useState<string | null>(null);
  const { isOn, setOn } = useSoundSwitch();
  const { person, facility } = session;
  return (
    <>
      <Dialog isOpen={isOpen && !isLeavingAll} onClose={onClose} title={person.displayName}>
        <p className="text-ink-2">
          {roleWords[person.role]}, staff number <span className="code">{person.staffNumber}</span>, {facility.name}
        </p>
        {otherPlaces.length > 0 && (
          <ul className="mt-4 border-t border-paper-3 tablet:hidden">
            {otherPlaces.map((place) => (
              <li key={place.to} className="border-b border-paper-3">
                <Link
                  to={place.to}
                  onClick={onClose}
                  className="flex min-h-13 items-center gap-3 font-semibold text-ink-1 no-underline"
                >
                  <Icon name={place.icon} size={24} />
                  {place.label}
                </Link>
              </li>
            ))}
          </ul>
        )}
        <div className="mt-5 grid gap-2.5">
          <Button icon="person" onPress={onChangePerson}>
            Change person
          </Button>
          <Button
            kind="quiet"
            icon="out"
            onPress={() => {
              onSignOut('here').catch((error: unknown) => {
                setRefusal(sentenceOf(error));
              });
            }}
          >
            Sign out
          </Button>
          <p role="alert" className={refusal === null ? 'sr-only' : 'font-semibold text-madder-3'}>
            {refusal}
          </p>
          <div className="flex flex-wrap justify-between gap-x-4 pt-1">
            <LinkButton kind="plain" size="small" to="/new-password" className="-ml-3">
              Change my password
            </LinkButton>
            <Button
              kind="plain"
              size="small"
              className="-ml-3"
              onPress={() => {
                setIsLeavingAll(true);
              }}
            >
              Sign out everywhere
            </Button>
            <span className="tablet:hidden">
              <Button
                kind="plain"
                size="small"
                icon={isOn ? 'sound' : 'soundOff'}
                aria-pressed={isOn}
                className="-ml-3"
                onPress={() => {
                  setOn(!isOn);
                }}
              >
                {isOn ? 'Sound on' : 'Sound off'}
              </Button>
            </span>
          </div>
        </div>
      </Dialog>
      <ConfirmDialog
        isOpen={isLeavingAll}
        onClose={() => {
          setIsLeavingAll(false);
        }}
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
