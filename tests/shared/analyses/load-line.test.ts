import { describe, expect, test } from 'vitest';
import { curveVoltages, deviceCurve } from '#shared/analyses/device-curve';
import { loadLine } from '#shared/analyses/load-line';
import { solveCircuit } from '#shared/analyses/operating-point';
import { type CircuitFile, isFet } from '#shared/circuit/circuit-file';
import { netlist } from '#shared/circuit/netlist';
import { readCircuit } from '#shared/circuit/read-circuit';
import { STARTERS } from '#shared/starters/starters';
import { circuit, I, N, P, R, V } from './parts';

const SWEEP = [0, 0.2, 0.4, 0.6, 0.8, 1, 1.2, 1.4, 1.6, 1.8];

function solved(file: CircuitFile) {
  const read = readCircuit(file);
  if (!read.ok) throw new Error('the circuit was not read');
  return { circuit: read.circuit, record: solveCircuit(read.circuit) };
}

function loadOf(ref: string, voltages: readonly number[], ...parts: CircuitFile['parts']) {
  const { circuit: read, record } = solved(circuit(...parts));
  const line = loadLine(read, record, ref, voltages);
  if (line?.kind !== 'swept') throw new Error(`${ref} has no swept load`);
  return { line, point: record.fets[ref] };
}

describe('closed forms', () => {
  test('a resistor is a straight line from VDD on one axis to VDD/R on the other', () => {
    const { line } = loadOf(
      'Q1',
      SWEEP,
      V('V1', 'vdd', 1.8),
      V('V2', 'in', 0.8),
      R('R1', 'vdd', 'out', 1e4),
      N('Q1', 'out', 'in', 'gnd'),
    );
    expect(line.points.map(({ vds }) => vds)).toEqual(SWEEP);
    for (const { vds, id } of line.points) expect(id).toBeCloseTo((1.8 - vds) / 1e4, 14);
  });

  test('resistors at both ends of the channel are one: the gate draws nothing and moves nothing', () => {
    const parts = [V('V1', 'vdd', 1.8), V('V2', 'in', 1), R('R1', 'vdd', 'out', 1e4), R('R2', 's', 'gnd', 5e3)];
    const { line } = loadOf('Q1', SWEEP, ...parts, N('Q1', 'out', 'in', 's'));
    for (const { vds, id } of line.points) expect(id).toBeCloseTo((1.8 - vds) / 1.5e4, 14);
  });

  test('past the voltage that the circuit gives by itself the current would have to flow back', () => {
    const { line } = loadOf(
      'Q1',
      [2],
      V('V1', 'vdd', 1),
      V('V2', 'in', 0.8),
      R('R1', 'vdd', 'out', 1e4),
      N('Q1', 'out', 'in', 'gnd'),
    );
    expect(line.points[0]?.id).toBeCloseTo(-1e-4, 14);
  });

  test('an ideal current source is level whatever the voltage', () => {
    const parts = [I('I1', 'gnd', 'out', 5e-5), V('V2', 'in', 1.2), R('R1', 'out', 'gnd', 1e6)];
    const { line } = loadOf('Q1', SWEEP, ...parts, N('Q1', 'out', 'in', 'gnd'));
    for (const { vds, id } of line.points) expect(id).toBeCloseTo(5e-5 - vds / 1e6, 14);
  });

  test('a P device sees the same load upside down', () => {
    const parts = [V('V1', 'vdd', 1.8), V('V2', 'in', 1), R('R1', 'out', 'gnd', 1e4)];
    const { line, point } = loadOf('Q1', SWEEP, ...parts, P('Q1', 'out', 'in', 'vdd'));
    expect(point?.vds).toBeLessThan(0);
    for (const { vds, id } of line.points) expect(id).toBeCloseTo((1.8 - vds) / 1e4, 14);
  });

  test('a device that conducts from its labelled source is seen from the end that is its source now', () => {
    const parts = [V('V1', 'vdd', 1.8), V('V2', 'in', 0.8), R('R1', 'vdd', 'out', 1e4)];
    const { line, point } = loadOf('Q1', SWEEP, ...parts, N('Q1', 'gnd', 'in', 'out'));
    expect(point?.reversed).toBe(true);
    for (const { vds, id } of line.points) expect(id).toBeCloseTo((1.8 - vds) / 1e4, 14);
  });

  test('a channel between ideal sources has no load line but a VDS', () => {
    const { circuit: read, record } = solved(
      circuit(V('V1', 'vdd', 1.8), V('V2', 'in', 1), N('Q1', 'vdd', 'in', 'gnd')),
    );
    expect(loadLine(read, record, 'Q1', SWEEP)).toEqual({ kind: 'fixed', vds: 1.8 });
  });
});

test('the curve has its knee where VDS is VOV, and the knee locus meets it there', () => {
  const parts = [V('V1', 'vdd', 1.8), V('V2', 'in', 0.8), R('R1', 'vdd', 'out', 1e4), N('Q1', 'out', 'in', 'gnd')];
  const { circuit: read, record } = solved(circuit(...parts));
  const [part, point] = [read.parts.find(isFet), record.fets.Q1];
  if (!part || !point) throw new Error('Q1 is solved');
  const voltages = curveVoltages(point, 1);
  const { id, knee } = deviceCurve(part, read.processes, read.temperature, point, voltages);
  const at = voltages.indexOf(point.vdsSat);
  expect(at).toBeGreaterThan(0);
  expect(knee[at]).toBeCloseTo(id[at] ?? 0, 15);
  for (const [index, vds] of voltages.entries()) {
    if (vds < point.vdsSat) expect(knee[index]).toBeLessThan(id[index] || Number.MIN_VALUE);
    if (vds > point.vdsSat) expect(knee[index]).toBeGreaterThan(id[index] ?? Number.MAX_VALUE);
  }
});

test.each(STARTERS.map(({ id, drawing }) => [id, drawing] as const))(
  'on every device of %s the operating point lies on the curve and on the load, and no sample is missing',
  (_, drawing) => {
    const { circuit: read, record } = solved(netlist(drawing).circuit);
    for (const part of read.parts.filter(isFet)) {
      const point = record.fets[part.ref];
      if (!point) throw new Error(`${part.ref} is solved`);
      const voltages = curveVoltages(point, 1.5 * Math.abs(point.vds) + 0.1);
      const here = Math.abs(point.vds);
      const curve = deviceCurve(part, read.processes, read.temperature, point, voltages);
      const id = Math.abs(point.id);
      expect(Math.abs((curve.id[voltages.indexOf(here)] ?? Number.NaN) - id)).toBeLessThan(1e-9 * id + 1e-15);
      const line = loadLine(read, record, part.ref, voltages);
      if (line?.kind !== 'swept') {
        expect(line).toEqual({ kind: 'fixed', vds: here });
        continue;
      }
      expect(Math.abs((line.points.find(({ vds }) => vds === here)?.id ?? Number.NaN) - id)).toBeLessThan(
        1e-9 * id + 1e-13,
      );
      expect(line.points.length).toBe(voltages.length);
    }
  },
);
