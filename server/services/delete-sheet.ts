import { Refusal } from '#shared/api/refusal';
import { deleteSheetRow } from '../db/queries/sheets';
import type { Context } from './context';
import { requireSheet } from './team-access';
import { tellTeam } from './tell-team';

/** Deletes a sheet for good, unless it was ever signed off. */
export function deleteSheet(ctx: Context, sheetId: string, askerId: string): void {
  const { sheet, team } = requireSheet(ctx.db, sheetId, askerId, 'delete-sheet');
  if (sheet.state === 'signed-off' || sheet.state === 'changed') {
    throw new Refusal('signed-off', 'What was signed off is kept: archive the sheet instead.');
  }
  ctx.rooms.dissolve(sheetId);
  deleteSheetRow(ctx.db, sheetId);
  tellTeam(ctx, team.id, { kind: 'sheet', teamId: team.id, sheetId });
}
