import type { Knex } from 'knex';
import { migrationSource, migrationTable } from './migrations/source';

/** For Knex's own command line: `node --import tsx node_modules/knex/bin/cli.js migrate:list`. */
const settings: Knex.Config = {
  client: 'pg',
  connection: process.env.DATABASE_URL ?? '',
  migrations: { migrationSource, tableName: migrationTable },
};

export default settings;
