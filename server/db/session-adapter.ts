import { DrizzleSQLiteAdapter } from '@lucia-auth/adapter-drizzle';
import type { Adapter } from 'lucia';
import type { Db } from './connect';
import { people, sessions } from './schema';

/**
 * Lucia keeps the token of the cookie itself as the session's id. This adapter hashes it on the way in, so that the
 * database, its copies and its backups hold nothing that signs anybody in.
 */
export function createSessionAdapter(db: Db, hashToken: (token: string) => string): Adapter {
  const inner = new DrizzleSQLiteAdapter(db, sessions, people);
  return {
    async getSessionAndUser(token) {
      const [session, user] = await inner.getSessionAndUser(hashToken(token));
      return [session && { ...session, id: token }, user];
    },
    getUserSessions: (personId) => inner.getUserSessions(personId),
    setSession: (session) => inner.setSession({ ...session, id: hashToken(session.id) }),
    updateSessionExpiration: (token, expiresAt) => inner.updateSessionExpiration(hashToken(token), expiresAt),
    deleteSession: (token) => inner.deleteSession(hashToken(token)),
    deleteUserSessions: (personId) => inner.deleteUserSessions(personId),
    deleteExpiredSessions: () => inner.deleteExpiredSessions(),
  };
}
