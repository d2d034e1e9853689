import { NavLink, useLocation } from 'react-router-dom';
import { Icon } from '../components/icon';
import type { Place } from './places';

const look =
  'grid h-14 w-full place-items-center content-center gap-[3px] text-[0.78125rem]/[0.9375rem] no-underline outline-offset-[-3px]';
const here = 'font-bold text-film-5 shadow-[inset_0_-4px_0_var(--color-film-4)]';
const elsewhere = 'font-medium text-ink-2';

type PhoneBarProps = {
  /** Three at most; the rest is under More. */
  places: readonly Place[];
  onMore: () => void;
  isMoreOpen: boolean;
};

/** The foot of the phone: three places and More. */
export function PhoneBar({ places, onMore, isMoreOpen }: PhoneBarProps) {
  const { pathname } = useLocation();
  const isElsewhere = !places.some((place) => (place.to === '/' ? pathname === '/' : pathname.startsWith(place.to)));
  return (
    <nav
      aria-label="Main"
      data-screen-only=""
      className="bg-fibre seal-edge-t grid auto-cols-fr grid-flow-col bg-paper-2 pt-[7px] pb-[env(safe-area-inset-bottom)] tablet:hidden"
    >
      {places.map((place) => (
        <NavLink
          key={place.to}
          to={place.to}
          end={place.to === '/'}
          className={({ isActive }) => `${look} ${isActive ? here : elsewhere}`}
        >
          <Icon name={place.icon} size={23} />
          {place.label}
        </NavLink>
      ))}
      <button
        type="button"
        onClick={onMore}
        aria-haspopup="dialog"
        aria-expanded={isMoreOpen}
        className={`${look} ${isElsewhere ? here : elsewhere}`}
      >
        <Icon name="more" size={23} />
        More
      </button>
    </nav>
  );
}
