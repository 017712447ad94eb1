import path from 'node:path';
import { DataSource, type MigrationInterface, type QueryRunner } from 'typeorm';
import { assertDurable, migrate, openWriter, walBytes } from '../../src/database/data-sources';
import { MIGRATIONS } from '../../src/database/migrations';
import { ENTITIES } from '../../src/entities';
import { temporaryFolder } from '../support/temporary-folder';

let temporary: ReturnType<typeof temporaryFolder>;
let file: string;

beforeEach(() => {
  temporary = temporaryFolder();
  file = path.join(temporary.folder, 'test.sqlite');
});
afterEach(() => temporary.remove());

async function withWriter<Outcome>(work: (writer: DataSource) => Promise<Outcome>): Promise<Outcome> {
  const writer = await openWriter({ file, entities: ENTITIES });
  try {
    return await work(writer);
  } finally {
    await writer.destroy();
  }
}

describe('migrations', () => {
  test('an empty database that ran all of them is what the entities describe, and nothing more is wanted', async () => {
    const wanted = await withWriter(
      async (writer) => (await writer.driver.createSchemaBuilder().log()).upQueries,
    );
    expect(wanted.map((query) => query.query)).toEqual([]);
  });

  test('all of them can be undone and done again', async () => {
    await withWriter(async (writer) => {
      for (const _migration of MIGRATIONS) await writer.undoLastMigration({ transaction: 'each' });
      const tables = await writer.query<{ name: string }[]>(
        `SELECT name FROM sqlite_master WHERE type = 'table' AND name NOT LIKE 'sqlite_%'`,
      );
      expect(tables.map((table) => table.name)).toEqual(['migration']);
      await migrate(writer);
      expect((await writer.driver.createSchemaBuilder().log()).upQueries).toEqual([]);
    });
  });

  test('a second start runs nothing again', async () => {
    const ran = () => withWriter((writer) => writer.query<unknown[]>('SELECT * FROM migration'));
    const first = await ran();
    expect(first).toHaveLength(MIGRATIONS.length);
    expect(await ran()).toEqual(first);
  });

  test('rebuilding a table keeps the rows of its children', async () => {
    await withWriter(async (writer) => {
      await writer.query(
        `INSERT INTO terminal (id, version, code, name, zone, created_at) VALUES ('t', 1, 'HBR', 'Harbor', 'UTC', 0)`,
      );
      await writer.query(
        `INSERT INTO track (id, terminal_id, position, label, markers, created_at) VALUES ('k', 't', 0, '1', '[]', 0)`,
      );
    });
    const rebuilding = new DataSource({
      type: 'better-sqlite3',
      database: file,
      migrations: [RebuildTerminal1],
    });
    rebuilding.setOptions({ migrationsTableName: 'migration' });
    await rebuilding.initialize();
    await migrate(rebuilding);
    expect(await rebuilding.query('SELECT label FROM track')).toEqual([{ label: '1' }]);
    await rebuilding.destroy();
  });

  test('a migration that leaves rows without their parents is found out', async () => {
    await withWriter(async (writer) => {
      await writer.query('PRAGMA foreign_keys = OFF');
      await writer.query(
        `INSERT INTO person_role (person_id, role, terminal) VALUES ('nobody', 'conductor', '*')`,
      );
      await expect(migrate(writer)).rejects.toThrow('1 rows point at rows that do not exist');
    });
  });
});

describe('durability settings', () => {
  test('are as they must be after opening', async () => {
    await withWriter((writer) => assertDurable(writer));
  });

  test.each([
    ['PRAGMA synchronous = NORMAL', 'synchronous is 1, must be 2'],
    ['PRAGMA foreign_keys = OFF', 'foreign_keys is 0, must be 1'],
    ['PRAGMA journal_mode = DELETE', 'journal_mode is delete, must be wal'],
  ])('after %s the database is not run on', async (pragma, complaint) => {
    await withWriter(async (writer) => {
      await writer.query(pragma);
      await expect(assertDurable(writer)).rejects.toThrow(complaint);
    });
  });

  test('a database that cannot keep a write-ahead log is refused at start', async () => {
    await expect(openWriter({ file: ':memory:', entities: ENTITIES })).rejects.toThrow(
      'journal_mode is memory',
    );
  });

  test('a checkpoint cuts the write-ahead log back', async () => {
    await withWriter(async (writer) => {
      for (let n = 0; n < 50; n += 1) {
        await writer.query('INSERT INTO counter (name, value) VALUES (?, ?)', [
          `row ${n} ${'x'.repeat(2000)}`,
          n,
        ]);
      }
      expect(walBytes(file)).toBeGreaterThan(100_000);
      await writer.query('PRAGMA wal_checkpoint(TRUNCATE)');
      expect(walBytes(file)).toBe(0);
    });
  });
});

/** As a generated migration would: a new table, the rows over, the old one dropped, the new one renamed. */
class RebuildTerminal1 implements MigrationInterface {
  name = 'RebuildTerminal9999999999999';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query('CREATE TABLE "terminal_new" AS SELECT * FROM "terminal"');
    await runner.query('CREATE UNIQUE INDEX "terminal_new_id" ON "terminal_new" ("id")');
    await runner.query('DROP TABLE "terminal"');
    await runner.query('ALTER TABLE "terminal_new" RENAME TO "terminal"');
  }

  async down(): Promise<void> {}
}
