import { describe, expect, test } from 'vitest';
import { meAnswer } from '#shared/api/accounts';
import { invitationAnswer, invitationLookUpAnswer, invitationsAnswer } from '#shared/api/invitations';
import { hashToken } from '../../server/auth/tokens';
import { invitations } from '../../server/db/schema';
import { startTestServer, TestClock } from './support/start-test-server';
import { codeOf, PASSWORD, Visitor } from './support/visitor';

const clock = new TestClock();
const server = await startTestServer({ now: clock.now });
const owner = await new Visitor(server).signUp('Ines Rautio');
const teamId = await owner.teamId();

describe('an invitation', () => {
  test('tells its holder what it is for before they have an account', async () => {
    const token = await owner.invite(teamId, 'designer');
    const answer = await new Visitor(server).post('/api/invitations/look-up', { token });
    expect(invitationLookUpAnswer.parse(answer.body).invitation).toMatchObject({
      team: 'Ines Rautio’s team',
      role: 'designer',
      invitedBy: 'Ines Rautio',
      email: null,
    });
  });

  test('brings a new account into the team, in its role and in no team of its own', async () => {
    const visitor = await new Visitor(server).signUp('Samir Kade', await owner.invite(teamId, 'designer'));
    const { teams } = meAnswer.parse((await visitor.get('/api/me')).body);
    expect(teams).toEqual([{ id: teamId, name: 'Ines Rautio’s team', role: 'designer' }]);
  });

  test('brings an account that exists into the team, once', async () => {
    const token = await owner.invite(teamId, 'reviewer');
    const visitor = await new Visitor(server).signUp('Tove Bakken');
    const joined = await visitor.post('/api/invitations/accept', { token });
    expect([joined.status, joined.body]).toEqual([
      200,
      { team: { id: teamId, name: 'Ines Rautio’s team', role: 'reviewer' } },
    ]);
    const late = await new Visitor(server).signUp('Late Comer');
    const again = await late.post('/api/invitations/accept', { token });
    expect([again.status, codeOf(again)]).toEqual([404, 'invitation-not-valid']);
    expect((await late.post('/api/invitations/look-up', { token })).status).toBe(404);
  });

  test('is taken by one of two who try at once', async () => {
    const token = await owner.invite(teamId, 'viewer');
    const visitors = await Promise.all(['First One', 'Second One'].map((name) => new Visitor(server).signUp(name)));
    const replies = await Promise.all(visitors.map((visitor) => visitor.post('/api/invitations/accept', { token })));
    expect(replies.map(({ status }) => status).sort()).toEqual([200, 404]);
  });

  test('is not used up by somebody who is in the team already', async () => {
    const token = await owner.invite(teamId, 'viewer');
    const reply = await owner.post('/api/invitations/accept', { token });
    expect([reply.status, codeOf(reply)]).toEqual([409, 'already-member']);
    expect((await owner.post('/api/invitations/look-up', { token })).status).toBe(200);
  });

  test('for an address is taken by that address only, whatever its case', async () => {
    const token = await owner.invite(teamId, 'viewer', 'Runa.Leclerc@Buoy.example');
    const other = await new Visitor(server).post('/api/sign-up', {
      name: 'Somebody Else',
      email: 'else@buoy.example',
      password: PASSWORD,
      invitation: token,
    });
    expect([other.status, codeOf(other)]).toEqual([403, 'invitation-for-another']);
    const signIn = await new Visitor(server).post('/api/sign-in', { email: 'else@buoy.example', password: PASSWORD });
    expect(signIn.status, 'no account is left over').toBe(401);
    await new Visitor(server).signUp('Runa Leclerc', token);
  });

  test('is over after seven days', async () => {
    const token = await owner.invite(teamId, 'viewer');
    clock.pass(7 * 24 * 3_600_000 - 1000);
    await owner.signIn('Ines Rautio');
    expect((await owner.post('/api/invitations/look-up', { token })).status).toBe(200);
    clock.pass(2000);
    expect((await owner.post('/api/invitations/look-up', { token })).status).toBe(404);
  });

  test('can be seen and taken back by owners, without its secret', async () => {
    const reply = await owner.post(`/api/teams/${teamId}/invitations`, { role: 'viewer' });
    const { invitation, link } = invitationAnswer.parse(reply.body);
    const token = link.split('/').at(-1) ?? '';
    expect(link).toBe(`${server.url}/invite/${token}`);
    const listed = await owner.get(`/api/teams/${teamId}/invitations`);
    expect(invitationsAnswer.parse(listed.body).invitations).toContainEqual(invitation);
    expect(JSON.stringify(listed.body)).not.toContain(token);
    expect((await owner.delete(`/api/invitations/${invitation.id}`)).status).toBe(204);
    expect((await owner.post('/api/invitations/look-up', { token })).status).toBe(404);
  });

  test('is kept as a hash only', async () => {
    const token = await owner.invite(teamId, 'viewer');
    const hashes = server.context.db.select({ hash: invitations.tokenHash }).from(invitations).all();
    expect(hashes).toContainEqual({ hash: hashToken(token) });
    expect(JSON.stringify(hashes)).not.toContain(token);
  });
});
