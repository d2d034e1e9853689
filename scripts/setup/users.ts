import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import path from 'node:path';

export type SystemUser = { readonly name: string; readonly uid: number; readonly gid: number };

function listUsers(): SystemUser[] {
  return readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .map((line) => line.split(':'))
    .map(([name = '', , uid, gid]) => ({ name, uid: Number(uid), gid: Number(gid) }));
}

export function findUserByName(name: string): SystemUser | undefined {
  return listUsers().find((user) => user.name === name);
}

export function findUserById(uid: number): SystemUser | undefined {
  return listUsers().find((user) => user.uid === uid);
}

/** For sentences: the name where there is one. */
export function nameOfUser(uid: number): string {
  return findUserById(uid)?.name ?? `user number ${uid}`;
}

export const isRoot = process.getuid?.() === 0;

/** What to give a child process so that it runs under that user; undefined: under this process's own. */
export function identityOf(user: SystemUser | undefined): { uid?: number; gid?: number } {
  return user === undefined ? {} : { uid: user.uid, gid: user.gid };
}

/** Asks the system itself whether the user gets into a folder: every folder above has to let it through. */
export function canEnter(folder: string, user: SystemUser | undefined): boolean {
  return spawnSync('/usr/bin/test', ['-x', folder], { ...identityOf(user), cwd: '/' }).status === 0;
}

/** The outermost folder on the way that shuts the user out. */
export function findClosedFolder(folder: string, user: SystemUser | undefined): string {
  const above = path.dirname(folder);
  return above === folder || canEnter(above, user) ? folder : findClosedFolder(above, user);
}
