import { wrap } from 'comlink';
import type { LoadLine } from '#shared/analyses/load-line';
import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import type { CircuitFile } from '#shared/circuit/circuit-file';
import type { SolverWorker } from './solver.worker';

/** A solver on its own thread. It answers a circuit at a time; a rejected answer means that it is of no more use. */
export type Solver = {
  /** The operating point without the search for others, which is what a person waits for. */
  firstPoint(circuit: CircuitFile): Promise<OperatingPointRecord>;
  /** The record of the circuit solved last once others were searched for; given up like a load line. */
  searchedPoint(): Promise<OperatingPointRecord | undefined>;
  /**
   * The load that a FET of the circuit solved last sees at `voltages` (V, as magnitudes). Given up, and undefined then, as
   * soon as another circuit or another line is asked for.
   */
  loadLine(ref: string, voltages: readonly number[]): Promise<LoadLine | undefined>;
  stop(): void;
};

/** Far beyond what the largest sheet takes: past this the worker hangs. In milliseconds. */
const LONGEST_SOLVE = 60_000;

export function startSolver(): Solver {
  const worker = new Worker(new URL('./solver.worker.ts', import.meta.url), { type: 'module', name: 'solver' });
  const remote = wrap<SolverWorker>(worker);
  // A dead worker answers nothing at all, so each question also listens for its death.
  const dead = new Promise<never>((_, reject) => {
    worker.addEventListener('error', (event) => {
      event.preventDefault();
      reject(new Error(event.message || 'its program could not be loaded'));
    });
    worker.addEventListener('messageerror', () => reject(new Error('its answer could not be read')));
  });
  dead.catch(() => {});
  const inTime = async <Answer>(answer: Promise<Answer>): Promise<Answer> => {
    let timer: ReturnType<typeof setTimeout> | undefined;
    const late = new Promise<never>((_, reject) => {
      timer = setTimeout(() => reject(new Error('it took longer than a minute')), LONGEST_SOLVE);
    });
    try {
      return await Promise.race([answer, dead, late]);
    } finally {
      clearTimeout(timer);
    }
  };
  return {
    firstPoint: (circuit) => inTime(remote.firstPoint(circuit)),
    searchedPoint: () => inTime(remote.searchedPoint()),
    loadLine: (ref, voltages) => inTime<LoadLine | undefined>(remote.loadLine(ref, voltages)),
    stop: () => worker.terminate(),
  };
}
