import type { InvitationLookUp } from '#shared/api/invitations';
import { Refusal } from '#shared/api/refusal';
import { hashToken } from '../auth/tokens';
import type { Db } from '../db/connect';
import { findOpenInvitation, type InvitationRow } from '../db/queries/invitations';
import type { Context } from './context';

/** What the holder of the link is invited to; the token is all the right they need. */
export function lookUpInvitation(ctx: Context, token: string): InvitationLookUp {
  const { team, role, invitedBy, email, expiresAt } = requireInvitation(ctx.db, token, ctx.now());
  return { team, role, invitedBy, email, expiresAt: new Date(expiresAt).toISOString() };
}

export function requireInvitation(db: Db, token: string, now: number): InvitationRow {
  const invitation = findOpenInvitation(db, hashToken(token), now);
  if (!invitation) {
    throw new Refusal('invitation-not-valid', 'This invitation was taken, taken back, or is over: ask for a new one.');
  }
  return invitation;
}
