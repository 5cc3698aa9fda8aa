import { createContext, type ReactNode, useContext, useEffect, useMemo, useState, useSyncExternalStore } from 'react';
import type { FetPoint, Region } from '#shared/analyses/operating-point-record';
import { type CircuitFile, isFet } from '#shared/circuit/circuit-file';
import type { Problem } from '#shared/circuit/problem';
import { problemsAbout } from './problems-about';
import { createSolutionStore, outdated, type Solution } from './solution-store';
import { type Solver, startSolver } from './solver-client';
import { vdsScale } from './vds-scale';

export type { Solution } from './solution-store';

type SheetSolution = {
  readonly solution: Solution;
  /** The circuit that the solution answers. */
  readonly circuit: CircuitFile | undefined;
  /** Where every margin ruler of the sheet ends, in volts. */
  readonly scaleEnd: number;
};

const SolutionContext = createContext<SheetSolution>({
  solution: { state: 'pending' },
  circuit: undefined,
  scaleEnd: 1,
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
  useEffect(() => () => store.close(), [store]);
  useEffect(() => store.submit(circuit), [store, circuit]);
  const latest = useSyncExternalStore(store.subscribe, store.latest);
  const value = useMemo((): SheetSolution => {
    // The store hears of a new circuit only after this render, which must not show the old figures as its own.
    const solution = latest.circuit === circuit ? latest.solution : outdated(latest.solution);
    const scaleEnd = 'record' in solution ? vdsScale(solution.record, marginsAsked(latest.circuit)) : 1;
    return { solution, circuit: latest.circuit, scaleEnd };
  }, [latest, circuit]);
  return <SolutionContext value={value}>{children}</SolutionContext>;
}

function marginsAsked(circuit: CircuitFile | undefined): (ref: string) => number {
  const asked = new Map(
    circuit?.parts.filter(isFet).map(({ ref, intent }) => [ref, intent?.region === 'saturated' ? intent.margin : 0]),
  );
  return (ref) => asked.get(ref) ?? 0;
}

export function useSolution(): Solution {
  return useContext(SolutionContext).solution;
}

/** The circuit that the solution answers; undefined before the first answer. */
export function useSolvedCircuit(): CircuitFile | undefined {
  return useContext(SolutionContext).circuit;
}

/** Where every margin ruler of the sheet ends, in volts. */
export function useVdsScale(): number {
  return useContext(SolutionContext).scaleEnd;
}

/** A FET's figures; undefined while there are none. Whether they are the present circuit's, the solution's state tells. */
export function useFetPoint(ref: string): FetPoint | undefined {
  const { solution } = useContext(SolutionContext);
  if (!('record' in solution) || solution.record.status !== 'solved') return undefined;
  return Object.hasOwn(solution.record.fets, ref) ? solution.record.fets[ref] : undefined;
}

export function useFetRegion(ref: string): Region | undefined {
  return useFetPoint(ref)?.region;
}

/** A net's voltage to ground in volts; undefined while there is none. */
export function useNetVoltage(net: string): number | undefined {
  const { solution } = useContext(SolutionContext);
  if (!('record' in solution) || solution.record.status !== 'solved') return undefined;
  return Object.hasOwn(solution.record.nets, net) ? solution.record.nets[net] : undefined;
}

const NO_PROBLEMS: readonly Problem[] = [];

/** What there is to be told beside a part. */
export function useProblemsAbout(ref: string): readonly Problem[] {
  const { solution, circuit } = useContext(SolutionContext);
  return useMemo(
    () => ('record' in solution ? problemsAbout(ref, solution.record, circuit) : NO_PROBLEMS),
    [ref, solution, circuit],
  );
}
