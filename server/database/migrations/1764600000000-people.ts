import type { MigrationInterface, QueryRunner } from 'typeorm'

/** Clubs, people, their roles and consents, sign-ins, and the audit trail. */
export class People1764600000000 implements MigrationInterface {
  name = 'People1764600000000'

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      `CREATE TABLE "clubs" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "name" text NOT NULL, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "PK_bb09bd0c8d5238aeaa8f86ee0d4" PRIMARY KEY ("id"))`,
    )
    await runner.query(
      `CREATE TABLE "users" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "name" text NOT NULL, "email" text NOT NULL, "password_hash" text NOT NULL, "units" text NOT NULL DEFAULT 'metric', "default_place_id" uuid, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "PK_a3ffb1c0c8416b9fc6f907b7433" PRIMARY KEY ("id"))`,
    )
    await runner.query(`CREATE UNIQUE INDEX "users_email_key" ON "users"  ("email") `)
    await runner.query(
      `CREATE TABLE "memberships" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "user_id" uuid NOT NULL, "club_id" uuid NOT NULL, "role" text NOT NULL, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "memberships_role_check" CHECK (role in ('athlete', 'coach', 'physio', 'admin')), CONSTRAINT "PK_25d28bd932097a9e90495ede7b4" PRIMARY KEY ("id"))`,
    )
    await runner.query(`CREATE INDEX "memberships_club_id_role_idx" ON "memberships"  ("club_id", "role") `)
    await runner.query(
      `CREATE UNIQUE INDEX "memberships_user_id_club_id_role_key" ON "memberships"  ("user_id", "club_id", "role") `,
    )
    await runner.query(
      `CREATE TABLE "athlete_profiles" ("user_id" uuid NOT NULL, "sex" text NOT NULL, "body_mass" double precision NOT NULL, "stature" double precision NOT NULL, "birth_date" date NOT NULL, "skill" text NOT NULL DEFAULT 'beginner', "strength_factors" jsonb NOT NULL DEFAULT '{}', "updated_at" TIMESTAMP WITH TIME ZONE NOT NULL DEFAULT now(), CONSTRAINT "athlete_profiles_skill_check" CHECK (skill in ('beginner', 'intermediate', 'advanced')), CONSTRAINT "athlete_profiles_sex_check" CHECK (sex in ('male', 'female', 'unspecified')), CONSTRAINT "PK_2c94acd1d50568f1e522a387f6b" PRIMARY KEY ("user_id"))`,
    )
    await runner.query(
      `CREATE TABLE "consents" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "athlete_id" uuid NOT NULL, "carer_id" uuid NOT NULL, "granted_at" TIMESTAMP WITH TIME ZONE NOT NULL, "revoked_at" TIMESTAMP WITH TIME ZONE, CONSTRAINT "PK_9efc68eb6aba7d638fb6ea034dd" PRIMARY KEY ("id"))`,
    )
    await runner.query(`CREATE INDEX "consents_carer_id_idx" ON "consents"  ("carer_id") `)
    await runner.query(
      `CREATE UNIQUE INDEX "consents_standing_key" ON "consents"  ("athlete_id", "carer_id") WHERE revoked_at is null`,
    )
    await runner.query(
      `CREATE TABLE "audit_entries" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "at" TIMESTAMP(3) WITH TIME ZONE NOT NULL DEFAULT clock_timestamp(), "actor_id" uuid, "action" text NOT NULL, "subject_id" uuid, "club_ids" uuid array NOT NULL, "details" jsonb NOT NULL DEFAULT '{}', CONSTRAINT "PK_6b1623bcad4d04530b76548d619" PRIMARY KEY ("id"))`,
    )
    await runner.query(`CREATE INDEX "audit_entries_subject_id_idx" ON "audit_entries"  ("subject_id") `)
    await runner.query(`CREATE INDEX "audit_entries_at_id_idx" ON "audit_entries"  ("at", "id") `)
    await runner.query(
      `CREATE TABLE "sign_ins" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "user_id" uuid NOT NULL, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL, "ends_at" TIMESTAMP WITH TIME ZONE NOT NULL, "revoked_at" TIMESTAMP WITH TIME ZONE, "revoked_why" text, CONSTRAINT "PK_4579b825694df5090ed8a003735" PRIMARY KEY ("id"))`,
    )
    await runner.query(`CREATE INDEX "sign_ins_user_id_idx" ON "sign_ins"  ("user_id") `)
    await runner.query(
      `CREATE TABLE "refresh_tokens" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "sign_in_id" uuid NOT NULL, "token_hash" text NOT NULL, "issued_at" TIMESTAMP WITH TIME ZONE NOT NULL, "expires_at" TIMESTAMP WITH TIME ZONE NOT NULL, "used_at" TIMESTAMP WITH TIME ZONE, CONSTRAINT "PK_7d8bee0204106019488c4c50ffa" PRIMARY KEY ("id"))`,
    )
    await runner.query(`CREATE UNIQUE INDEX "refresh_tokens_token_hash_key" ON "refresh_tokens"  ("token_hash") `)
    await runner.query(`CREATE INDEX "refresh_tokens_sign_in_id_idx" ON "refresh_tokens"  ("sign_in_id") `)
    await runner.query(
      `CREATE TABLE "password_resets" ("id" uuid NOT NULL DEFAULT gen_random_uuid(), "user_id" uuid NOT NULL, "token_hash" text NOT NULL, "created_at" TIMESTAMP WITH TIME ZONE NOT NULL, "expires_at" TIMESTAMP WITH TIME ZONE NOT NULL, "used_at" TIMESTAMP WITH TIME ZONE, CONSTRAINT "PK_4816377aa98211c1de34469e742" PRIMARY KEY ("id"))`,
    )
    await runner.query(`CREATE UNIQUE INDEX "password_resets_token_hash_key" ON "password_resets"  ("token_hash") `)
    await runner.query(`CREATE INDEX "password_resets_user_id_idx" ON "password_resets"  ("user_id") `)
    await runner.query(
      `ALTER TABLE "memberships" ADD CONSTRAINT "memberships_user_id_fkey" FOREIGN KEY ("user_id") REFERENCES "users"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
    )
    await runner.query(
      `ALTER TABLE "memberships" ADD CONSTRAINT "memberships_club_id_fkey" FOREIGN KEY ("club_id") REFERENCES "clubs"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
    )
    await runner.query(
      `ALTER TABLE "athlete_profiles" ADD CONSTRAINT "athlete_profiles_user_id_fkey" FOREIGN KEY ("user_id") REFERENCES "users"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
    )
    await runner.query(
      `ALTER TABLE "consents" ADD CONSTRAINT "consents_athlete_id_fkey" FOREIGN KEY ("athlete_id") REFERENCES "users"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
    )
    await runner.query(
      `ALTER TABLE "consents" ADD CONSTRAINT "consents_carer_id_fkey" FOREIGN KEY ("carer_id") REFERENCES "users"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
    )
    await runner.query(
      `ALTER TABLE "audit_entries" ADD CONSTRAINT "audit_entries_actor_id_fkey" FOREIGN KEY ("actor_id") REFERENCES "users"("id") ON DELETE SET NULL ON UPDATE NO ACTION`,
    )
    await runner.query(
      `ALTER TABLE "audit_entries" ADD CONSTRAINT "audit_entries_subject_id_fkey" FOREIGN KEY ("subject_id") REFERENCES "users"("id") ON DELETE SET NULL ON UPDATE NO ACTION`,
    )
    await runner.query(
      `ALTER TABLE "sign_ins" ADD CONSTRAINT "sign_ins_user_id_fkey" FOREIGN KEY ("user_id") REFERENCES "users"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
    )
    await runner.query(
      `ALTER TABLE "refresh_tokens" ADD CONSTRAINT "refresh_tokens_sign_in_id_fkey" FOREIGN KEY ("sign_in_id") REFERENCES "sign_ins"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
    )
    await runner.query(
      `ALTER TABLE "password_resets" ADD CONSTRAINT "password_resets_user_id_fkey" FOREIGN KEY ("user_id") REFERENCES "users"("id") ON DELETE CASCADE ON UPDATE NO ACTION`,
    )
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`ALTER TABLE "password_resets" DROP CONSTRAINT "password_resets_user_id_fkey"`)
    await runner.query(`ALTER TABLE "refresh_tokens" DROP CONSTRAINT "refresh_tokens_sign_in_id_fkey"`)
    await runner.query(`ALTER TABLE "sign_ins" DROP CONSTRAINT "sign_ins_user_id_fkey"`)
    await runner.query(`ALTER TABLE "audit_entries" DROP CONSTRAINT "audit_entries_subject_id_fkey"`)
    await runner.query(`ALTER TABLE "audit_entries" DROP CONSTRAINT "audit_entries_actor_id_fkey"`)
    await runner.query(`ALTER TABLE "consents" DROP CONSTRAINT "consents_carer_id_fkey"`)
    await runner.query(`ALTER TABLE "consents" DROP CONSTRAINT "consents_athlete_id_fkey"`)
    await runner.query(`ALTER TABLE "athlete_profiles" DROP CONSTRAINT "athlete_profiles_user_id_fkey"`)
    await runner.query(`ALTER TABLE "memberships" DROP CONSTRAINT "memberships_club_id_fkey"`)
    await runner.query(`ALTER TABLE "memberships" DROP CONSTRAINT "memberships_user_id_fkey"`)
    await runner.query(`DROP INDEX "public"."password_resets_user_id_idx"`)
    await runner.query(`DROP INDEX "public"."password_resets_token_hash_key"`)
    await runner.query(`DROP TABLE "password_resets"`)
    await runner.query(`DROP INDEX "public"."refresh_tokens_sign_in_id_idx"`)
    await runner.query(`DROP INDEX "public"."refresh_tokens_token_hash_key"`)
    await runner.query(`DROP TABLE "refresh_tokens"`)
    await runner.query(`DROP INDEX "public"."sign_ins_user_id_idx"`)
    await runner.query(`DROP TABLE "sign_ins"`)
    await runner.query(`DROP INDEX "public"."audit_entries_at_id_idx"`)
    await runner.query(`DROP INDEX "public"."audit_entries_subject_id_idx"`)
    await runner.query(`DROP TABLE "audit_entries"`)
    await runner.query(`DROP INDEX "public"."consents_standing_key"`)
    await runner.query(`DROP INDEX "public"."consents_carer_id_idx"`)
    await runner.query(`DROP TABLE "consents"`)
    await runner.query(`DROP TABLE "athlete_profiles"`)
    await runner.query(`DROP INDEX "public"."memberships_user_id_club_id_role_key"`)
    await runner.query(`DROP INDEX "public"."memberships_club_id_role_idx"`)
    await runner.query(`DROP TABLE "memberships"`)
    await runner.query(`DROP INDEX "public"."users_email_key"`)
    await runner.query(`DROP TABLE "users"`)
    await runner.query(`DROP TABLE "clubs"`)
  }
}
