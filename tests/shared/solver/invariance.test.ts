import { describe, expect, test } from 'vitest';
import { firstOperatingPoint, operatingPoint } from '#shared/analyses/operating-point';
import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import type { CircuitFile, CircuitPart } from '#shared/circuit/circuit-file';
import { isFet } from '#shared/circuit/circuit-file';
import { terminalsOf } from '#shared/circuit/terminals';
import { randomCircuit, seededRandom } from './random-circuit';

const seeds = Array.from({ length: 200 }, (_, index) => index + 1);
const sizeOf = (seed: number): number => 3 + ((seed * 37) % 58);
const some = seeds.filter((seed) => seed % 10 === 0);

/** A, the sum of currents out of every net, from the record's own figures alone. */
function sums(circuit: CircuitFile, record: OperatingPointRecord): Map<string, number> {
  const total = new Map<string, number>();
  const flow = (from: string, to: string, current: number) => {
    total.set(from, (total.get(from) ?? 0) + current);
    total.set(to, (total.get(to) ?? 0) - current);
  };
  for (const part of circuit.parts) {
    if (part.kind === 'resistor') flow(part.a, part.b, record.resistors[part.ref]?.current ?? Number.NaN);
    if (part.kind === 'voltage') flow(part.minus, part.plus, record.sources[part.ref]?.current ?? Number.NaN);
    if (part.kind === 'nfet') flow(part.drain, part.source, record.fets[part.ref]?.id ?? Number.NaN);
    if (part.kind === 'pfet') flow(part.source, part.drain, record.fets[part.ref]?.id ?? Number.NaN);
  }
  return total;
}

function farthest(a: OperatingPointRecord, b: OperatingPointRecord): number {
  expect(Object.keys(b.nets)).toEqual(Object.keys(a.nets));
  return Math.max(...Object.entries(a.nets).map(([net, voltage]) => Math.abs(voltage - (b.nets[net] ?? Number.NaN))));
}

describe('circuits wired at random', { timeout: 120_000 }, () => {
  test('all have an operating point, found cold, at which every current and the power balance', {
    timeout: 120_000,
  }, () => {
    for (const seed of seeds) {
      const circuit = randomCircuit(seed, sizeOf(seed));
      const { record } = firstOperatingPoint(circuit);
      expect(record.status, `seed ${seed}: ${record.problems.map(({ message }) => message).join(' ')}`).toBe('solved');
      for (const [net, sum] of sums(circuit, record)) {
        expect(Math.abs(sum), `seed ${seed}, net ${net}`).toBeLessThan(1e-12);
      }
      const power = (entries: Record<string, { power: number }>) =>
        Object.values(entries).reduce((total, { power: watts }) => total + watts, 0);
      const [delivered, spent] = [power(record.sources), power(record.fets) + power(record.resistors)];
      expect(Math.abs(delivered - spent), `seed ${seed}`).toBeLessThan(1e-9 * delivered + 1e-15);
    }
  });

  test('come out the same in any order of parts and under any refs', () => {
    for (const seed of some) {
      const circuit = randomCircuit(seed, sizeOf(seed));
      const random = seededRandom(seed);
      const shuffled = circuit.parts
        .map((part) => ({ part, key: random() }))
        .sort((a, b) => a.key - b.key)
        .map(({ part }, index): CircuitPart => ({ ...part, ref: `X${index}` }));
      const [one, other] = [operatingPoint(circuit), operatingPoint({ ...circuit, parts: shuffled })];
      expect(farthest(one, other), `seed ${seed}`).toBeLessThan(1e-12);
    }
  });

  test('come out the same whatever was solved before', () => {
    const circuit = randomCircuit(30, 20);
    const first = operatingPoint(circuit);
    operatingPoint(randomCircuit(40, 50));
    expect(operatingPoint(circuit)).toEqual(first);
  });

  test('do not change when labelled drains and sources change places', () => {
    for (const seed of some) {
      const circuit = randomCircuit(seed, sizeOf(seed));
      // A body left out is tied to the labelled source, so that one has a meaning; a body of its own has none.
      const parts = circuit.parts.map((part) =>
        isFet(part) && part.body !== undefined ? { ...part, drain: part.source, source: part.drain } : part,
      );
      expect(farthest(operatingPoint(circuit), operatingPoint({ ...circuit, parts })), `seed ${seed}`).toBeLessThan(
        1e-9,
      );
    }
  });

  test('keep their voltages when every conductance grows alike', () => {
    for (const seed of some) {
      const circuit = randomCircuit(seed, sizeOf(seed));
      const parts = circuit.parts.map((part): CircuitPart => {
        if (part.kind === 'resistor') return { ...part, resistance: part.resistance / 64 };
        return isFet(part) && part.k !== undefined ? { ...part, k: part.k * 64 } : part;
      });
      const [one, other] = [operatingPoint(circuit), operatingPoint({ ...circuit, parts })];
      expect(farthest(one, other), `seed ${seed}`).toBeLessThan(1e-6);
    }
  });

  test('are the same upside down: N for P, every voltage negated', () => {
    for (const seed of some) {
      const circuit = randomCircuit(seed, sizeOf(seed));
      const parts = circuit.parts.map((part): CircuitPart => {
        if (part.kind === 'voltage') return { ...part, voltage: -part.voltage };
        if (!isFet(part)) return part;
        const threshold = -(part.overrides?.threshold ?? 0);
        return { ...part, kind: part.kind === 'nfet' ? 'pfet' : 'nfet', overrides: { ...part.overrides, threshold } };
      });
      const [one, other] = [operatingPoint(circuit), operatingPoint({ ...circuit, parts })];
      for (const [net, voltage] of Object.entries(one.nets)) {
        expect(other.nets[net], `seed ${seed}, net ${net}`).toBeCloseTo(-voltage, 9);
      }
    }
  });

  test('touch only nets that their record holds', () => {
    const circuit = randomCircuit(7, 12);
    const nets = new Set(circuit.parts.flatMap((part) => terminalsOf(part).map(({ net }) => net)));
    expect(Object.keys(operatingPoint(circuit).nets).sort()).toEqual([...nets].sort());
  });
});
