import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Terminals and their tracks with stopping markers. */
export class CreateTerminals1764600002000 implements MigrationInterface {
  name = 'CreateTerminals1764600002000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      `CREATE TABLE "terminal" ("id" text PRIMARY KEY NOT NULL, "version" integer NOT NULL, "code" text NOT NULL,
       "name" text NOT NULL, "zone" text NOT NULL, "created_at" bigint NOT NULL,
       CONSTRAINT "terminal_code" UNIQUE ("code"))`,
    );
    await runner.query(
      `CREATE TABLE "track" ("id" text PRIMARY KEY NOT NULL, "terminal_id" text NOT NULL, "position" integer NOT NULL,
       "label" text NOT NULL, "length_feet" integer, "cars" integer, "grade_percent" real, "markers" text NOT NULL,
       "created_at" bigint NOT NULL, CONSTRAINT "track_label" UNIQUE ("terminal_id", "label"),
       CONSTRAINT "track_terminal" FOREIGN KEY ("terminal_id") REFERENCES "terminal" ("id") ON DELETE CASCADE
       ON UPDATE NO ACTION)`,
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`DROP TABLE "track"`);
    await runner.query(`DROP TABLE "terminal"`);
  }
}
