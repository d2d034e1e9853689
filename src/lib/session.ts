import type { Permission, Role } from '#domain/access/permissions';
import { createContext, use } from 'react';
import type { Facility } from './facility';

export type SessionPerson = {
  readonly id: string;
  readonly displayName: string;
  readonly initials: string;
  readonly staffNumber: string;
  readonly role: Role;
};

/** Who is at this station, for every screen below the frame. */
export type Session = {
  readonly person: SessionPerson;
  readonly facility: Facility;
  readonly permissions: readonly Permission[];
};

export const SessionContext = createContext<Session | null>(null);

export function useSession(): Session {
  const session = use(SessionContext);
  if (session === null) throw new Error('useSession needs somebody to be signed in');
  return session;
}

/** Whether the person at this station may do it. The server asks again; this is for what the screen shows. */
export function useMay(permission: Permission): boolean {
  return useSession().permissions.includes(permission);
}
