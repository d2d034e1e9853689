import { paths } from '#contract/paths';
import type { ChangePersonRequest, Person } from '#contract/people';
import { useState } from 'react';
import { useWrite } from '../../../components/stock/use-write';
import { useAnnounce } from '../../../components/ui/announcer';
import { Button } from '../../../components/ui/button';
import { ConfirmDialog, type ConfirmDialogProps } from '../../../components/ui/confirm-dialog';
import { FileLink } from '../../../components/ui/file-link';
import { useChangePerson, useGiveOneTimePassword, useGivePin } from '../mutations';
import { ChangePersonDialog } from './change-person-dialog';
import type { ShownOnce } from './shown-once-dialog';

type Asking = 'nothing' | 'change' | 'password' | 'new-badge' | 'take-badge' | 'pin' | 'switch-off' | 'switch-on';

type PersonActsProps = { person: Person; isSelf: boolean; onShown: (shown: ShownOnce) => void };

/** What an administrator can do about a person. Each act says beforehand what others will notice of it. */
export function PersonActs({ person, isSelf, onShown }: PersonActsProps) {
  const [asking, setAsking] = useState<Asking>('nothing');
  const announce = useAnnounce();
  const change = useChangePerson(person.id);
  const givePassword = useGiveOneTimePassword(person.id);
  const givePin = useGivePin(person.id);
  const write = useWrite();
  const { displayName: name, staffNumber } = person;

  async function keep(changes: Partial<ChangePersonRequest>, done: string) {
    await write((id) => change.mutateAsync({ requestId: id, version: person.version, ...changes }));
    announce(done);
  }

  const questions: Readonly<Record<Exclude<Asking, 'nothing' | 'change'>, Question>> = {
    password: {
      title: `Give ${name} a one-time password?`,
      text: 'The present password stops opening at once, and this person is signed out everywhere. The one-time password holds for 24 hours.',
      confirmWords: 'Give it out',
      waitingWords: 'Giving it out',
      act: async () => {
        const reply = await write((id) => givePassword.mutateAsync(id));
        onShown({
          what: 'one-time-password',
          personName: name,
          staffNumber,
          secret: reply.oneTimePassword,
          expiresAt: reply.expiresAt,
        });
      },
    },
    'new-badge': {
      title: `Give ${name} a new badge?`,
      text: person.hasBadge
        ? 'The present badge stops opening at once, and this person is signed out everywhere. Their PIN stays.'
        : 'It opens together with a PIN, which is given out next.',
      confirmWords: 'Give a new badge',
      waitingWords: 'Giving it out',
      act: () => keep({ badge: 'new' }, `${name} has a new badge.`),
    },
    'take-badge': {
      title: `Take the badge of ${name} away?`,
      text: 'Badge and PIN stop opening at once, and this person is signed out everywhere. The password stays.',
      confirmWords: 'Take it away',
      waitingWords: 'Taking it away',
      act: () => keep({ badge: null }, `${name} has no badge any more.`),
    },
    pin: {
      title: `Give ${name} a PIN?`,
      text: 'A PIN there was stops opening at once, and this person is signed out everywhere.',
      confirmWords: 'Give it out',
      waitingWords: 'Giving it out',
      act: async () => {
        const { pin } = await write((id) => givePin.mutateAsync(id));
        onShown({ what: 'pin', personName: name, staffNumber, secret: pin, expiresAt: null });
      },
    },
    'switch-off': {
      title: `Switch off the sign-in of ${name}?`,
      text: 'They are signed out everywhere and cannot come in until it is switched on again. What they did stays in their name.',
      confirmWords: 'Switch it off',
      waitingWords: 'Switching it off',
      isStop: true,
      act: () => keep({ isDisabled: true }, `The sign-in of ${name} is switched off.`),
    },
    'switch-on': {
      title: `Switch on the sign-in of ${name}?`,
      text: 'Password, badge and PIN open again as they were.',
      confirmWords: 'Switch it on',
      waitingWords: 'Switching it on',
      act: () => keep({ isDisabled: false }, `The sign-in of ${name} is switched on.`),
    },
  };
  const question = asking === 'nothing' || asking === 'change' ? null : questions[asking];
  const ask = (next: Asking) => () => {
    setAsking(next);
  };
  function close() {
    setAsking('nothing');
  }
  const own = isSelf ? 'Another administrator has to do this for you.' : undefined;

  return (
    <div className="mt-5 grid gap-2.5">
      <Button onPress={ask('change')}>Change name, role or shift</Button>
      <Button
        kind="quiet"
        onPress={ask('password')}
        blockedBecause={isSelf ? 'Change your own password under your name.' : undefined}
      >
        Give a one-time password
      </Button>
      <Button kind="quiet" onPress={ask('new-badge')}>
        {person.hasBadge ? 'Replace the badge' : 'Give a badge'}
      </Button>
      {person.hasBadge && (
        <>
          <FileLink
            kind="quiet"
            icon="print"
            how="open"
            to={paths.personBadge(person.id)}
            className="justify-items-stretch"
          >
            Print the badge
          </FileLink>
          <Button kind="quiet" onPress={ask('pin')}>
            {person.hasPin ? 'Give a new PIN' : 'Give a PIN'}
          </Button>
          <Button kind="quiet" onPress={ask('take-badge')}>
            Take the badge away
          </Button>
        </>
      )}
      {person.isDisabled ? (
        <Button kind="quiet" onPress={ask('switch-on')}>
          Switch the sign-in on
        </Button>
      ) : (
        <Button kind="quiet" onPress={ask('switch-off')} blockedBecause={own}>
          Switch the sign-in off
        </Button>
      )}
      <ChangePersonDialog isOpen={asking === 'change'} person={person} onClose={close} />
      {question !== null && (
        <ConfirmDialog
          isOpen
          onClose={close}
          title={question.title}
          confirmWords={question.confirmWords}
          waitingWords={question.waitingWords}
          kind={question.isStop === true ? 'stop' : 'film'}
          onConfirm={question.act}
        >
          <p>{question.text}</p>
        </ConfirmDialog>
      )}
    </div>
  );
}

type Question = Pick<ConfirmDialogProps, 'title' | 'confirmWords' | 'waitingWords'> & {
  readonly text: string;
  readonly isStop?: boolean;
  readonly act: () => Promise<void>;
};
