import { operatingPoint } from '#shared/analyses/operating-point';
import type { CircuitFile } from '#shared/circuit/circuit-file';
import { type Circuit, readCircuit } from '#shared/circuit/read-circuit';
import { Equations } from '#shared/solver/equations';
import { buildNetwork } from '#shared/solver/network';
import { settle } from '#shared/solver/settle';
import { type Topology, topologyOf } from '#shared/solver/topology';
import { DenseLu } from '../shared/solver/dense-lu';
import { SHAPES, type Shape } from './circuits';
import { print } from './print';

const SIZES = [10, 60, 100, 1000, 10_000];
/** Unknowns above which a dense factorisation would take minutes. */
const MOST_DENSE_UNKNOWNS = 700;

interface Timing {
  readonly fets: number;
  readonly unknowns: number;
  readonly iterations: number;
  /** ms, medians. */
  readonly cold: number;
  readonly known: number;
  readonly dense: number | null;
}

/**
 * Times the way from a checked circuit to its operating point, the search for further points left aside. Cold: with the topology
 * still to be analysed. Known: with the topology of an earlier round, values and start anew. Dense: as known, the same
 * Newton steps on ml-matrix. Values change every round, so nothing can be remembered; kinds take turns within a round, so that a
 * busy machine slows all alike and the ratios stand.
 */
export function speed(): void {
  for (const [name, shape] of Object.entries(SHAPES)) {
    print(`\n${name}`);
    print('    FETs  unknowns  steps    cold ms   known ms  cold/known   dense ms  dense/known');
    const timings = SIZES.map((size) => time(shape, size));
    for (const { fets, unknowns, iterations, cold, known, dense } of timings) {
      const row = [
        String(fets).padStart(8),
        String(unknowns).padStart(10),
        String(iterations).padStart(7),
        cold.toFixed(2).padStart(11),
        known.toFixed(2).padStart(11),
        (cold / known).toFixed(1).padStart(12),
        (dense?.toFixed(1) ?? '–').padStart(11),
        (dense === null ? '–' : (dense / known).toFixed(0)).padStart(13),
      ];
      print(row.join(''));
    }
    const [small, large] = [timings[2], timings[4]];
    if (small && large) {
      const exponent = (a: number, b: number): string =>
        (Math.log(b / a) / Math.log(large.fets / small.fets)).toFixed(2);
      print(
        `    from 100 to 10,000: cold grows as FETs^${exponent(small.cold, large.cold)}, known as FETs^${exponent(small.known, large.known)}`,
      );
    }
  }
  searched();
}

function time(shape: Shape, size: number): Timing {
  const rounds = size <= 100 ? 60 : size <= 1000 ? 12 : 5;
  const cold: number[] = [];
  const known: number[] = [];
  const dense: number[] = [];
  const kept = topologyOf(checked(shape(size, 1)));
  const unknowns = kept.groups.length;
  let iterations = 0;
  // The first rounds warm the compiler up.
  for (let round = -Math.ceil(rounds / 3); round < rounds; round++) {
    const circuit = checked(shape(size, 1000 + round));
    const one = clock(() => solve(circuit, topologyOf(circuit)));
    const two = clock(() => solve(circuit, kept));
    const three =
      unknowns <= MOST_DENSE_UNKNOWNS && (size <= 100 || round % 6 === 0)
        ? clock(() => solve(circuit, kept, true))
        : null;
    if (round < 0) continue;
    cold.push(one.ms);
    known.push(two.ms);
    if (three) dense.push(three.ms);
    iterations = two.result;
  }
  return {
    fets: kept.fets.length,
    unknowns,
    iterations,
    cold: median(cold),
    known: median(known),
    dense: dense.length > 0 ? median(dense) : null,
  };
}

/** The whole record with its search, as HTTP and the command line give it, for the size that people draw. */
function searched(): void {
  print('\nthe whole record of 60 FETs from the file on, further points searched');
  for (const [name, shape] of Object.entries(SHAPES)) {
    const times = Array.from({ length: 12 }, (_, round) => clock(() => operatingPoint(shape(60, round))).ms);
    print(`    ${name}: ${median(times.slice(4)).toFixed(1)} ms`);
  }
}

function solve(circuit: Circuit, topology: Topology, isDense = false): number {
  const network = buildNetwork(circuit, topology);
  const { answer } = settle(isDense ? new Equations(network, new DenseLu(network.pattern)) : new Equations(network));
  if (answer.kind !== 'point') throw new Error('A timed circuit was not solved.');
  return answer.iterations;
}

function checked(file: CircuitFile): Circuit {
  const read = readCircuit(file);
  if (!read.ok) throw new Error(read.problems.map(({ message }) => message).join(' '));
  return read.circuit;
}

function clock<Result>(work: () => Result): { ms: number; result: Result } {
  const from = performance.now();
  const result = work();
  return { ms: performance.now() - from, result };
}

function median(list: readonly number[]): number {
  return list.toSorted((a, b) => a - b)[list.length >> 1] ?? Number.NaN;
}
