import { ensureClientBuild } from '../setup/client-build';
import { startApi, type ApiSettings } from '../setup/api-process';
import { line } from './output';
import type { Place } from './settings';

/** What listens at the printed address. */
export type Serving = {
  readonly port: number;
  /** Resolves when it ended without being asked. */
  readonly ended: Promise<void>;
  readonly stop: () => Promise<void>;
};

export type ServingSettings = Pick<ApiSettings, 'databaseUrl' | 'sessionSecret'>;

/** The built client and the API behind one port. */
export async function serveBuilt(settings: ServingSettings, place: Place, stop: Promise<void>): Promise<Serving> {
  const client = await ensureClientBuild(stop);
  line('Client', client.isNew ? 'built' : 'as built before');
  return startApi({ ...settings, ...place, clientFolder: client.folder });
}
