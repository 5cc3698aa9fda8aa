import { describe, expect, test } from 'vitest';
import { operatingPointRecordSchema } from '#shared/analyses/operating-point-record';
import { sheetAnswer, sheetsAnswer } from '#shared/api/sheets';
import { circuitFileSchema } from '#shared/circuit/circuit-file';
import { STARTERS } from '#shared/starters/starters';
import { startTestServer, TestClock } from './support/start-test-server';
import { codeOf, fieldsOf, Visitor } from './support/visitor';

const clock = new TestClock();
const server = await startTestServer({ now: clock.now });
const ines = await new Visitor(server).signUp('Ines Rautio');
const teamId = await ines.teamId();

const point = async (sheetId: string) =>
  operatingPointRecordSchema.parse((await ines.get(`/api/sheets/${sheetId}/operating-point`)).body);
const circuitOf = async (sheetId: string) => (await ines.get(`/api/sheets/${sheetId}/circuit`)).body;

/** The circuit of the contract's first example. */
const STAGE = {
  format: 'stillpoint.circuit',
  version: 1,
  ground: 'gnd',
  processes: { demo: { nfet: { kPrime: 2e-4, threshold: 0.5, lambda: 0.05 } } },
  parts: [
    { ref: 'V1', kind: 'voltage', plus: 'vdd', minus: 'gnd', voltage: 1.8 },
    { ref: 'V2', kind: 'voltage', plus: 'in', minus: 'gnd', voltage: 0.8 },
    { ref: 'R1', kind: 'resistor', a: 'vdd', b: 'out', resistance: 10000 },
    {
      ref: 'Q1',
      kind: 'nfet',
      drain: 'out',
      gate: 'in',
      source: 'gnd',
      process: 'demo',
      width: 1e-5,
      length: 1e-6,
    },
  ],
};

