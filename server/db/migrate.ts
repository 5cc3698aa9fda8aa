import { readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { drizzle } from 'drizzle-orm/better-sqlite3';
import { migrate } from 'drizzle-orm/better-sqlite3/migrator';
import { z } from 'zod';
import type { Connection } from './connect';

const journal = z.object({ entries: z.array(z.object({ when: z.number(), tag: z.string() })) });

/**
 * Brings the database to the newest schema and turns foreign keys on. A database that holds something is copied
 * beside itself first. Throws when a migration would be skipped or leaves a broken reference.
 */
export function migrateDatabase({ sqlite, file }: Connection, folder: string): void {
  const { entries } = journal.parse(JSON.parse(readFileSync(join(folder, 'meta', '_journal.json'), 'utf8')));
  assertAscending(entries);
  const pending = entries.slice(appliedCount(sqlite));
  const [first] = pending;
  if (first && pending.length < entries.length) backUp(sqlite, `${file}.before-${first.tag}`);

  // A migration that rebuilds a table drops the old one, and with foreign keys on that deletes every row that refers
  // to it. The pragma does nothing inside the migrator's transaction, so it is set here.
  sqlite.pragma('foreign_keys = OFF');
  migrate(drizzle(sqlite), { migrationsFolder: folder });
  const broken = sqlite.pragma('foreign_key_check');
  if (Array.isArray(broken) && broken.length > 0) {
    throw new Error(`After migrating ${file}, ${broken.length} rows refer to rows that are not there.`);
  }
  if (appliedCount(sqlite) !== entries.length) {
    throw new Error(`${file} has other migrations than ${folder}: it is from another version of the program.`);
  }
  sqlite.pragma('foreign_keys = ON');
}

/** The migrator silently skips an entry that is older than the last applied one, so such a journal is refused. */
function assertAscending(entries: readonly { when: number; tag: string }[]): void {
  for (const [i, entry] of entries.entries()) {
    const before = entries[i - 1];
    if (before && before.when >= entry.when) {
      throw new Error(`Migration ${entry.tag} is dated before ${before.tag}: generate it anew.`);
    }
  }
}

function appliedCount(sqlite: Connection['sqlite']): number {
  const table = sqlite.prepare("select 1 from sqlite_master where name = '__drizzle_migrations'").get();
  if (!table) return 0;
  return z.object({ n: z.number() }).parse(sqlite.prepare('select count(*) as n from __drizzle_migrations').get()).n;
}

function backUp(sqlite: Connection['sqlite'], copy: string): void {
  // An older copy is of an attempt that was rolled back: the database still holds what it holds.
  rmSync(copy, { force: true });
  sqlite.prepare('vacuum into ?').run(copy);
}
