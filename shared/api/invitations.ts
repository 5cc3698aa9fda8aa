import { z } from 'zod';
import { ownTeamShape } from './accounts';
import { emailField, idField, roleField, timeField, tokenField } from './fields';

/** `POST /api/teams/:id/invitations`; with an address only that address can take it. */
export const createInvitationBody = z.strictObject({ email: emailField.optional(), role: roleField });
export type CreateInvitationBody = z.infer<typeof createInvitationBody>;

/** `POST /api/invitations/accept` and `POST /api/invitations/look-up`. */
export const invitationTokenBody = z.strictObject({ token: tokenField });
export type InvitationTokenBody = z.infer<typeof invitationTokenBody>;

/** An invitation nobody has taken yet, as owners see it. */
export const invitationShape = z.object({
  id: idField,
  email: z.string().nullable(),
  role: roleField,
  invitedBy: z.string(),
  createdAt: timeField,
  expiresAt: timeField,
});
export type Invitation = z.infer<typeof invitationShape>;

/** The 201 of making one. The link is shown this once: only its hash is kept. */
export const invitationAnswer = z.object({ invitation: invitationShape, link: z.string() });
/** `GET /api/teams/:id/invitations`: those that can still be taken, newest first. */
export const invitationsAnswer = z.object({ invitations: z.array(invitationShape) });

/** `POST /api/invitations/look-up`, which needs no session: what the holder of the link is being asked. */
export const invitationLookUpAnswer = z.object({
  invitation: z.object({
    team: z.string(),
    role: roleField,
    invitedBy: z.string(),
    email: z.string().nullable(),
    expiresAt: timeField,
  }),
});
export type InvitationLookUp = z.infer<typeof invitationLookUpAnswer>['invitation'];

/** `POST /api/invitations/accept`. */
export const acceptedAnswer = z.object({ team: ownTeamShape });
