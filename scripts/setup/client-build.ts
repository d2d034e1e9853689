import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, renameSync, rmSync, statSync } from 'node:fs';
import path from 'node:path';
import { top } from './checkout.mjs';
import { makeFolder } from './keeper';
import { Refusal } from './refusal.mjs';
import { runCommand } from './run-command';

/** Everything that can change what the browser gets. */
const inputs = [
  'src',
  'public',
  'index.html',
  'vite.config.ts',
  'tailwind.config.ts',
  'postcss.config.js',
  'package-lock.json',
];
const builds = path.join(top, 'dist', 'client');
const buildLimitMs = 180_000;
const kept = 3;

export type ClientBuild = { readonly folder: string; readonly isNew: boolean };

/**
 * The built client of exactly these sources; builds it if there is none yet. Every build has a folder named by its
 * sources, so a running server never loses the files it serves to a later build.
 */
export async function ensureClientBuild(stop?: Promise<void>): Promise<ClientBuild> {
  const folder = path.join(builds, hashInputs());
  if (existsSync(path.join(folder, 'index.html'))) return { folder, isNew: false };
  const unfinished = path.join(builds, `unfinished-${process.pid}`);
  makeFolder(unfinished);
  try {
    const result = await runCommand({
      args: [process.execPath, '--import', 'tsx', 'scripts/setup/build-client.ts', unfinished],
      cwd: top,
      env: { ...process.env, NODE_ENV: 'production' },
      limitMs: buildLimitMs,
      ...(stop === undefined ? {} : { stop }),
    });
    if (result.exitCode !== 0) {
      const reason = result.hasTimedOut ? `it took longer than ${buildLimitMs / 1000} s` : result.output.trim();
      throw new Refusal(`The client could not be built:\n\n${reason}`);
    }
    if (!existsSync(folder)) renameSync(unfinished, folder);
  } finally {
    rmSync(unfinished, { recursive: true, force: true });
  }
  removeOldBuilds(folder);
  return { folder, isNew: true };
}

function hashInputs(): string {
  const hash = createHash('sha256');
  for (const input of inputs) {
    for (const file of listFiles(input))
      hash
        .update(`${file}\0`)
        .update(readFileSync(path.join(top, file)))
        .update('\0');
  }
  return hash.digest('hex').slice(0, 16);
}

function listFiles(place: string): string[] {
  const full = path.join(top, place);
  if (!existsSync(full)) return [];
  if (!statSync(full).isDirectory()) return [place];
  return readdirSync(full)
    .sort()
    .flatMap((name) => listFiles(path.join(place, name)));
}

function removeOldBuilds(current: string): void {
  const others = readdirSync(builds)
    .filter((name) => !name.startsWith('unfinished-'))
    .map((name) => path.join(builds, name))
    .filter((folder) => folder !== current)
    .sort((a, b) => statSync(b).mtimeMs - statSync(a).mtimeMs);
  for (const folder of others.slice(kept - 1)) rmSync(folder, { recursive: true, force: true });
}
