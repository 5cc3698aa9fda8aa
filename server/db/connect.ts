import { mkdirSync } from 'node:fs';
import { dirname } from 'node:path';
import type { RunResult } from 'better-sqlite3';
import Sqlite from 'better-sqlite3';
import { drizzle } from 'drizzle-orm/better-sqlite3';
import type { BaseSQLiteDatabase } from 'drizzle-orm/sqlite-core';
import * as schema from './schema';

/** What queries run on: the database, or a transaction in it. */
export type Db = BaseSQLiteDatabase<'sync', RunResult, typeof schema>;

export interface Connection {
  readonly file: string;
  readonly sqlite: Sqlite.Database;
  readonly db: Db;
}

/** Opens the file, making it and its folder if there are none. Run `migrateDatabase` before any query. */
export function openDatabase(file: string): Connection {
  mkdirSync(dirname(file), { recursive: true, mode: 0o700 });
  const sqlite = new Sqlite(file);
  sqlite.pragma('journal_mode = WAL');
  // NORMAL may lose the last commits when the power fails, and they have been sent to other people by then.
  sqlite.pragma('synchronous = FULL');
  sqlite.pragma('busy_timeout = 5000');
  return { file, sqlite, db: drizzle(sqlite, { schema }) };
}
