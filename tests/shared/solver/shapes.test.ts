import { describe, expect, test } from 'vitest';
import { operatingPoint } from '#shared/analyses/operating-point';
import type { CircuitPart } from '#shared/circuit/circuit-file';
import { circuit, I, N, P, R, V } from '../analyses/parts';

const modulated = (threshold: number) => ({ overrides: { threshold, lambda: 0.1 } });

function inverter(index: number, input: string, output: string): CircuitPart[] {
  return [
    N(`N${index}`, output, input, 'gnd', modulated(0.45)),
    P(`P${index}`, output, input, 'vdd', modulated(-0.45)),
  ];
}

describe('shapes that are hard to settle', { timeout: 30_000 }, () => {
  test('a stack of 60 devices with body effect carries one current', () => {
    const parts = Array.from({ length: 60 }, (_, index) =>
      N(`Q${index}`, index === 0 ? 'vdd' : `s${index}`, 'vdd', index === 59 ? 'gnd' : `s${index + 1}`, {
        body: 'gnd',
        overrides: { threshold: 0.45, lambda: 0.08, gamma: 0.45 },
      }),
    );
    const record = operatingPoint(circuit(V('V1', 'vdd', 27), ...parts));
    expect(record.status).toBe('solved');
    const currents = Object.values(record.fets).map(({ id }) => id);
    expect(Math.max(...currents) - Math.min(...currents)).toBeLessThan(1e-12);
    expect(Math.min(...currents)).toBeGreaterThan(1e-3);
  });

  test('a chain of 30 inverters is driven to the rails, exactly', () => {
    const chain = Array.from({ length: 30 }, (_, index) => inverter(index, `i${index}`, `i${index + 1}`)).flat();
    const record = operatingPoint(circuit(V('V1', 'vdd', 1.8), V('V2', 'i0', 0.89), ...chain));
    expect(record.nets).toMatchObject({ i29: 1.8, i30: 0 });
  });

  test.each([3, 5, 29])('a ring of %i inverters rests where each input equals its output', (length) => {
    const ring = Array.from({ length }, (_, index) => inverter(index, `i${index}`, `i${(index + 1) % length}`)).flat();
    const { nets } = operatingPoint(circuit(V('V1', 'vdd', 1.8), ...ring));
    for (let index = 0; index < length; index++) expect(nets[`i${index}`]).toBeCloseTo(0.9, 9);
  });

  test('a follower closed around a gain of some 10⁹ stands within its offset', () => {
    const stages = Array.from({ length: 5 }, (_, index) => [
      N(`Q${index}`, `d${index + 1}`, `d${index}`, 'gnd', modulated(0.5)),
      I(`I${index}`, 'vdd', `d${index + 1}`, 1e-4),
    ]).flat();
    // An odd number of inversions, closed through a resistor into the first gate.
    const record = operatingPoint(circuit(V('V1', 'vdd', 3), ...stages, R('RF', 'd5', 'd0', 1e6)));
    expect(record.status).toBe('solved');
    for (const { id } of Object.values(record.fets)) expect(id).toBeCloseTo(1e-4, 12);
    expect(record.nets.d5).toBeCloseTo(record.nets.d0 ?? Number.NaN, 9);
  });

  test('values at the ends of what a number can hold give figures that can be printed', () => {
    for (const value of [1e-300, 1e300]) {
      const record = operatingPoint(
        circuit(V('V1', 'a', value), R('R1', 'a', 'b', 1 / value), N('Q1', 'b', 'b', 'gnd', { k: value })),
      );
      expect(JSON.stringify(record)).not.toContain('null');
      expect(['solved', 'unsolved']).toContain(record.status);
    }
  });
});
