import { equalityDeep } from 'lib0/function';
import type { FetPoint, Solution as Point } from '#shared/analyses/operating-point-record';
import { type CircuitFile, isFet } from '#shared/circuit/circuit-file';
import type { Problem } from '#shared/circuit/problem';
import { NO_POINTS, type OperatingPoints, operatingPoints, type PointChoice, problemsAt } from './operating-points';
import { problemsAbout } from './problems-about';
import type { Solution, SolutionOf } from './solution-store';
import { vdsScale } from './vds-scale';

/** A solution as the parts of a page read it: whatever is the same as before is the same object as before. */
export type SheetFigures = {
  readonly solution: Solution;
  /** The circuit's operating points, and which of them the figures below are of. */
  readonly points: OperatingPoints;
  /** The point shown; undefined while the circuit is not solved. */
  readonly point: Point | undefined;
  /** The circuit that the solution answers. */
  readonly circuit: CircuitFile | undefined;
  /** Where every margin ruler of the sheet ends, in volts. */
  readonly scaleEnd: number;
  /** By reference; empty while there are no figures. */
  readonly fets: ReadonlyMap<string, FetPoint>;
  /** V to ground, by net. */
  readonly nets: ReadonlyMap<string, number>;
  /** What is known to hold at the point shown. */
  readonly told: readonly Problem[];
  /** What is to be told beside each part, by reference. */
  readonly problems: ReadonlyMap<string, readonly Problem[]>;
};

export const NO_FIGURES: SheetFigures = {
  solution: { state: 'pending' },
  points: NO_POINTS,
  point: undefined,
  circuit: undefined,
  scaleEnd: 1,
  fets: new Map(),
  nets: new Map(),
  told: [],
  problems: new Map(),
};

export function sheetFigures(
  { circuit, solution, searching }: SolutionOf,
  before: SheetFigures,
  choice?: PointChoice,
): SheetFigures {
  const record = 'record' in solution ? solution.record : undefined;
  const settled = solution.state === 'current' && !searching;
  const points = keptIfEqual(before.points, operatingPoints(record, choice, settled ? undefined : before.points.count));
  const sameRecord = record && 'record' in before.solution && before.solution.record === record;
  if (sameRecord && before.circuit === circuit && before.points.shown === points.shown) {
    return { ...before, solution, points };
  }
  const point = points.points[points.shown];
  const told = record ? problemsAt(record, points.shown) : [];
  return {
    solution,
    points,
    point,
    circuit,
    scaleEnd: point ? vdsScale(point, marginsAsked(circuit)) : 1,
    fets: keptWhereEqual(before.fets, Object.entries(point?.fets ?? {})),
    nets: new Map(Object.entries(point?.nets ?? {})),
    told,
    problems: keptWhereEqual(
      before.problems,
      (record && circuit ? circuit.parts : []).map((part) => [part.ref, problemsAbout(part, told)] as const),
    ),
  };
}

/** Whoever reads the points hears of them only when they changed. */
function keptIfEqual(before: OperatingPoints, now: OperatingPoints): OperatingPoints {
  const same = before.shown === now.shown && before.count === now.count && before.points.length === now.points.length;
  return same && before.points.every((point, index) => point === now.points[index]) ? before : now;
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
