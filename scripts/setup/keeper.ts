import { chownSync, existsSync, mkdirSync, statSync } from 'node:fs';
import path from 'node:path';
import { Refusal } from './refusal.mjs';
import { findUserById, isRoot, nameOfUser, type SystemUser } from './users';

/** The ordinary user to whom a place belongs while root works in it; undefined when it is one's own. */
export function findKeeper(place: string): SystemUser | undefined {
  if (!isRoot) return undefined;
  if (!existsSync(place)) return findKeeper(path.dirname(place));
  const { uid } = statSync(place);
  return uid === 0 ? undefined : findUserById(uid);
}

/** Hands what root made to whoever keeps the folder it lies in, so that it does not lock that user out. */
export function handToKeeper(file: string): void {
  const keeper = findKeeper(path.dirname(file));
  if (keeper !== undefined) chownSync(file, keeper.uid, keeper.gid);
}

/** Makes a folder and those above it; says whose checkout it is where this user may not. */
export function makeFolder(folder: string): void {
  if (existsSync(folder)) return;
  const above = path.dirname(folder);
  makeFolder(above);
  try {
    mkdirSync(folder, { mode: 0o755 });
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'EEXIST') return;
    throw new Refusal(
      `The folder ${folder} could not be made: ${above} belongs to ${nameOfUser(statSync(above).uid)}. ` +
        'Start as that user, or in a checkout of your own.',
    );
  }
  handToKeeper(folder);
}
