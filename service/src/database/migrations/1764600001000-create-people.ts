import type { MigrationInterface, QueryRunner } from 'typeorm';

/** People, what they may do where, and how they come in: sessions, one-time links, failed tries. */
export class CreatePeople1764600001000 implements MigrationInterface {
  name = 'CreatePeople1764600001000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      `CREATE TABLE "person" ("id" text PRIMARY KEY NOT NULL, "version" integer NOT NULL, "email" text NOT NULL,
       "name" text NOT NULL, "password_hash" text, "active" boolean NOT NULL, "created_at" bigint NOT NULL,
       CONSTRAINT "person_email" UNIQUE ("email"))`,
    );
    await runner.query(
      `CREATE TABLE "person_role" ("person_id" text NOT NULL, "role" text NOT NULL, "terminal" text NOT NULL,
       CONSTRAINT "person_role_person" FOREIGN KEY ("person_id") REFERENCES "person" ("id") ON DELETE CASCADE
       ON UPDATE NO ACTION, PRIMARY KEY ("person_id", "role", "terminal"))`,
    );
    await runner.query(
      `CREATE TABLE "session" ("id" text PRIMARY KEY NOT NULL, "person_id" text NOT NULL, "started_at" bigint NOT NULL,
       "last_seen_at" bigint NOT NULL, "ends_at" bigint NOT NULL, "ended_at" bigint, "device" text NOT NULL,
       CONSTRAINT "session_person" FOREIGN KEY ("person_id") REFERENCES "person" ("id") ON DELETE CASCADE
       ON UPDATE NO ACTION)`,
    );
    await runner.query(`CREATE INDEX "session_person_ended" ON "session" ("person_id", "ended_at")`);
    await runner.query(
      `CREATE TABLE "one_time_link" ("token_hash" text PRIMARY KEY NOT NULL, "person_id" text NOT NULL,
       "created_at" bigint NOT NULL, "expires_at" bigint NOT NULL, "used_at" bigint,
       CONSTRAINT "one_time_link_person" FOREIGN KEY ("person_id") REFERENCES "person" ("id") ON DELETE CASCADE
       ON UPDATE NO ACTION)`,
    );
    await runner.query(
      `CREATE TABLE "sign_in_attempt" ("key" text PRIMARY KEY NOT NULL, "failed" integer NOT NULL,
       "last_failed_at" bigint NOT NULL, "blocked_until" bigint NOT NULL)`,
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`DROP TABLE "sign_in_attempt"`);
    await runner.query(`DROP TABLE "one_time_link"`);
    await runner.query(`DROP TABLE "session"`);
    await runner.query(`DROP TABLE "person_role"`);
    await runner.query(`DROP TABLE "person"`);
  }
}
