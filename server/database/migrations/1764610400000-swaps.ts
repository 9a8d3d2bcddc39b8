import type { MigrationInterface, QueryRunner } from 'typeorm'

export class Swaps1764610400000 implements MigrationInterface {
  name = 'Swaps1764610400000'

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create table swaps (
        id uuid primary key default gen_random_uuid(),
        slot_id uuid not null constraint swaps_slot_id_fkey references slots on delete cascade,
        exercise_version_id uuid not null constraint swaps_exercise_version_id_fkey references exercise_versions,
        sets integer not null constraint swaps_sets_check check (sets between 1 and 20),
        repetitions integer not null constraint swaps_repetitions_check check (repetitions between 1 and 300),
        unit text not null constraint swaps_unit_check check (unit in ('repetitions', 'seconds')),
        rir double precision not null constraint swaps_rir_check check (rir between 0 and 10),
        load double precision,
        pieces integer not null constraint swaps_pieces_check check (pieces in (1, 2)),
        rank integer not null constraint swaps_rank_check check (rank >= 1),
        fingerprint text not null,
        rule_set_version integer not null constraint swaps_rule_set_version_fkey references rule_sets,
        ranking jsonb not null,
        taken_by uuid constraint swaps_taken_by_fkey references users on delete set null,
        taken_at timestamptz not null,
        undone_by uuid constraint swaps_undone_by_fkey references users on delete set null,
        undone_at timestamptz,
        constraint swaps_undone_check check (undone_by is null or undone_at is not null)
      );
      create unique index swaps_one_standing on swaps (slot_id) where undone_at is null;
      create index swaps_slot_id_idx on swaps (slot_id);
    `)
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('drop table swaps')
  }
}
