import { and, asc, eq, lte, max } from 'drizzle-orm';
import type { Db } from '../connect';
import { sheets, sheetUpdates } from '../schema';

/** The updates that make up a sheet's live document, in the order they were stored. */
export function loadUpdates(db: Db, sheetId: string): Uint8Array[] {
  return db
    .select({ content: sheetUpdates.content })
    .from(sheetUpdates)
    .where(eq(sheetUpdates.sheetId, sheetId))
    .orderBy(asc(sheetUpdates.seq))
    .all()
    .map((row) => row.content);
}

/** Where a sheet's log ends: another number whenever anything was stored. Undefined where there is no log. */
export function endOfLog(db: Db, sheetId: string): number | undefined {
  const row = db
    .select({ seq: max(sheetUpdates.seq) })
    .from(sheetUpdates)
    .where(eq(sheetUpdates.sheetId, sheetId))
    .get();
  return row?.seq ?? undefined;
}

/** Stores all of these, or none, and notes when the sheet changed. */
export function appendUpdates(db: Db, sheetId: string, updates: readonly Uint8Array[], now: number): void {
  db.transaction((tx) => {
    for (const update of updates) insertUpdate(tx, sheetId, update);
    tx.update(sheets).set({ changedAt: now }).where(eq(sheets.id, sheetId)).run();
  });
}

export function insertUpdate(db: Db, sheetId: string, update: Uint8Array): void {
  db.insert(sheetUpdates)
    .values({ sheetId, content: Buffer.from(update) })
    .run();
}

/** Puts one row with the whole state in the place of every row there is. */
export function compactUpdates(db: Db, sheetId: string, state: Uint8Array): void {
  db.transaction((tx) => {
    const end = endOfLog(tx, sheetId) ?? 0;
    insertUpdate(tx, sheetId, state);
    tx.delete(sheetUpdates)
      .where(and(eq(sheetUpdates.sheetId, sheetId), lte(sheetUpdates.seq, end)))
      .run();
  });
}
