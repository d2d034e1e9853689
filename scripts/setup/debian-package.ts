import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';
import { Refusal } from './refusal.mjs';

type DebianPackage = {
  /** What it is to a reader: "PostgreSQL". */
  readonly title: string;
  readonly packageName: string;
  /** Finishes the sentence for a system without apt: what to install and which setting to make. */
  readonly otherwise: string;
  readonly find: () => string | undefined;
  readonly beforeInstall?: () => void;
};

/** Where the program is; installs Debian's package when it is missing and this process may, else says how. */
export function ensureDebianPackage(wanted: DebianPackage): string {
  const found = wanted.find();
  if (found !== undefined) return found;
  if (!existsSync('/usr/bin/apt-get')) throw new Refusal(`${wanted.title} was not found. ${wanted.otherwise}`);
  const install = `apt-get install -y --no-install-recommends ${wanted.packageName}`;
  if (process.getuid?.() !== 0) {
    throw new Refusal(
      `${wanted.title} is not installed, and only root may install it. Run this once, then start again:\n\n` +
        `  sudo sh -c 'apt-get update && ${install}'`,
    );
  }
  console.log(`  Installing Debian's package ${wanted.packageName} (once)`);
  wanted.beforeInstall?.();
  runApt(['update', '-q'], wanted);
  runApt(install.split(' ').slice(1), wanted);
  const installed = wanted.find();
  if (installed === undefined) {
    throw new Refusal(`Debian's package ${wanted.packageName} was installed, but its programs were not found.`);
  }
  return installed;
}

function runApt(args: readonly string[], wanted: DebianPackage): void {
  const result = spawnSync('apt-get', args, {
    encoding: 'utf8',
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
    stdio: ['ignore', 'pipe', 'pipe'],
    maxBuffer: 64 * 1024 * 1024,
  });
  if (result.status === 0) return;
  throw new Refusal(
    `Debian's package ${wanted.packageName} could not be installed. apt-get ${args.join(' ')} said:\n\n` +
      `${result.stdout}${result.stderr}`.trim(),
  );
}
