import { describe, expect, test, vi } from 'vitest';
import { contentOf, LiveSheet } from '../support/live-sheet';
import { startTestServer, TestClock } from '../support/start-test-server';
import { assembleTeam, Visitor } from '../support/visitor';

const clock = new TestClock();
const server = await startTestServer({ now: clock.now });
const { teamId, owner, designer, reviewer, viewer, outsider } = await assembleTeam(server);
const sheetId = await owner.createSheet(teamId, { starter: 'mirror' });
const member = (visitor: Visitor) => `/api/teams/${teamId}/members/${visitor.personId}`;

/** The code with which the socket was closed for good; the client has given up by then. */
async function finalCode(live: LiveSheet): Promise<number | undefined> {
  await vi.waitFor(() => expect(live.provider.shouldConnect).toBe(false), { timeout: 5000 });
  return live.closes.at(-1);
}

describe('opening a sheet', () => {
  test.each([
    ['without a session', new Visitor(server), sheetId, 4401],
    ['of a team one is not in', outsider, sheetId, 4404],
    ['that does not exist', owner, 'none', 4404],
    ['whose id is none', owner, `${'x'.repeat(65)}`, 4404],
  ])('%s is refused for good', async (_what, visitor, id, code) => {
    expect(await finalCode(new LiveSheet(server, visitor, id))).toBe(code);
  });

  test.each(['https://elsewhere.example', `http://localhost:${server.port + 1}`, 'null'])(
    'from a page of %s is refused, cookie or not',
    async (origin) => {
      expect(await finalCode(new LiveSheet(server, owner, sheetId, origin))).toBe(4403);
    },
  );

  test('with a session that has ended is refused', async () => {
    const visitor = new Visitor(server);
    await visitor.signIn('Tove Bakken');
    const copy = new Visitor(server);
    copy.cookie = visitor.cookie;
    await visitor.post('/api/sign-out');
    expect(await finalCode(new LiveSheet(server, copy, sheetId))).toBe(4401);
  });

  test('elsewhere than at /sync is answered by nobody', async () => {
    const elsewhere = new LiveSheet({ url: server.url, port: server.port }, owner, '../elsewhere');
    await vi.waitFor(() => expect(elsewhere.closes).toContain(1006));
    expect(elsewhere.provider.synced).toBe(false);
  });
});

describe('who may only look', () => {
  test.each([
    ['viewer', viewer],
    ['reviewer', reviewer],
  ])('as %s gets the sheet live; what they change reaches nobody, and they are told', async (role, visitor) => {
    const ines = await new LiveSheet(server, owner, sheetId).synced();
    const watching = await new LiveSheet(server, visitor, sheetId).synced();
    expect(contentOf(watching.doc)).toEqual(contentOf(ines.doc));
    expect(watching.refusals, 'nothing was changed yet').toEqual([]);

    watching.notes.set('mark', role);
    await vi.waitFor(() => expect(watching.refusals[0]).toMatch(/^not-allowed/));
    ines.notes.set('seen by', role);
    await vi.waitFor(() => expect(watching.notes.get('seen by')).toBe(role));
    expect(ines.notes.has('mark')).toBe(false);

    // What they changed while cut off is not taken on the way back either.
    watching.provider.disconnect();
    watching.refusals.length = 0;
    watching.provider.connect();
    await vi.waitFor(() => expect(watching.refusals[0]).toMatch(/^not-allowed/), { timeout: 5000 });
    expect(ines.notes.has('mark')).toBe(false);
    watching.leave();
    ines.leave();
    const fresh = await new LiveSheet(server, owner, sheetId).synced();
    expect(fresh.notes.has('mark')).toBe(false);
  });

  test('are told too of a deletion that lies between two others', async () => {
    const ines = await new LiveSheet(server, owner, sheetId).synced();
    for (const name of ['left', 'middle', 'right']) ines.notes.set(name, 1);
    ines.notes.delete('left');
    ines.notes.delete('right');
    const watching = await new LiveSheet(server, viewer, sheetId).synced();
    expect(watching.notes.get('middle')).toBe(1);
    watching.notes.delete('middle');
    watching.provider.disconnect();
    watching.refusals.length = 0;
    watching.provider.connect();
    await vi.waitFor(() => expect(watching.refusals[0]).toMatch(/^not-allowed/), { timeout: 5000 });
    expect(ines.notes.get('middle')).toBe(1);
  });

  test('are not told off when they come back with nothing of their own', async () => {
    const ines = await new LiveSheet(server, owner, sheetId).synced();
    const watching = await new LiveSheet(server, viewer, sheetId).synced();
    ines.notes.set('passing', 1);
    ines.notes.delete('passing');
    ines.notes.set('last', 'word');
    await vi.waitFor(() => expect(watching.notes.get('last')).toBe('word'));
    watching.provider.disconnect();
    watching.provider.connect();
    await watching.synced();
    ines.notes.set('last', 'of all');
    await vi.waitFor(() => expect(watching.notes.get('last')).toBe('of all'));
    expect(watching.refusals).toEqual([]);
  });
});

