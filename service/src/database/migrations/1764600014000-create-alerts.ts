import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Alerts, one standing at most for each cause on a subject, and the memory of their hold times. */
export class CreateAlerts1764600014000 implements MigrationInterface {
  name = 'CreateAlerts1764600014000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      `CREATE TABLE "alert" ("id" text PRIMARY KEY NOT NULL, "version" integer NOT NULL, "terminal_code" text NOT NULL,
       "service_date" text NOT NULL, "subject_kind" text NOT NULL, "subject_id" text NOT NULL, "turn_id" text,
       "cause" text NOT NULL, "priority" text NOT NULL, "state" text NOT NULL, "subject" text NOT NULL,
       "text" text NOT NULL, "action" text NOT NULL, "actor" text NOT NULL, "by_when" bigint, "lines" text NOT NULL,
       "raised_at" bigint NOT NULL, "taken_at" bigint, "taken_by" text, "taken_by_id" text, "set_aside_until" bigint,
       "set_aside_reason" text, "set_aside_by" text, "cleared_at" bigint, "closed_at" bigint, "closed_by" text,
       "closed_cause" text, "previous_id" text, "created_at" bigint NOT NULL)`,
    );
    await runner.query(
      `CREATE UNIQUE INDEX "alert_standing" ON "alert" ("subject_kind", "subject_id", "cause")
       WHERE "state" IN ('raised', 'taken', 'set-aside')`,
    );
    await runner.query(`CREATE INDEX "alert_terminal" ON "alert" ("terminal_code", "state")`);
    await runner.query(`CREATE INDEX "alert_subject" ON "alert" ("subject_id")`);
    await runner.query(
      `CREATE TABLE "alert_watch" ("subject_id" text NOT NULL, "cause" text NOT NULL, "memory" text NOT NULL,
       "changed_at" bigint NOT NULL, PRIMARY KEY ("subject_id", "cause"))`,
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`DROP TABLE "alert_watch"`);
    await runner.query(`DROP TABLE "alert"`);
  }
}
