import { Refusal } from '#shared/api/refusal';
import type { ChangeSheetBody, SheetAnswer } from '#shared/api/sheets';
import { updateSheet } from '../db/queries/sheets';
import type { Context } from './context';
import { sheetAnswerOf } from './sheet-answer';
import { requireRole, requireSheet } from './team-access';
import { tellTeam } from './tell-team';

/** Renames a sheet (who may edit it), or puts it away and brings it back (owners). One that is away stays as it is. */
export function changeSheet(ctx: Context, sheetId: string, changes: ChangeSheetBody, askerId: string): SheetAnswer {
  const { sheet, team } = requireSheet(ctx.db, sheetId, askerId, 'open-sheet');
  const { name = sheet.name, archived = sheet.archived } = changes;
  if (changes.name !== undefined) requireRole(team, 'edit-sheet');
  if (changes.archived !== undefined) requireRole(team, 'archive-sheet');
  if (changes.name !== undefined && sheet.archived && archived) {
    throw new Refusal('archived', 'This sheet is archived: bring it back to change it.');
  }
  const changedAt = ctx.now();
  updateSheet(ctx.db, sheetId, { name, archived, changedAt });
  if (archived !== sheet.archived) ctx.rooms.recheckSheet(sheetId);
  tellTeam(ctx, team.id, { kind: 'sheet', teamId: team.id, sheetId });
  return { sheet: sheetAnswerOf({ ...sheet, name, archived, changedAt }), team };
}
