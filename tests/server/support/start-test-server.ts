import { copyFileSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import pino from 'pino';
import { afterAll } from 'vitest';
import { openDatabase } from '../../../server/db/connect';
import { migrateDatabase } from '../../../server/db/migrate';
import { type Replacements, type Running, startServer } from '../../../server/start';

const folder = mkdtempSync(join(tmpdir(), 'stillpoint-test-'));
const template = join(folder, 'template.db');
const running = new Set<Running>();
let copies = 0;

afterAll(async () => {
  await Promise.all([...running].map((server) => server.stop()));
  rmSync(folder, { recursive: true });
});

/** A fresh, migrated database file. */
export function newDatabaseFile(): string {
  if (copies === 0) {
    const connection = openDatabase(template);
    migrateDatabase(connection, 'drizzle');
    connection.sqlite.close();
  }
  copies += 1;
  const file = join(folder, `${copies}.db`);
  copyFileSync(template, file);
  return file;
}

/** A place for a file that is gone after the tests. */
export function temporaryFile(name: string): string {
  return join(folder, name);
}

/** A clock that stands until it is moved. */
export class TestClock {
  private at = Date.now();
  readonly now = () => this.at;
  pass(milliseconds: number): void {
    this.at += milliseconds;
  }
}

/** What a server has written to its log, line by line. */
export class TestLog {
  readonly lines: string[] = [];
  readonly logger = pino({ level: 'info' }, { write: (line) => void this.lines.push(line) });
}

/** The real server on a free port of loopback, with the real database in a file. */
export async function startTestServer(
  options: Replacements & { file?: string; publicUrl?: string; trustProxy?: number } = {},
): Promise<Running & { stop(): Promise<void> }> {
  const { file = newDatabaseFile(), publicUrl, trustProxy = 0, ...replaced } = options;
  const server = await startServer(
    {
      mode: 'serve',
      port: 0,
      host: '127.0.0.1',
      databaseFile: file,
      publicUrl,
      trustProxy,
      demoPassword: undefined,
      logLevel: 'silent',
    },
    replaced,
  );
  running.add(server);
  return {
    ...server,
    stop: () => {
      running.delete(server);
      return server.stop();
    },
  };
}
