import { SESSION_LIMITS } from '../auth/session-limits';
import { KNOWN_FOR } from '../auth/throttle';
import type { Db } from '../db/connect';
import { deleteSessionsBefore } from '../db/queries/sessions';
import { deleteAttemptsBefore } from '../db/queries/sign-in-attempts';

/** Removes what no longer counts: ended sessions, old sign-in attempts. */
export function keepHouse(db: Db, now: number): void {
  deleteSessionsBefore(db, { seenAt: now - SESSION_LIMITS.idle, createdAt: now - SESSION_LIMITS.absolute });
  deleteAttemptsBefore(db, now - KNOWN_FOR);
}
