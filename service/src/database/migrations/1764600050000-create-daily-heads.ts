import type { MigrationInterface, QueryRunner } from 'typeorm';

/**
 * Daily heads of the sealed log, append-only like the log itself, and an index that finds the entries of a day of
 * receipt.
 */
export class CreateDailyHeads1764600050000 implements MigrationInterface {
  name = 'CreateDailyHeads1764600050000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      `CREATE TABLE "daily_head" ("date" text PRIMARY KEY NOT NULL, "sequence" integer NOT NULL, "hash" text NOT NULL,
       "entries" integer NOT NULL, "published_at" bigint NOT NULL)`,
    );
    await runner.query(`CREATE INDEX "entry_received" ON "entry" ("received_at")`);
    await runner.query(
      `CREATE TRIGGER "daily_head_not_changed" BEFORE UPDATE ON "daily_head"
       BEGIN SELECT RAISE(ABORT, 'a published head is never changed'); END`,
    );
    await runner.query(
      `CREATE TRIGGER "daily_head_not_deleted" BEFORE DELETE ON "daily_head"
       BEGIN SELECT RAISE(ABORT, 'a published head is never deleted'); END`,
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`DROP INDEX "entry_received"`);
    await runner.query(`DROP TABLE "daily_head"`);
  }
}
