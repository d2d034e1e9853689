import { spawn, type ChildProcess } from 'node:child_process';
import { closeSync, existsSync, openSync, readFileSync, renameSync, statSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { localFolder, top } from './checkout.mjs';
import { handToKeeper, makeFolder } from './keeper';
import { Refusal } from './refusal.mjs';
import { killGroup } from './run-command';

export type ApiSettings = {
  readonly databaseUrl: string;
  readonly host: string;
  /** 0 takes a free one. */
  readonly port: number;
  readonly sessionSecret: string;
  /** Absent while Vite serves the client. */
  readonly clientFolder?: string;
  readonly logFile?: string;
};

export type ApiProcess = {
  readonly port: number;
  /** Resolves when it ended, wanted or not. */
  readonly ended: Promise<void>;
  readonly stop: () => Promise<void>;
};

const listenLimitMs = 60_000;
const stopLimitMs = 10_000;
const largestLog = 5 * 1024 * 1024;
export const apiLog = path.join(localFolder, 'server.log');

/** Starts server/main.ts and waits until it listens. */
export async function startApi(settings: ApiSettings): Promise<ApiProcess> {
  const logFile = settings.logFile ?? apiLog;
  const log = openLog(logFile);
  const logStart = statSync(logFile).size;
  const child = spawn(process.execPath, ['--enable-source-maps', '--import', 'tsx', 'server/main.ts'], {
    cwd: top,
    env: {
      ...process.env,
      NODE_ENV: 'production',
      DATABASE_URL: settings.databaseUrl,
      HOST: settings.host,
      PORT: String(settings.port),
      SESSION_SECRET: settings.sessionSecret,
      ...(settings.clientFolder === undefined ? {} : { CLIENT_DIR: settings.clientFolder }),
    },
    // A group of its own: Ctrl-C in the terminal reaches only the command, which stops this in order.
    detached: true,
    // Over the channel it says on which port it listens, and by its closing it learns that the command died.
    stdio: ['ignore', log, log, 'ipc'],
  });
  closeSync(log);
  const ended = new Promise<void>((resolve) => {
    child.once('error', () => {
      resolve();
    });
    child.once('exit', () => {
      resolve();
    });
  });
  const port = await Promise.race([listeningPort(child), ended, sleep(listenLimitMs, undefined, { ref: false })]);
  if (port === undefined) {
    await stopProcess(child, ended);
    const said = readFileSync(logFile).subarray(logStart).toString('utf8').trim().slice(-2000);
    throw new Refusal(
      `The server did not start. ${said === '' ? `It said nothing within ${listenLimitMs / 1000} s.` : `It said:\n\n${said}`}`,
    );
  }
  return { port, ended, stop: () => stopProcess(child, ended) };
}

function listeningPort(child: ChildProcess): Promise<number> {
  return new Promise((resolve) => {
    child.on('message', (message: unknown) => {
      if (typeof message === 'object' && message !== null && 'listening' in message) resolve(Number(message.listening));
    });
  });
}

async function stopProcess(child: ChildProcess, ended: Promise<void>): Promise<void> {
  if (child.pid === undefined) return;
  killGroup(child.pid, 'SIGTERM');
  const isLate = await Promise.race([ended.then(() => false), sleep(stopLimitMs, true, { ref: false })]);
  if (isLate) killGroup(child.pid, 'SIGKILL');
}

/** One older log is kept. */
function openLog(file: string): number {
  makeFolder(path.dirname(file));
  if (existsSync(file) && statSync(file).size > largestLog) renameSync(file, `${file}.old`);
  const log = openSync(file, 'a', 0o600);
  handToKeeper(file);
  return log;
}
