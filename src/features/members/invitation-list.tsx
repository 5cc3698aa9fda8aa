import type { Invitation } from '#shared/api/invitations';
import { useInvitations, useRevokeInvitation } from '../../api/invitations';
import { Button } from '../../ui/button';
import { Failure } from '../../ui/notice';
import { useStatus } from '../../ui/status';
import { Waiting } from '../../ui/waiting';
import { When } from '../../ui/when';

/** The links that nobody has taken yet. */
export function InvitationList({ teamId }: { readonly teamId: string }) {
  const invitations = useInvitations(teamId);
  const revoke = useRevokeInvitation(teamId);
  const { say, warn } = useStatus();
  const takeBack = (invitation: Invitation) =>
    revoke.mutate(invitation.id, {
      onSuccess: () => say('The link no longer works.'),
      onError: (error) => warn(`The link still works. ${error.message}`),
    });
  return (
    <section>
      <h2 className="text-xs text-faint">Open links</h2>
      {invitations.isPending && <Waiting>Fetching the links</Waiting>}
      {invitations.isError && (
        <div className="mt-2">
          <Failure onRetry={() => invitations.refetch()}>
            The links could not be fetched. {invitations.error.message}
          </Failure>
        </div>
      )}
      {invitations.data?.length === 0 && <p className="mt-2">None.</p>}
      {invitations.data && invitations.data.length > 0 && (
        <ul className="mt-2 border-b border-rule">
          {invitations.data.map((invitation) => (
            <li key={invitation.id} className="flex items-start justify-between gap-3 border-t border-rule py-2">
              <div className="min-w-0">
                <p>{invitation.role}</p>
                <p className="truncate text-xs text-faint">{invitation.email ?? 'whoever has the link'}</p>
                <p className="text-xs text-faint">
                  by {invitation.invitedBy}, good until <When at={invitation.expiresAt} />
                </p>
              </div>
              <Button
                look="quiet"
                className="-my-1.5 text-xs whitespace-nowrap"
                aria-label={`Take back the link for ${invitation.email ?? `one ${invitation.role}`}`}
                busy={revoke.isPending && revoke.variables === invitation.id}
                onClick={() => takeBack(invitation)}
              >
                Take back
              </Button>
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}
