const HOUR = 3_600_000;

/**
 * A session ends three days after its last use and thirty days after it was made. Both are longer than the twenty
 * hours beyond which WCAG 2.2.1 asks for no warning.
 */
export const SESSION_LIMITS = { idle: 72 * HOUR, absolute: 720 * HOUR };

export function sessionLives(session: { createdAt: number; seenAt: number }, now: number): boolean {
  return now < session.seenAt + SESSION_LIMITS.idle && now < session.createdAt + SESSION_LIMITS.absolute;
}
