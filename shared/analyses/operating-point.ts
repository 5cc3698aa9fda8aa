import type { Problem } from '../circuit/problem';
import { type Circuit, readCircuit } from '../circuit/read-circuit';
import { emptyRecord } from '../circuit/record-by-name';
import { Equations } from '../solver/equations';
import { buildNetwork } from '../solver/network';
import { settle } from '../solver/settle';
import { explainFailure } from './explain-failure';
import { remarkOnNets } from './net-remarks';
import type { OperatingPointRecord, PointStatus } from './operating-point-record';
import { remarkOnFets } from './remarks';
import { describeSolution } from './solution';

/** The operating point of a circuit file that was parsed from JSON. Never throws: what is wrong is in the record's problems. */
export function operatingPoint(input: unknown): OperatingPointRecord {
  const read = readCircuit(input);
  if (!read.ok) return withoutSolution('invalid', read.problems);
  return solveCircuit(read.circuit, read.warnings);
}

/** The operating point of a circuit that was read and checked; `warnings` from reading it come first. */
export function solveCircuit(circuit: Circuit, warnings: readonly Problem[] = []): OperatingPointRecord {
  const network = buildNetwork(circuit);
  const equations = new Equations(network);
  const settled = settle(equations);
  if (settled.kind !== 'point') {
    const { problem, residual } = explainFailure(circuit, equations, settled);
    return { ...withoutSolution('unsolved', [problem, ...warnings]), iterations: settled.iterations, residual };
  }
  const { solution, residual } = describeSolution(equations, settled.x, settled.surelyUnstable);
  const undriven = settled.undriven.flatMap(({ groups }) => groups.flatMap((group) => network.groups[group] ?? []));
  equations.spreadVoltages(settled.x);
  return {
    status: 'solved',
    problems: [
      ...warnings,
      ...remarkOnFets(circuit, solution),
      ...remarkOnNets(network, equations.netVoltages, undriven),
    ],
    iterations: settled.iterations,
    residual,
    ...solution,
    alternatives: [],
    alternativesSearched: false,
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
