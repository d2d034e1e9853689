import type { Role } from './permissions';

/** What people call each role, on screens and on badges. */
export const roleWords: Readonly<Record<Role, string>> = {
  technician: 'Technician',
  lead: 'Lead',
  supervisor: 'Supervisor',
  'infection-prevention': 'Infection prevention',
  'operating-room': 'Operating room',
  engineer: 'Engineer',
  surveyor: 'Surveyor',
  administrator: 'Administrator',
};
