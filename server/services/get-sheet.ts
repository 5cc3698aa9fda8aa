import type { SheetAnswer } from '#shared/api/sheets';
import type { Context } from './context';
import { sheetAnswerOf } from './sheet-answer';
import { requireSheet } from './team-access';

export function getSheet(ctx: Context, sheetId: string, askerId: string): SheetAnswer {
  const { sheet, team } = requireSheet(ctx.db, sheetId, askerId, 'open-sheet');
  return { sheet: sheetAnswerOf(sheet), team };
}
