import { type Action, can } from '#shared/access/roles';
import type { OwnTeam } from '#shared/api/accounts';
import { Refusal } from '#shared/api/refusal';
import type { Db } from '../db/connect';
import { findSheet, type SheetRow } from '../db/queries/sheets';
import { findOwnTeam } from '../db/queries/teams';

/** The team, if this person may do this in it; a team they are not in is as absent as one that does not exist. */
export function requireTeam(db: Db, teamId: string, personId: string, action: Action): OwnTeam {
  const team = findOwnTeam(db, teamId, personId);
  if (!team) throw new Refusal('not-found', 'There is no such team, or you are not in it.');
  requireRole(team, action);
  return team;
}

/** The sheet and its team, if this person may do this there. */
export function requireSheet(
  db: Db,
  sheetId: string,
  personId: string,
  action: Action,
): { sheet: SheetRow; team: OwnTeam } {
  const sheet = findSheet(db, sheetId);
  const team = sheet && findOwnTeam(db, sheet.teamId, personId);
  if (!team) throw new Refusal('not-found', 'There is no such sheet, or it is another team’s.');
  requireRole(team, action);
  return { sheet, team };
}

export function requireRole(team: OwnTeam, action: Action): void {
  if (!can(team.role, action)) throw new Refusal('not-allowed', `As ${team.role} you may not do this in ${team.name}.`);
}
