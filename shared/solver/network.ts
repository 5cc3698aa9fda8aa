import { type CircuitPart, type FetPart, isFet } from '../circuit/circuit-file';
import type { Circuit } from '../circuit/read-circuit';
import { terminalsOf } from '../circuit/terminals';
import { type FetModel, fetModel } from '../device/fet-model';
import { PatternBuilder, type SparsePattern, slotOf } from '../linalg/sparse-matrix';

/** Where a FET or a resistor adds to the Jacobian: slots of rows × columns, −1 where either is held by ground. */
export interface NetworkFet {
  readonly ref: string;
  readonly model: FetModel;
  readonly drain: number;
  readonly gate: number;
  readonly source: number;
  readonly body: number;
  /** Slots of the drain's row, then of the source's, each against drain, gate, source, body. */
  readonly slots: Int32Array;
}

export interface NetworkResistor {
  readonly ref: string;
  readonly a: number;
  readonly b: number;
  readonly conductance: number;
  /** Slots (a, a), (a, b), (b, a), (b, b). */
  readonly slots: Int32Array;
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

/**
 * A circuit as the solver sees it. Nets joined by voltage sources and inductors keep fixed differences, so they move as
 * one group with one unknown, the voltage of the group's root; ground's group has none. Nets are numbered in the order
 * of their names and parts come in an order that neither the file's nor their refs decide, so the same circuit is
 * summed in the same order however it was written down.
 */
export interface Network {
  readonly nets: readonly string[];
  readonly ground: number;
  /** Unknown of each net, −1 for nets that voltage sources hold against ground. */
  readonly groupOf: Int32Array;
  /** Volts of each net above its group's root. */
  readonly offset: Float64Array;
  /** How many unknowns there are, and the nets of each. */
  readonly groups: readonly (readonly number[])[];
  readonly fets: readonly NetworkFet[];
  readonly resistors: readonly NetworkResistor[];
  readonly currents: readonly NetworkCurrent[];
  /** From the roots outwards. */
  readonly branches: readonly NetworkBranch[];
  readonly pattern: SparsePattern;
  /** Slot of each unknown's diagonal. */
  readonly diagonal: Int32Array;
}

/** Numbers the nets, joins them into groups and lays out the Jacobian: once for a circuit. */
export function buildNetwork(circuit: Circuit): Network {
  const parts = canonicalOrder(circuit.parts);
  const names = new Set([
    circuit.ground,
    ...parts.flatMap((part) => terminalsOf(part).map((terminal) => terminal.net)),
  ]);
  const nets = [...names].sort();
  const numbers = new Map(nets.map((net, index) => [net, index]));
  const numberOf = (net: string): number => numbers.get(net) ?? 0;
  const ground = numberOf(circuit.ground);

  const { groupOf, offset, groups, branches } = joinGroups(parts, nets.length, ground, numberOf);
  const builder = new PatternBuilder(groups.length);
  const reserve = (rows: readonly number[], columns: readonly number[]): void => {
    for (const row of rows) {
      for (const column of columns) {
        const i = groupOf[row] ?? -1;
        const j = groupOf[column] ?? -1;
        if (i >= 0 && j >= 0) builder.add(i, j);
      }
    }
  };
  const resistors = parts.flatMap((part) =>
    part.kind === 'resistor' ? [{ part, a: numberOf(part.a), b: numberOf(part.b) }] : [],
  );
  const fets = parts.filter(isFet).map((part) => ({ part, ...fetNets(part, numberOf) }));
  for (const { a, b } of resistors) reserve([a, b], [a, b]);
  for (const { drain, gate, source, body } of fets) reserve([drain, source], [drain, gate, source, body]);

  const pattern = builder.build();
  const slots = (rows: readonly number[], columns: readonly number[]): Int32Array =>
    Int32Array.from(
      rows.flatMap((row) =>
        columns.map((column) => {
          const i = groupOf[row] ?? -1;
          const j = groupOf[column] ?? -1;
          return i >= 0 && j >= 0 ? slotOf(pattern, i, j) : -1;
        }),
      ),
    );
  return {
    nets,
    ground,
    groupOf,
    offset,
    groups,
    branches,
    pattern,
    diagonal: Int32Array.from(groups, (_, group) => slotOf(pattern, group, group)),
    resistors: resistors.map(({ part, a, b }) => ({
      ref: part.ref,
      a,
      b,
      conductance: 1 / part.resistance,
      slots: slots([a, b], [a, b]),
    })),
    fets: fets.map(({ part, drain, gate, source, body }) => ({
      ref: part.ref,
      model: fetModel(part, circuit.processes, circuit.temperature),
      drain,
      gate,
      source,
      body,
      slots: slots([drain, source], [drain, gate, source, body]),
    })),
    currents: parts.flatMap((part) =>
      part.kind === 'current'
        ? [{ ref: part.ref, from: numberOf(part.from), to: numberOf(part.to), current: part.current }]
        : [],
    ),
  };
}

function fetNets(part: FetPart, numberOf: (net: string) => number) {
  const source = numberOf(part.source);
  return {
    drain: numberOf(part.drain),
    gate: numberOf(part.gate),
    source,
    body: part.body === undefined ? source : numberOf(part.body),
  };
}

/** Parts by what they are and where they go, so that neither the file's order nor the refs decide; equal parts may change places. */
function canonicalOrder(parts: readonly CircuitPart[]): CircuitPart[] {
  const keyed = parts.map((part) => {
    const { ref, ...rest } = part;
    const key = JSON.stringify(Object.entries(rest).sort(([a], [b]) => (a < b ? -1 : 1)));
    return { key, ref, part };
  });
  keyed.sort((a, b) => (a.key < b.key ? -1 : a.key > b.key ? 1 : a.ref < b.ref ? -1 : 1));
  return keyed.map(({ part }) => part);
}

interface Edge {
  ref: string;
  kind: 'voltage' | 'inductor';
  plus: number;
  minus: number;
  voltage: number;
}

/** Walks the forest of voltage sources and inductors (checked to have no loop) from ground, then from the first net of each other tree. */
function joinGroups(
  parts: readonly CircuitPart[],
  netCount: number,
  ground: number,
  numberOf: (net: string) => number,
) {
  const edges = Array.from({ length: netCount }, (): Edge[] => []);
  for (const part of parts) {
    const edge = edgeOf(part, numberOf);
    if (!edge) continue;
    edges[edge.plus]?.push(edge);
    edges[edge.minus]?.push(edge);
  }

  const groupOf = new Int32Array(netCount).fill(-2);
  const offset = new Float64Array(netCount);
  const groups: number[][] = [];
  const branches: NetworkBranch[] = [];
  const roots = [ground, ...Array.from({ length: netCount }, (_, net) => net)];
  for (const root of roots) {
    if (groupOf[root] !== -2) continue;
    const group = root === ground ? -1 : groups.length;
    groupOf[root] = group;
    const members = [root];
    for (const parent of members) {
      for (const { ref, kind, plus, minus, voltage } of edges[parent] ?? []) {
        const childIsPlus = parent === minus;
        const child = childIsPlus ? plus : minus;
        if (groupOf[child] !== -2) continue;
        groupOf[child] = group;
        offset[child] = (offset[parent] ?? 0) + (childIsPlus ? voltage : -voltage);
        branches.push({ ref, kind, voltage, parent, child, childIsPlus });
        members.push(child);
      }
    }
    if (group >= 0) groups.push(members);
  }
  return { groupOf, offset, groups, branches };
}

function edgeOf(part: CircuitPart, numberOf: (net: string) => number): Edge | null {
  const { ref } = part;
  if (part.kind === 'voltage') {
    return { ref, kind: 'voltage', plus: numberOf(part.plus), minus: numberOf(part.minus), voltage: part.voltage };
  }
  if (part.kind === 'inductor') {
    return { ref, kind: 'inductor', plus: numberOf(part.a), minus: numberOf(part.b), voltage: 0 };
  }
  return null;
}
