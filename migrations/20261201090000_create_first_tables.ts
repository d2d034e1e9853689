import type { Knex } from 'knex';

/** Every table the first release stands on. Units are in the column names; closed sets are text with a named check. */
export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    create table facilities (
      id uuid primary key,
      name text not null,
      time_zone text not null,
      unit_system text not null constraint facilities_unit_system_check check (unit_system in ('metric', 'us-customary')),
      load_number_pattern text not null,
      day_rule text not null constraint facilities_day_rule_check check (day_rule in ('calendar-day', 'production-day')),
      production_day_starts_at text not null default '00:00',
      shifts jsonb not null default '[]',
      created_at timestamptz not null
    );

    create table people (
      id uuid primary key,
      staff_number text not null constraint people_staff_number_key unique,
      display_name text not null,
      initials text not null,
      password_hash text not null,
      must_change_password boolean not null default false,
      one_time_password_expires_at timestamptz,
      badge_code text constraint people_badge_code_key unique,
      pin_hash text,
      is_disabled boolean not null default false,
      signed_out_everywhere_at timestamptz,
      created_at timestamptz not null,
      version integer not null default 1
    );

    create table memberships (
      person_id uuid not null constraint memberships_person_id_fkey references people (id),
      facility_id uuid not null constraint memberships_facility_id_fkey references facilities (id),
      role text not null constraint memberships_role_check check (role in ('technician', 'lead', 'supervisor', 'infection-prevention', 'operating-room', 'engineer', 'surveyor', 'administrator')),
      usual_shift text,
      expires_at timestamptz,
      constraint memberships_pkey primary key (person_id, facility_id),
      constraint memberships_surveyor_expires_check check (role <> 'surveyor' or expires_at is not null)
    );
    create index memberships_facility_id_idx on memberships (facility_id);

    create table sign_in_attempts (
      id bigint generated always as identity constraint sign_in_attempts_pkey primary key,
      subject text not null,
      source text not null,
      at timestamptz not null,
      is_success boolean not null
    );
    create index sign_in_attempts_subject_at_idx on sign_in_attempts (subject, at);
    create index sign_in_attempts_source_at_idx on sign_in_attempts (source, at);

    -- The session store's own column names and types.
    create table session (
      sid varchar not null collate "default" constraint session_pkey primary key,
      sess json not null,
      expire timestamp(6) not null
    );
    create index session_expire_idx on session (expire);

    create table requests (
      id uuid primary key,
      facility_id uuid not null constraint requests_facility_id_fkey references facilities (id),
      person_id uuid not null constraint requests_person_id_fkey references people (id),
      act text not null,
      body_digest text not null,
      response jsonb,
      at timestamptz not null
    );

    create table audit_events (
      id bigint generated always as identity constraint audit_events_pkey primary key,
      facility_id uuid constraint audit_events_facility_id_fkey references facilities (id),
      at timestamptz not null,
      actor_id uuid constraint audit_events_actor_id_fkey references people (id),
      kind text not null,
      subject_kind text not null,
      subject_id text not null,
      load_id uuid,
      request_id uuid,
      payload jsonb not null,
      payload_version integer not null default 1
    );
    create index audit_events_facility_id_at_idx on audit_events (facility_id, at);
    create index audit_events_subject_idx on audit_events (subject_kind, subject_id, id);
    create index audit_events_load_id_idx on audit_events (load_id, id);

    create function refuse_audit_change() returns trigger language plpgsql as $$
    begin
      raise exception 'audit events are append-only' using errcode = 'restrict_violation';
    end $$;
    create trigger audit_events_append_only before update or delete on audit_events for each row execute function refuse_audit_change();
    create trigger audit_events_no_truncate before truncate on audit_events for each statement execute function refuse_audit_change();

    create table policies (
      id uuid primary key,
      facility_id uuid not null constraint policies_facility_id_fkey references facilities (id),
      number integer not null,
      settings jsonb not null,
      author_id uuid constraint policies_author_id_fkey references people (id),
      second_person_id uuid constraint policies_second_person_id_fkey references people (id),
      reason text not null,
      effective_at timestamptz not null,
      created_at timestamptz not null,
      constraint policies_facility_id_number_key unique (facility_id, number)
    );

    create table items (
      id uuid primary key,
      facility_id uuid not null constraint items_facility_id_fkey references facilities (id),
      code text not null,
      name text not null,
      kind text not null constraint items_kind_check check (kind in ('pouch', 'rigid-container', 'wrapped-tray', 'basin', 'textile-pack', 'challenge-device')),
      packaging text not null constraint items_packaging_check check (packaging in ('paper-film-pouch', 'double-pouch', 'wrap', 'rigid-container', 'none')),
      length_mm double precision not null constraint items_length_mm_check check (length_mm > 0),
      width_mm double precision not null constraint items_width_mm_check check (width_mm > 0),
      height_mm double precision not null constraint items_height_mm_check check (height_mm > 0),
      mass_kg double precision not null constraint items_mass_kg_check check (mass_kg > 0),
      metal_mass_kg double precision not null default 0 constraint items_metal_mass_kg_check check (metal_mass_kg >= 0),
      textile_mass_kg double precision not null default 0 constraint items_textile_mass_kg_check check (textile_mass_kg >= 0),
      metal text not null default 'stainless-steel' constraint items_metal_check check (metal in ('stainless-steel', 'aluminium', 'titanium')),
      is_implant boolean not null default false,
      pose text not null constraint items_pose_check check (pose in ('on-edge', 'flat', 'tilted')),
      is_perforated boolean not null default true,
      clearance_mm double precision constraint items_clearance_mm_check check (clearance_mm >= 0),
      stands_on text[] not null default '{}',
      greatest_stack_height_mm double precision,
      filter_zones jsonb not null default '[]',
      cycle_needs jsonb not null,
      preferred_holder text,
      mass_limit_kg double precision,
      cool_s integer not null default 1800 constraint items_cool_s_check check (cool_s >= 0),
      expiry_rule text not null default 'event-related' constraint items_expiry_rule_check check (expiry_rule in ('event-related', 'dated')),
      expiry_days integer,
      device_identifier text,
      ifu_reference text,
      ifu_revision text,
      service text not null default '',
      note text not null default '',
      is_retired boolean not null default false,
      version integer not null default 1,
      constraint items_facility_id_code_key unique (facility_id, code),
      constraint items_expiry_days_check check (expiry_rule <> 'dated' or expiry_days > 0)
    );
    create unique index items_facility_id_device_identifier_key on items (facility_id, device_identifier) where device_identifier is not null;

    create table programs (
      id uuid primary key,
      facility_id uuid not null constraint programs_facility_id_fkey references facilities (id),
      code text not null,
      name text not null,
      cycle_type text not null constraint programs_cycle_type_check check (cycle_type in ('dynamic-air-removal', 'gravity', 'immediate-use')),
      temperature_c double precision not null constraint programs_temperature_c_check check (temperature_c > 0),
      exposure_s integer not null constraint programs_exposure_s_check check (exposure_s > 0),
      dry_s integer not null constraint programs_dry_s_check check (dry_s >= 0),
      greatest_load_mass_kg double precision,
      is_retired boolean not null default false,
      version integer not null default 1,
      constraint programs_facility_id_code_key unique (facility_id, code)
    );

    create table sterilizers (
      id uuid primary key,
      facility_id uuid not null constraint sterilizers_facility_id_fkey references facilities (id),
      code text not null,
      number text not null,
      name text not null,
      size_class text not null constraint sterilizers_size_class_check check (size_class in ('large', 'small')),
      chamber_width_mm double precision not null constraint sterilizers_chamber_width_mm_check check (chamber_width_mm > 0),
      chamber_depth_mm double precision not null constraint sterilizers_chamber_depth_mm_check check (chamber_depth_mm > 0),
      chamber_height_mm double precision not null constraint sterilizers_chamber_height_mm_check check (chamber_height_mm > 0),
      drain_x_mm double precision not null,
      drain_y_mm double precision not null,
      greatest_load_mass_kg double precision not null constraint sterilizers_greatest_load_mass_kg_check check (greatest_load_mass_kg > 0),
      steam_line text not null default '',
      has_air_detector boolean not null default false,
      needs_air_removal_test boolean not null default true,
      service_state text not null constraint sterilizers_service_state_check check (service_state in ('in-service', 'out-of-service', 'awaiting-requalification')),
      version integer not null default 1,
      constraint sterilizers_facility_id_code_key unique (facility_id, code),
      constraint sterilizers_facility_id_number_key unique (facility_id, number)
    );

    create table sterilizer_programs (
      sterilizer_id uuid not null constraint sterilizer_programs_sterilizer_id_fkey references sterilizers (id),
      program_id uuid not null constraint sterilizer_programs_program_id_fkey references programs (id),
      is_qualified boolean not null,
      constraint sterilizer_programs_pkey primary key (sterilizer_id, program_id)
    );

    create table carts (
      id uuid primary key,
      facility_id uuid not null constraint carts_facility_id_fkey references facilities (id),
      code text not null,
      name text not null,
      size_class text not null constraint carts_size_class_check check (size_class in ('large', 'small')),
      is_usable boolean not null default true,
      note text not null default '',
      version integer not null default 1,
      constraint carts_facility_id_code_key unique (facility_id, code)
    );

    create table shelves (
      id uuid primary key,
      cart_id uuid not null constraint shelves_cart_id_fkey references carts (id),
      level integer not null constraint shelves_level_check check (level >= 1),
      name text not null,
      place_code text not null constraint shelves_place_code_key unique,
      width_mm double precision not null constraint shelves_width_mm_check check (width_mm > 0),
      depth_mm double precision not null constraint shelves_depth_mm_check check (depth_mm > 0),
      clear_height_mm double precision not null constraint shelves_clear_height_mm_check check (clear_height_mm > 0),
      surface text not null constraint shelves_surface_check check (surface in ('wire', 'solid')),
      greatest_mass_kg double precision not null constraint shelves_greatest_mass_kg_check check (greatest_mass_kg > 0),
      is_usable boolean not null default true,
      constraint shelves_cart_id_level_key unique (cart_id, level)
    );

    create table holder_kinds (
      id uuid primary key,
      facility_id uuid not null constraint holder_kinds_facility_id_fkey references facilities (id),
      code text not null,
      name text not null,
      form text not null constraint holder_kinds_form_check check (form in ('rack', 'basket', 'wedge', 'spacer')),
      slots integer constraint holder_kinds_slots_check check (slots > 0),
      pitch_mm double precision constraint holder_kinds_pitch_mm_check check (pitch_mm > 0),
      greatest_height_mm double precision,
      greatest_length_mm double precision,
      greatest_thickness_mm double precision,
      across_mm double precision not null constraint holder_kinds_across_mm_check check (across_mm > 0),
      along_mm double precision not null constraint holder_kinds_along_mm_check check (along_mm > 0),
      mass_kg double precision not null constraint holder_kinds_mass_kg_check check (mass_kg >= 0),
      owned integer not null default 0 constraint holder_kinds_owned_check check (owned >= 0),
      version integer not null default 1,
      constraint holder_kinds_facility_id_code_key unique (facility_id, code),
      constraint holder_kinds_rack_check check (form <> 'rack' or (slots is not null and pitch_mm is not null and greatest_height_mm is not null and greatest_length_mm is not null and greatest_thickness_mm is not null))
    );

    create table holders (
      id uuid primary key,
      facility_id uuid not null constraint holders_facility_id_fkey references facilities (id),
      holder_kind_id uuid not null constraint holders_holder_kind_id_fkey references holder_kinds (id),
      name text not null,
      place_code text not null constraint holders_place_code_key unique,
      condition text not null default 'good' constraint holders_condition_check check (condition in ('good', 'in-repair', 'missing')),
      version integer not null default 1,
      constraint holders_facility_id_name_key unique (facility_id, name)
    );

    create sequence package_code_numbers;
    create sequence place_code_numbers;

    create table runs (
      id uuid primary key,
      facility_id uuid not null constraint runs_facility_id_fkey references facilities (id),
      name text not null,
      sterilizer_id uuid constraint runs_sterilizer_id_fkey references sterilizers (id),
      program_id uuid constraint runs_program_id_fkey references programs (id),
      wanted_at timestamptz,
      state text not null constraint runs_state_check check (state in ('waiting', 'taken', 'dropped')),
      created_at timestamptz not null,
      created_by uuid not null constraint runs_created_by_fkey references people (id),
      version integer not null default 1
    );
    create index runs_facility_id_state_idx on runs (facility_id, state);

    create table packages (
      id uuid primary key,
      facility_id uuid not null constraint packages_facility_id_fkey references facilities (id),
      code text not null constraint packages_code_key unique,
      item_id uuid not null constraint packages_item_id_fkey references items (id),
      life integer not null default 1,
      state text not null constraint packages_state_check check (state in ('packed', 'staged', 'in-load', 'processed', 'sterile', 'quarantined', 'stored', 'on-case-cart', 'used', 'returned', 'recalled', 'discarded')),
      run_id uuid constraint packages_run_id_fkey references runs (id),
      held_reason text,
      packed_by uuid not null constraint packages_packed_by_fkey references people (id),
      packed_at timestamptz not null,
      is_contents_confirmed boolean not null,
      has_internal_indicator boolean not null,
      has_external_indicator boolean not null,
      expires_on date,
      destination text not null default '',
      version integer not null default 1
    );
    create index packages_facility_id_state_idx on packages (facility_id, state);
    create index packages_run_id_idx on packages (run_id);
    create index packages_item_id_idx on packages (item_id);

    create table label_prints (
      id uuid primary key,
      package_id uuid not null constraint label_prints_package_id_fkey references packages (id),
      -- The labels printed in one go.
      batch_id uuid not null,
      copy integer not null,
      reason text,
      printed_by uuid not null constraint label_prints_printed_by_fkey references people (id),
      printed_at timestamptz not null,
      constraint label_prints_package_id_copy_key unique (package_id, copy),
      constraint label_prints_reason_check check (copy = 1 or length(trim(reason)) > 0)
    );
    create index label_prints_batch_id_idx on label_prints (batch_id);

    create table air_removal_tests (
      id uuid primary key,
      facility_id uuid not null constraint air_removal_tests_facility_id_fkey references facilities (id),
      sterilizer_id uuid not null constraint air_removal_tests_sterilizer_id_fkey references sterilizers (id),
      tested_at timestamptz not null,
      test_day date not null,
      result text not null constraint air_removal_tests_result_check check (result in ('passed', 'failed')),
      pack_lot text not null,
      pack_expires_on date not null,
      is_before_first_load boolean not null,
      read_by uuid not null constraint air_removal_tests_read_by_fkey references people (id),
      second_reader uuid constraint air_removal_tests_second_reader_fkey references people (id),
      note text not null default '',
      recorded_at timestamptz not null
    );
    create index air_removal_tests_sterilizer_id_test_day_idx on air_removal_tests (sterilizer_id, test_day);

    create table loads (
      id uuid primary key,
      facility_id uuid not null constraint loads_facility_id_fkey references facilities (id),
      number text not null,
      day date not null,
      count_of_day integer not null constraint loads_count_of_day_check check (count_of_day > 0),
      sterilizer_id uuid not null constraint loads_sterilizer_id_fkey references sterilizers (id),
      program_id uuid not null constraint loads_program_id_fkey references programs (id),
      cart_id uuid not null constraint loads_cart_id_fkey references carts (id),
      run_id uuid constraint loads_run_id_fkey references runs (id),
      state text not null constraint loads_state_check check (state in ('building', 'closed', 'in-sterilizer', 'cooling', 'awaiting-proof', 'ready-to-sign', 'released', 'released-implant-early', 'held', 'failed', 'set-aside', 'aborted', 'abandoned')),
      opened_by uuid not null constraint loads_opened_by_fkey references people (id),
      opened_at timestamptz not null,
      closed_by uuid constraint loads_closed_by_fkey references people (id),
      closed_at timestamptz,
      abandoned_reason text,
      policy_id uuid not null constraint loads_policy_id_fkey references policies (id),
      rule_set text,
      verdict jsonb,
      contents jsonb,
      contents_digest text,
      version integer not null default 1,
      constraint loads_facility_id_number_key unique (facility_id, number),
      constraint loads_sterilizer_id_day_count_of_day_key unique (sterilizer_id, day, count_of_day),
      constraint loads_closed_check check (state in ('building', 'abandoned') or (closed_by is not null and closed_at is not null and rule_set is not null and verdict is not null and contents_digest is not null))
    );
    create index loads_facility_id_state_idx on loads (facility_id, state);
    create unique index loads_cart_id_building_key on loads (cart_id) where state = 'building';

    create table load_holders (
      load_id uuid not null constraint load_holders_load_id_fkey references loads (id),
      holder_id uuid not null constraint load_holders_holder_id_fkey references holders (id),
      shelf_id uuid not null constraint load_holders_shelf_id_fkey references shelves (id),
      x_mm double precision not null,
      y_mm double precision not null,
      turn integer not null constraint load_holders_turn_check check (turn in (0, 90)),
      is_open boolean not null default true,
      constraint load_holders_pkey primary key (load_id, holder_id)
    );
    create unique index load_holders_holder_id_open_key on load_holders (holder_id) where is_open;

    create table load_packages (
      load_id uuid not null constraint load_packages_load_id_fkey references loads (id),
      package_id uuid not null constraint load_packages_package_id_fkey references packages (id),
      is_open boolean not null default true,
      was_staged boolean not null,
      listed_at timestamptz not null,
      scanned_at timestamptz,
      scanned_by uuid constraint load_packages_scanned_by_fkey references people (id),
      entry text constraint load_packages_entry_check check (entry in ('wedge', 'camera', 'keyed')),
      place_kind text constraint load_packages_place_kind_check check (place_kind in ('shelf', 'slot', 'basket', 'package')),
      shelf_id uuid constraint load_packages_shelf_id_fkey references shelves (id),
      holder_id uuid constraint load_packages_holder_id_fkey references holders (id),
      slot integer,
      below_package_id uuid constraint load_packages_below_package_id_fkey references packages (id),
      x_mm double precision,
      y_mm double precision,
      turn integer constraint load_packages_turn_check check (turn in (0, 90)),
      pose text constraint load_packages_pose_check check (pose in ('on-edge', 'flat', 'tilted')),
      paper text constraint load_packages_paper_check check (paper in ('left', 'right', 'up', 'down')),
      constraint load_packages_pkey primary key (load_id, package_id),
      constraint load_packages_place_check check (
        (place_kind is null and shelf_id is null and holder_id is null and slot is null and below_package_id is null)
        or (place_kind = 'shelf' and shelf_id is not null and x_mm is not null and y_mm is not null and turn is not null and pose is not null)
        or (place_kind = 'slot' and holder_id is not null and slot is not null and pose is not null)
        or (place_kind = 'basket' and holder_id is not null and x_mm is not null and y_mm is not null and turn is not null and pose is not null)
        or (place_kind = 'package' and below_package_id is not null and below_package_id <> package_id and x_mm is not null and y_mm is not null and turn is not null and pose is not null)
      ),
      constraint load_packages_scanned_check check (place_kind is null or scanned_at is not null)
    );
    -- A package can be in one open load only, whatever races.
    create unique index load_packages_package_id_open_key on load_packages (package_id) where is_open;

    create table load_counts (
      load_id uuid not null constraint load_counts_load_id_fkey references loads (id),
      shelf_id uuid not null constraint load_counts_shelf_id_fkey references shelves (id),
      counted integer not null constraint load_counts_counted_check check (counted >= 0),
      counted_by uuid not null constraint load_counts_counted_by_fkey references people (id),
      counted_at timestamptz not null,
      constraint load_counts_pkey primary key (load_id, shelf_id)
    );

    create table load_acceptances (
      id uuid primary key,
      load_id uuid not null constraint load_acceptances_load_id_fkey references loads (id),
      finding_key text not null,
      rule_id text not null,
      reason text not null constraint load_acceptances_reason_check check (length(trim(reason)) > 0),
      accepted_by uuid not null constraint load_acceptances_accepted_by_fkey references people (id),
      accepted_at timestamptz not null,
      constraint load_acceptances_load_id_finding_key_key unique (load_id, finding_key)
    );

    create table load_stickers (
      id uuid primary key,
      load_id uuid not null constraint load_stickers_load_id_fkey references loads (id),
      package_id uuid not null constraint load_stickers_package_id_fkey references packages (id),
      -- The stickers printed in one go.
      batch_id uuid not null,
      copy integer not null,
      reason text,
      printed_by uuid not null constraint load_stickers_printed_by_fkey references people (id),
      printed_at timestamptz not null,
      voided_at timestamptz,
      voided_by uuid constraint load_stickers_voided_by_fkey references people (id),
      void_reason text,
      constraint load_stickers_load_id_package_id_copy_key unique (load_id, package_id, copy),
      constraint load_stickers_reason_check check (copy = 1 or length(trim(reason)) > 0)
    );
    -- Two live stickers for one package cannot be.
    create unique index load_stickers_package_id_live_key on load_stickers (package_id) where voided_at is null;
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw(`
    drop table load_stickers, load_acceptances, load_counts, load_packages, load_holders, loads, air_removal_tests, label_prints, packages, runs cascade;
    drop sequence package_code_numbers, place_code_numbers;
    drop table holders, holder_kinds, shelves, carts, sterilizer_programs, sterilizers, programs, items, policies cascade;
    drop table audit_events, requests, session, sign_in_attempts, memberships, people, facilities cascade;
    drop function refuse_audit_change();
  `);
}
