import { and, desc, eq, gt, lt } from 'drizzle-orm';
import type { Db } from '../connect';
import { signInAttempts } from '../schema';

export type AttemptRow = Omit<typeof signInAttempts.$inferSelect, 'id'>;

/** Notes an attempt and gives its number. */
export function insertAttempt(db: Db, attempt: AttemptRow): number {
  return Number(db.insert(signInAttempts).values(attempt).run().lastInsertRowid);
}

export function markSucceeded(db: Db, id: number): void {
  db.update(signInAttempts).set({ succeeded: true }).where(eq(signInAttempts.id, id)).run();
}

/** Newest first. */
export function attemptsOnAccount(db: Db, account: string, since: number): AttemptRow[] {
  return db
    .select()
    .from(signInAttempts)
    .where(and(eq(signInAttempts.account, account), gt(signInAttempts.at, since)))
    .orderBy(desc(signInAttempts.at), desc(signInAttempts.id))
    .all();
}

/** Failures only, newest first. */
export function failuresFromAddress(db: Db, address: string, since: number): AttemptRow[] {
  return db
    .select()
    .from(signInAttempts)
    .where(and(eq(signInAttempts.address, address), eq(signInAttempts.succeeded, false), gt(signInAttempts.at, since)))
    .orderBy(desc(signInAttempts.at), desc(signInAttempts.id))
    .all();
}

/** Whether somebody got in to this account from this address since then. */
export function hasSucceededFrom(db: Db, account: string, address: string, since: number): boolean {
  return (
    db
      .select({ id: signInAttempts.id })
      .from(signInAttempts)
      .where(
        and(
          eq(signInAttempts.account, account),
          eq(signInAttempts.address, address),
          eq(signInAttempts.succeeded, true),
          gt(signInAttempts.at, since),
        ),
      )
      .limit(1)
      .get() !== undefined
  );
}

export function deleteAttemptsBefore(db: Db, at: number): void {
  db.delete(signInAttempts).where(lt(signInAttempts.at, at)).run();
}
