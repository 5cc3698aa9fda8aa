import type { Role } from '#shared/access/roles';
import type { Member } from '#shared/api/members';
import { Refusal } from '#shared/api/refusal';
import { countOwners, findMember, setRole } from '../db/queries/teams';
import type { Context } from './context';
import { memberAnswerOf } from './member-answer';
import { requireTeam } from './team-access';
import { tellTeam } from './tell-team';

/** Changes what a member may do, at once on their open sheets too. The last owner stays one. */
export function changeRole(
  ctx: Context,
  change: { teamId: string; personId: string; role: Role },
  askerId: string,
): Member {
  const { teamId, personId, role } = change;
  requireTeam(ctx.db, teamId, askerId, 'manage-members');
  const member = ctx.db.transaction((tx) => {
    const before = findMember(tx, teamId, personId);
    if (!before) throw new Refusal('not-found', 'This person is not in the team.');
    if (before.role === 'owner' && role !== 'owner' && countOwners(tx, teamId) === 1) {
      throw new Refusal('last-owner', 'A team keeps at least one owner: make somebody else an owner first.');
    }
    setRole(tx, teamId, personId, role);
    return { ...before, role };
  });
  ctx.rooms.recheck(personId);
  tellTeam(ctx, teamId, { kind: 'member', teamId, personId });
  return memberAnswerOf(member);
}
