import { can } from '#shared/access/roles';
import { InvitationList } from '../features/members/invitation-list';
import { InviteForm } from '../features/members/invite-form';
import { MemberTable } from '../features/members/member-table';
import { RoleNotes } from '../features/teams/role-notes';
import { PageTitle } from '../ui/page-title';
import { TeamFrame } from './team-frame';

/** Who is in the team; for owners, the way to bring people in. */
export function TeamPage() {
  return (
    <TeamFrame
      margin={(team) => (
        <div key={team.id} className="flex flex-col gap-10">
          {can(team.role, 'manage-members') && (
            <>
              <InviteForm teamId={team.id} />
              <InvitationList teamId={team.id} />
            </>
          )}
          <RoleNotes />
        </div>
      )}
    >
      {(team) => (
        <>
          <div className="mb-4">
            <PageTitle windowTitle={`Members of ${team.name}`}>Members</PageTitle>
          </div>
          <MemberTable key={team.id} team={team} />
        </>
      )}
    </TeamFrame>
  );
}