describe('an archived sheet', () => {
  test('is shown live and changed by nobody, owners included, until it is brought back', async () => {
    const id = await owner.createSheet(teamId, { starter: 'mirror' });
    const ines = await new LiveSheet(server, owner, id).synced();
    const samir = await new LiveSheet(server, designer, id).synced();
    await owner.patch(`/api/sheets/${id}`, { archived: true });
    samir.notes.set('too late', true);
    await vi.waitFor(() => expect(samir.refusals[0]).toMatch(/^archived/), { timeout: 1000 });

    const late = await new LiveSheet(server, owner, id).synced();
    late.notes.set('later still', true);
    await vi.waitFor(() => expect(late.refusals[0]).toMatch(/^archived/), { timeout: 1000 });
    expect(ines.notes.toJSON()).not.toHaveProperty('too late');

    await owner.patch(`/api/sheets/${id}`, { archived: false });
    ines.notes.set('in time', true);
    const fresh = await new LiveSheet(server, designer, id).synced();
    await vi.waitFor(() => expect(fresh.notes.get('in time')).toBe(true));
    expect(fresh.notes.has('too late') || fresh.notes.has('later still')).toBe(false);
    expect([...ines.closes, ...samir.closes, ...late.closes]).toEqual([]);
  });
});

describe('what changes while a sheet is open', () => {
  test('a designer made a viewer can look on, but not draw, within a second', async () => {
    const ines = await new LiveSheet(server, owner, sheetId).synced();
    const samir = await new LiveSheet(server, designer, sheetId).synced();
    await owner.patch(member(designer), { role: 'viewer' });
    samir.notes.set('too late', true);
    await vi.waitFor(() => expect(samir.refusals[0]).toMatch(/^not-allowed: as viewer/), { timeout: 1000 });
    expect([samir.closes, ines.notes.has('too late')]).toEqual([[], false]);
    await owner.patch(member(designer), { role: 'designer' });
    samir.notes.set('in time', true);
    await vi.waitFor(() => expect(ines.notes.get('in time')).toBe(true), { timeout: 1000 });
  });

  test('somebody removed from the team is cut off within a second', async () => {
    const visitor = await new Visitor(server).signUp('Short Stay', await owner.invite(teamId, 'designer'));
    const live = await new LiveSheet(server, visitor, sheetId).synced();
    await owner.delete(member(visitor));
    await vi.waitFor(() => expect(live.closes).toEqual([4403]), { timeout: 1000 });
  });

  test('signing out cuts off that browser and no other', async () => {
    const here = new Visitor(server);
    const there = new Visitor(server);
    await here.signIn('Samir Kade');
    await there.signIn('Samir Kade');
    const liveHere = await new LiveSheet(server, here, sheetId).synced();
    const liveThere = await new LiveSheet(server, there, sheetId).synced();
    await here.post('/api/sign-out');
    await vi.waitFor(() => expect(liveHere.closes).toEqual([4401]), { timeout: 1000 });
    expect(liveThere.closes).toEqual([]);
  });

  test('a sheet that is deleted is closed for everyone', async () => {
    const doomed = await owner.createSheet(teamId);
    const live = await new LiveSheet(server, designer, doomed).synced();
    await owner.delete(`/api/sheets/${doomed}`);
    expect(await finalCode(live)).toBe(4404);
  });
});
