import { createHash, randomBytes } from 'node:crypto';

/** A random id for a row: not secret, but not to be guessed either. */
export function newId(): string {
  return randomBytes(12).toString('hex');
}

/** The secret of a link: 256 random bits. */
export function newToken(): string {
  return randomBytes(32).toString('base64url');
}

/** What is kept of a token. Tokens are random enough that a plain hash cannot be reversed. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
