import type { Knex } from 'knex';

/** Who has finished which lesson, by which rules. A row is never changed; a lesson may be finished again. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    create table finished_lessons (
      id uuid primary key,
      facility_id uuid not null constraint finished_lessons_facility_id_fkey references facilities (id),
      person_id uuid not null constraint finished_lessons_person_id_fkey references people (id),
      rule_id text not null constraint finished_lessons_rule_id_check check (rule_id <> ''),
      rule_set text not null constraint finished_lessons_rule_set_check check (rule_set <> ''),
      tries integer not null constraint finished_lessons_tries_check check (tries >= 1),
      -- The load whose finding opened the lesson; null where it was opened from the list.
      load_id uuid constraint finished_lessons_load_id_fkey references loads (id),
      finished_at timestamptz not null
    );
    create index finished_lessons_person_id_idx on finished_lessons (facility_id, person_id, rule_id, finished_at);
    create index finished_lessons_load_id_idx on finished_lessons (load_id) where load_id is not null;
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('drop table finished_lessons;');
}
