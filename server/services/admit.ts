import { can } from '#shared/access/roles';
import { sessionLives } from '../auth/session-limits';
import type { Db } from '../db/connect';
import { findSession } from '../db/queries/sessions';
import { findSheet } from '../db/queries/sheets';
import { findOwnTeam } from '../db/queries/teams';
import type { Admit } from '../sync/rooms';
import { CLOSE } from '../sync/socket-codes';

/** Asks the database afresh each time: what was true when a sheet was opened may be over. */
export function createAdmit(db: Db, now: () => number): Admit {
  return ({ personId, sessionId }, sheetId) => {
    if (!isLive(db, sessionId, now())) return { admitted: false, code: CLOSE.notSignedIn, reason: 'not signed in' };
    const sheet = findSheet(db, sheetId);
    if (!sheet) return { admitted: false, code: CLOSE.noSuchSheet, reason: 'no such sheet' };
    const team = findOwnTeam(db, sheet.teamId, personId);
    if (!team || !can(team.role, 'open-sheet')) {
      return { admitted: false, code: CLOSE.notAllowed, reason: 'not in this team' };
    }
    return { admitted: true, role: team.role, archived: sheet.archived };
  };
}

export function isLive(db: Db, sessionId: string, now: number): boolean {
  const session = findSession(db, sessionId);
  return session !== undefined && sessionLives(session, now);
}
