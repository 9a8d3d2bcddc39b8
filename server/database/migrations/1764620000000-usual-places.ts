import type { MigrationInterface, QueryRunner } from 'typeorm'

/** A person's usual place is a real one, and is forgotten when the place is. */
export class UsualPlaces1764620000000 implements MigrationInterface {
  name = 'UsualPlaces1764620000000'

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      `ALTER TABLE "users" ADD CONSTRAINT "users_default_place_id_fkey" FOREIGN KEY ("default_place_id") REFERENCES "places"("id") ON DELETE SET NULL ON UPDATE NO ACTION`,
    )
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`ALTER TABLE "users" DROP CONSTRAINT "users_default_place_id_fkey"`)
  }
}
