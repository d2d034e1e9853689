/** Everything a person may be allowed to do. A route names one of these; nothing is allowed by silence. */
export const permissions = [
  'load.view',
  'load.open',
  'load.build',
  'load.accept-finding',
  'load.close',
  'load.abandon',
  'load.print-stickers',
  'air-removal-test.record',
  'lesson.finish',
  'item.view',
  'item.edit',
  'equipment.view',
  'equipment.edit',
  'package.view',
  'package.pack',
  'package.stage',
  'package.print-labels',
  'people.view',
  'people.edit',
  'policy.view',
  'policy.propose',
  'policy.confirm',
  'audit.view',
] as const;

export type Permission = (typeof permissions)[number];

export const roles = [
  'technician',
  'lead',
  'supervisor',
  'infection-prevention',
  'operating-room',
  'engineer',
  'surveyor',
  'administrator',
] as const;

export type Role = (typeof roles)[number];
