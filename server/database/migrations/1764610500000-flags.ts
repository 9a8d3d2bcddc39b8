import type { MigrationInterface, QueryRunner } from 'typeorm'

export class Flags1764610500000 implements MigrationInterface {
  name = 'Flags1764610500000'

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create table flags (
        id uuid primary key default gen_random_uuid(),
        club_id uuid not null constraint flags_club_id_fkey references clubs on delete cascade,
        raised_by uuid not null constraint flags_raised_by_fkey references users on delete cascade,
        slot_id uuid not null constraint flags_slot_id_fkey references slots on delete cascade,
        original_id uuid not null constraint flags_original_id_fkey references exercises,
        exercise_id uuid not null constraint flags_exercise_id_fkey references exercises,
        reason text not null constraint flags_reason_check
          check (reason in ('hurts', 'wrongMuscle', 'loadOff', 'notPossibleHere', 'other')),
        note text not null constraint flags_note_check check (char_length(note) <= 2000),
        rule_set_version integer not null constraint flags_rule_set_version_fkey references rule_sets,
        raised_at timestamptz not null,
        state text not null constraint flags_state_check check (state in ('open', 'settled'))
      );
      create index flags_club_id_idx on flags (club_id, raised_at desc, id desc);
      create index flags_raised_by_idx on flags (raised_by, raised_at desc, id desc);
      create index flags_slot_id_idx on flags (slot_id);
    `)
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('drop table flags')
  }
}
