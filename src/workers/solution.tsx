import {
  createContext,
  type ReactNode,
  useContext,
  useEffect,
  useLayoutEffect,
  useState,
  useSyncExternalStore,
} from 'react';
import type { FetPoint, Solution as Point, Region } from '#shared/analyses/operating-point-record';
import { terminalCurrent } from '#shared/analyses/terminal-current';
import type { CircuitFile, CircuitPart } from '#shared/circuit/circuit-file';
import type { Problem } from '#shared/circuit/problem';
import type { OperatingPoints, PointChoice } from './operating-points';
import { NO_FIGURES, type SheetFigures, sheetFigures } from './sheet-figures';
import { createSolutionStore, type Solution, type SolutionStore } from './solution-store';
import { type Solver, startSolver } from './solver-client';

export type { Solution } from './solution-store';

type FigureSource = Pick<SolutionStore, 'subscribe' | 'loadLine'> & {
  now(): SheetFigures;
  /** Shows another of the operating points, until the circuit changes. */
  show(index: number): void;
};

// The context itself never changes: each reader hears of its own figures alone, and the rest of a page is not drawn again.
const SolutionContext = createContext<FigureSource>({
  now: () => NO_FIGURES,
  subscribe: () => () => undefined,
  loadLine: async () => undefined,
  show: () => undefined,
});

/** Solves the circuit on a thread of its own each time it changes, for everything below. */
export function SolutionProvider({
  circuit,
  start = startSolver,
  children,
}: {
  circuit: CircuitFile;
  start?: () => Solver;
  children: ReactNode;
}) {
  const [store] = useState(() => createSolutionStore(start));
  const [source] = useState(() => figureSource(store));
  useEffect(() => () => store.close(), [store]);
  // Before the change is painted, so that no old figure is ever shown beside it as its own.
  useLayoutEffect(() => store.submit(circuit), [store, circuit]);
  return <SolutionContext value={source}>{children}</SolutionContext>;
}

function figureSource(store: SolutionStore): FigureSource {
  const listeners = new Set<() => void>();
  let latest = store.latest();
  let choice: PointChoice | undefined;
  let figures = sheetFigures(latest, NO_FIGURES);
  const now = () => {
    const next = store.latest();
    if (next !== latest) {
      latest = next;
      figures = sheetFigures(next, figures, choice);
    }
    return figures;
  };
  return {
    subscribe(listener) {
      listeners.add(listener);
      const leave = store.subscribe(listener);
      return () => {
        listeners.delete(listener);
        leave();
      };
    },
    now,
    // A load line goes through the first point.
    loadLine: async (ref, voltages) => (now().points.shown === 0 ? store.loadLine(ref, voltages) : undefined),
    show(index) {
      const { solution } = now();
      if (!('record' in solution)) return;
      choice = { record: solution.record, index };
      figures = sheetFigures(latest, figures, choice);
      for (const listener of listeners) listener();
    },
  };
}

/** What `pick` finds in the figures. It must give the same object as long as nothing changed. */
function useFigures<T>(pick: (figures: SheetFigures) => T): T {
  const source = useContext(SolutionContext);
  return useSyncExternalStore(source.subscribe, () => pick(source.now()));
}

export function useSolution(): Solution {
  return useFigures(({ solution }) => solution);
}

/** Whether there are figures and whose; changes with every edit, unlike the figures themselves. */
export function useSolutionState(): Solution['state'] {
  return useFigures(({ solution }) => solution.state);
}

/** The circuit that the solution answers; undefined before the first answer. */
export function useSolvedCircuit(): CircuitFile | undefined {
  return useFigures(({ circuit }) => circuit);
}

/** Where every margin ruler of the sheet ends, in volts. */
export function useVdsScale(): number {
  return useFigures(({ scaleEnd }) => scaleEnd);
}

/** A FET's figures; undefined while there are none. Whether they are the present circuit's, the solution's state tells. */
export function useFetPoint(ref: string): FetPoint | undefined {
  return useFigures(({ fets }) => fets.get(ref));
}

export function useFetRegion(ref: string): Region | undefined {
  return useFigures(({ fets }) => fets.get(ref)?.region);
}

/** A net's voltage to ground in volts; undefined while there is none. */
export function useNetVoltage(net: string): number | undefined {
  return useFigures(({ nets }) => nets.get(net));
}

/** The current in A that leaves a part by a terminal; undefined unless it is that of the circuit as it stands. */
export function useTerminalCurrent({ kind, ref }: Pick<CircuitPart, 'kind' | 'ref'>, pin: string): number | undefined {
  return useFigures(({ solution, point }) =>
    solution.state === 'current' && point ? terminalCurrent(point, kind, ref, pin) : undefined,
  );
}

/** Every figure of the operating point shown; undefined while the circuit is not solved. */
export function useShownPoint(): Point | undefined {
  return useFigures(({ point }) => point);
}

/** Whether the figures are those of a point other than the record's first. */
export function useIsOtherPoint(): boolean {
  return useFigures(({ points }) => points.shown > 0);
}

/** The circuit's operating points, which one is shown, and the way to show another. */
export function useOperatingPoints(): OperatingPoints & { show(index: number): void } {
  const { show } = useContext(SolutionContext);
  return { ...useFigures(({ points }) => points), show };
}

/** What is known to hold at the point shown. */
export function useProblems(): readonly Problem[] {
  return useFigures(({ told }) => told);
}

const NO_PROBLEMS: readonly Problem[] = [];

/** What there is to be told beside a part. */
export function useProblemsAbout(ref: string): readonly Problem[] {
  return useFigures(({ problems }) => problems.get(ref) ?? NO_PROBLEMS);
}

/** Asks for the load that a FET sees in the circuit solved last; see the solver. */
export function useAskLoadLine(): Solver['loadLine'] {
  return useContext(SolutionContext).loadLine;
}
