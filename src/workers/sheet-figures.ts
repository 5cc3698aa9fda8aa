import { equalityDeep } from 'lib0/function';
import type { FetPoint } from '#shared/analyses/operating-point-record';
import { type CircuitFile, isFet } from '#shared/circuit/circuit-file';
import type { Problem } from '#shared/circuit/problem';
import { problemsAbout } from './problems-about';
import type { Solution, SolutionOf } from './solution-store';
import { vdsScale } from './vds-scale';

/** A solution as the parts of a page read it: whatever is the same as before is the same object as before. */
export type SheetFigures = {
  readonly solution: Solution;
  /** The circuit that the solution answers. */
  readonly circuit: CircuitFile | undefined;
  /** Where every margin ruler of the sheet ends, in volts. */
  readonly scaleEnd: number;
  /** By reference; empty while there are no figures. */
  readonly fets: ReadonlyMap<string, FetPoint>;
  /** V to ground, by net. */
  readonly nets: ReadonlyMap<string, number>;
  /** What is to be told beside each part, by reference. */
  readonly problems: ReadonlyMap<string, readonly Problem[]>;
};

export const NO_FIGURES: SheetFigures = {
  solution: { state: 'pending' },
  circuit: undefined,
  scaleEnd: 1,
  fets: new Map(),
  nets: new Map(),
  problems: new Map(),
};

export function sheetFigures({ circuit, solution }: SolutionOf, before: SheetFigures): SheetFigures {
  const record = 'record' in solution ? solution.record : undefined;
  if (record && 'record' in before.solution && before.solution.record === record && before.circuit === circuit) {
    return { ...before, solution };
  }
  const solved = record?.status === 'solved' ? record : undefined;
  return {
    solution,
    circuit,
    scaleEnd: record ? vdsScale(record, marginsAsked(circuit)) : 1,
    fets: keptWhereEqual(before.fets, Object.entries(solved?.fets ?? {})),
    nets: new Map(Object.entries(solved?.nets ?? {})),
    problems: keptWhereEqual(
      before.problems,
      record ? (circuit?.parts ?? []).map((part) => [part.ref, problemsAbout(part, record.problems)] as const) : [],
    ),
  };
}

function keptWhereEqual<T>(
  before: ReadonlyMap<string, T>,
  entries: readonly (readonly [string, T])[],
): ReadonlyMap<string, T> {
  return new Map(
    entries.map(([name, value]) => {
      const old = before.get(name);
      return [name, old !== undefined && equalityDeep(old, value) ? old : value];
    }),
  );
}

function marginsAsked(circuit: CircuitFile | undefined): (ref: string) => number {
  const asked = new Map(
    circuit?.parts.filter(isFet).map(({ ref, intent }) => [ref, intent?.region === 'saturated' ? intent.margin : 0]),
  );
  return (ref) => asked.get(ref) ?? 0;
}
