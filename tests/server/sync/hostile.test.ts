import * as encoding from 'lib0/encoding';
import { describe, expect, test, vi } from 'vitest';
import * as Y from 'yjs';
import { LiveSheet, rawSocket } from '../support/live-sheet';
import { startTestServer } from '../support/start-test-server';
import { assembleTeam } from '../support/visitor';

const server = await startTestServer();
const { teamId, owner, designer } = await assembleTeam(server);
const sheetId = await owner.createSheet(teamId, { starter: 'mirror' });

const UPDATE = (content: Uint8Array) =>
  encoding.encode((encoder) => {
    encoding.writeVarUint(encoder, 0);
    encoding.writeVarUint(encoder, 2);
    encoding.writeVarUint8Array(encoder, content);
  });

const PRESENCE = (clientId: number, clock: number, state: unknown) =>
  encoding.encode((encoder) => {
    encoding.writeVarUint(encoder, 1);
    encoding.writeVarUint8Array(
      encoder,
      encoding.encode((inner) => {
        encoding.writeVarUint(inner, 1);
        encoding.writeVarUint(inner, clientId);
        encoding.writeVarUint(inner, clock);
        encoding.writeVarString(inner, JSON.stringify(state));
      }),
    );
  });

/** An update that sets one key of the sheet's map. */
const SETTING = (value: unknown) => {
  const doc = new Y.Doc();
  doc.getMap('sheet').set('hostile', value);
  return UPDATE(Y.encodeStateAsUpdate(doc));
};

/** Lists in lists, so many levels of them. */
const nested = (levels: number): unknown[] => Array.from({ length: levels }).reduce<unknown[]>((inner) => [inner], []);

describe('what no client would send', () => {
  test.each<[string, Uint8Array | string, number]>([
    ['text', 'hello', 1003],
    ['no bytes at all', new Uint8Array(), 1007],
    ['a message of no kind', new Uint8Array([77, 1, 2]), 1007],
    ['a sync step that is none', new Uint8Array([0, 9, 1, 0]), 1007],
    ['a frame that ends too early', new Uint8Array([0, 2, 200, 1]), 1007],
    ['an update of noise', UPDATE(new Uint8Array([255, 254, 253, 252, 251, 7, 7, 7])), 1007],
    ['presence that is no JSON object', PRESENCE(5, 1, ['x']), 1007],
    ['a value nested too deep', SETTING(nested(1000)), 1007],
    ['a type within the sheet’s maps', SETTING(new Y.Map()), 1007],
    ['a document within the sheet’s maps', SETTING(new Y.Doc()), 1007],
    ['presence beyond every clock', PRESENCE(5, Number.MAX_SAFE_INTEGER, {}), 1007],
    ['a frame beyond 2 MiB', new Uint8Array(2 * 1_048_576 + 1), 1009],
  ])('%s ends that socket and disturbs nobody else', async (_what, frame, code) => {
    const samir = await new LiveSheet(server, designer, sheetId).synced();
    const { socket, closed } = await rawSocket(server, owner, sheetId);
    socket.send(frame);
    expect(await closed).toBe(code);
    const ines = await new LiveSheet(server, owner, sheetId).synced();
    const mark = `after ${code}`;
    ines.notes.set('mark', mark);
    await vi.waitFor(() => expect(samir.notes.get('mark')).toBe(mark));
    expect(samir.closes).toEqual([]);
  });

  test('a change that is too large is refused with a word, and the line stays', async () => {
    const ines = await new LiveSheet(server, owner, sheetId).synced();
    ines.notes.set('huge', 'x'.repeat(1_100_000));
    await vi.waitFor(() => expect(ines.refusals[0]).toMatch(/^too-large/));
    expect(ines.closes).toEqual([]);
    const fresh = await new LiveSheet(server, designer, sheetId).synced();
    expect(fresh.notes.has('huge')).toBe(false);
  });

  test('a flood ends that socket with “later”, and disturbs nobody else', async () => {
    const samir = await new LiveSheet(server, designer, sheetId).synced();
    const { socket, closed } = await rawSocket(server, owner, sheetId);
    for (let i = 0; i < 2000; i += 1) socket.send(new Uint8Array([3]));
    expect(await closed).toBe(1013);
    expect(samir.closes).toEqual([]);
  });

  test('a flood of few but long frames is one too', async () => {
    const { socket, closed } = await rawSocket(server, owner, sheetId);
    // An update that says nothing, in a frame with much behind it.
    const frame = new Uint8Array(2_000_000);
    frame.set(UPDATE(Y.encodeStateAsUpdate(new Y.Doc())));
    for (let i = 0; i < 20; i += 1) socket.send(frame);
    expect(await closed).toBe(1013);
  });

  test('a change that builds on one that is missing is asked for, not lost', async () => {
    const ines = await new LiveSheet(server, owner, sheetId).synced();
    const samir = await new LiveSheet(server, designer, sheetId).synced();
    const updates: Uint8Array[] = [];
    const away = new Y.Doc();
    Y.applyUpdate(away, Y.encodeStateAsUpdate(ines.doc));
    away.on('update', (update: Uint8Array) => updates.push(update));
    away.getMap('sheet').set('one', 1);
    away.getMap('sheet').set('two', 2);
    const { socket } = await rawSocket(server, owner, sheetId);
    const asked = new Promise<void>((resolve) => {
      socket.on('message', (data: Buffer) => {
        // Sync step 1 again, after the one on joining.
        if (data[0] === 0 && data[1] === 0 && sent) resolve();
      });
    });
    let sent = false;
    sent = true;
    socket.send(UPDATE(updates[1] ?? new Uint8Array()));
    await asked;
    socket.send(UPDATE(updates[0] ?? new Uint8Array()));
    await vi.waitFor(() => expect([samir.notes.get('one'), samir.notes.get('two')]).toEqual([1, 2]));
    away.destroy();
  });
});

