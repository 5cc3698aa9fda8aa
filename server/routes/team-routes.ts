import { createInvitationBody, invitationTokenBody } from '#shared/api/invitations';
import { changeRoleBody } from '#shared/api/members';
import { createTeamBody } from '#shared/api/teams';
import { parseBody } from '../http/parse';
import type { Route } from '../http/route';
import { acceptInvitation } from '../services/accept-invitation';
import { changeRole } from '../services/change-role';
import type { Context } from '../services/context';
import { createTeam } from '../services/create-team';
import { invite } from '../services/invite';
import { listInvitations } from '../services/list-invitations';
import { listMembers } from '../services/list-members';
import { listTeams } from '../services/list-teams';
import { lookUpInvitation } from '../services/look-up-invitation';
import { removeMember } from '../services/remove-member';
import { revokeInvitation } from '../services/revoke-invitation';

export function teamRoutes(ctx: Context): Route[] {
  return [
    {
      method: 'get',
      path: '/api/teams',
      access: 'signed-in',
      handle: ({ signedIn: { person } }) => ({ status: 200, body: { teams: listTeams(ctx, person.id) } }),
    },
    {
      method: 'post',
      path: '/api/teams',
      access: 'signed-in',
      perMinute: 60,
      handle: ({ body, signedIn: { person } }) => {
        const { name } = parseBody(createTeamBody, body);
        return { status: 201, body: { team: createTeam(ctx, name, person.id) } };
      },
    },
    {
      method: 'get',
      path: '/api/teams/:teamId/members',
      access: 'signed-in',
      handle: ({ param, signedIn: { person } }) => ({
        status: 200,
        body: { members: listMembers(ctx, param('teamId'), person.id) },
      }),
    },
    {
      method: 'patch',
      path: '/api/teams/:teamId/members/:personId',
      access: 'signed-in',
      handle: ({ param, body, signedIn: { person } }) => {
        const { role } = parseBody(changeRoleBody, body);
        const change = { teamId: param('teamId'), personId: param('personId'), role };
        return { status: 200, body: { member: changeRole(ctx, change, person.id) } };
      },
    },
    {
      method: 'delete',
      path: '/api/teams/:teamId/members/:personId',
      access: 'signed-in',
      handle: ({ param, signedIn: { person } }) => {
        removeMember(ctx, { teamId: param('teamId'), personId: param('personId') }, person.id);
        return { status: 204 };
      },
    },
    {
      method: 'get',
      path: '/api/teams/:teamId/invitations',
      access: 'signed-in',
      handle: ({ param, signedIn: { person } }) => ({
        status: 200,
        body: { invitations: listInvitations(ctx, param('teamId'), person.id) },
      }),
    },
    {
      method: 'post',
      path: '/api/teams/:teamId/invitations',
      access: 'signed-in',
      perMinute: 120,
      handle: ({ param, body, signedIn: { person } }) => ({
        status: 201,
        body: invite(ctx, param('teamId'), parseBody(createInvitationBody, body), person),
      }),
    },
    {
      method: 'delete',
      path: '/api/invitations/:invitationId',
      access: 'signed-in',
      handle: ({ param, signedIn: { person } }) => {
        revokeInvitation(ctx, param('invitationId'), person.id);
        return { status: 204 };
      },
    },
    {
      // A POST, so that the token is in no log of addresses.
      method: 'post',
      path: '/api/invitations/look-up',
      access: 'public',
      perMinute: 120,
      handle: ({ body }) => {
        const { token } = parseBody(invitationTokenBody, body);
        return { status: 200, body: { invitation: lookUpInvitation(ctx, token) } };
      },
    },
    {
      method: 'post',
      path: '/api/invitations/accept',
      access: 'signed-in',
      perMinute: 60,
      handle: ({ body, signedIn: { person } }) => {
        const { token } = parseBody(invitationTokenBody, body);
        return { status: 200, body: { team: acceptInvitation(ctx, token, person) } };
      },
    },
  ];
}
