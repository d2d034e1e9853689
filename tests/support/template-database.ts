import type { TestProject } from 'vitest/node';
import { ensureTemplate, holdTestServer, sweepOldDatabases } from './test-server';

declare module 'vitest' {
  // Vitest's own interface, widened as its documentation of provide() asks.
  // eslint-disable-next-line @typescript-eslint/consistent-type-definitions
  interface ProvidedContext {
    databaseServer: string;
    databaseTemplate: string;
  }
}

/** Once per run of the server tests, before any of them. */
export default async function setUp(project: TestProject): Promise<() => Promise<void>> {
  const server = await holdTestServer();
  const template = await ensureTemplate(server.url);
  await sweepOldDatabases(server.url, template);
  project.provide('databaseServer', server.url);
  project.provide('databaseTemplate', template);
  return server.release;
}
