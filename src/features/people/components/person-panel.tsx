import type { Person } from '#contract/people';
import { useEffect, useRef, type ReactNode } from 'react';
import { Button } from '../../../components/ui/button';
import { Code } from '../../../components/ui/code';
import { FilmPanel } from '../../../components/ui/film-panel';
import { useFacility } from '../../../lib/facility';
import { roleWords } from '#domain/access/role-words';
import { useMay, useSession } from '../../../lib/session';
import { useNow } from '../../../lib/use-now';
import { badgeWords, signInWords } from '../person-words';
import { PersonActs } from './person-acts';
import type { ShownOnce } from './shown-once-dialog';

type PersonPanelProps = {
  person: Person;
  onClose: () => void;
  onShown: (shown: ShownOnce) => void;
};

/** One person, beside the list or, on the phone, in its place. */
export function PersonPanel({ person, onClose, onShown }: PersonPanelProps) {
  const head = useRef<HTMLHeadingElement>(null);
  const mayEdit = useMay('people.edit');
  const { person: self } = useSession();
  const { timeZone } = useFacility();
  const now = useNow();

  useEffect(() => {
    head.current?.focus();
  }, [person.id]);

  return (
    <FilmPanel
      seal="left"
      label={person.displayName}
      className="self-start px-6 py-5 max-tablet:-mx-4 tablet:sticky tablet:top-5 tablet:max-h-[calc(100dvh-2.5rem)] tablet:overflow-auto"
    >
      <div className="flex items-start justify-between gap-3">
        <h2 ref={head} tabIndex={-1} className="text-say outline-none">
          {person.displayName}
        </h2>
        <Button kind="plain" size="small" className="-mt-1.5 -mr-3" onPress={onClose}>
          Close
        </Button>
      </div>
      {person.id === self.id && <p className="text-small text-ink-2">This is you.</p>}
      <dl className="mt-3 grid grid-cols-[7rem_minmax(0,1fr)] gap-x-3 gap-y-1.5 text-row">
        <Fact name="Staff number">
          <Code>{person.staffNumber}</Code>
        </Fact>
        <Fact name="Initials">{person.initials}</Fact>
        <Fact name="Role">{roleWords[person.role]}</Fact>
        <Fact name="Usual shift">{person.usualShift ?? 'Not set'}</Fact>
        <Fact name="Sign-in">{signInWords(person, { now, timeZone })}</Fact>
        <Fact name="Badge">
          {badgeWords(person)}
          {person.badgeCode !== null && (
            <>
              <br />
              <Code>{person.badgeCode}</Code>
            </>
          )}
          {person.hasBadge && person.badgeCode === null && mayEdit && (
            <span className="block text-small font-normal text-ink-2">
              Its code is shown, and the badge printed, to who signed in with a password.
            </span>
          )}
        </Fact>
        {person.worksElsewhere && <Fact name="Also at">another facility</Fact>}
      </dl>
      {mayEdit && <PersonActs person={person} isSelf={person.id === self.id} onShown={onShown} />}
    </FilmPanel>
  );
}

function Fact({ name, children }: { name: string; children: ReactNode }) {
  return (
    <>
      <dt className="text-ink-2">{name}</dt>
      <dd className="font-medium">{children}</dd>
    </>
  );
}
