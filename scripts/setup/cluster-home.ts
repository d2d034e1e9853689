import { createHash } from 'node:crypto';
import { chownSync, existsSync, mkdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { Refusal } from './refusal.mjs';
import { canEnter, findClosedFolder, findUserById, findUserByName, isRoot, nameOfUser, type SystemUser } from './users';

export type ClusterHome = {
  readonly folder: string;
  readonly data: string;
  readonly log: string;
  readonly password: string;
  readonly port: string;
  readonly leases: string;
  /** Undefined: the server runs under the user of this process. */
  readonly serverUser: SystemUser | undefined;
  /** Hands a file to whoever keeps the checkout, so that what root made does not lock its owner out. */
  readonly handOver: (file: string) => void;
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
  const keeper = findKeeper(wanted);
  const handOver = (file: string): void => {
    if (keeper !== undefined) chownSync(file, keeper.uid, keeper.gid);
  };
  makeFolder(wanted, handOver);
  const serverUser = isRoot ? (keeper ?? findPackageUser()) : undefined;
  const folder = canEnter(wanted, serverUser) ? wanted : moveElsewhere(wanted, elsewhere, serverUser, handOver);
  const data = path.join(folder, 'data');
  refuseForeignData(data, serverUser);
  return {
    folder,
    data,
    log: path.join(folder, 'server.log'),
    password: path.join(folder, 'password'),
    port: path.join(folder, 'port'),
    leases: path.join(folder, 'leases'),
    serverUser,
    handOver,
  };
}

/** The ordinary user to whom the checkout belongs while root works in it. */
function findKeeper(folder: string): SystemUser | undefined {
  if (!isRoot) return undefined;
  const present = existsSync(folder) ? folder : findNearestFolder(folder);
  const { uid } = statSync(present);
  return uid === 0 ? undefined : findUserById(uid);
}

function findNearestFolder(folder: string): string {
  return existsSync(folder) ? folder : findNearestFolder(path.dirname(folder));
}

function findPackageUser(): SystemUser {
  const user = findUserByName('postgres') ?? findUserByName('nobody');
  if (user !== undefined) return user;
  throw new Refusal('PostgreSQL does not run as root, and there is no user "postgres" or "nobody" to run it under.');
}

function makeFolder(folder: string, handOver: (file: string) => void): void {
  if (existsSync(folder)) return;
  makeFolder(path.dirname(folder), handOver);
  try {
    mkdirSync(folder, { mode: 0o755 });
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'EEXIST') return;
    const above = path.dirname(folder);
    throw new Refusal(
      `The folder ${folder} could not be made: ${above} belongs to ${nameOfUser(statSync(above).uid)}. ` +
        'Start as that user, or set LOCAL_DIR to a folder of your own.',
    );
  }
  handOver(folder);
}

/** The way there is written down in the checkout, so that the data is found again if the checkout moves. */
function moveElsewhere(
  wanted: string,
  elsewhere: string,
  serverUser: SystemUser | undefined,
  handOver: (file: string) => void,
): string {
  const signpost = path.join(wanted, 'elsewhere');
  if (existsSync(signpost)) return readFileSync(signpost, 'utf8').trim();
  const folder = path.join(elsewhere, createHash('sha256').update(wanted).digest('hex').slice(0, 12));
  makeFolder(folder, handOver);
  if (!canEnter(folder, serverUser)) {
    const closed = findClosedFolder(folder, serverUser);
    throw new Refusal(
      `PostgreSQL runs as ${serverUser?.name ?? 'this user'}, who cannot enter ${closed}. ` +
        'Set LOCAL_DIR to a folder that every user may enter, then start again.',
    );
  }
  writeFileSync(signpost, `${folder}\n`);
  console.log(`  ${findClosedFolder(wanted, serverUser)} is closed to PostgreSQL's user: the data goes to ${folder}`);
  return folder;
}

function refuseForeignData(data: string, serverUser: SystemUser | undefined): void {
  if (!existsSync(data)) return;
  const { uid } = statSync(data);
  if (uid === (serverUser?.uid ?? process.getuid?.())) return;
  throw new Refusal(
    `The database in ${data} belongs to ${nameOfUser(uid)}, so this user cannot start it. Start as the user who ` +
      'started it first (root, if it was root), set LOCAL_DIR to another folder, or remove that folder and the data in it.',
  );
}
