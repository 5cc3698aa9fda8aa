import { useState } from 'react';
import { can, ROLES, type Role } from '#shared/access/roles';
import type { OwnTeam } from '#shared/api/accounts';
import type { Member } from '#shared/api/members';
import { useChangeRole, useMembers } from '../../api/members';
import { useSession } from '../../api/session';
import { initialsOf } from '../../formats/initials';
import { Button } from '../../ui/button';
import { Initials } from '../../ui/initials';
import { Failure } from '../../ui/notice';
import { Select } from '../../ui/select';
import { useStatus } from '../../ui/status';
import { Cell, HeadCell, Table } from '../../ui/table';
import { Waiting } from '../../ui/waiting';
import { When } from '../../ui/when';
import { RemoveDialog } from './remove-dialog';

/** Who is in the team, and as what. Owners change that here; anybody may leave. */
export function MemberTable({ team }: { readonly team: OwnTeam }) {
  const { person } = useSession();
  const members = useMembers(team.id);
  const changeRole = useChangeRole(team.id);
  const { say, warn } = useStatus();
  const [removing, setRemoving] = useState<Member | null>(null);
  if (members.isPending) return <Waiting>Fetching the members</Waiting>;
  const failure = members.isError && (
    <Failure onRetry={() => members.refetch()}>The members could not be fetched. {members.error.message}</Failure>
  );
  if (!members.data) return failure;

  const manages = can(team.role, 'manage-members');
  const setRole = (member: Member, role: Role) =>
    changeRole.mutate(
      { personId: member.id, role },
      {
        onSuccess: () => say(`${member.name} is now ${role === 'owner' ? 'an' : 'a'} ${role}.`),
        onError: (error) => warn(`${member.name} is still ${member.role}. ${error.message}`),
      },
    );
  return (
    <>
      {failure}
      <Table label="Members">
        <thead>
          <tr>
            <HeadCell className="w-full sm:w-3/5">name</HeadCell>
            <HeadCell>role</HeadCell>
            <HeadCell className="hidden md:table-cell">joined</HeadCell>
            <HeadCell>
              <span className="sr-only">actions</span>
            </HeadCell>
          </tr>
        </thead>
        <tbody>
          {members.data.map((member) => {
            const own = member.id === person.id;
            // What was chosen is shown while it is on its way; what was refused springs back.
            const chosen = changeRole.isPending && changeRole.variables.personId === member.id;
            return (
              <tr key={member.id}>
                <Cell className="max-w-0">
                  <div className="flex items-center gap-3">
                    <span className="hidden sm:block">
                      <Initials text={initialsOf(member.name)} own={own} />
                    </span>
                    <div className="min-w-0 wrap-anywhere">
                      <p className="font-bold">
                        {member.name}
                        {own && <span className="font-normal text-faint"> (you)</span>}
                      </p>
                      <p className="text-xs text-faint">{member.email}</p>
                    </div>
                  </div>
                </Cell>
                <Cell className="whitespace-nowrap">
                  {manages ? (
                    <Select
                      aria-label={`Role of ${member.name}`}
                      className="h-8 w-32"
                      value={chosen ? changeRole.variables.role : member.role}
                      onChange={(event) => {
                        const role = ROLES.find((one) => one === event.target.value);
                        if (role !== undefined) setRole(member, role);
                      }}
                    >
                      {ROLES.map((role) => (
                        <option key={role}>{role}</option>
                      ))}
                    </Select>
                  ) : (
                    member.role
                  )}
                </Cell>
                <Cell className="hidden text-faint md:table-cell">
                  <When at={member.joinedAt} />
                </Cell>
                <Cell className="text-right">
                  {(own || manages) && (
                    <Button
                      look="quiet"
                      className="text-xs"
                      aria-label={own ? `Leave ${team.name}` : `Remove ${member.name}`}
                      onClick={() => setRemoving(member)}
                    >
                      {own ? 'Leave' : 'Remove'}
                    </Button>
                  )}
                </Cell>
              </tr>
            );
          })}
        </tbody>
      </Table>
      {removing !== null && <RemoveDialog team={team} member={removing} onClose={() => setRemoving(null)} />}
    </>
  );
}
