import { describe, expect, onTestFinished, test, vi } from 'vitest';
import { type ChangeEvent, changeEvent } from '#shared/api/events';
import { setTemperature } from '#shared/doc/commands';
import { LiveSheet } from './support/live-sheet';
import { startTestServer, TestClock } from './support/start-test-server';
import { assembleTeam, type Visitor } from './support/visitor';

const clock = new TestClock();
const server = await startTestServer({ now: clock.now });
const { teamId, owner, designer, viewer, outsider } = await assembleTeam(server);

interface Stream {
  readonly events: ChangeEvent[];
  ended: boolean;
}

/** Listens as an open page does. */
async function listen(visitor: Visitor): Promise<Stream> {
  const abort = new AbortController();
  onTestFinished(() => abort.abort());
  const response = await fetch(`http://127.0.0.1:${server.port}/api/events`, {
    headers: { cookie: visitor.cookie ?? '' },
    signal: abort.signal,
  });
  expect(response.headers.get('content-type')).toContain('text/event-stream');
  const stream: Stream = { events: [], ended: false };
  const read = async () => {
    let text = '';
    for await (const chunk of response.body ?? []) {
      text += Buffer.from(chunk).toString();
      for (let end = text.indexOf('\n\n'); end >= 0; end = text.indexOf('\n\n')) {
        const data = /^data: (.*)$/m.exec(text.slice(0, end))?.[1];
        if (data !== undefined) stream.events.push(changeEvent.parse(JSON.parse(data)));
        text = text.slice(end + 2);
      }
    }
    stream.ended = true;
  };
  read().catch(() => {
    stream.ended = true;
  });
  return stream;
}

describe('the stream of events', () => {
  test('tells everyone in the team what changed, by ids, and nobody else', async () => {
    const [watching, elsewhere] = [await listen(viewer), await listen(outsider)];
    const sheetId = await owner.createSheet(teamId);
    await owner.patch(`/api/sheets/${sheetId}`, { name: 'Renamed' });
    await owner.patch(`/api/teams/${teamId}/members/${designer.personId}`, { role: 'reviewer' });
    const sheet = { kind: 'sheet', teamId, sheetId };
    const member = { kind: 'member', teamId, personId: designer.personId };
    await vi.waitFor(() => expect(watching.events).toEqual([sheet, sheet, member]));
    expect(elsewhere.events).toEqual([]);
  });

  test('tells that somebody came to a sheet, changed it and left, for the list to say so', async () => {
    const sheetId = await owner.createSheet(teamId);
    const stream = await listen(viewer);
    const list = { kind: 'sheets', teamId };
    const live = await new LiveSheet(server, owner, sheetId).synced();
    await vi.waitFor(() => expect(stream.events).toEqual([list]));
    setTemperature(live.doc, 60);
    await vi.waitFor(() => expect(stream.events).toEqual([list, list]), { timeout: 5000 });
    live.leave();
    await vi.waitFor(() => expect(stream.events).toEqual([list, list, list]));
  });

  test('tells somebody that they were removed', async () => {
    const stream = await listen(designer);
    await owner.delete(`/api/teams/${teamId}/members/${designer.personId}`);
    await vi.waitFor(() => {
      expect(stream.events).toEqual([{ kind: 'member', teamId, personId: designer.personId }]);
    });
  });

  test('ends with its session', async () => {
    const stream = await listen(outsider);
    await outsider.post('/api/sign-out');
    await vi.waitFor(() => expect(stream.ended).toBe(true));
  });

  test('ends with a session whose time is over, and tells it nothing more', async () => {
    const [away, here] = [await listen(viewer), await listen(owner)];
    const day = 24 * 3_600_000;
    for (let days = 0; days < 4; days += 1) {
      clock.pass(day);
      await owner.get('/api/me');
    }
    const sheetId = await owner.createSheet(teamId);
    await vi.waitFor(() => expect(here.events).toContainEqual({ kind: 'sheet', teamId, sheetId }));
    await vi.waitFor(() => expect(away.ended).toBe(true));
    expect(away.events).toEqual([]);
  });
});
