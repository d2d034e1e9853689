import { NavLink } from 'react-router-dom';
import { Icon } from '../components/icon';
import { Mark } from '../components/mark';
import { Button } from '../components/ui/button';
import { useSoundSwitch } from '../lib/sounds';
import type { SessionPerson } from '../lib/session';
import type { Place } from './places';

type RailProps = {
  places: readonly Place[];
  person: SessionPerson;
  onPerson: () => void;
};

/** The left edge on tablet and desk: where to go, the sound, and who is at this station. */
export function Rail({ places, person, onPerson }: RailProps) {
  return (
    <div
      data-screen-only=""
      className="bg-fibre seal-edge-r flex min-h-0 flex-col overflow-y-auto bg-paper-2 pt-2.5 pr-[9px] pb-2.5 max-tablet:hidden"
    >
      <span className="grid h-11 flex-none place-items-center">
        <Mark />
      </span>
      <nav aria-label="Main">
        <ul>
          {places.map((place) => (
            <li key={place.to}>
              <NavLink
                to={place.to}
                end={place.to === '/'}
                className={({ isActive }) =>
                  `relative flex h-15.5 flex-col items-center justify-center gap-1 text-[0.78125rem]/[0.9375rem] no-underline outline-offset-[-3px] ${isActive ? 'bg-linear-to-r from-paper-0/0 to-paper-0 font-bold text-film-5 before:absolute before:inset-y-[9px] before:left-0 before:w-1 before:bg-film-4' : 'font-medium text-ink-2 hover:text-ink-1'}`
                }
              >
                <Icon name={place.icon} size={24} />
                {place.label}
              </NavLink>
            </li>
          ))}
        </ul>
      </nav>
      <span className="flex-1" />
      <SoundSwitch />
      <PersonButton person={person} onPress={onPerson} />
    </div>
  );
}

/** Sounds on or off at this station; loudness is the tablet's own. */
function SoundSwitch() {
  const { isOn, setOn } = useSoundSwitch();
  return (
    <Button
      kind="plain"
      aria-pressed={isOn}
      aria-label="Sound"
      className="min-h-13 w-full flex-none !px-0"
      onPress={() => {
        setOn(!isOn);
      }}
    >
      <span className="flex flex-col items-center gap-1 text-[0.78125rem]/[0.9375rem] font-medium text-ink-2">
        <Icon name={isOn ? 'sound' : 'soundOff'} size={22} />
        {isOn ? 'Sound on' : 'Sound off'}
      </span>
    </Button>
  );
}

/** Who it is, large enough to be read from the cart, and the way to another person. */
function PersonButton({ person, onPress }: { person: SessionPerson; onPress: () => void }) {
  return (
    <Button
      kind="plain"
      aria-label={`${person.displayName} is at this station. Change person or sign out`}
      className="mt-1 w-full flex-none !px-1 py-1.5"
      onPress={onPress}
    >
      <span className="flex w-full flex-col items-center gap-1">
        <span className="grid h-9 w-9 place-items-center bg-film-5 text-body font-semibold text-paper-0">
          {person.initials}
        </span>
        <span className="w-full text-small leading-[0.9375rem] font-semibold break-words text-ink-1">
          {person.displayName}
        </span>
        <span className="text-least font-medium text-film-4 underline underline-offset-2">Change</span>
      </span>
    </Button>
  );
}
