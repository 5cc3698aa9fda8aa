import type { ChangeEvent } from '#shared/api/events';
import { membersOf } from '../db/queries/teams';
import type { Context } from './context';

/** Tells everyone in the team, and whoever was in it until just now. */
export function tellTeam(
  ctx: Pick<Context, 'db' | 'events'>,
  teamId: string,
  event: ChangeEvent,
  also: readonly string[] = [],
): void {
  ctx.events.tell([...membersOf(ctx.db, teamId).map((member) => member.id), ...also], event);
}
