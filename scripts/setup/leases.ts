import { mkdirSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { processStart } from './processes';

/** A file per process that uses a shared thing, so that the last one knows it is the last. */
export function takeLease(folder: string): void {
  mkdirSync(folder, { recursive: true });
  writeFileSync(path.join(folder, leaseName(process.pid)), '');
}

export function dropLease(folder: string): void {
  rmSync(path.join(folder, leaseName(process.pid)), { force: true });
}

/** Leases of processes that ended without dropping theirs are cleared away. */
export function hasOtherLease(folder: string): boolean {
  const others = readdirSync(folder).filter((name) => name !== leaseName(process.pid));
  const living = others.filter((name) => {
    const isLiving = leaseName(Number(name.split('-')[0])) === name;
    if (!isLiving) rmSync(path.join(folder, name), { force: true });
    return isLiving;
  });
  return living.length > 0;
}

function leaseName(pid: number): string {
  return `${pid}-${processStart(pid) ?? 'ended'}`;
}
