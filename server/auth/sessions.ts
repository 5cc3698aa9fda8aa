import { type Adapter, Lucia, TimeSpan } from 'lucia';
import type { Person } from '#shared/api/accounts';
import { SESSION_LIMITS, sessionLives } from './session-limits';
import { hashToken } from './tokens';

declare module 'lucia' {
  interface Register {
    Lucia: Lucia<SessionTimes, { name: string; email: string }>;
    DatabaseSessionAttributes: SessionTimes;
    DatabaseUserAttributes: { name: string; email: string };
  }
}

type SessionTimes = { createdAt: number; seenAt: number };

/** Who sent a request, and by which session. */
export interface SignedIn {
  readonly person: Person;
  /** The session's name in the database: the hash of its token. */
  readonly sessionId: string;
}

export interface Sessions {
  /** The cookie's name is the only part of it that others may need. */
  readonly cookieName: string;
  /** Starts a session and gives the `Set-Cookie` header for it. */
  open(personId: string): Promise<string>;
  /** Who the `Cookie` header speaks for; null for nobody, also when the session has ended. */
  identify(cookieHeader: string | undefined): Promise<SignedIn | null>;
  /** The `Set-Cookie` header that takes the cookie away. */
  blankCookie(): string;
}

/** How stale the time of last use may get, so that not every request writes. */
const TOUCH_AFTER = 60_000;

/**
 * The design: the cookie holds 200 random bits, the database their SHA-256. Lucia makes tokens and cookies and looks
 * sessions up; the idle and the absolute time-out are ours, by the clock handed in, and checked at every use.
 */
export function createSessions(deps: {
  readonly adapter: Adapter;
  readonly touch: (sessionId: string, seenAt: number) => void;
  readonly secure: boolean;
  readonly now: () => number;
}): Sessions {
  const cookieName = deps.secure ? '__Host-stillpoint' : 'stillpoint';
  const lucia = new Lucia(deps.adapter, {
    sessionExpiresIn: new TimeSpan(SESSION_LIMITS.absolute, 'ms'),
    sessionCookie: { name: cookieName, attributes: { secure: deps.secure, sameSite: 'lax', path: '/' } },
    getSessionAttributes: ({ createdAt, seenAt }) => ({ createdAt, seenAt }),
    getUserAttributes: ({ name, email }) => ({ name, email }),
  });

  return {
    cookieName,
    async open(personId) {
      const now = deps.now();
      const session = await lucia.createSession(personId, { createdAt: now, seenAt: now });
      return lucia.createSessionCookie(session.id).serialize();
    },
    async identify(cookieHeader) {
      const token = lucia.readSessionCookie(cookieHeader ?? '');
      if (!token) return null;
      const { session, user } = await lucia.validateSession(token);
      if (!session) return null;
      const now = deps.now();
      if (!sessionLives(session, now)) {
        await lucia.invalidateSession(token);
        return null;
      }
      const sessionId = hashToken(token);
      if (now - session.seenAt > TOUCH_AFTER) deps.touch(sessionId, now);
      return { sessionId, person: { id: user.id, name: user.name, email: user.email } };
    },
    blankCookie: () => lucia.createBlankSessionCookie().serialize(),
  };
}
