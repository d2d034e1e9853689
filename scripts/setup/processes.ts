import { readFileSync, readlinkSync } from 'node:fs';

/** Fields of proc(5)'s stat from the third on; the second, the name, may itself hold blanks and brackets. */
function readStat(pid: number): string[] | undefined {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    // Ended, and only waiting for its parent to ask how.
    return fields[0] === 'Z' || fields[0] === 'X' ? undefined : fields;
  } catch {
    return undefined;
  }
}

export function isRunning(pid: number): boolean {
  return readStat(pid) !== undefined;
}

/** When a process began, in clock ticks since boot; with the id it names one process for good. */
export function processStart(pid: number): string | undefined {
  return readStat(pid)?.[19];
}

/** Id of the process that started this one; changes when that one ends. */
export function processParent(pid: number): number | undefined {
  const parent = readStat(pid)?.[1];
  return parent === undefined ? undefined : Number(parent);
}

export function processName(pid: number): string | undefined {
  try {
    return readFileSync(`/proc/${pid}/comm`, 'utf8').trim();
  } catch {
    return undefined;
  }
}

/** Undefined as well when it is another user's and may not be read. */
export function processFolder(pid: number): string | undefined {
  try {
    return readlinkSync(`/proc/${pid}/cwd`);
  } catch {
    return undefined;
  }
}
