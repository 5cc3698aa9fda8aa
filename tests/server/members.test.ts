import { describe, expect, test } from 'vitest';
import { membersAnswer } from '#shared/api/members';
import { startTestServer } from './support/start-test-server';
import { assembleTeam, codeOf } from './support/visitor';

const server = await startTestServer();
const { teamId, owner, designer, reviewer, viewer, outsider } = await assembleTeam(server);
const member = (id: string) => `/api/teams/${teamId}/members/${id}`;

describe('a team', () => {
  test('shows its members to each of them', async () => {
    const { members } = membersAnswer.parse((await viewer.get(`/api/teams/${teamId}/members`)).body);
    expect(members.map(({ name, role }) => [name, role])).toEqual([
      ['Ines Rautio', 'owner'],
      ['Runa Leclerc', 'viewer'],
      ['Samir Kade', 'designer'],
      ['Tove Bakken', 'reviewer'],
    ]);
  });

  test('keeps its last owner', async () => {
    const demoted = await owner.patch(member(owner.personId), { role: 'designer' });
    expect([demoted.status, codeOf(demoted)]).toEqual([409, 'last-owner']);
    const left = await owner.delete(member(owner.personId));
    expect([left.status, codeOf(left)]).toEqual([409, 'last-owner']);
  });

  test('lets an owner go once there is another', async () => {
    expect((await owner.patch(member(designer.personId), { role: 'owner' })).status).toBe(200);
    expect((await owner.patch(member(owner.personId), { role: 'reviewer' })).status).toBe(200);
    expect((await owner.patch(member(reviewer.personId), { role: 'viewer' })).status).toBe(403);
    expect((await designer.patch(member(owner.personId), { role: 'owner' })).status).toBe(200);
  });

  test('lets anybody leave, who then sees nothing of it', async () => {
    expect((await viewer.delete(member(viewer.personId))).status).toBe(204);
    expect((await viewer.get(`/api/teams/${teamId}/sheets`)).status).toBe(404);
  });

  test('knows only the four roles and its own members', async () => {
    expect((await owner.patch(member(reviewer.personId), { role: 'admin' })).status).toBe(422);
    expect((await owner.patch(member(outsider.personId), { role: 'owner' })).status).toBe(404);
  });
});
