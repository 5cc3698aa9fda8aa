import type { Problem } from '../circuit/problem';
import { type Circuit, readCircuit } from '../circuit/read-circuit';
import { emptyRecord } from '../circuit/record-by-name';
import { Equations } from '../solver/equations';
import type { KnownTopology } from '../solver/known-topology';
import { buildNetwork } from '../solver/network';
import { MOST_UNKNOWNS_SEARCHED, searchPoints } from '../solver/search';
import { type Point, settle } from '../solver/settle';
import { topologyOf } from '../solver/topology';
import { remarkOnAlternatives } from './alternatives';
import { explainFailure } from './explain-failure';
import { remarkOnNets } from './net-remarks';
import type { OperatingPointRecord, PointStatus } from './operating-point-record';
import { remarkOnFets } from './remarks';
import { describeSolution } from './solution';

/** An answer before the search for further points: the record says `alternativesSearched: false`. */
export interface FirstOperatingPoint {
  readonly record: OperatingPointRecord;
  /** What the search goes on from; none where there is nothing to search. */
  readonly solved?: Solved | undefined;
}

/** A solved circuit, between two steps of its solution. */
interface Solved {
  readonly circuit: Circuit;
  readonly warnings: readonly Problem[];
  readonly equations: Equations;
  readonly points: readonly Point[];
  readonly iterations: number;
}

/**
 * The operating point of a circuit file that was parsed from JSON, with its alternatives. Never throws: what is wrong is in
 * the record's problems. `known` spares the analysis of a circuit that is wired as the last one was.
 */
export function operatingPoint(input: unknown, known?: KnownTopology): OperatingPointRecord {
  return toTheEnd(searchAlternatives(firstOperatingPoint(input, known)));
}

/** As `operatingPoint`, of a circuit that was read and checked; `warnings` from reading it come first. */
export function solveCircuit(
  circuit: Circuit,
  warnings: readonly Problem[] = [],
  known?: KnownTopology,
): OperatingPointRecord {
  return toTheEnd(searchAlternatives(solveFirst(circuit, warnings, known)));
}

/** The operating point without the search for others, for a caller who wants to show something first. */
export function firstOperatingPoint(input: unknown, known?: KnownTopology): FirstOperatingPoint {
  const read = readCircuit(input);
  if (!read.ok) return { record: withoutSolution('invalid', read.problems) };
  return solveFirst(read.circuit, read.warnings, known);
}

/**
 * Searches on from a first answer, between two `yield`s for a millisecond or so, so that a caller can stop in between. The result
 * is the record that `operatingPoint` gives. It takes the first answer's place as a whole: should the search have met a
 * point that is listed before the first one's, it is that one's record.
 */
export function* searchAlternatives(first: FirstOperatingPoint): Generator<undefined, OperatingPointRecord> {
  const { record, solved } = first;
  if (!solved || solved.equations.size > MOST_UNKNOWNS_SEARCHED) return record;
  const points = yield* searchPoints(solved.equations, solved.points);
  return recordOf({ ...solved, points }, true);
}

function toTheEnd<Result>(steps: Generator<undefined, Result>): Result {
  for (;;) {
    const step = steps.next();
    if (step.done) return step.value;
  }
}

function solveFirst(circuit: Circuit, warnings: readonly Problem[], known?: KnownTopology): FirstOperatingPoint {
  const equations = new Equations(buildNetwork(circuit, known?.of(circuit) ?? topologyOf(circuit)));
  const { answer, points } = settle(equations);
  const { iterations } = answer;
  if (answer.kind !== 'point') {
    const { problem, residual } = explainFailure(circuit, equations, answer);
    return { record: { ...withoutSolution('unsolved', [problem, ...warnings]), iterations, residual } };
  }
  const solved = { circuit, warnings, equations, points, iterations };
  return { record: recordOf({ ...solved, points: [answer] }, false), solved };
}

/** The record of the first of the points, the others as its alternatives. */
function recordOf(solved: Solved, alternativesSearched: boolean): OperatingPointRecord {
  const { circuit, warnings, equations, iterations } = solved;
  const { network } = equations;
  const [point, ...others] = solved.points as readonly [Point, ...Point[]];
  const alternatives = others.map(({ x, surelyUnstable }) => describeSolution(equations, x, surelyUnstable).solution);
  const { solution, residual } = describeSolution(equations, point.x, point.surelyUnstable);
  const undriven = point.undriven.flatMap(({ groups }) => groups.flatMap((group) => network.groups[group] ?? []));
  equations.spreadVoltages(point.x);
  return {
    status: 'solved',
    problems: [
      ...warnings,
      ...remarkOnAlternatives(solution, alternatives),
      ...remarkOnFets(circuit, solution),
      ...remarkOnNets(network, equations.netVoltages, undriven),
    ],
    iterations,
    residual,
    ...solution,
    alternatives,
    alternativesSearched,
  };
}

/** A record of a file that is wrong or a circuit without an operating point: problems, and no figure. */
export function withoutSolution(status: Exclude<PointStatus, 'solved'>, problems: Problem[]): OperatingPointRecord {
  return {
    status,
    problems,
    iterations: 0,
    residual: 0,
    nets: emptyRecord(),
    fets: emptyRecord(),
    sources: emptyRecord(),
    resistors: emptyRecord(),
    surelyUnstable: false,
    alternatives: [],
    alternativesSearched: false,
  };
}
