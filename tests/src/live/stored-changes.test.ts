import { expect, test, vi } from 'vitest';
import { WebSocket } from 'ws';
import * as Y from 'yjs';
import { loadUpdates } from '../../../server/db/queries/sheet-log';
import { StoredChanges } from '../../../src/live/stored-changes';
import { LiveSheet } from '../../server/support/live-sheet';
import { startTestServer } from '../../server/support/start-test-server';
import { Visitor } from '../../server/support/visitor';

vi.stubGlobal('WebSocket', WebSocket);

const server = await startTestServer();
const ines = await new Visitor(server).signUp('Ines Rautio');

/** What the server's database holds of the sheet's notes. */
function stored(sheetId: string): Record<string, unknown> {
  const doc = new Y.Doc();
  for (const update of loadUpdates(server.context.db, sheetId)) Y.applyUpdate(doc, update);
  return doc.getMap('sheet').toJSON();
}

test('a change counts as stored once it is in the database, made on the line or before it came back', async () => {
  const sheetId = await ines.createSheet(await ines.teamId());
  const live = await new LiveSheet(server, ines, sheetId).synced();
  const safe: Record<string, unknown>[] = [];
  const changes = new StoredChanges(live.provider, () => {
    if (changes.notStored === 0) safe.push(stored(sheetId));
  });

  live.notes.set('on the line', 1);
  expect(changes.notStored).toBe(1);
  await vi.waitFor(() => expect(safe).toHaveLength(1));
  expect(safe[0]).toMatchObject({ 'on the line': 1 });

  live.provider.disconnect();
  live.notes.set('off the line', 2);
  expect(changes.notStored).toBe(1);
  live.provider.connect();
  await vi.waitFor(() => expect(changes.notStored).toBe(0), { timeout: 5000 });
  expect(safe[1]).toMatchObject({ 'off the line': 2 });
});
