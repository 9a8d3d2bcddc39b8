import type { MigrationInterface, QueryRunner } from 'typeorm'

export class SoreJoints1764610300000 implements MigrationInterface {
  name = 'SoreJoints1764610300000'

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create table sore_joints (
        id uuid primary key default gen_random_uuid(),
        athlete_id uuid not null constraint sore_joints_athlete_id_fkey references users on delete cascade,
        joint text not null constraint sore_joints_joint_check
          check (joint in ('neck', 'shoulder', 'elbow', 'wrist', 'lowerBack', 'hip', 'knee', 'ankle')),
        side text,
        rating integer not null constraint sore_joints_rating_check check (rating between 0 and 10),
        provocations text[] not null,
        red_flags text[] not null,
        note text not null,
        day date not null,
        state text not null constraint sore_joints_state_check check (state in ('open', 'redFlag', 'closed')),
        reported_at timestamptz not null,
        closed_at timestamptz,
        cleared_by uuid constraint sore_joints_cleared_by_fkey references users on delete set null,
        cleared_at timestamptz,
        clearance_note text,
        constraint sore_joints_side_check check (
          case when joint in ('neck', 'lowerBack') then side is null else side is not null and side in ('left', 'right') end
        ),
        constraint sore_joints_closed_check check ((state = 'closed') = (closed_at is not null)),
        constraint sore_joints_flagged_check check (state <> 'redFlag' or (cardinality(red_flags) > 0 and cleared_at is null)),
        constraint sore_joints_open_check check (state <> 'open' or cardinality(red_flags) = 0 or cleared_at is not null),
        constraint sore_joints_cleared_check check ((cleared_at is null) = (clearance_note is null))
      );
      create unique index sore_joints_one_standing on sore_joints (athlete_id, joint, coalesce(side, ''))
        where state <> 'closed';
      create index sore_joints_history_idx on sore_joints (athlete_id, reported_at desc, id desc);
    `)
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('drop table sore_joints')
  }
}
