import { readFileSync, realpathSync } from 'node:fs';
import path from 'node:path';
import { processFolder, processName } from './processes';

export type Postmaster = { readonly pid: number; readonly port: number; readonly state: string };

/**
 * What PostgreSQL wrote about its own process: process id, data folder, start time, port, socket folder, address,
 * shared memory, state; one a line.
 */
export function readPostmaster(data: string): Postmaster | undefined {
  try {
    const lines = readFileSync(path.join(data, 'postmaster.pid'), 'utf8').split('\n');
    const pid = Number(lines[0]);
    if (!Number.isInteger(pid) || pid <= 0) return undefined;
    return { pid, port: Number(lines[3]), state: (lines[7] ?? '').trim() };
  } catch {
    return undefined;
  }
}

/**
 * The living server of this data folder. After a power cut the process id in the file may be somebody else's: ours is
 * called postgres and has the data folder as its own.
 */
export function findPostmaster(data: string): Postmaster | undefined {
  const written = readPostmaster(data);
  if (written === undefined || processName(written.pid) !== 'postgres') return undefined;
  return processFolder(written.pid) === realpathSync(data) ? written : undefined;
}
