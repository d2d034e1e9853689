import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { localFolder } from '../setup/checkout.mjs';
import { handToKeeper, makeFolder } from '../setup/keeper';
import { isPortFree } from '../setup/ports';
import { Refusal } from '../setup/refusal.mjs';

const largestPort = 65_535;

export type Place = { readonly host: string; readonly port: number };

/** Reads HOST and PORT and refuses a port that is taken, before any lengthy work. */
export async function readPlace(env: NodeJS.ProcessEnv): Promise<Place> {
  const host = env.HOST === undefined || env.HOST === '' ? '127.0.0.1' : env.HOST;
  const port = readPort(env.PORT);
  if (port !== 0 && !(await isPortFree(port, host))) throw await takenPort(port);
  return { host, port };
}

function readPort(text = '3000'): number {
  const port = Number(text);
  if (/^\d+$/.test(text) && port <= largestPort) return port;
  throw new Refusal(`PORT is "${text}". It has to be a whole number from 0 to ${largestPort}; 0 takes a free port.`);
}

async function takenPort(port: number): Promise<Refusal> {
  const another = port < largestPort ? port + 1 : port - 1;
  const choose = `choose another port: PORT=${another} npm start`;
  if (await isPaperside(port)) {
    return new Refusal(`Paperside is already running at http://localhost:${port}. Open it there, or ${choose}`);
  }
  return new Refusal(`Port ${port} is already taken by another program. Stop that program, or ${choose}`);
}

async function isPaperside(port: number): Promise<boolean> {
  try {
    const reply = await fetch(`http://127.0.0.1:${port}/api/health`, { signal: AbortSignal.timeout(1_000) });
    const health: unknown = await reply.json();
    return typeof health === 'object' && health !== null && 'status' in health && health.status === 'ok';
  } catch {
    return false;
  }
}

/** The key that seals session cookies: the one given, else one made for this machine and kept. */
export function ensureSessionSecret(env: NodeJS.ProcessEnv): string {
  if (env.SESSION_SECRET !== undefined && env.SESSION_SECRET !== '') return env.SESSION_SECRET;
  const file = path.join(localFolder, 'session-secret');
  if (!existsSync(file)) {
    makeFolder(localFolder);
    writeFileSync(file, randomBytes(32).toString('base64url'), { mode: 0o600 });
    handToKeeper(file);
  }
  return readFileSync(file, 'utf8');
}
