import type { Person } from '#shared/api/accounts';
import type { CreateInvitationBody, Invitation } from '#shared/api/invitations';
import { hashToken, newId, newToken } from '../auth/tokens';
import { insertInvitation } from '../db/queries/invitations';
import type { Context } from './context';
import { invitationAnswerOf } from './invitation-answer';
import { requireTeam } from './team-access';

const GOOD_FOR = 7 * 24 * 3_600_000;

/** Makes an invitation and the link that takes it. The link cannot be had again: only a hash of its token is kept. */
export function invite(
  ctx: Context,
  teamId: string,
  { email, role }: CreateInvitationBody,
  asker: Person,
): { invitation: Invitation; link: string } {
  const team = requireTeam(ctx.db, teamId, asker.id, 'manage-members');
  const token = newToken();
  const createdAt = ctx.now();
  const row = { id: newId(), teamId, email: email ?? null, role, createdAt, expiresAt: createdAt + GOOD_FOR };
  insertInvitation(ctx.db, { ...row, tokenHash: hashToken(token), invitedBy: asker.id });
  return {
    invitation: invitationAnswerOf({ ...row, team: team.name, invitedBy: asker.name }),
    link: `${ctx.publicUrl()}/invite/${token}`,
  };
}
