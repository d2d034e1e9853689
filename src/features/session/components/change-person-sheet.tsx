import type { SessionResponse } from '#contract/session';
import { Dialog } from '../../../components/ui/dialog';
import { Button } from '../../../components/ui/button';
import { useAnnounce } from '../../../components/ui/announcer';
import { IdentifyPerson } from './identify-person';

type ChangePersonSheetProps = {
  isOpen: boolean;
  /** asked: somebody wants to take over. ended: the sign-in ended under the person's hands. */
  because: 'asked' | 'ended';
  /** A badge scanned on the screen below. */
  firstBadge: string | null;
  personBefore: string;
  onSignedIn: (session: SessionResponse) => void;
  onClose: () => void;
  /** Give the screen up and go to the sign-in screen. */
  onLeave: () => void;
};

/** Another person, the same screen: the load below stays as it is, and what comes now is in the new name. */
export function ChangePersonSheet({
  isOpen,
  because,
  firstBadge,
  personBefore,
  onSignedIn,
  onClose,
  onLeave,
}: ChangePersonSheetProps) {
  const announce = useAnnounce();
  const hasEnded = because === 'ended';
  return (
    <Dialog
      isOpen={isOpen}
      onClose={hasEnded ? undefined : onClose}
      material="film"
      title={hasEnded ? 'Sign in to go on' : 'Change person'}
      {...(hasEnded
        ? {
            actions: (
              <Button kind="plain" size="small" className="-ml-3" onPress={onLeave}>
                Leave this screen
              </Button>
            ),
          }
        : {})}
    >
      <p className="mb-4 text-ink-2">
        {hasEnded
          ? `The sign-in of ${personBefore} has ended. The screen below is kept as it is.`
          : `${personBefore} is signed in here. The screen below stays; what comes next is in your name.`}
      </p>
      <IdentifyPerson
        // A badge scanned on the screen opens the sheet at its PIN.
        key={firstBadge ?? 'none'}
        layer="sheet"
        firstBadge={firstBadge}
        onSignedIn={(session) => {
          announce(`${session.person.displayName} is signed in.`);
          onSignedIn(session);
        }}
      />
    </Dialog>
  );
}
