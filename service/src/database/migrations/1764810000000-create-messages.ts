import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Outgoing messages with every try, the links in them, and the telephone numbers they go to. */
export class CreateMessages1764810000000 implements MigrationInterface {
  name = 'CreateMessages1764810000000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`ALTER TABLE "person" ADD COLUMN "phone" text`);
    await runner.query(
      `CREATE TABLE "message" ("id" text PRIMARY KEY NOT NULL, "channel" text NOT NULL, "address" text NOT NULL,
       "person_id" text NOT NULL, "name" text NOT NULL, "terminal_code" text, "alert_id" text,
       "occasion" text NOT NULL, "subject" text NOT NULL, "body" text NOT NULL, "link_purpose" text,
       "state" text NOT NULL, "tries" integer NOT NULL, "next_at" bigint, "claimed_by" text, "sent_at" bigint,
       "created_at" bigint NOT NULL)`,
    );
    await runner.query(`CREATE INDEX "message_due" ON "message" ("state", "next_at")`);
    await runner.query(`CREATE INDEX "message_alert" ON "message" ("alert_id")`);
    await runner.query(
      `CREATE TABLE "message_try" ("message_id" text NOT NULL, "number" integer NOT NULL, "outcome" text NOT NULL,
       "detail" text NOT NULL, "tried_at" bigint NOT NULL, PRIMARY KEY ("message_id", "number"))`,
    );
    await runner.query(
      `CREATE TABLE "taken_link" ("token_hash" text PRIMARY KEY NOT NULL, "alert_id" text NOT NULL,
       "person_id" text NOT NULL, "created_at" bigint NOT NULL, "expires_at" bigint NOT NULL, "used_at" bigint)`,
    );
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`DROP TABLE "taken_link"`);
    await runner.query(`DROP TABLE "message_try"`);
    await runner.query(`DROP TABLE "message"`);
    await runner.query(`ALTER TABLE "person" DROP COLUMN "phone"`);
  }
}
