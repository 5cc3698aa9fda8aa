import type { LoadLine } from '#shared/analyses/load-line';
import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import type { CircuitFile } from '#shared/circuit/circuit-file';
import type { Solver } from './solver-client';

/** What is known of the circuit on the sheet. An outdated record answers an earlier circuit, and is replaced shortly. */
export type Solution =
  | { readonly state: 'pending' }
  | { readonly state: 'current' | 'outdated'; readonly record: OperatingPointRecord }
  | { readonly state: 'failed'; readonly reason: string };

/** A solution, and the circuit that it is about. */
export type SolutionOf = { readonly circuit: CircuitFile | undefined; readonly solution: Solution };

export type SolutionStore = {
  /** Asks for the operating point of this circuit; whatever was asked before is of no more interest. */
  submit(circuit: CircuitFile): void;
  subscribe(listener: () => void): () => void;
  latest(): SolutionOf;
  /** The load that a FET sees (V, as magnitudes); undefined when the circuit changed before it was known. */
  loadLine(ref: string, voltages: readonly number[]): Promise<LoadLine | undefined>;
  /** Stops the solver. The next `submit` starts another. */
  close(): void;
};

const NOTHING_ASKED: SolutionOf = { circuit: undefined, solution: { state: 'pending' } };

/**
 * Solves the newest circuit only: while one is being solved the next waits, a newer one takes its place in the queue, and an
 * answer that is no longer wanted is dropped. A solver that fails is stopped, and started afresh for the next circuit.
 */
export function createSolutionStore(startSolver: () => Solver): SolutionStore {
  const listeners = new Set<() => void>();
  let latest = NOTHING_ASKED;
  let solver: Solver | undefined;
  let wanted: CircuitFile | undefined;
  let running: symbol | undefined;

  const publish = (next: SolutionOf) => {
    latest = next;
    for (const listener of listeners) listener();
  };
  const stop = () => {
    solver?.stop();
    solver = undefined;
    running = undefined;
  };
  const run = async (circuit: CircuitFile) => {
    const thisRun = Symbol('run');
    running = thisRun;
    let solution: Solution;
    try {
      solver ??= startSolver();
      solution = { state: 'current', record: await solver.operatingPoint(circuit) };
    } catch (error) {
      solution = { state: 'failed', reason: failure(error) };
    }
    if (running !== thisRun) return;
    running = undefined;
    if (solution.state === 'failed') stop();
    if (wanted === circuit) publish({ circuit, solution });
    else if (wanted) void run(wanted);
  };

  return {
    submit(circuit) {
      if (circuit === wanted) return;
      wanted = circuit;
      publish({ circuit: latest.circuit, solution: outdated(latest.solution) });
      if (!running) void run(circuit);
    },
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    latest: () => latest,
    async loadLine(ref, voltages) {
      const asked = solver;
      if (!asked || running || latest.solution.state !== 'current') return undefined;
      const { circuit } = latest;
      try {
        const line = await asked.loadLine(ref, voltages);
        return wanted === circuit ? line : undefined;
      } catch {
        // A solver that fails here fails the next circuit too, which then starts another.
        if (solver === asked && !running) stop();
        return undefined;
      }
    },
    close() {
      wanted = undefined;
      stop();
    },
  };
}

/** The same once another circuit is on the sheet. */
function outdated(solution: Solution): Solution {
  switch (solution.state) {
    case 'current':
      return { state: 'outdated', record: solution.record };
    case 'failed':
      return { state: 'pending' };
    case 'pending':
    case 'outdated':
      return solution;
  }
}

function failure(error: unknown): string {
  const why = error instanceof Error ? error.message : String(error);
  return `The solver stopped (${why}). Change any value and it starts again; if it stops again, undo the last change.`;
}
