import type { Knex } from 'knex';

/** What the instructions for use of a pouch ask about facing its neighbours; null where they are silent. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    alter table items
      add column facing text
        constraint items_facing_check check (facing in ('one-way', 'alternating')),
      add constraint items_facing_kind_check check (facing is null or kind = 'pouch');
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('alter table items drop column facing;');
}
