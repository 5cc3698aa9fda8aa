import { operatingPoint } from '#shared/analyses/operating-point';
import type { Solver } from '../../src/workers/solver-client';

/** The real solver, on this thread: jsdom has no workers. */
export function solverHere(): Solver {
  return { operatingPoint: async (circuit) => operatingPoint(circuit), stop: () => undefined };
}

/** The real solver, which answers its first question and keeps every later one waiting. */
export function solverThatStalls(): Solver {
  let asked = 0;
  return {
    operatingPoint: (circuit) =>
      asked++ === 0 ? Promise.resolve(operatingPoint(circuit)) : new Promise(() => undefined),
    stop: () => undefined,
  };
}
