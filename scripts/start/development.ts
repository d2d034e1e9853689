import { watch } from 'node:fs';
import path from 'node:path';
import { createServer } from 'vite';
import { startApi, type ApiProcess, type ApiSettings } from '../setup/api-process';
import { top } from '../setup/checkout.mjs';
import { findFreePort } from '../setup/ports';
import { line } from './output';
import type { Serving, ServingSettings } from './serving';
import type { Place } from './settings';

/** What the API is made of; a change in any of them restarts it. */
const apiFolders = ['server', 'src/domain', 'src/contract'];
/** An editor writes a file in several steps. */
const quietMs = 150;

/** Vite serves the client from its sources and passes /api on; the API restarts when its sources change. */
export async function serveSources(settings: ServingSettings, place: Place): Promise<Serving> {
  const port = place.port === 0 ? await findFreePort() : place.port;
  const apiPort = await findFreePort();
  process.env.API_URL = `http://127.0.0.1:${apiPort}`;
  const stopApi = await keepApiFresh({ ...settings, host: '127.0.0.1', port: apiPort });
  const vite = await createServer({ root: top, logLevel: 'warn', server: { host: place.host, port } });
  await vite.listen();
  line('Client', 'served from its sources; changes show at once');
  return {
    port,
    ended: new Promise(() => undefined),
    stop: async () => {
      await vite.close();
      await stopApi();
    },
  };
}

async function keepApiFresh(settings: ApiSettings): Promise<() => Promise<void>> {
  let api: ApiProcess | undefined = await startApi(settings);
  let isStopped = false;
  let timer: NodeJS.Timeout | undefined;
  // One restart after the other, however fast the changes come.
  let queue = Promise.resolve();
  async function restart(): Promise<void> {
    await api?.stop();
    api = undefined;
    if (isStopped) return;
    try {
      api = await startApi(settings);
      line('API', 'restarted');
    } catch (error) {
      console.error(`\n${error instanceof Error ? error.message : String(error)}\n`);
    }
  }
  const watchers = apiFolders.map((folder) =>
    watch(path.join(top, folder), { recursive: true }, (_event, file) => {
      if (file?.endsWith('.ts') !== true) return;
      clearTimeout(timer);
      timer = setTimeout(() => {
        queue = queue.then(restart);
      }, quietMs);
    }),
  );
  return async () => {
    isStopped = true;
    clearTimeout(timer);
    for (const watcher of watchers) watcher.close();
    await queue;
    await api?.stop();
  };
}
