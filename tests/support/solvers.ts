import { loadLine } from '#shared/analyses/load-line';
import { firstOperatingPoint, operatingPoint } from '#shared/analyses/operating-point';
import type { CircuitFile } from '#shared/circuit/circuit-file';
import { readCircuit } from '#shared/circuit/read-circuit';
import type { Solver } from '../../src/workers/solver-client';

/** The real solver, on this thread: jsdom has no workers. */
export function solverHere(): Solver {
  let last: CircuitFile | undefined;
  return {
    firstPoint: async (circuit) => {
      last = circuit;
      return firstOperatingPoint(circuit).record;
    },
    searchedPoint: async () => operatingPoint(last),
    loadLine: async (ref, voltages) => {
      const read = readCircuit(last);
      return read.ok ? loadLine(read.circuit, operatingPoint(last), ref, voltages) : undefined;
    },
    stop: () => undefined,
  };
}

/** The real solver, which answers its first question and keeps every later one waiting. */
export function solverThatStalls(): Solver {
  let asked = 0;
  return {
    firstPoint: (circuit) => (asked++ === 0 ? Promise.resolve(operatingPoint(circuit)) : new Promise(() => undefined)),
    searchedPoint: async () => undefined,
    loadLine: () => new Promise(() => undefined),
    stop: () => undefined,
  };
}
