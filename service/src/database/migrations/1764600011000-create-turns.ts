import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Turns, with copies of what their entries say. */
export class CreateTurns1764600011000 implements MigrationInterface {
  name = 'CreateTurns1764600011000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      `CREATE TABLE "turn" ("id" text PRIMARY KEY NOT NULL, "version" integer NOT NULL, "terminal_code" text NOT NULL,
       "zone" text NOT NULL, "service_date" text NOT NULL, "kind" text NOT NULL, "origin" text NOT NULL,
       "timetable_id" text, "pair_key" text, "inbound_train" text, "outbound_train" text,
       "scheduled_arrival_at" bigint, "scheduled_departure_at" bigint, "planned_track" text, "planned_set" text,
       "reverses" integer, "plan_id" text NOT NULL, "track" text, "set_label" text, "expected_arrival_at" bigint,
       "arrival_at" bigint, "held_until" bigint, "departure_at" bigint, "annulled_at" bigint,
       "entry_count" integer NOT NULL, "crew" text NOT NULL, "carried_crew" text NOT NULL, "span_from" bigint NOT NULL,
       "span_to" bigint NOT NULL, "settled_at" bigint, "withdrawn_at" bigint, "created_at" bigint NOT NULL)`,
    );
    await runner.query(`CREATE INDEX "turn_day" ON "turn" ("terminal_code", "service_date")`);
    await runner.query(`CREATE INDEX "turn_span" ON "turn" ("terminal_code", "span_to")`);
    await runner.query(`CREATE INDEX "turn_unsettled" ON "turn" ("span_from") WHERE "settled_at" IS NULL`);
    await runner.query(`CREATE INDEX "turn_set" ON "turn" ("set_label", "span_from")`);
    await runner.query(
      `CREATE UNIQUE INDEX "turn_pair" ON "turn" ("terminal_code", "service_date", "pair_key")
       WHERE "pair_key" IS NOT NULL`,
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`DROP TABLE "turn"`);
  }
}
