import type { Permission } from '#domain/access/permissions';
import type { IconName } from '../components/icon';

/** A screen that the rail leads to. */
export type Place = {
  readonly to: string;
  readonly label: string;
  readonly icon: IconName;
  /** Any of these lets a person in; none means everybody who is signed in. */
  readonly permissions: readonly Permission[];
};

export const places: readonly Place[] = [
  { to: '/', label: 'Today', icon: 'today', permissions: [] },
  { to: '/loads', label: 'Load', icon: 'load', permissions: ['load.view'] },
  { to: '/pack', label: 'Pack', icon: 'pack', permissions: ['package.pack'] },
  { to: '/lessons', label: 'Lessons', icon: 'practice', permissions: ['load.view'] },
  { to: '/stock', label: 'Stock', icon: 'stock', permissions: ['item.view', 'equipment.view'] },
  { to: '/policy', label: 'Policy', icon: 'policy', permissions: ['policy.view'] },
  { to: '/people', label: 'People', icon: 'people', permissions: ['people.view'] },
];

/** The places a person may go to: a word that leads nowhere is not shown. */
export function placesFor(permissions: readonly Permission[]): readonly Place[] {
  return places.filter(
    (place) => place.permissions.length === 0 || place.permissions.some((one) => permissions.includes(one)),
  );
}
