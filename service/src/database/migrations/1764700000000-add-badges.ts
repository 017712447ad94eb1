import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Badges and PINs, for signing in on phones that a crew shares. Everybody begins without either. */
export class AddBadges1764700000000 implements MigrationInterface {
  name = 'AddBadges1764700000000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`ALTER TABLE "person" ADD COLUMN "badge" text`);
    await runner.query(`ALTER TABLE "person" ADD COLUMN "pin_hash" text`);
    await runner.query(`CREATE UNIQUE INDEX "person_badge" ON "person" ("badge")`);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`DROP INDEX "person_badge"`);
    await runner.query(`ALTER TABLE "person" DROP COLUMN "pin_hash"`);
    await runner.query(`ALTER TABLE "person" DROP COLUMN "badge"`);
  }
}
