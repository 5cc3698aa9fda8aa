import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { firstOperatingPoint, operatingPoint } from '#shared/analyses/operating-point';
import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import type { CircuitFile, CircuitPart } from '#shared/circuit/circuit-file';
import { isFet } from '#shared/circuit/circuit-file';
import { readCircuit } from '#shared/circuit/read-circuit';
import { terminalsOf } from '#shared/circuit/terminals';
import { Equations } from '#shared/solver/equations';
import { buildNetwork } from '#shared/solver/network';
import { settle } from '#shared/solver/settle';
import { DenseLu } from './dense-lu';
import { randomCircuit, seededRandom } from './random-circuit';

const circuits = fc
  .record({ seed: fc.integer({ min: 1, max: 1e6 }), fets: fc.integer({ min: 3, max: 30 }) })
  .map(({ seed, fets }) => ({ seed, file: randomCircuit(seed, fets) }));
const first = (file: CircuitFile): OperatingPointRecord => firstOperatingPoint(file).record;
const runs = (numRuns: number) => ({ seed: 4, numRuns });

/** Nets and refs under other names, parts in another order. */
function renamed(file: CircuitFile, seed: number): { file: CircuitFile; netOf: (net: string) => string } {
  const random = seededRandom(seed);
  const nets = [...new Set(file.parts.flatMap((part) => terminalsOf(part).map(({ net }) => net)))];
  const shuffled = nets.map((net) => ({ net, key: random() })).sort((a, b) => a.key - b.key);
  const names = new Map(shuffled.map(({ net }, index) => [net, net === file.ground ? net : `w${index}`]));
  const netOf = (net: string): string => names.get(net) ?? net;
  const parts = file.parts
    .map((part, index): CircuitPart => {
      const moved = Object.fromEntries(terminalsOf(part).map(({ name, net }) => [name, netOf(net)]));
      return { ...part, ...moved, ref: `X${index}` };
    })
    .map((part) => ({ part, key: random() }))
    .sort((a, b) => a.key - b.key)
    .map(({ part }) => part);
  return { file: { ...file, parts }, netOf };
}

describe('whatever the circuit', { timeout: 120_000 }, () => {
  test('Kirchhoff’s current law holds to 1 nA + 1 ppm of the largest branch at every listed point', () => {
    fc.assert(
      fc.property(circuits, ({ file }) => {
        const record = operatingPoint(file);
        expect(record.status).toBe('solved');
        for (const { fets, resistors, sources } of [record, ...record.alternatives]) {
          const leaving = new Map<string, number>();
          let largest = 0;
          const flow = (from: string, to: string, current = Number.NaN): void => {
            leaving.set(from, (leaving.get(from) ?? 0) + current);
            leaving.set(to, (leaving.get(to) ?? 0) - current);
            largest = Math.max(largest, Math.abs(current));
          };
          for (const part of file.parts) {
            if (part.kind === 'resistor') flow(part.a, part.b, resistors[part.ref]?.current);
            if (part.kind === 'voltage') flow(part.minus, part.plus, sources[part.ref]?.current);
            if (part.kind === 'nfet') flow(part.drain, part.source, fets[part.ref]?.id);
            if (part.kind === 'pfet') flow(part.source, part.drain, fets[part.ref]?.id);
          }
          for (const sum of leaving.values()) expect(Math.abs(sum)).toBeLessThan(1e-9 + 1e-6 * largest);
        }
      }),
      runs(40),
    );
  });

  test('the order of parts and the names of parts and nets change nothing', () => {
    fc.assert(
      fc.property(circuits, ({ seed, file }) => {
        const other = renamed(file, seed);
        const [one, two] = [first(file), first(other.file)];
        for (const [net, voltage] of Object.entries(one.nets)) {
          expect(Math.abs((two.nets[other.netOf(net)] ?? Number.NaN) - voltage)).toBeLessThan(
            1e-9 * (1 + Math.abs(voltage)),
          );
        }
      }),
      runs(60),
    );
  });

  test('a net split by a tiny resistor moves by no more than the current through it explains', () => {
    const tiny = 1e-3;
    fc.assert(
      fc.property(circuits, ({ file }) => {
        const [cut, ...others] = file.parts.filter((part) => part.kind === 'resistor');
        if (cut?.kind !== 'resistor') return;
        const rest = file.parts.filter((part) => part !== cut && !others.includes(part as typeof cut));
        const split: CircuitPart[] = [
          { ...cut, a: 'split' },
          { ref: 'RT', kind: 'resistor', a: 'split', b: cut.a, resistance: tiny },
        ];
        const [one, two] = [first(file), first({ ...file, parts: [...rest, ...others, ...split] })];
        // The same as adding it to the resistor it is in series with, which is a million times larger or more.
        const current = Math.abs(one.resistors[cut.ref]?.current ?? Number.NaN);
        for (const [net, voltage] of Object.entries(one.nets)) {
          const moved = Math.abs((two.nets[net] ?? Number.NaN) - voltage);
          expect(moved).toBeLessThan(1e3 * tiny * current + 1e-7);
        }
      }),
      runs(30),
    );
  });

  test('widths, current sources and conductances scaled by one factor keep every voltage', () => {
    fc.assert(
      fc.property(circuits, fc.double({ min: 0.01, max: 100, noNaN: true }), ({ file }, factor) => {
        const parts = file.parts.map((part): CircuitPart => {
          if (part.kind === 'resistor') return { ...part, resistance: part.resistance / factor };
          return isFet(part) && part.k !== undefined ? { ...part, k: part.k * factor } : part;
        });
        const withSource = (scale: number): CircuitPart => ({
          ref: 'I1',
          kind: 'current',
          from: 'vdd',
          to: 'n0',
          current: 1e-6 * scale,
        });
        const one = first({ ...file, parts: [...file.parts, withSource(1)] });
        const two = first({ ...file, parts: [...parts, withSource(factor)] });
        for (const [net, voltage] of Object.entries(one.nets)) {
          expect(Math.abs((two.nets[net] ?? Number.NaN) - voltage)).toBeLessThan(1e-6 * (1 + Math.abs(voltage)));
        }
      }),
      runs(30),
    );
  });

  test('Newton’s steps on a general-purpose dense factorisation lead to the same point', () => {
    fc.assert(
      fc.property(circuits, ({ file }) => {
        const read = readCircuit(file);
        if (!read.ok) throw new Error('A random circuit is well posed.');
        const network = buildNetwork(read.circuit);
        const [ours, dense] = [new Equations(network), new Equations(network, new DenseLu(network.pattern))].map(
          (equations) => settle(equations).answer,
        );
        expect([ours?.kind, dense?.kind]).toEqual(['point', 'point']);
        if (ours?.kind !== 'point' || dense?.kind !== 'point') return;
        for (const [group, voltage] of ours.x.entries()) {
          expect(Math.abs((dense.x[group] ?? Number.NaN) - voltage)).toBeLessThan(1e-6 * (1 + Math.abs(voltage)));
        }
      }),
      runs(25),
    );
  });
});
