import type { Invitation } from '#shared/api/invitations';
import type { InvitationRow } from '../db/queries/invitations';

export function invitationAnswerOf(row: InvitationRow): Invitation {
  const { id, email, role, invitedBy } = row;
  return {
    id,
    email,
    role,
    invitedBy,
    createdAt: new Date(row.createdAt).toISOString(),
    expiresAt: new Date(row.expiresAt).toISOString(),
  };
}
