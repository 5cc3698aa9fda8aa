import type { Sheet } from '#shared/api/sheets';
import { sheetsOf } from '../db/queries/sheets';
import type { Context } from './context';
import { sheetAnswerOf } from './sheet-answer';
import { requireTeam } from './team-access';

export function listSheets(ctx: Context, teamId: string, askerId: string): Sheet[] {
  requireTeam(ctx.db, teamId, askerId, 'open-sheet');
  return sheetsOf(ctx.db, teamId).map(sheetAnswerOf);
}