describe('a sheet', () => {
  test.each(STARTERS.map(({ id }) => id))('from the starter %s is solved', async (starter) => {
    const record = await point(await ines.createSheet(teamId, { starter }));
    expect(record.status).toBe('solved');
    expect(Object.keys(record.fets).length).toBeGreaterThan(0);
  });

  test('from a circuit file has the currents that the file’s text gives', async () => {
    const record = await point(await ines.createSheet(teamId, { circuit: STAGE }));
    // The figures are those of the contract's example record.
    expect(record.fets.Q1?.id).toBeCloseTo(9.38756e-5, 9);
    expect(record.fets.Q1?.region).toBe('saturated');
  });

  test('exported and imported again is the same drawing', async () => {
    const first = await circuitOf(await ines.createSheet(teamId, { starter: 'differential-pair' }));
    const second = await circuitOf(await ines.createSheet(teamId, { circuit: first }));
    const { parts, drawing } = circuitFileSchema.parse(second);
    expect({ parts, drawing }).toEqual({
      parts: circuitFileSchema.parse(first).parts,
      drawing: circuitFileSchema.parse(first).drawing,
    });
  });

  test('from a file with faults is not made, and every fault is named', async () => {
    const circuit = { ...STAGE, parts: [...STAGE.parts, { ...STAGE.parts[2], resistance: -1, colour: 'red' }] };
    const reply = await ines.post(`/api/teams/${teamId}/sheets`, { name: 'Faulty', circuit });
    expect([reply.status, codeOf(reply)]).toEqual([422, 'invalid']);
    expect(fieldsOf(reply).circuit).toContain('R1');
    expect(fieldsOf(reply).circuit).toContain('colour');
  });

  test('from a file that only lacks a connection is made, to be mended on the sheet', async () => {
    const circuit = { ...STAGE, parts: STAGE.parts.filter(({ ref }) => ref !== 'V2') };
    const record = await point(await ines.createSheet(teamId, { circuit }));
    expect(record.status).toBe('invalid');
    expect(record.problems.map(({ code }) => code)).toContain('floating-net');
  });

  test('is named from one starter or one circuit that exists', async () => {
    const make = (more: object) => ines.post(`/api/teams/${teamId}/sheets`, { name: 'Input pair', ...more });
    expect(fieldsOf(await make({ starter: 'none-such' })).starter).toContain('mirror');
    expect((await make({ starter: 'mirror', circuit: STAGE })).status).toBe(422);
    expect((await make({ starter: 'mirror', copyOf: 'a sheet' })).status).toBe(422);
    expect((await make({ copyOf: 'none-such' })).status).toBe(404);
    expect((await make({ name: '' })).status).toBe(422);
  });

  test('is renamed, put away and brought back', async () => {
    const id = await ines.createSheet(teamId);
    clock.pass(5000);
    const renamed = sheetAnswer.parse((await ines.patch(`/api/sheets/${id}`, { name: 'Hydrophone input' })).body);
    expect(renamed.sheet).toMatchObject({ name: 'Hydrophone input', archived: false, state: 'draft' });
    expect(Date.parse(renamed.sheet.changedAt) - Date.parse(renamed.sheet.createdAt)).toBe(5000);
    await ines.patch(`/api/sheets/${id}`, { archived: true });
    const refused = await ines.patch(`/api/sheets/${id}`, { name: 'Renamed in the archive' });
    expect([refused.status, codeOf(refused)]).toEqual([409, 'archived']);
    const { sheets } = sheetsAnswer.parse((await ines.get(`/api/teams/${teamId}/sheets`)).body);
    expect(sheets[0]).toMatchObject({ id, archived: true });
    const back = await ines.patch(`/api/sheets/${id}`, { archived: false, name: 'Back again' });
    expect(sheetAnswer.parse(back.body).sheet).toMatchObject({ name: 'Back again', archived: false });
    expect((await ines.patch(`/api/sheets/${id}`, {})).status).toBe(422);
    expect((await ines.patch(`/api/sheets/${id}`, { teamId: 'another' })).status).toBe(422);
  });

  test('copied is the same drawing, and from then on another sheet', async () => {
    const original = await ines.createSheet(teamId, { starter: 'cascode-mirror' });
    const body = { name: 'Input pair, copy', copyOf: original };
    const reply = await ines.post(`/api/teams/${teamId}/sheets`, body);
    expect(reply.status).toBe(201);
    const { sheet } = sheetAnswer.parse(reply.body);
    expect(sheet).toMatchObject({ name: 'Input pair, copy', state: 'draft', createdBy: 'Ines Rautio' });
    const [first, second] = [await circuitOf(original), await circuitOf(sheet.id)].map((one) =>
      circuitFileSchema.parse(one),
    );
    expect(second).toEqual({ ...first, title: 'Input pair, copy' });
    expect((await ines.delete(`/api/sheets/${original}`)).status).toBe(204);
    expect((await point(sheet.id)).status).toBe('solved');
  });

  test('that was deleted is gone', async () => {
    const id = await ines.createSheet(teamId);
    expect((await ines.delete(`/api/sheets/${id}`)).status).toBe(204);
    expect((await ines.get(`/api/sheets/${id}`)).status).toBe(404);
  });
});

describe('the operating point of a circuit sent', () => {
  test('is its record', async () => {
    const reply = await ines.post('/api/operating-point', { circuit: STAGE });
    expect(reply.status).toBe(200);
    expect(operatingPointRecordSchema.parse(reply.body).nets.out).toBeCloseTo(0.861244, 6);
  });

  test('is a record too when the circuit is wrong, with 422', async () => {
    const reply = await ines.post('/api/operating-point', { circuit: { ...STAGE, ground: 'elsewhere' } });
    const record = operatingPointRecordSchema.parse(reply.body);
    expect([reply.status, record.status]).toEqual([422, 'invalid']);
    expect(record.problems.map(({ code }) => code)).toContain('no-ground');
  });
});
