import type { Drawing } from '#shared/circuit/drawing';
import type { Db } from '../db/connect';
import { insertUpdate } from '../db/queries/sheet-log';
import { insertSheet, type NewSheetRow } from '../db/queries/sheets';
import { firstState } from '../sync/first-state';

/** Stores a sheet and what its live document begins with, together and once: no document is ever filled again. */
export function storeNewSheet(db: Db, sheet: NewSheetRow, drawing: Drawing): void {
  const state = firstState(drawing);
  db.transaction((tx) => {
    insertSheet(tx, sheet);
    insertUpdate(tx, sheet.id, state);
  });
}
