import type { Knex } from 'knex';

/**
 * Policy in versions: a change is proposed by one person and confirmed by another, holds from a day of the facility's
 * calendar, and never changes afterwards. A closed load keeps what it was judged by.
 */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    -- The day was kept as an instant; the facility's own day rule says which day that is.
    alter table policies add column effective_on date;
    update policies set effective_on = (
      select (policies.effective_at at time zone facilities.time_zone
        - case facilities.day_rule when 'production-day' then facilities.production_day_starts_at::interval else interval '0' end)::date
      from facilities where facilities.id = policies.facility_id
    );
    alter table policies alter column effective_on set not null;
    alter table policies add column changes jsonb not null default '[]';

    create table policy_proposals (
      id uuid primary key,
      facility_id uuid not null constraint policy_proposals_facility_id_fkey references facilities (id),
      -- The newest version when it was proposed; 0 where there was none.
      base_number integer not null constraint policy_proposals_base_number_check check (base_number >= 0),
      changes jsonb not null constraint policy_proposals_changes_check check (jsonb_array_length(changes) > 0),
      reason text not null constraint policy_proposals_reason_check check (length(trim(reason)) > 0),
      effective_on date not null,
      proposed_by uuid not null constraint policy_proposals_proposed_by_fkey references people (id),
      proposed_at timestamptz not null,
      state text not null default 'open' constraint policy_proposals_state_check check (state in ('open', 'confirmed', 'withdrawn', 'refused')),
      settled_by uuid constraint policy_proposals_settled_by_fkey references people (id),
      settled_at timestamptz,
      settled_reason text,
      constraint policy_proposals_settled_check check ((state = 'open') = (settled_by is null) and (state = 'open') = (settled_at is null)),
      constraint policy_proposals_two_people_check check (
        (state = 'withdrawn' and settled_by = proposed_by) or (state <> 'withdrawn' and settled_by is distinct from proposed_by)
      ),
      constraint policy_proposals_settled_reason_check check (
        state not in ('withdrawn', 'refused') or (settled_reason is not null and length(trim(settled_reason)) > 0)
      )
    );
    create index policy_proposals_facility_id_idx on policy_proposals (facility_id);
    create unique index policy_proposals_facility_id_open_key on policy_proposals (facility_id) where state = 'open';

    alter table policies add column proposal_id uuid
      constraint policies_proposal_id_fkey references policy_proposals (id)
      constraint policies_proposal_id_key unique;
    -- The settings a facility begins with have nobody's name; every later version has two.
    alter table policies add constraint policies_two_people_check check (
      (author_id is null and second_person_id is null and proposal_id is null)
      or (author_id is not null and second_person_id is not null and author_id <> second_person_id)
    );

    create function refuse_policy_change() returns trigger language plpgsql as $$
    begin
      raise exception 'a policy version never changes' using errcode = 'restrict_violation';
    end $$;
    create trigger policies_never_change before update or delete on policies for each row execute function refuse_policy_change();
    create trigger policies_no_truncate before truncate on policies for each statement execute function refuse_policy_change();

    create function refuse_settled_proposal_change() returns trigger language plpgsql as $$
    begin
      if tg_op = 'UPDATE' then
        if old.state = 'open' and row(old.id, old.facility_id, old.base_number, old.changes, old.reason, old.effective_on, old.proposed_by, old.proposed_at)
          is not distinct from row(new.id, new.facility_id, new.base_number, new.changes, new.reason, new.effective_on, new.proposed_by, new.proposed_at)
        then
          return new;
        end if;
      end if;
      raise exception 'a proposal is settled once and never changed' using errcode = 'restrict_violation';
    end $$;
    create trigger policy_proposals_settle_once before update or delete on policy_proposals for each row execute function refuse_settled_proposal_change();
    create trigger policy_proposals_no_truncate before truncate on policy_proposals for each statement execute function refuse_settled_proposal_change();

    -- Everything the rules looked at when the load was closed: without it a load cannot be judged again as it was.
    alter table loads add column view_at_close jsonb;
    create function refuse_closed_load_change() returns trigger language plpgsql as $$
    begin
      raise exception 'a load keeps the policy it was opened under and the verdict it was closed with' using errcode = 'restrict_violation';
    end $$;
    create trigger loads_keep_policy before update on loads for each row
      when (old.policy_id is distinct from new.policy_id)
      execute function refuse_closed_load_change();
    create trigger loads_keep_verdict before update on loads for each row
      when (old.contents_digest is not null and
        row(old.rule_set, old.verdict, old.contents, old.contents_digest, old.view_at_close, old.closed_by, old.closed_at)
        is distinct from row(new.rule_set, new.verdict, new.contents, new.contents_digest, new.view_at_close, new.closed_by, new.closed_at))
      execute function refuse_closed_load_change();
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    drop trigger loads_keep_verdict on loads;
    drop trigger loads_keep_policy on loads;
    drop function refuse_closed_load_change();
    alter table loads drop column view_at_close;

    drop trigger policies_no_truncate on policies;
    drop trigger policies_never_change on policies;
    drop function refuse_policy_change();
    alter table policies drop constraint policies_two_people_check, drop column proposal_id, drop column changes, drop column effective_on;
    drop table policy_proposals;
    drop function refuse_settled_proposal_change();
  `);
}
