import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { findKeeper, makeFolder } from './keeper';
import { Refusal } from './refusal.mjs';
import { canEnter, findClosedFolder, findUserByName, isRoot, nameOfUser, type SystemUser } from './users';

export type ClusterHome = {
  readonly folder: string;
  readonly data: string;
  readonly log: string;
  readonly password: string;
  readonly port: string;
  readonly leases: string;
  /** Undefined: the server runs under the user of this process. */
  readonly serverUser: SystemUser | undefined;
};

/**
 * Decides where the data lives and under whom the server runs, and refuses what could only fail later.
 *
 * PostgreSQL does not run as root. Under root it runs as the checkout's owner, or, where that is root too, as the
 * package's own user.
 * @param wanted folder inside the checkout
 * @param elsewhere parent for the data when that user cannot reach the checkout, as below /root
 */
export function chooseClusterHome(wanted: string, elsewhere: string): ClusterHome {
  makeFolder(wanted);
  const serverUser = isRoot ? (findKeeper(wanted) ?? findPackageUser()) : undefined;
  const folder = chooseFolder(wanted, elsewhere, serverUser);
  const data = path.join(folder, 'data');
  refuseForeign(folder, isRoot ? undefined : process.getuid?.());
  refuseForeign(data, serverUser?.uid ?? process.getuid?.());
  return {
    folder,
    data,
    log: path.join(folder, 'server.log'),
    password: path.join(folder, 'password'),
    port: path.join(folder, 'port'),
    leases: path.join(folder, 'leases'),
    serverUser,
  };
}

function findPackageUser(): SystemUser {
  const user = findUserByName('postgres') ?? findUserByName('nobody');
  if (user !== undefined) return user;
  throw new Refusal('PostgreSQL does not run as root, and there is no user "postgres" or "nobody" to run it under.');
}

/** Inside the checkout, or where root once put the data because the checkout was closed to the server's user. */
function chooseFolder(wanted: string, elsewhere: string, serverUser: SystemUser | undefined): string {
  const signpost = path.join(wanted, 'elsewhere');
  if (existsSync(signpost)) return readFileSync(signpost, 'utf8').trim();
  if (canEnter(wanted, serverUser)) return wanted;
  // A name by chance: another checkout may come to lie at this path, and must not find this one's data.
  const folder = path.join(elsewhere, randomBytes(6).toString('hex'));
  makeFolder(folder);
  if (!canEnter(folder, serverUser)) {
    const closed = findClosedFolder(folder, serverUser);
    throw new Refusal(
      `PostgreSQL runs as ${serverUser?.name ?? 'this user'}, who cannot enter ${closed}. ` +
        'Set LOCAL_DIR to a folder that every user may enter, then start again.',
    );
  }
  writeFileSync(signpost, `${folder}\n`);
  return folder;
}

/** `uid` undefined: whoever it belongs to is welcome. */
function refuseForeign(place: string, uid: number | undefined): void {
  if (uid === undefined || !existsSync(place)) return;
  const { uid: ownerId } = statSync(place);
  if (ownerId === uid) return;
  throw new Refusal(
    `The database in ${place} belongs to ${nameOfUser(ownerId)}, so it cannot be started from here. Start as the user ` +
      'who started it first (root, if it was root), or set LOCAL_DIR to another folder to begin anew there.',
  );
}