describe('presence', () => {
  const userOf = (live: LiveSheet, clientId: number) => live.provider.awareness.getStates().get(clientId)?.user;

  test('carries the name of the session, whatever its sender claims', async () => {
    const ines = await new LiveSheet(server, owner, sheetId).synced();
    const samir = await new LiveSheet(server, designer, sheetId).synced();
    samir.provider.awareness.setLocalState({
      user: { id: owner.personId, name: 'Ines Rautio' },
      pointer: { x: 1, y: 2 },
    });
    await vi.waitFor(() => {
      expect(ines.provider.awareness.getStates().get(samir.doc.clientID)?.pointer).toEqual({ x: 1, y: 2 });
    });
    const stamp = { id: designer.personId, name: 'Samir Kade', initials: 'SK', role: 'designer' };
    expect(userOf(ines, samir.doc.clientID)).toEqual(stamp);
  });

  test('of somebody else cannot be changed or removed', async () => {
    const ines = await new LiveSheet(server, owner, sheetId).synced();
    const watching = await new LiveSheet(server, owner, sheetId).synced();
    ines.provider.awareness.setLocalState({ pointer: 'here' });
    const { clientID } = ines.doc;
    await vi.waitFor(() => expect(watching.provider.awareness.getStates().get(clientID)?.pointer).toBe('here'));
    const { socket } = await rawSocket(server, designer, sheetId);
    socket.send(PRESENCE(clientID, 500, { pointer: 'elsewhere' }));
    socket.send(PRESENCE(clientID, 501, null));
    socket.send(PRESENCE(77, 1, { pointer: 'own' }));
    await vi.waitFor(() => expect(watching.provider.awareness.getStates().get(77)?.pointer).toBe('own'));
    expect(watching.provider.awareness.getStates().get(clientID)?.pointer).toBe('here');
  });

  test('goes with its socket, and comes back with it at once', async () => {
    const ines = await new LiveSheet(server, owner, sheetId).synced();
    const samir = await new LiveSheet(server, designer, sheetId).synced();
    samir.provider.awareness.setLocalState({ pointer: 'here' });
    const seen = () => ines.provider.awareness.getStates().get(samir.doc.clientID)?.pointer;
    await vi.waitFor(() => expect(seen()).toBe('here'));
    samir.provider.ws?.close();
    await vi.waitFor(() => expect(seen()).toBeUndefined(), { timeout: 2000 });
    await vi.waitFor(() => expect(seen()).toBe('here'), { timeout: 5000 });
    samir.leave();
    await vi.waitFor(() => expect(seen()).toBeUndefined(), { timeout: 2000 });
  });

  test('shows a role that has changed', async () => {
    const ines = await new LiveSheet(server, owner, sheetId).synced();
    const samir = await new LiveSheet(server, designer, sheetId).synced();
    samir.provider.awareness.setLocalState({ pointer: 'here' });
    await vi.waitFor(() => expect(userOf(ines, samir.doc.clientID)?.role).toBe('designer'));
    await owner.patch(`/api/teams/${teamId}/members/${designer.personId}`, { role: 'reviewer' });
    await vi.waitFor(() => expect(userOf(ines, samir.doc.clientID)?.role).toBe('reviewer'), { timeout: 1000 });
  });
});
