import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Past departures that come from tables, and the imports that brought them. */
export class CreateHistory1764600030000 implements MigrationInterface {
  name = 'CreateHistory1764600030000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      `CREATE TABLE "history_import" ("id" text PRIMARY KEY NOT NULL, "state" text NOT NULL, "file_name" text NOT NULL,
       "row_count" integer NOT NULL, "problems" text NOT NULL, "uploaded_by" text, "created_at" bigint NOT NULL)`,
    );
    await runner.query(
      `CREATE TABLE "past_departure" ("id" text PRIMARY KEY NOT NULL, "import_id" text NOT NULL,
       "terminal_code" text NOT NULL, "service_date" text NOT NULL, "train" text NOT NULL, "set_label" text, "track" text,
       "scheduled_arrival_at" bigint, "actual_arrival_at" bigint, "scheduled_departure_at" bigint NOT NULL,
       "actual_departure_at" bigint, "annulled" integer NOT NULL,
       CONSTRAINT "past_departure_once" UNIQUE ("terminal_code", "service_date", "train", "scheduled_departure_at"))`,
    );
    await runner.query(`CREATE INDEX "past_departure_import" ON "past_departure" ("import_id")`);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`DROP TABLE "past_departure"`);
    await runner.query(`DROP TABLE "history_import"`);
  }
}
