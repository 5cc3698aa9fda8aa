import { createHash, createHmac, randomBytes } from 'node:crypto';

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

const PSEUDONYM_KEY = randomBytes(32);

/**
 * A name for an e-mail address that has no account: the same address is the same name until the server stops, and nobody
 * can find the address by trying.
 */
export function pseudonym(email: string): string {
  return `unknown-${createHmac('sha256', PSEUDONYM_KEY).update(email).digest('hex').slice(0, 16)}`;
}
