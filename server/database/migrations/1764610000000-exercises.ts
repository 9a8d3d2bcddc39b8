import type { MigrationInterface, QueryRunner } from 'typeorm'

export class Exercises1764610000000 implements MigrationInterface {
  name = 'Exercises1764610000000'

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create table exercises (
        id uuid primary key default gen_random_uuid(),
        slug text not null,
        created_at timestamptz not null
      );
      create unique index exercises_slug_key on exercises (slug);

      create table exercise_versions (
        id uuid primary key default gen_random_uuid(),
        exercise_id uuid not null constraint exercise_versions_exercise_id_fkey references exercises on delete cascade,
        version integer not null constraint exercise_versions_version_check check (version >= 1),
        name text not null,
        document jsonb not null,
        solutions jsonb not null,
        coordination double precision not null
          constraint exercise_versions_coordination_check check (coordination between 0 and 100),
        is_current boolean not null,
        published_at timestamptz not null
      );
      create unique index exercise_versions_exercise_id_version_key on exercise_versions (exercise_id, version);
      create unique index exercise_versions_one_current on exercise_versions (exercise_id) where is_current;
      create index exercise_versions_name_idx on exercise_versions (name, exercise_id) where is_current;

      create table rule_sets (
        version integer primary key constraint rule_sets_version_check check (version >= 1),
        data jsonb not null,
        is_active boolean not null,
        created_at timestamptz not null
      );
      create unique index rule_sets_one_active on rule_sets (is_active) where is_active;

      create table catalogue_state (
        id smallint primary key constraint catalogue_state_single_row check (id = 1),
        revision integer not null
      );
      insert into catalogue_state (id, revision) values (1, 0);
    `)
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('drop table catalogue_state, rule_sets, exercise_versions, exercises')
  }
}
