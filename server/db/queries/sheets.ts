import { desc, eq } from 'drizzle-orm';
import type { Db } from '../connect';
import { sheets } from '../schema';

export type SheetRow = typeof sheets.$inferSelect;

export function insertSheet(db: Db, sheet: typeof sheets.$inferInsert): void {
  db.insert(sheets).values(sheet).run();
}

export function findSheet(db: Db, id: string): SheetRow | undefined {
  return db.select().from(sheets).where(eq(sheets.id, id)).get();
}

/** Last changed first. */
export function sheetsOf(db: Db, teamId: string): SheetRow[] {
  return db
    .select()
    .from(sheets)
    .where(eq(sheets.teamId, teamId))
    .orderBy(desc(sheets.changedAt), desc(sheets.id))
    .all();
}

export function updateSheet(
  db: Db,
  id: string,
  changes: { name?: string; archived?: boolean; changedAt?: number },
): void {
  db.update(sheets).set(changes).where(eq(sheets.id, id)).run();
}

export function deleteSheetRow(db: Db, id: string): void {
  db.delete(sheets).where(eq(sheets.id, id)).run();
}
