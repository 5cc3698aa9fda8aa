import { cpSync, existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { BLANK_DRAWING } from '#shared/starters/starters';
import { type Connection, openDatabase } from '../../../server/db/connect';
import { migrateDatabase } from '../../../server/db/migrate';
import { insertPerson } from '../../../server/db/queries/people';
import { loadUpdates } from '../../../server/db/queries/sheet-log';
import { insertTeam } from '../../../server/db/queries/teams';
import { storeNewSheet } from '../../../server/services/store-new-sheet';
import { temporaryFile } from '../support/start-test-server';

/** The migrations there are, and one more of SQL given here. */
function migrationsWith(name: string, sql: string, when = 4_000_000_000_000): string {
  const folder = temporaryFile(name);
  mkdirSync(folder);
  cpSync('drizzle', folder, { recursive: true });
  const journal = join(folder, 'meta', '_journal.json');
  const content = JSON.parse(readFileSync(journal, 'utf8'));
  content.entries.push({ idx: content.entries.length, version: '6', when, tag: name, breakpoints: true });
  writeFileSync(journal, JSON.stringify(content));
  writeFileSync(join(folder, `${name}.sql`), sql);
  return folder;
}

function databaseWithASheet(name: string): Connection {
  const connection = openDatabase(temporaryFile(`${name}.db`));
  migrateDatabase(connection, 'drizzle');
  const { db } = connection;
  insertPerson(db, { id: 'p', name: 'Ines Rautio', email: 'ines@buoy.example', passwordHash: 'none', createdAt: 1 });
  insertTeam(db, { id: 't', name: 'Buoy', createdAt: 1 });
  const sheet = { id: 's', teamId: 't', name: 'Input pair', createdBy: 'p', createdAt: 1, changedAt: 1 };
  storeNewSheet(db, { ...sheet, state: 'draft', archived: false }, BLANK_DRAWING);
  return connection;
}

const REBUILD = `PRAGMA foreign_keys=OFF;--> statement-breakpoint
CREATE TABLE \`__new_teams\` (\`id\` text PRIMARY KEY NOT NULL, \`name\` text NOT NULL, \`created_at\` integer NOT NULL);--> statement-breakpoint
INSERT INTO \`__new_teams\` SELECT "id", "name", "created_at" FROM \`teams\`;--> statement-breakpoint
DROP TABLE \`teams\`;--> statement-breakpoint
ALTER TABLE \`__new_teams\` RENAME TO \`teams\`;--> statement-breakpoint
PRAGMA foreign_keys=ON;`;

describe('migrating', () => {
  test('a table that is rebuilt keeps what hangs on it', () => {
    const connection = databaseWithASheet('rebuild');
    migrateDatabase(connection, migrationsWith('9000_rebuild', REBUILD));
    expect(loadUpdates(connection.db, 's')).toHaveLength(1);
    expect(connection.sqlite.pragma('foreign_keys', { simple: true })).toBe(1);
    connection.sqlite.close();
  });

  test('copies a database that holds something first', () => {
    const connection = databaseWithASheet('copied');
    const copy = `${connection.file}.before-9000_drop`;
    expect(existsSync(copy)).toBe(false);
    migrateDatabase(connection, migrationsWith('9000_drop', 'DELETE FROM `sheet_updates`;'));
    expect(loadUpdates(connection.db, 's')).toEqual([]);
    connection.sqlite.close();
    const before = openDatabase(copy);
    expect(loadUpdates(before.db, 's')).toHaveLength(1);
    before.sqlite.close();
  });

  test('that leaves a broken reference is an error', () => {
    const connection = databaseWithASheet('broken');
    const folder = migrationsWith('9000_broken', 'DELETE FROM `teams`;');
    expect(() => migrateDatabase(connection, folder)).toThrow(/refer to rows that are not there/);
    connection.sqlite.close();
  });

  test('never skips a migration in silence', () => {
    const connection = databaseWithASheet('late');
    const folder = migrationsWith('9000_late', 'DELETE FROM `sheets`;', 1);
    expect(() => migrateDatabase(connection, folder)).toThrow(/dated before/);
    connection.sqlite.close();
  });

  test('leaves the file as durable as it must be', () => {
    const connection = databaseWithASheet('pragmas');
    expect(connection.sqlite.pragma('journal_mode', { simple: true })).toBe('wal');
    // 2 is FULL.
    expect(connection.sqlite.pragma('synchronous', { simple: true })).toBe(2);
    connection.sqlite.close();
  });
});

test('the tables hold only the four roles', () => {
  const connection = databaseWithASheet('roles');
  const insert = connection.sqlite.prepare("insert into memberships values ('t', 'p', ?, 1)");
  expect(() => insert.run('admin')).toThrow(/CHECK/);
  expect(insert.run('viewer').changes).toBe(1);
  connection.sqlite.close();
});
