import path from 'node:path';
import { fileURLToPath } from 'node:url';

/** Absolute path of the checkout's top folder. */
export const top = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '..', '..');

/** What this machine keeps for itself: database, logs, secrets. Git never sees it. */
export const localFolder = path.resolve(top, process.env.LOCAL_DIR ?? '.local');
