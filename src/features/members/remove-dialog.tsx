import type { OwnTeam } from '#shared/api/accounts';
import type { Member } from '#shared/api/members';
import { useRemoveMember } from '../../api/members';
import { useSession } from '../../api/session';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Failure } from '../../ui/notice';
import { useStatus } from '../../ui/status';

interface RemoveDialogProps {
  readonly team: OwnTeam;
  readonly member: Member;
  readonly onClose: () => void;
}

/** Asks before somebody is taken out of the team, or leaves it: only a new invitation brings them back. */
export function RemoveDialog({ team, member, onClose }: RemoveDialogProps) {
  const { person } = useSession();
  const { say } = useStatus();
  const remove = useRemoveMember(team.id);
  const own = member.id === person.id;
  const confirm = () =>
    remove.mutate(member.id, {
      onSuccess: () => {
        say(own ? `You left ${team.name}.` : `${member.name} is no longer in ${team.name}.`);
        onClose();
      },
    });
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={own ? 'Leave the team?' : 'Remove from the team?'}
      description={
        own
          ? `You will no longer open the sheets of ${team.name}. To come back you need a new invitation.`
          : `${member.name} will no longer open the sheets of ${team.name}, also those open now. What they did stays, with their name. To bring them back, invite them again.`
      }
    >
      {remove.isError && (
        <div className="mb-4">
          <Failure>{remove.error.message}</Failure>
        </div>
      )}
      <div className="flex flex-wrap justify-end gap-3">
        <Button onClick={onClose}>Cancel</Button>
        <Button look="danger" busy={remove.isPending} onClick={confirm}>
          {own ? 'Leave' : `Remove ${member.name}`}
        </Button>
      </div>
    </Dialog>
  );
}
