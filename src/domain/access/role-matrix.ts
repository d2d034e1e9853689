import { roles, type Permission, type Role } from './permissions';

const viewing = [
  'load.view',
  'item.view',
  'equipment.view',
  'package.view',
  'policy.view',
] as const satisfies Permission[];

const building = [
  ...viewing,
  'load.open',
  'load.build',
  'load.close',
  'load.abandon',
  'load.print-stickers',
  'air-removal-test.record',
  'lesson.finish',
  'package.pack',
  'package.stage',
  'package.print-labels',
] as const satisfies Permission[];

/** A change of policy takes two: one who proposes it, and another who confirms it. */
const decidingPolicy = ['policy.propose', 'policy.confirm'] as const satisfies Permission[];

/** The one table of who may do what. The server guards with it, the screens show by it. */
const matrix: Readonly<Record<Role, readonly Permission[]>> = {
  technician: building,
  lead: [...building, 'load.accept-finding', 'item.edit'],
  supervisor: [
    ...building,
    ...decidingPolicy,
    'load.accept-finding',
    'item.edit',
    'equipment.edit',
    'people.view',
    'audit.view',
  ],
  'infection-prevention': [...viewing, 'policy.confirm', 'audit.view'],
  'operating-room': ['load.view', 'package.view', 'item.view'],
  engineer: ['load.view', 'equipment.view', 'equipment.edit', 'air-removal-test.record', 'policy.view'],
  surveyor: [...viewing, 'people.view', 'audit.view'],
  administrator: [
    ...viewing,
    ...decidingPolicy,
    'item.edit',
    'equipment.edit',
    'people.view',
    'people.edit',
    'audit.view',
  ],
};

export function permissionsOf(role: Role): readonly Permission[] {
  return matrix[role];
}

/** Every role that may do it. */
export function rolesPermitted(permission: Permission): readonly Role[] {
  return roles.filter((role) => isPermitted(role, permission));
}

export function isPermitted(role: Role, permission: Permission): boolean {
  return matrix[role].includes(permission);
}
