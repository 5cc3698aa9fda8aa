import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';

/** The demo's password: the one given, or else a random one kept in a file beside the database, for its owner's eyes. */
export function demoPassword(databaseFile: string, given: string | undefined): string {
  if (given !== undefined) return given;
  const file = `${databaseFile}.demo-password`;
  if (existsSync(file)) return readFileSync(file, 'utf8').trim();
  const password = randomBytes(9).toString('base64url');
  writeFileSync(file, `${password}\n`, { mode: 0o600 });
  return password;
}
