import type { MigrationInterface, QueryRunner } from 'typeorm';

/** The sealed log of entries. Two triggers make it append-only for everybody, the service included. */
export class CreateEntries1764600012000 implements MigrationInterface {
  name = 'CreateEntries1764600012000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      `CREATE TABLE "entry" ("sequence" integer PRIMARY KEY NOT NULL, "id" text NOT NULL, "subject_kind" text NOT NULL,
       "subject_id" text NOT NULL, "kind" text NOT NULL, "terminal_code" text NOT NULL, "service_date" text NOT NULL,
       "observed_at" bigint NOT NULL, "received_at" bigint NOT NULL, "body" text NOT NULL, "body_hash" text NOT NULL,
       "previous_hash" text NOT NULL, "hash" text NOT NULL, CONSTRAINT "entry_id" UNIQUE ("id"))`,
    );
    await runner.query(`CREATE INDEX "entry_subject" ON "entry" ("subject_id", "sequence")`);
    await runner.query(`CREATE INDEX "entry_day" ON "entry" ("terminal_code", "service_date")`);
    await runner.query(
      `CREATE TRIGGER "entry_not_changed" BEFORE UPDATE ON "entry"
       BEGIN SELECT RAISE(ABORT, 'an entry is never changed'); END`,
    );
    await runner.query(
      `CREATE TRIGGER "entry_not_deleted" BEFORE DELETE ON "entry"
       BEGIN SELECT RAISE(ABORT, 'an entry is never deleted'); END`,
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`DROP TABLE "entry"`);
  }
}
