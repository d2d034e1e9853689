import type { Permission, Role } from '#domain/access/permissions';

/** Who asks, in which facility: taken from the session once per request, handed down from there. */
export type Actor = {
  readonly personId: string;
  readonly displayName: string;
  readonly facilityId: string;
  readonly role: Role;
  readonly permissions: readonly Permission[];
};
