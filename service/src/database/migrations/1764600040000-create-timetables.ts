import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Imported timetables, when they were made active and for which terminals, and which days they have opened. */
export class CreateTimetables1764600040000 implements MigrationInterface {
  name = 'CreateTimetables1764600040000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      `CREATE TABLE "timetable" ("id" text PRIMARY KEY NOT NULL, "version" integer NOT NULL, "state" text NOT NULL,
       "file_name" text NOT NULL, "file_bytes" integer NOT NULL, "route_types" text NOT NULL,
       "attempts" integer NOT NULL, "uploaded_by" text, "read_at" bigint, "problems" text NOT NULL, "summary" text,
       "created_at" bigint NOT NULL)`,
    );
    await runner.query(
      `CREATE TABLE "timetable_content" ("timetable_id" text PRIMARY KEY NOT NULL, "content" text NOT NULL)`,
    );
    await runner.query(
      `CREATE TABLE "timetable_activation" ("number" integer PRIMARY KEY NOT NULL, "timetable_id" text NOT NULL,
       "from_date" text NOT NULL, "accept_guesses" integer NOT NULL, "activated_by" text NOT NULL,
       "taken_back_by" text, "taken_back_at" bigint, "created_at" bigint NOT NULL)`,
    );
    await runner.query(
      `CREATE INDEX "timetable_activation_timetable" ON "timetable_activation" ("timetable_id")`,
    );
    await runner.query(
      `CREATE TABLE "timetable_terminal" ("activation_number" integer NOT NULL, "code" text NOT NULL,
       "position" integer NOT NULL, "name" text NOT NULL, "station_ids" text NOT NULL,
       PRIMARY KEY ("activation_number", "code"))`,
    );
    await runner.query(
      `CREATE TABLE "timetable_day" ("service_date" text PRIMARY KEY NOT NULL,
       "activation_number" integer NOT NULL, "created_at" bigint NOT NULL)`,
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    for (const table of ['day', 'terminal', 'activation', 'content']) {
      await runner.query(`DROP TABLE "timetable_${table}"`);
    }
    await runner.query(`DROP TABLE "timetable"`);
  }
}
