import type { Sheet } from '#shared/api/sheets';
import type { SheetRow } from '../db/queries/sheets';

export function sheetAnswerOf(row: SheetRow): Sheet {
  const { id, teamId, name, state, archived } = row;
  return {
    id,
    teamId,
    name,
    state,
    archived,
    createdAt: new Date(row.createdAt).toISOString(),
    changedAt: new Date(row.changedAt).toISOString(),
    createdBy: row.author,
  };
}
