import type { CurrentPart, FetPart, ResistorPart } from '../circuit/circuit-file';
import type { Circuit } from '../circuit/read-circuit';
import { type FetModel, fetModel } from '../device/fet-model';
import type { SparsePattern } from '../linalg/sparse-matrix';
import { type Topology, topologyOf } from './topology';

export interface NetworkFet {
  readonly ref: string;
  readonly model: FetModel;
  readonly drain: number;
  readonly gate: number;
  readonly source: number;
  readonly body: number;
  /** Where its slots begin in the topology's `fetSlots`. */
  readonly slotsAt: number;
}

export interface NetworkResistor {
  readonly ref: string;
  readonly a: number;
  readonly b: number;
  readonly conductance: number;
  /** Where its slots begin in the topology's `resistorSlots`. */
  readonly slotsAt: number;
}

export interface NetworkCurrent {
  readonly ref: string;
  readonly from: number;
  readonly to: number;
  readonly current: number;
}

/** A voltage source or an inductor that hangs net `child` on net `parent`, nearer to its group's root. */
export interface NetworkBranch {
  readonly ref: string;
  readonly kind: 'voltage' | 'inductor';
  /** V from minus to plus, 0 for an inductor. */
  readonly voltage: number;
  readonly parent: number;
  readonly child: number;
  /** The child is at the branch's plus (or a) end. */
  readonly childIsPlus: boolean;
}

/** A circuit as the solver sees it: a topology, and the values of its parts. */
export interface Network {
  readonly topology: Topology;
  readonly nets: readonly string[];
  readonly ground: number;
  /** Unknown of each net, −1 for nets that voltage sources hold against ground. */
  readonly groupOf: Int32Array;
  /** Volts of each net above its group's root. */
  readonly offset: Float64Array;
  readonly groups: readonly (readonly number[])[];
  readonly fets: readonly NetworkFet[];
  readonly resistors: readonly NetworkResistor[];
  readonly currents: readonly NetworkCurrent[];
  /** From the roots outwards. */
  readonly branches: readonly NetworkBranch[];
  readonly pattern: SparsePattern;
  readonly diagonal: Int32Array;
}

/** Fills a circuit's values into its topology. */
export function buildNetwork(circuit: Circuit, topology: Topology = topologyOf(circuit)): Network {
  const { parts, processes, temperature } = circuit;
  const { nets, ground, groupOf, groups, diagonal, analysis } = topology;
  const branches = topology.branches.map(({ index, ...place }): NetworkBranch => {
    const part = parts[index];
    if (part?.kind === 'voltage') return { ref: part.ref, kind: 'voltage', voltage: part.voltage, ...place };
    return { ref: part?.ref ?? '', kind: 'inductor', voltage: 0, ...place };
  });
  const offset = new Float64Array(nets.length);
  for (const { parent, child, childIsPlus, voltage } of branches) {
    offset[child] = (offset[parent] as number) + (childIsPlus ? voltage : -voltage);
  }
  const fets = topology.fets.map(({ index, drain, gate, source, body }, at): NetworkFet => {
    const part = parts[index] as FetPart;
    const model = fetModel(part, processes, temperature);
    return { ref: part.ref, model, drain, gate, source, body, slotsAt: 8 * at };
  });
  const resistors = topology.resistors.map(({ index, a, b }, at): NetworkResistor => {
    const { ref, resistance } = parts[index] as ResistorPart;
    return { ref, a, b, conductance: 1 / resistance, slotsAt: 4 * at };
  });
  const currents = topology.currents.map(({ index, a, b }): NetworkCurrent => {
    const { ref, current } = parts[index] as CurrentPart;
    return { ref, from: a, to: b, current };
  });
  orderTwins(fets, areParallelFets, compareModels);
  orderTwins(resistors, areParallelResistors, (one, other) => one.conductance - other.conductance);
  orderTwins(currents, areParallelCurrents, (one, other) => one.current - other.current);
  const { pattern } = analysis;
  return { topology, nets, ground, groupOf, offset, groups, fets, resistors, currents, branches, pattern, diagonal };
}

/** Brings runs of parts wired in parallel into the order of their values, as sums depend on the order in their last digits. */
function orderTwins<Part>(
  parts: Part[],
  areParallel: (one: Part, other: Part) => boolean,
  compare: (one: Part, other: Part) => number,
): void {
  for (let from = 0; from < parts.length; ) {
    let to = from + 1;
    while (to < parts.length && areParallel(parts[from] as Part, parts[to] as Part)) to++;
    if (to - from > 1) {
      const run = parts.slice(from, to).sort(compare);
      for (const [at, part] of run.entries()) parts[from + at] = part;
    }
    from = to;
  }
}

function areParallelFets(one: NetworkFet, other: NetworkFet): boolean {
  return one.gate === other.gate && joinSame(one.drain, one.source, other.drain, other.source);
}

function areParallelResistors(one: NetworkResistor, other: NetworkResistor): boolean {
  return joinSame(one.a, one.b, other.a, other.b);
}

function areParallelCurrents(one: NetworkCurrent, other: NetworkCurrent): boolean {
  return one.from === other.from && one.to === other.to;
}

function joinSame(a: number, b: number, c: number, d: number): boolean {
  return (a === c && b === d) || (a === d && b === c);
}

function compareModels(
  { model: one, body: oneBody }: NetworkFet,
  { model: other, body: otherBody }: NetworkFet,
): number {
  return (
    one.sign - other.sign ||
    one.kn - other.kn ||
    one.threshold - other.threshold ||
    one.lambda - other.lambda ||
    one.gamma - other.gamma ||
    one.surfacePotential - other.surfacePotential ||
    oneBody - otherBody
  );
}
