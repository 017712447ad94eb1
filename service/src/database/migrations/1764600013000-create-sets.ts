import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Equipment sets and the units they are made of. */
export class CreateSets1764600013000 implements MigrationInterface {
  name = 'CreateSets1764600013000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(
      `CREATE TABLE "equipment_set" ("id" text PRIMARY KEY NOT NULL, "version" integer NOT NULL, "label" text NOT NULL,
       "leading_unit" text, "off_air_since" bigint, "created_at" bigint NOT NULL,
       CONSTRAINT "equipment_set_label" UNIQUE ("label"))`,
    );
    await runner.query(
      `CREATE TABLE "unit" ("id" text PRIMARY KEY NOT NULL, "number" text NOT NULL, "kind" text NOT NULL,
       "length_feet" real, "tons" real, "handbrake_pounds" real, "created_at" bigint NOT NULL,
       CONSTRAINT "unit_number" UNIQUE ("number"))`,
    );
    await runner.query(
      `CREATE TABLE "set_unit" ("set_id" text NOT NULL, "position" integer NOT NULL, "unit_id" text NOT NULL,
       CONSTRAINT "set_unit_set" FOREIGN KEY ("set_id") REFERENCES "equipment_set" ("id") ON DELETE CASCADE
       ON UPDATE NO ACTION, CONSTRAINT "set_unit_of_unit" FOREIGN KEY ("unit_id") REFERENCES "unit" ("id")
       ON DELETE NO ACTION ON UPDATE NO ACTION, PRIMARY KEY ("set_id", "position"))`,
    );
    await runner.query(`CREATE INDEX "set_unit_unit" ON "set_unit" ("unit_id")`);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`DROP TABLE "set_unit"`);
    await runner.query(`DROP TABLE "unit"`);
    await runner.query(`DROP TABLE "equipment_set"`);
  }
}
