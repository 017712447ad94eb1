import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Running numbers, the one table of changes that live streams resume from, and named settings. */
export class CreateFoundation1764600000000 implements MigrationInterface {
  name = 'CreateFoundation1764600000000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`CREATE TABLE "counter" ("name" text PRIMARY KEY NOT NULL, "value" integer NOT NULL)`);
    await runner.query(
      `CREATE TABLE "change" ("number" integer PRIMARY KEY NOT NULL, "kind" text NOT NULL, "object_id" text NOT NULL,
       "version" integer NOT NULL, "terminal_code" text NOT NULL, "created_at" bigint NOT NULL)`,
    );
    await runner.query(`CREATE INDEX "change_terminal" ON "change" ("terminal_code", "number")`);
    await runner.query(
      `CREATE TABLE "setting" ("scope" text NOT NULL, "name" text NOT NULL, "value" text NOT NULL,
       "version" integer NOT NULL, "changed_by" text, "changed_at" bigint NOT NULL, PRIMARY KEY ("scope", "name"))`,
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`DROP TABLE "setting"`);
    await runner.query(`DROP TABLE "change"`);
    await runner.query(`DROP TABLE "counter"`);
  }
}
