import type { MigrationInterface, QueryRunner } from 'typeorm'

export class Places1764610100000 implements MigrationInterface {
  name = 'Places1764610100000'

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create table places (
        id uuid primary key default gen_random_uuid(),
        club_id uuid not null constraint places_club_id_fkey references clubs on delete cascade,
        name text not null
      );
      create unique index places_club_id_name_key on places (club_id, name);

      create table place_equipment (
        place_id uuid not null constraint place_equipment_place_id_fkey references places on delete cascade,
        kind text not null,
        first_load double precision,
        load_step double precision,
        last_load double precision,
        primary key (place_id, kind),
        constraint place_equipment_steps_check check (
          (first_load is null and load_step is null and last_load is null)
          or (first_load is not null and load_step > 0 and last_load >= first_load)
        )
      );
    `)
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query('drop table place_equipment, places')
  }
}
