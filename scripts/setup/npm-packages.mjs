import { spawn } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { exclusively } from './exclusive.mjs';
import { Refusal } from './refusal.mjs';

const leastNode = [20, 19];

/**
 * Plain sentence when this Node is too old for the packages; they fail in less readable ways.
 * @param {string} [version] as in process.versions.node
 */
export function requireNode(version = process.versions.node) {
  const [major = 0, minor = 0] = version.split('.').map(Number);
  const [leastMajor = 0, leastMinor = 0] = leastNode;
  if (major > leastMajor || (major === leastMajor && minor >= leastMinor)) return;
  throw new Refusal(
    `Paperside needs Node ${leastNode.join('.')} or newer; this is Node ${version}. Install a newer Node, then start again.`,
  );
}

/**
 * Installs exactly what package-lock.json says when node_modules is missing, half made or of another lock file.
 * @param {string} top absolute path of the checkout
 */
export async function ensureNpmPackages(top) {
  if (installedMatchesLock(top)) return;
  await exclusively(top, 'installing the npm packages', async () => {
    if (installedMatchesLock(top)) return;
    console.log('  Installing the npm packages from the lock file (about half a minute, only when they change)');
    await runNpmCi(top);
    if (!installedMatchesLock(top)) {
      throw new Refusal(
        `npm finished, but node_modules does not match package-lock.json. Remove the folder ${path.join(top, 'node_modules')} and start again.`,
      );
    }
  });
}

/**
 * npm keeps its own account of what it put into node_modules; it writes it last, so a broken install has none.
 * @param {string} top
 */
export function installedMatchesLock(top) {
  const wanted = readPackages(path.join(top, 'package-lock.json'));
  const found = readPackages(path.join(top, 'node_modules', '.package-lock.json'));
  if (wanted === undefined) throw new Refusal(`There is no package-lock.json in ${top}: the checkout is not whole.`);
  if (found === undefined) return false;
  return Object.entries(wanted).every(([place, entry]) => {
    if (place === '') return true;
    const installed = found[place];
    // An optional package may be made for another processor or system and then stays out.
    if (installed === undefined) return entry.optional === true;
    return installed.version === entry.version && existsSync(path.join(top, place));
  });
}

/**
 * @param {string} file
 * @returns {Record<string, { version?: string, optional?: boolean }> | undefined}
 */
function readPackages(file) {
  try {
    /** @type {unknown} */
    const lock = JSON.parse(readFileSync(file, 'utf8'));
    if (typeof lock !== 'object' || lock === null || !('packages' in lock)) return undefined;
    return /** @type {Record<string, { version?: string, optional?: boolean }>} */ (lock.packages);
  } catch {
    return undefined;
  }
}

/**
 * @param {string} top
 * @returns {Promise<void>}
 */
function runNpmCi(top) {
  // Started through npm, its own program file is known; a bare name would search the PATH again.
  const npmFile = process.env.npm_execpath;
  const [command, ...before] = npmFile?.endsWith('.js') ? [process.execPath, npmFile] : ['npm'];
  const args = [...before, 'ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'];
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { cwd: top, stdio: ['ignore', 'pipe', 'pipe'] });
    let output = '';
    child.stdout.on('data', (/** @type {Buffer} */ chunk) => (output += chunk.toString()));
    child.stderr.on('data', (/** @type {Buffer} */ chunk) => (output += chunk.toString()));
    child.once('error', (error) => {
      reject(new Refusal(`npm could not be started (${error.message}). Install npm, then start again.`));
    });
    child.once('close', (code) => {
      if (code === 0) resolve();
      else reject(new Refusal(`The npm packages could not be installed. npm said:\n\n${output.trim()}`));
    });
  });
}
