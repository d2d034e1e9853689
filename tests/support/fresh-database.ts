import { afterAll, beforeAll, inject } from 'vitest';
import { openDb, type Db } from '../../server/platform/db';
import { copyDatabase } from './test-server';

export type FreshDatabase = {
  /** Ready from the first beforeAll of the file on. */
  readonly db: Db;
  /** Connection address, for what opens its own connections. */
  readonly url: string;
};

/** A migrated, empty database that belongs to the calling test file alone. Call it at the top of the file. */
export function freshDatabase(): FreshDatabase {
  let opened: { db: Db; url: string } | undefined;
  beforeAll(async () => {
    const url = await copyDatabase(inject('databaseServer'), inject('databaseTemplate'));
    opened = { db: openDb(url, 6), url };
  });
  afterAll(async () => {
    await opened?.db.destroy();
  });
  function ready(): { db: Db; url: string } {
    if (opened === undefined) throw new Error('The database is ready only inside tests and hooks.');
    return opened;
  }
  return {
    get db() {
      return ready().db;
    },
    get url() {
      return ready().url;
    },
  };
}
