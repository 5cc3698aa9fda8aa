import { expect, test } from 'vitest';
import { operatingPoint } from '#shared/analyses/operating-point';
import { terminalCurrent } from '#shared/analyses/terminal-current';
import { netlist } from '#shared/circuit/netlist';
import { terminalsOf } from '#shared/circuit/terminals';
import { STARTERS } from '#shared/starters/starters';

/** A, of the largest current on the sheet. */
const KIRCHHOFF = 1e-6;

test.each(STARTERS)('$id: the currents that leave parts into a net add up to nothing', ({ drawing }) => {
  const { circuit } = netlist(drawing);
  const record = operatingPoint(circuit);
  expect(record.status).toBe('solved');
  const sums = new Map<string, number>();
  let largest = 0;
  for (const part of circuit.parts) {
    for (const { name, net } of terminalsOf(part)) {
      const current = terminalCurrent(record, part.kind, part.ref, name);
      if (current === undefined) continue;
      largest = Math.max(largest, Math.abs(current));
      sums.set(net, (sums.get(net) ?? 0) + current);
    }
  }
  expect(largest).toBeGreaterThan(0);
  for (const [net, sum] of sums) expect(Math.abs(sum), net).toBeLessThan(KIRCHHOFF * largest);
});

test('nothing is told of gates, of capacitors and of parts that the record does not hold', () => {
  const drawing = STARTERS.find(({ id }) => id === 'mirror')?.drawing;
  if (!drawing) throw new Error('there is a mirror');
  const record = operatingPoint(netlist(drawing).circuit);
  expect(terminalCurrent(record, 'nfet', 'Q1', 'drain')).toBeCloseTo(-(record.fets.Q1?.id ?? 0), 12);
  expect(terminalCurrent(record, 'nfet', 'Q1', 'gate')).toBeUndefined();
  expect(terminalCurrent(record, 'capacitor', 'C1', 'a')).toBeUndefined();
  expect(terminalCurrent(record, 'resistor', 'constructor', 'a')).toBeUndefined();
});
