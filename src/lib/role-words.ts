import type { Role } from '#domain/access/permissions';

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
