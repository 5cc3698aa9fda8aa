import { desc, eq, getTableColumns } from 'drizzle-orm';
import type { Db } from '../connect';
import { people, sheets } from '../schema';

/** A sheet with the name of whoever began it. */
export type SheetRow = typeof sheets.$inferSelect & { author: string };

const sheetRow = { ...getTableColumns(sheets), author: people.name };

export type NewSheetRow = typeof sheets.$inferInsert;

export function insertSheet(db: Db, sheet: NewSheetRow): void {
  db.insert(sheets).values(sheet).run();
}

export function findSheet(db: Db, id: string): SheetRow | undefined {
  return db
    .select(sheetRow)
    .from(sheets)
    .innerJoin(people, eq(people.id, sheets.createdBy))
    .where(eq(sheets.id, id))
    .get();
}

/** Last changed first. */
export function sheetsOf(db: Db, teamId: string): SheetRow[] {
  return db
    .select(sheetRow)
    .from(sheets)
    .innerJoin(people, eq(people.id, sheets.createdBy))
    .where(eq(sheets.teamId, teamId))
    .orderBy(desc(sheets.changedAt), desc(sheets.id))
    .all();
}

export function updateSheet(db: Db, id: string, changes: { name: string; archived: boolean; changedAt: number }): void {
  db.update(sheets).set(changes).where(eq(sheets.id, id)).run();
}

export function deleteSheetRow(db: Db, id: string): void {
  db.delete(sheets).where(eq(sheets.id, id)).run();
}
