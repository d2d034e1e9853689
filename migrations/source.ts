import type { Knex } from 'knex';
import * as createFirstTables from './20261201090000_create_first_tables';
import * as addPolicyVersions from './20261201180000_add_policy_versions';
import * as addFinishedLessons from './20261201190000_add_finished_lessons';
import * as addFacingToItems from './20261201200000_add_facing_to_items';
import * as addOrderOfLoads from './20261201210000_add_order_of_loads';

/**
 * Every migration, oldest first. A static list and names without extension, since Knex stores the names: the same
 * ones then hold under tsx, in Vitest and in a bundle, where its own reading of the folder differs or fails.
 */
const migrations: Readonly<Record<string, Knex.Migration>> = {
  '20261201090000_create_first_tables': createFirstTables,
  '20261201180000_add_policy_versions': addPolicyVersions,
  '20261201190000_add_finished_lessons': addFinishedLessons,
  '20261201200000_add_facing_to_items': addFacingToItems,
  '20261201210000_add_order_of_loads': addOrderOfLoads,
};

export const migrationSource: Knex.MigrationSource<string> = {
  getMigrations: () => Promise.resolve(Object.keys(migrations).sort()),
  getMigrationName: (name) => name,
  getMigration: (name) => {
    const migration = migrations[name];
    if (migration === undefined) return Promise.reject(new Error(`There is no migration called ${name}.`));
    return Promise.resolve(migration);
  },
};

export const migrationTable = 'schema_migrations';
