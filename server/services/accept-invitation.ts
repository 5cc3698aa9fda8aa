import type { OwnTeam, Person } from '#shared/api/accounts';
import { Refusal } from '#shared/api/refusal';
import type { Db } from '../db/connect';
import { markTaken } from '../db/queries/invitations';
import { findOwnTeam, insertMembership } from '../db/queries/teams';
import type { Context } from './context';
import { requireInvitation } from './look-up-invitation';
import { tellTeam } from './tell-team';

/** Brings a signed-in person into the team that the link is for. */
export function acceptInvitation(ctx: Context, token: string, person: Person): OwnTeam {
  const team = ctx.db.transaction((tx) => joinByInvitation(tx, token, person, ctx.now()));
  tellTeam(ctx, team.id, { kind: 'member', teamId: team.id, personId: person.id });
  return team;
}

/** Takes the invitation for this person. To be run in a transaction: an invitation is taken once. */
export function joinByInvitation(db: Db, token: string, person: Person, now: number): OwnTeam {
  const { id, teamId, team, role, email } = requireInvitation(db, token, now);
  if (email !== null && email !== person.email) {
    throw new Refusal('invitation-for-another', 'This invitation is for another address.');
  }
  if (findOwnTeam(db, teamId, person.id)) throw new Refusal('already-member', `You are in ${team} already.`);
  insertMembership(db, { teamId, personId: person.id, role, joinedAt: now });
  markTaken(db, id, person.id, now);
  return { id: teamId, name: team, role };
}
