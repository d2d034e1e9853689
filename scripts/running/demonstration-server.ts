import { randomBytes } from 'node:crypto';
import path from 'node:path';
import { copyDatabase, ensureTemplate, holdTestServer, sweepOldDatabases } from '../../tests/support/test-server';
import { startApi } from '../setup/api-process';
import { localFolder } from '../setup/checkout.mjs';
import { ensureClientBuild } from '../setup/client-build';
import { layOutDemonstration } from '../start/demonstration';

export type RunningDemonstration = {
  readonly url: string;
  readonly stop: () => Promise<void>;
};

/** Everything several demonstrations have in common: the database server, a laid-out hospital to copy, the built client. */
export type DemonstrationMaker = {
  /** Starts the program with a hospital of its own, as `npm start` lays it out, on a port of its own. */
  readonly start: () => Promise<RunningDemonstration>;
  readonly release: () => Promise<void>;
};

/**
 * The program as people get it (production build, server in a process of its own, durable database), but with databases
 * that belong to the caller. `name` names its log under .local.
 */
export async function makeDemonstrations(name: string, now = new Date()): Promise<DemonstrationMaker> {
  const server = await holdTestServer();
  const running = new Set<RunningDemonstration>();
  try {
    const template = await ensureTemplate(server.url);
    await sweepOldDatabases(server.url, template);
    const hospital = await copyDatabase(server.url, template);
    await layOutDemonstration(hospital, now);
    const { folder } = await ensureClientBuild();
    const hospitalName = new URL(hospital).pathname.slice(1);
    return {
      start: async () => {
        const api = await startApi({
          databaseUrl: await copyDatabase(server.url, hospitalName),
          host: '127.0.0.1',
          port: 0,
          sessionSecret: randomBytes(32).toString('hex'),
          clientFolder: folder,
          logFile: path.join(localFolder, name, 'server.log'),
        });
        const demonstration: RunningDemonstration = {
          // Browsers count this address as secure, so the camera may be used.
          url: `http://localhost:${api.port}`,
          stop: async () => {
            running.delete(demonstration);
            await api.stop();
          },
        };
        running.add(demonstration);
        return demonstration;
      },
      release: async () => {
        for (const one of [...running]) await one.stop();
        await server.release();
      },
    };
  } catch (error) {
    await server.release();
    throw error;
  }
}
