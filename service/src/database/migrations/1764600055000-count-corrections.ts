import type { MigrationInterface, QueryRunner } from 'typeorm';

/**
 * How many changes of the record each turn has that need an approval, and how many of them wait, so that the list of
 * corrections finds them without reading every log. What is there already is counted generously: the list itself
 * looks at the entries.
 */
export class CountCorrections1764600055000 implements MigrationInterface {
  name = 'CountCorrections1764600055000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`ALTER TABLE "turn" ADD COLUMN "correction_count" integer NOT NULL DEFAULT (0)`);
    await runner.query(`ALTER TABLE "turn" ADD COLUMN "waiting_count" integer NOT NULL DEFAULT (0)`);
    for (const column of ['correction_count', 'waiting_count']) {
      await runner.query(
        `UPDATE "turn" SET "${column}" = (SELECT count(*) FROM "entry" WHERE "entry"."subject_id" = "turn"."id"
         AND "entry"."kind" IN ('corrected', 'withdrawn')) WHERE "departure_at" IS NOT NULL`,
      );
    }
    await runner.query(
      `CREATE INDEX "turn_corrections" ON "turn" ("terminal_code", "waiting_count") WHERE "correction_count" > 0`,
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`DROP INDEX "turn_corrections"`);
    await runner.query(`ALTER TABLE "turn" DROP COLUMN "waiting_count"`);
    await runner.query(`ALTER TABLE "turn" DROP COLUMN "correction_count"`);
  }
}
