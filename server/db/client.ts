import { copyFileSync, existsSync, mkdirSync, renameSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import SQLite from 'better-sqlite3';
import { drizzle } from 'drizzle-orm/better-sqlite3';
import type { MigrationMeta } from 'drizzle-orm/migrator';
import * as schema from './schema';

/** The database's one file in the data folder. */
const FILE = 'tallyrail.sqlite';

/** Opens the one file in a folder and brings it to today's schema. This module alone names the driver. */
export function openDatabase(folder: string, migrations: readonly MigrationMeta[]) {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const file = new SQLite(join(folder, FILE));
  file.pragma('journal_mode = WAL'); // readers never wait for a writer
  file.pragma('synchronous = NORMAL'); // with WAL, safe when we crash; a power cut may lose the last moments
  file.pragma('busy_timeout = 5000'); // ms; a backup may hold the file for a moment
  applyMigrations(file, migrations);
  file.pragma('foreign_keys = ON');
  return {
    database: drizzle(file, { schema }),
    close: () => file.close(),
    /** Writes a whole copy, while others go on reading and writing. */
    copyTo: async (path: string): Promise<void> => {
      await file.backup(path);
    },
  };
}

export type ShopDatabase = ReturnType<typeof openDatabase>['database'];

/**
 * Whether a file is a sound copy of a database of ours, and no newer than this program knows.
 *
 * @returns what is wrong with it, in a sentence; null where nothing is.
 */
export function faultOf(path: string, migrations: readonly MigrationMeta[]): string | null {
  let file: SQLite.Database | undefined;
  try {
    file = new SQLite(path, { readonly: true, fileMustExist: true });
    const [check] = file.pragma('integrity_check', { simple: false }) as { readonly integrity_check: string }[];
    if (check?.integrity_check !== 'ok') return 'The file is damaged.';
    const newest = Number(file.prepare('SELECT max(created_at) FROM __drizzle_migrations').pluck().get() ?? 0);
    const known = Math.max(0, ...migrations.map(({ folderMillis }) => folderMillis));
    return newest > known ? 'The copy comes from a newer Tallyrail. Bring this one up to date first.' : null;
  } catch (error) {
    if (error instanceof SQLite.SqliteError) return 'The file is not a copy of a Tallyrail database.';
    throw error;
  } finally {
    file?.close();
  }
}

/** Puts a copy in the place of the database, which nobody may have open; what was there is kept beside it. */
export function putInPlace(folder: string, copy: string): void {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const file = join(folder, FILE);
  if (existsSync(file)) renameSync(file, join(folder, 'before-restore.sqlite'));
  for (const beside of ['-wal', '-shm']) rmSync(file + beside, { force: true });
  copyFileSync(copy, file);
}

/** A write that is ready to run. */
export interface Write {
  readonly run: () => unknown;
}

/**
 * Runs some writes, all of them or none, in their order. What a later one needs to know is decided before: that is
 * what a driver whose database is elsewhere can do as well.
 */
export async function allOrNothing(database: ShopDatabase, writes: readonly Write[]): Promise<void> {
  database.transaction(() => writes.forEach((write) => write.run()), { behavior: 'immediate' });
}

/** Whether an error is the database's refusal of a second row where there may be one. */
export function isTaken(error: unknown): boolean {
  const cause = error instanceof Error && error.cause instanceof Error ? error.cause : error;
  return cause instanceof Error && 'code' in cause && (cause.code === 'SQLITE_CONSTRAINT_UNIQUE' || cause.code === 'SQLITE_CONSTRAINT_PRIMARYKEY');
}

/**
 * Applies what is new, all of it or none, and keeps account in the table Drizzle's own migrator uses. That one reads
 * a folder, and a built server has none: its migrations are part of it (nuxt.config.ts).
 */
function applyMigrations(file: SQLite.Database, migrations: readonly MigrationMeta[]): void {
  file.pragma('foreign_keys = OFF'); // a table that is rebuilt is dropped for a moment
  file.exec('CREATE TABLE IF NOT EXISTS __drizzle_migrations (id INTEGER PRIMARY KEY, hash text NOT NULL, created_at numeric)');
  const newest = file.prepare('SELECT max(created_at) FROM __drizzle_migrations').pluck();
  const note = file.prepare('INSERT INTO __drizzle_migrations (hash, created_at) VALUES (?, ?)');
  const applyAll = file.transaction(() => {
    const done = Number(newest.get() ?? 0);
    for (const { sql, hash, folderMillis } of migrations.filter((migration) => migration.folderMillis > done)) {
      for (const statement of sql) file.exec(statement);
      note.run(hash, folderMillis);
    }
    const [broken] = file.pragma('foreign_key_check') as unknown[];
    if (broken) throw new Error(`A migration left a row that points nowhere: ${JSON.stringify(broken)}`);
  });
  applyAll.immediate(); // two servers started at once: the second waits, then finds nothing to do
}
