import { spawn } from 'node:child_process';
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { text } from 'node:stream/consumers';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { operatingPoint } from '#shared/analyses/operating-point';
import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';

const ROOT = fileURLToPath(new URL('../../../', import.meta.url));

const stage = {
  format: 'stillpoint.circuit',
  version: 1,
  ground: 'gnd',
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
      k: 2e-3,
      overrides: { threshold: 0.5, lambda: 0.05 },
    },
  ],
};
/** 1 µA into a device that is off. */
const stuck = {
  ...stage,
  parts: [
    { ref: 'I1', kind: 'current', from: 'gnd', to: 'out', current: 1e-6 },
    { ref: 'Q1', kind: 'nfet', drain: 'out', gate: 'gnd', source: 'gnd', k: 1e-3, overrides: { threshold: 0.5 } },
  ],
};
const wrong = { ...stage, parts: [{ ...stage.parts[2], resistance: 0 }] };

let folder: string;
const file = (name: string): string => join(folder, name);

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'solve-'));
  await writeFile(file('stage.json'), JSON.stringify(stage));
  await writeFile(file('stuck.json'), JSON.stringify(stuck));
  await writeFile(file('wrong.json'), JSON.stringify(wrong));
  await writeFile(file('torn.json'), '{ "format": ');
});
afterAll(() => rm(folder, { recursive: true }));

async function solve(list: readonly string[], input = '') {
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/cli/solve.ts', ...list], { cwd: ROOT });
  child.stdin.end(input);
  const exited = new Promise<number | null>((resolve) => child.on('close', resolve));
  const [out, err, status] = await Promise.all([text(child.stdout), text(child.stderr), exited]);
  return { out, err, status };
}

function records(out: string): OperatingPointRecord[] {
  return out
    .trimEnd()
    .split('\n')
    .map((line) => JSON.parse(line) as OperatingPointRecord);
}

// Each command starts a process that compiles what it loads.
describe('the solve command', { timeout: 30_000 }, () => {
  test('prints one record a line in the order given, exactly what the analysis returns, and 2 beats 1 beats 0', async () => {
    const { out, err, status } = await solve(
      [
        '--json',
        file('stage.json'),
        file('stuck.json'),
        '-',
        file('wrong.json'),
        file('torn.json'),
        file('absent.json'),
      ],
      JSON.stringify(stage),
    );
    const printed = records(out);
    expect(printed.map((record) => record.status)).toEqual([
      'solved',
      'unsolved',
      'solved',
      'invalid',
      'invalid',
      'invalid',
    ]);
    expect(printed[0]).toEqual(JSON.parse(JSON.stringify(operatingPoint(stage))));
    expect(printed[2]).toEqual(printed[0]);
    for (const [index, name] of [[4, 'torn.json'] as const, [5, 'absent.json'] as const]) {
      expect(printed[index]?.problems).toEqual([
        expect.objectContaining({ code: 'bad-value', message: expect.stringContaining(name) }),
      ]);
    }
    expect(err).toBe('');
    expect(status).toBe(2);
  });

  test('exits with 0 when all are solved and 1 when some are not', async () => {
    const [solved, unsolved] = await Promise.all([
      solve([file('stage.json')]),
      solve([file('stage.json'), file('stuck.json'), '--json']),
    ]);
    expect(solved.status).toBe(0);
    expect(unsolved.status).toBe(1);
    expect(records(unsolved.out)).toHaveLength(2);
  });

  test('shows people a table with units', async () => {
    const { out } = await solve([file('stage.json')]);
    expect(out.replaceAll('\u00a0', ' ')).toMatch(/^Q1 +saturated +93\.9 µA /m);
  });

  test('refuses an option it does not have, and a line without files, on standard error', async () => {
    const [unknown, none] = await Promise.all([solve([file('stage.json'), '--fast']), solve(['--json'])]);
    for (const { out, err, status } of [unknown, none]) {
      expect(status).toBe(2);
      expect(out).toBe('');
      expect(err).toContain('usage:');
    }
    expect(unknown.err).toContain('--fast');
  });
});
