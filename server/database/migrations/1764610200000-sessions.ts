import type { MigrationInterface, QueryRunner } from 'typeorm'

export class Sessions1764610200000 implements MigrationInterface {
  name = 'Sessions1764610200000'

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create table sessions (
        id uuid primary key default gen_random_uuid(),
        athlete_id uuid not null constraint sessions_athlete_id_fkey references users on delete cascade,
        club_id uuid not null constraint sessions_club_id_fkey references clubs on delete cascade,
        day date not null,
        title text not null,
        minutes integer not null constraint sessions_minutes_check check (minutes between 1 and 600),
        place_id uuid constraint sessions_place_id_fkey references places on delete set null
      );
      create unique index sessions_athlete_id_day_key on sessions (athlete_id, day);

      create table slots (
        id uuid primary key default gen_random_uuid(),
        session_id uuid not null constraint slots_session_id_fkey references sessions on delete cascade,
        position integer not null constraint slots_position_check check (position >= 1),
        exercise_id uuid not null constraint slots_exercise_id_fkey references exercises,
        sets integer not null constraint slots_sets_check check (sets between 1 and 20),
        repetitions integer not null constraint slots_repetitions_check check (repetitions between 1 and 300),
        unit text not null constraint slots_unit_check check (unit in ('repetitions', 'seconds')),
        rir double precision not null constraint slots_rir_check check (rir between 0 and 10),
        load double precision constraint slots_load_check check (load between -200 and 600),
        pieces integer not null constraint slots_pieces_check check (pieces in (1, 2)),
        intent text not null constraint slots_intent_check check (intent in ('strength', 'size', 'skill', 'endurance')),
        target text not null
      );
      create unique index slots_session_id_position_key on slots (session_id, position);
      create index slots_exercise_id_idx on slots (exercise_id);
    `)
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('drop table slots, sessions')
  }
}
