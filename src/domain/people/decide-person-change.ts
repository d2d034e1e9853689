import type { Role } from '../access/permissions';
import { accept, refuse, type Result } from '../result';

/*
 * What an administrator may change about a person. Nobody changes their own access, one administrator stays whatever
 * happens, a surveyor's access always has an end, and one facility does not decide over the sign-in of somebody who also
 * works at another: else its administrator could give out a password and walk in there.
 * Functional and object rights: OWASP ASVS 5.0, 8.2.1 and 8.2.2.
 */

export type PersonAccess = {
  readonly role: Role;
  /** Milliseconds since 1970, UTC; null: no end. */
  readonly expiresAtMs: number | null;
  readonly isDisabled: boolean;
};

/** What belongs to the person wherever they work, as against their place in one facility. */
export type SignInAct = 'change-name' | 'disable' | 'enable' | 'change-badge' | 'reset-password' | 'reset-pin';

export type PersonChange = {
  readonly isSelf: boolean;
  readonly before: PersonAccess;
  readonly after: PersonAccess;
  readonly signInActs: readonly SignInAct[];
  /** Whether the person who decides is administrator wherever this person works. */
  readonly administersAll: boolean;
  /** Whether, without this person, each facility they are administrator of keeps one whose access has no end. */
  readonly othersAdministerHere: boolean;
  readonly othersAdministerEverywhere: boolean;
};

export type PersonChangeRefusal =
  'own-access' | 'own-password' | 'surveyor-needs-end' | 'last-administrator' | 'works-elsewhere';

function isLasting({ role, expiresAtMs, isDisabled }: PersonAccess): boolean {
  return role === 'administrator' && expiresAtMs === null && !isDisabled;
}

function isSameAccess(before: PersonAccess, after: PersonAccess): boolean {
  return (
    before.role === after.role && before.expiresAtMs === after.expiresAtMs && before.isDisabled === after.isDisabled
  );
}

/** @returns whether the person's open sessions end with it, or why not */
export function decidePersonChange(
  change: PersonChange,
): Result<{ readonly endsSessions: boolean }, PersonChangeRefusal> {
  const { isSelf, before, after, signInActs } = change;
  if (isSelf && !isSameAccess(before, after)) {
    return refuse('own-access', 'Your own role, end and access are changed by another administrator.');
  }
  if (isSelf && signInActs.includes('reset-password')) {
    return refuse('own-password', 'Change your own password yourself, under your name.');
  }
  if (signInActs.length > 0 && !change.administersAll) {
    return refuse(
      'works-elsewhere',
      'This person also works at another facility. An administrator of both has to do this.',
    );
  }
  if (after.role === 'surveyor' && after.expiresAtMs === null) {
    return refuse('surveyor-needs-end', 'A surveyor sees this facility for a time only. Set when it ends.');
  }
  if (isLasting(before) && !isLasting(after)) {
    const others =
      before.isDisabled === after.isDisabled ? change.othersAdministerHere : change.othersAdministerEverywhere;
    if (!others) {
      return refuse('last-administrator', 'This is the last administrator. Make somebody else administrator first.');
    }
  }
  const endsSessions =
    !isSelf && (!isSameAccess(before, after) || signInActs.some((act) => act !== 'change-name' && act !== 'enable'));
  return accept({ endsSessions });
}
