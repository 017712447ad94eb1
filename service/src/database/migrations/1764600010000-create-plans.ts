import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Versions of each terminal's step plans. */
export class CreatePlans1764600010000 implements MigrationInterface {
  name = 'CreatePlans1764600010000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      `CREATE TABLE "step_plan" ("id" text PRIMARY KEY NOT NULL, "terminal_code" text NOT NULL, "key" text NOT NULL,
       "name" text NOT NULL, "version" integer NOT NULL, "effective_from" text NOT NULL, "steps" text NOT NULL,
       "created_at" bigint NOT NULL, "created_by" text,
       CONSTRAINT "step_plan_version" UNIQUE ("terminal_code", "key", "version"))`,
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`DROP TABLE "step_plan"`);
  }
}
