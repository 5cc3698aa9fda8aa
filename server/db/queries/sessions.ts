import { and, eq, lt, or } from 'drizzle-orm';
import type { Db } from '../connect';
import { sessions } from '../schema';

export type SessionRow = typeof sessions.$inferSelect;

/** `id` is the hash of the token. */
export function findSession(db: Db, id: string): SessionRow | undefined {
  return db.select().from(sessions).where(eq(sessions.id, id)).get();
}

export function touchSession(db: Db, id: string, seenAt: number): void {
  db.update(sessions).set({ seenAt }).where(eq(sessions.id, id)).run();
}

/** Removes sessions last seen, or made, before these times. */
export function deleteSessionsBefore(db: Db, limits: { seenAt: number; createdAt: number }): void {
  db.delete(sessions)
    .where(or(lt(sessions.seenAt, limits.seenAt), lt(sessions.createdAt, limits.createdAt)))
    .run();
}

export function deleteSession(db: Db, id: string, personId: string): void {
  db.delete(sessions)
    .where(and(eq(sessions.id, id), eq(sessions.userId, personId)))
    .run();
}
