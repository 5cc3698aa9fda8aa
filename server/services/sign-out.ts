import type { SignedIn } from '../auth/sessions';
import { deleteSession } from '../db/queries/sessions';
import type { Context } from './context';

/** Ends the session on the server, with its sockets and streams. */
export function endSession(ctx: Context, { sessionId, person }: SignedIn): void {
  deleteSession(ctx.db, sessionId, person.id);
  ctx.rooms.recheck(person.id);
  ctx.events.recheck(person.id);
}
