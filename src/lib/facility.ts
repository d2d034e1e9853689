import { createContext, use } from 'react';

export type UnitSystem = 'metric' | 'us-customary';

/** How this place tells time and length. */
export type Facility = {
  readonly id: string;
  readonly name: string;
  /** IANA name. */
  readonly timeZone: string;
  readonly unitSystem: UnitSystem;
};

/** Before anyone has signed in: the tablet's own zone. */
export const unknownFacility: Facility = {
  id: '',
  name: '',
  timeZone: new Intl.DateTimeFormat().resolvedOptions().timeZone,
  unitSystem: 'metric',
};

export const FacilityContext = createContext<Facility>(unknownFacility);

export function useFacility(): Facility {
  return use(FacilityContext);
}
