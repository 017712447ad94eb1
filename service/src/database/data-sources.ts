import { statSync } from 'node:fs';
import type { Database } from 'better-sqlite3';
import { DataSource, type DataSourceOptions, type EntitySchema } from 'typeorm';
import { MIGRATIONS } from './migrations';

/** A class of rows, as TypeORM takes it. */
export type EntityClass = (new () => object) | EntitySchema;

/** What both connections are opened with. */
export interface DatabaseOptions {
  file: string;
  entities: EntityClass[];
}

/** The log is cut back to this after a checkpoint, so that one long read cannot leave gigabytes behind. Our choice. */
const walLimitBytes = 16 * 1024 * 1024;

function preparing(database: Database): void {
  database.pragma('journal_mode = WAL');
  // TypeORM's driver is built with NORMAL in WAL mode, under which a power cut takes acknowledged rows away.
  database.pragma('synchronous = FULL');
  database.pragma(`journal_size_limit = ${walLimitBytes}`);
}

/** Settings of the connection that writes. */
export function writerOptions({ file, entities }: DatabaseOptions): DataSourceOptions {
  return {
    type: 'better-sqlite3',
    database: file,
    entities,
    migrations: MIGRATIONS,
    migrationsTableName: 'migration',
    synchronize: false,
    prepareDatabase: preparing,
  };
}

/** Settings of the connection that only reads; it sees nothing of a transaction before its commit. */
export function readerOptions({ file, entities }: DatabaseOptions): DataSourceOptions {
  return {
    type: 'better-sqlite3',
    database: file,
    entities,
    synchronize: false,
    readonly: true,
    fileMustExist: true,
  };
}

/** Opens the connection that writes, brings the tables up to date and makes sure that commits are durable. */
export async function openWriter(options: DatabaseOptions): Promise<DataSource> {
  const writer = await new DataSource(writerOptions(options)).initialize();
  try {
    await migrate(writer);
    await assertDurable(writer);
  } catch (error) {
    await writer.destroy();
    throw error;
  }
  return writer;
}

/**
 * Runs what is missing. SQLite rebuilds a table to change it, and dropping the old one would take the rows of its
 * children along: foreign keys are off meanwhile, outside any transaction, and everything is checked afterwards.
 */
export async function migrate(writer: DataSource): Promise<void> {
  await writer.query('PRAGMA foreign_keys = OFF');
  try {
    await writer.runMigrations({ transaction: 'each' });
  } finally {
    await writer.query('PRAGMA foreign_keys = ON');
  }
  const orphans = await writer.query<unknown[]>('PRAGMA foreign_key_check');
  if (orphans.length > 0) throw new Error(`${orphans.length} rows point at rows that do not exist`);
}

/** Refuses to go on when the database would not keep what it acknowledges. */
export async function assertDurable(writer: DataSource): Promise<void> {
  const wanted = { journal_mode: 'wal', synchronous: 2, foreign_keys: 1 } as const;
  const wrong: string[] = [];
  for (const [name, value] of Object.entries(wanted)) {
    const [row] = await writer.query<Record<string, unknown>[]>(`PRAGMA ${name}`);
    const read = row === undefined ? undefined : Object.values(row)[0];
    if (read !== value) wrong.push(`${name} is ${String(read)}, must be ${value}`);
  }
  if (wrong.length > 0) throw new Error(`The database is not safe to run on: ${wrong.join('; ')}`);
}

/** Size of the write-ahead log beside a database file, 0 when there is none. */
export function walBytes(file: string): number {
  return statSync(`${file}-wal`, { throwIfNoEntry: false })?.size ?? 0;
}
