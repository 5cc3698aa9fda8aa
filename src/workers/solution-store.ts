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
export type SolutionOf = {
  readonly circuit: CircuitFile | undefined;
  readonly solution: Solution;
  /** Whether the circuit's other operating points are still being looked for. */
  readonly searching: boolean;
};

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

const NOTHING_ASKED: SolutionOf = { circuit: undefined, solution: { state: 'pending' }, searching: false };

/**
 * Solves the newest circuit only, and then looks whether it has other operating points: while one is being solved the next waits, a newer one takes its place in the queue, and an
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
      solution = { state: 'current', record: await solver.firstPoint(circuit) };
    } catch (error) {
      solution = { state: 'failed', reason: failure(error) };
    }
    if (running !== thisRun) return;
    running = undefined;
    if (solution.state === 'failed') stop();
    if (wanted === circuit) publish({ circuit, solution, searching: solution.state === 'current' });
    else if (wanted) return void run(wanted);
    // Whoever hears of the first answer may already have changed the circuit.
    if (wanted === circuit && solution.state === 'current') void searchOn(circuit);
  };
  /** Asks for what may come after the first answer, and drops it when the circuit has changed since. */
  const afterwards = async <Answer>(circuit: CircuitFile | undefined, ask: (solver: Solver) => Promise<Answer>) => {
    const asked = solver;
    if (!asked || running) return undefined;
    try {
      const answer = await ask(asked);
      return wanted === circuit ? answer : undefined;
    } catch {
      // A solver that failed is of no use to the next circuit, which starts another.
      if (solver === asked && !running) stop();
      return undefined;
    }
  };
  const searchOn = async (circuit: CircuitFile) => {
    const record = await afterwards(circuit, (asked) => asked.searchedPoint());
    if (record) publish({ circuit, solution: { state: 'current', record }, searching: false });
    else if (wanted === circuit && latest.searching) publish({ ...latest, searching: false });
  };

  return {
    submit(circuit) {
      if (circuit === wanted) return;
      wanted = circuit;
      publish({ circuit: latest.circuit, solution: outdated(latest.solution), searching: false });
      if (!running) void run(circuit);
    },
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    latest: () => latest,
    async loadLine(ref, voltages) {
      if (latest.solution.state !== 'current') return undefined;
      return afterwards(latest.circuit, (asked) => asked.loadLine(ref, voltages));
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
