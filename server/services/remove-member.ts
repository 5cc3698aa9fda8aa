import { Refusal } from '#shared/api/refusal';
import { countOwners, deleteMembership, findMember } from '../db/queries/teams';
import type { Context } from './context';
import { requireTeam } from './team-access';
import { tellTeam } from './tell-team';

/** An owner removes anybody, anybody leaves; the last owner does neither. Open sheets are cut off at once. */
export function removeMember(
  ctx: Context,
  { teamId, personId }: { teamId: string; personId: string },
  askerId: string,
): void {
  requireTeam(ctx.db, teamId, askerId, personId === askerId ? 'see-members' : 'manage-members');
  ctx.db.transaction((tx) => {
    const member = findMember(tx, teamId, personId);
    if (!member) throw new Refusal('not-found', 'This person is not in the team.');
    if (member.role === 'owner' && countOwners(tx, teamId) === 1) {
      throw new Refusal('last-owner', 'A team keeps at least one owner: make somebody else an owner first.');
    }
    deleteMembership(tx, teamId, personId);
  });
  ctx.rooms.recheck(personId);
  tellTeam(ctx, teamId, { kind: 'member', teamId, personId }, [personId]);
}
