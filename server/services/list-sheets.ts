import { setTimeout as wait } from 'node:timers/promises';
import type { ListedSheet } from '#shared/api/sheets';
import { sheetsOf } from '../db/queries/sheets';
import type { Context } from './context';
import { sheetAnswerOf } from './sheet-answer';
import { requireTeam } from './team-access';

/** How long a list waits for sheets that changed to be solved, in milliseconds; those that take longer are told of later. */
const PATIENCE = 300;

/** The team's sheets with how each stands and who has it open. */
export async function listSheets(ctx: Context, teamId: string, askerId: string): Promise<ListedSheet[]> {
  requireTeam(ctx.db, teamId, askerId, 'open-sheet');
  const unknown = sheetsOf(ctx.db, teamId).filter(({ id }) => ctx.standings.of(id) === undefined);
  if (unknown.length > 0) await solveWithPatience(ctx, teamId, unknown);
  return sheetsOf(ctx.db, teamId).map((row) => ({
    ...sheetAnswerOf(row),
    standing: ctx.standings.of(row.id) ?? null,
    here: ctx.rooms
      .peopleIn(row.id)
      .map(({ id, name }) => ({ id, name }))
      .sort((a, b) => (a.name < b.name ? -1 : 1)),
  }));
}

async function solveWithPatience(ctx: Context, teamId: string, sheets: readonly { id: string }[]): Promise<void> {
  const solving = ctx.standings.solve(
    teamId,
    sheets.map(({ id }) => id),
  );
  const impatience = new AbortController();
  const late = await Promise.race([
    solving.then(() => false),
    wait(PATIENCE, true, { signal: impatience.signal }).catch(() => true),
  ]);
  impatience.abort();
  // Told only when something came of it, or a sheet that cannot be read would be asked for again and again.
  if (late) void solving.then((solved) => solved > 0 && ctx.listNews.ofTeam(teamId));
}
