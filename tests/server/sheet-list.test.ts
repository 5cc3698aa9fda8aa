import { expect, test, vi } from 'vitest';
import { operatingPointRecordSchema } from '#shared/analyses/operating-point-record';
import { standingOf } from '#shared/analyses/verdict';
import type { ListedSheet } from '#shared/api/sheets';
import { circuitFileSchema } from '#shared/circuit/circuit-file';
import { remove, setTemperature } from '#shared/doc/commands';
import { readDrawing } from '#shared/doc/read-drawing';
import { LiveSheet } from './support/live-sheet';
import { solvedList } from './support/solved-list';
import { newDatabaseFile, startTestServer } from './support/start-test-server';
import { assembleTeam, Visitor } from './support/visitor';

const server = await startTestServer();
const { teamId, owner, designer, viewer } = await assembleTeam(server);

async function listed(visitor: Visitor, sheetId: string): Promise<ListedSheet> {
  const found = (await solvedList(visitor, teamId)).find(({ id }) => id === sheetId);
  if (!found) throw new Error(`the list lacks ${sheetId}`);
  return found;
}

/** The least slack of a sheet, from the figures of its own operating point. */
async function leastSlack(visitor: Visitor, sheetId: string): Promise<number> {
  const { fets } = operatingPointRecordSchema.parse((await visitor.get(`/api/sheets/${sheetId}/operating-point`)).body);
  const { parts } = circuitFileSchema.parse((await visitor.get(`/api/sheets/${sheetId}/circuit`)).body);
  const slacks = parts.flatMap((part) => {
    const point = fets[part.ref];
    return point && 'intent' in part && part.intent ? [standingOf(point, part.intent).slack] : [];
  });
  return Math.min(...slacks);
}

test('a sheet’s standing is that of its own operating point, also right after an edit', async () => {
  const id = await owner.createSheet(teamId, { starter: 'differential-pair' });
  const first = (await listed(viewer, id)).standing;
  expect(first).toMatchObject({ status: 'solved', fets: 6, verdicts: { met: 6, thin: 0, missed: 0 } });
  expect(first).toMatchObject({ worst: { ref: 'Q2', verdict: 'met', slack: await leastSlack(viewer, id) } });

  const live = await new LiveSheet(server, designer, id).synced();
  setTemperature(live.doc, 125);
  await vi.waitFor(async () => {
    const circuit = circuitFileSchema.parse((await viewer.get(`/api/sheets/${id}/circuit`)).body);
    expect(circuit.temperature).toBe(125);
  });
  const second = (await listed(viewer, id)).standing;
  expect(second).toMatchObject({ worst: { slack: await leastSlack(viewer, id) } });
  expect(second).not.toEqual(first);
});

test('a sheet that cannot be solved says why, and an empty one that nothing is drawn', async () => {
  const blank = await owner.createSheet(teamId);
  expect((await listed(viewer, blank)).standing).toEqual({ status: 'empty', fets: 0 });

  const id = await owner.createSheet(teamId, { starter: 'four-resistor-stage' });
  const live = await new LiveSheet(server, designer, id).synced();
  const gateResistors = readDrawing(live.doc).drawing.parts.filter((part) => 'ref' in part && /^R[12]$/.test(part.ref));
  remove(live.doc, new Set(gateResistors.map((part) => part.id)), new Set());
  await vi.waitFor(
    async () => {
      expect((await listed(viewer, id)).standing).toMatchObject({ status: 'invalid', fets: 1, reason: /float/ });
    },
    { timeout: 20_000 },
  );
});

test('a sheet whose FETs have no intent has no worst device', async () => {
  const id = await owner.createSheet(teamId, { starter: 'mirror' });
  const circuit = circuitFileSchema.parse((await owner.get(`/api/sheets/${id}/circuit`)).body);
  const parts = circuit.parts.map((part) => ('intent' in part ? { ...part, intent: undefined } : part));
  const bare = await owner.createSheet(teamId, { circuit: { ...circuit, parts, drawing: undefined } });
  expect((await listed(viewer, bare)).standing).toMatchObject({ status: 'solved', fets: 2, worst: null });
});

test('who has a sheet open is named once, however many windows they have, and until they leave', async () => {
  const id = await owner.createSheet(teamId);
  expect((await listed(viewer, id)).here).toEqual([]);
  const windows = [new LiveSheet(server, designer, id), new LiveSheet(server, designer, id)];
  windows.push(new LiveSheet(server, owner, id));
  for (const one of windows) await one.synced();
  expect((await listed(viewer, id)).here).toEqual([
    { id: owner.personId, name: 'Ines Rautio' },
    { id: designer.personId, name: 'Samir Kade' },
  ]);
  for (const one of windows.slice(0, 2)) one.leave();
  await vi.waitFor(async () => expect((await listed(viewer, id)).here).toHaveLength(1));
});

test('a restart changes nothing that the list says', async () => {
  const file = newDatabaseFile();
  const first = await startTestServer({ file });
  const team = await assembleTeam(first);
  for (const starter of ['mirror', 'cascode-amplifier', 'output-driver']) {
    await team.owner.createSheet(team.teamId, { starter });
  }
  const before = await solvedList(team.owner, team.teamId);
  await first.stop();
  const again = new Visitor(await startTestServer({ file }));
  await again.signIn('Ines Rautio');
  expect(await solvedList(again, team.teamId)).toEqual(before);
});
