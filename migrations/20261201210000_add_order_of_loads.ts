import type { Knex } from 'knex';

/** The list of loads is read from the newest on, a page at a time. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw('create index loads_facility_id_opened_at_id_idx on loads (facility_id, opened_at, id)');
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('drop index loads_facility_id_opened_at_id_idx');
}
