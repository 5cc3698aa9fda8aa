import { type CircuitPart, type FetPart, isFet } from '../circuit/circuit-file';
import type { Circuit } from '../circuit/read-circuit';
import { TERMINALS, type TerminalName, terminalsOf } from '../circuit/terminals';
import { analyse, type LuAnalysis } from '../linalg/lu-analysis';
import { PatternBuilder, slotOf } from '../linalg/sparse-matrix';
import { KIND, orderNets } from './net-order';

/** A part by its index in the circuit's list, with the nets it is on. */
export interface FetPlace {
  readonly index: number;
  readonly drain: number;
  readonly gate: number;
  readonly source: number;
  readonly body: number;
}

export interface TwoTerminalPlace {
  readonly index: number;
  /** The net at a or from. */
  readonly a: number;
  /** The net at b or to. */
  readonly b: number;
}

/** A voltage source or an inductor that hangs net `child` on net `parent`, nearer to its group's root. */
export interface BranchPlace {
  readonly index: number;
  readonly parent: number;
  readonly child: number;
  /** The child is at the branch's plus (or a) end. */
  readonly childIsPlus: boolean;
}

/**
 * All that a circuit's wiring decides, whatever its values: made once, and good for every circuit wired alike. Nets joined
 * by voltage sources and inductors keep fixed differences, so they move as one group with one unknown, the voltage of
 * the group's root; ground's group has none. Nets are numbered in the order of their names, groups and parts in one
 * that neither names, refs nor the file's order decide, so the same circuit is summed in the same order however it was
 * written down.
 */
export interface Topology {
  readonly parts: readonly CircuitPart[];
  readonly nets: readonly string[];
  readonly ground: number;
  /** Unknown of each net, −1 for nets that voltage sources hold against ground. */
  readonly groupOf: Int32Array;
  /** The nets of each unknown, its root first. */
  readonly groups: readonly (readonly number[])[];
  readonly fets: readonly FetPlace[];
  readonly resistors: readonly TwoTerminalPlace[];
  readonly currents: readonly TwoTerminalPlace[];
  /** From the roots outwards. */
  readonly branches: readonly BranchPlace[];
  readonly analysis: LuAnalysis;
  /** Slot of each unknown's diagonal. */
  readonly diagonal: Int32Array;
  /** Of each FET eight slots: the drain's row, then the source's, each against drain, gate, source, body. */
  readonly fetSlots: Int32Array;
  /** Of each resistor four slots: (a, a), (a, b), (b, a), (b, b). Entries that ground takes go to the slot past the last. */
  readonly resistorSlots: Int32Array;
}

/** Whether a circuit has the wiring that a topology was made of, part by part. */
export function isWiredAs(topology: Topology, circuit: Circuit): boolean {
  return (
    topology.parts.length === circuit.parts.length &&
    topology.nets[topology.ground] === circuit.ground &&
    circuit.parts.every((part, index) => isSameWiring(part, topology.parts[index]))
  );
}

function isSameWiring(one: CircuitPart, other: CircuitPart | undefined): boolean {
  if (one === other) return true;
  if (one.kind !== other?.kind) return false;
  const [nets, others]: Partial<Record<TerminalName, string | undefined>>[] = [one, other];
  return TERMINALS[one.kind].every((terminal) => nets?.[terminal] === others?.[terminal]);
}

export function topologyOf(circuit: Circuit): Topology {
  const { parts } = circuit;
  const names = new Set([circuit.ground]);
  for (const part of parts) for (const { net } of terminalsOf(part)) names.add(net);
  const nets = [...names].sort();
  const numbers = new Map(nets.map((net, index) => [net, index]));
  const numberOf = (net: string): number => numbers.get(net) as number;
  const ground = numberOf(circuit.ground);
  const placeOf = orderNets(parts, nets.length, numberOf);

  const order = canonicalOrder(parts, (net) => placeOf[numberOf(net)] as number);
  const { groupOf, groups, branches } = joinGroups(parts, order, placeOf, ground, numberOf);
  const fets = order.flatMap((index) => {
    const part = parts[index] as CircuitPart;
    return isFet(part) ? [fetPlace(index, part, numberOf)] : [];
  });
  const resistors = order.flatMap((index) => {
    const part = parts[index] as CircuitPart;
    return part.kind === 'resistor' ? [{ index, a: numberOf(part.a), b: numberOf(part.b) }] : [];
  });
  const currents = order.flatMap((index) => {
    const part = parts[index] as CircuitPart;
    return part.kind === 'current' ? [{ index, a: numberOf(part.from), b: numberOf(part.to) }] : [];
  });
  const jacobian = layOut(groupOf, groups.length, fets, resistors);
  return { parts, nets, ground, groupOf, groups, fets, resistors, currents, branches, ...jacobian };
}

function fetPlace(index: number, part: FetPart, numberOf: (net: string) => number): FetPlace {
  const source = numberOf(part.source);
  const body = part.body === undefined ? source : numberOf(part.body);
  return { index, drain: numberOf(part.drain), gate: numberOf(part.gate), source, body };
}

/** Parts by what they are and where they go; parts wired in parallel stay as they came. */
function canonicalOrder(parts: readonly CircuitPart[], placeOf: (net: string) => number): number[] {
  const keys = parts.map((part) => {
    const places = terminalsOf(part).map(({ net }) => placeOf(net));
    const [first = 0, second = 0, third = 0, fourth = -1] = places;
    if (part.kind === 'voltage' || part.kind === 'current') return [KIND[part.kind], first, second];
    // Which of the two ends is called what is a label.
    if (!isFet(part)) return [KIND[part.kind], Math.min(first, second), Math.max(first, second)];
    return [KIND[part.kind], Math.min(first, third), Math.max(first, third), second, fourth];
  });
  const compare = (a: readonly number[] = [], b: readonly number[] = []): number => {
    for (let at = 0; at < a.length; at++) if (a[at] !== b[at]) return (a[at] as number) - (b[at] ?? 0);
    return 0;
  };
  return [...parts.keys()].sort((a, b) => compare(keys[a], keys[b]));
}

interface Edge {
  readonly index: number;
  readonly plus: number;
  readonly minus: number;
}

/** Walks the forest of voltage sources and inductors (checked to have no loop) from ground, then from the first net of each other tree. */
function joinGroups(
  parts: readonly CircuitPart[],
  order: readonly number[],
  placeOf: Int32Array,
  ground: number,
  numberOf: (net: string) => number,
) {
  const edges = new Map<number, Edge[]>();
  const hang = (net: number, edge: Edge): void => {
    const list = edges.get(net);
    if (list) list.push(edge);
    else edges.set(net, [edge]);
  };
  for (const index of order) {
    const part = parts[index] as CircuitPart;
    const ends =
      part.kind === 'voltage' ? [part.plus, part.minus] : part.kind === 'inductor' ? [part.a, part.b] : undefined;
    if (!ends) continue;
    const [plus = ground, minus = ground] = ends.map(numberOf);
    hang(plus, { index, plus, minus });
    hang(minus, { index, plus, minus });
  }

  const groupOf = new Int32Array(placeOf.length).fill(-2);
  const groups: number[][] = [];
  const branches: BranchPlace[] = [];
  const byPlace = new Int32Array(placeOf.length);
  for (let net = 0; net < placeOf.length; net++) byPlace[placeOf[net] as number] = net;
  for (const root of [ground, ...byPlace]) {
    if (groupOf[root] !== -2) continue;
    const group = root === ground ? -1 : groups.length;
    groupOf[root] = group;
    const members = [root];
    for (const parent of members) {
      for (const { index, plus, minus } of edges.get(parent) ?? []) {
        const childIsPlus = parent === minus;
        const child = childIsPlus ? plus : minus;
        if (groupOf[child] !== -2) continue;
        groupOf[child] = group;
        branches.push({ index, parent, child, childIsPlus });
        members.push(child);
      }
    }
    if (group >= 0) groups.push(members);
  }
  return { groupOf, groups, branches };
}

/** The Jacobian's pattern, and each part's slots in it. */
function layOut(
  groupOf: Int32Array,
  size: number,
  fets: readonly FetPlace[],
  resistors: readonly TwoTerminalPlace[],
): Pick<Topology, 'analysis' | 'diagonal' | 'fetSlots' | 'resistorSlots'> {
  const builder = new PatternBuilder(size);
  const rows: number[] = [];
  const columns: number[] = [];
  const reserve = (row: number, column: number): void => {
    const [i, j] = [groupOf[row] as number, groupOf[column] as number];
    const isThere = i >= 0 && j >= 0;
    if (isThere) builder.add(i, j);
    rows.push(isThere ? i : -1);
    columns.push(j);
  };
  const reserveRow = (row: number, drain: number, gate: number, source: number, body: number): void => {
    reserve(row, drain);
    reserve(row, gate);
    reserve(row, source);
    reserve(row, body);
  };
  for (const { drain, gate, source, body } of fets) {
    reserveRow(drain, drain, gate, source, body);
    reserveRow(source, drain, gate, source, body);
  }
  for (const { a, b } of resistors) {
    reserve(a, a);
    reserve(a, b);
    reserve(b, a);
    reserve(b, b);
  }
  const pattern = builder.build();
  const slots = new Int32Array(rows.length);
  for (let at = 0; at < slots.length; at++) {
    const row = rows[at] as number;
    slots[at] = row < 0 ? pattern.rows.length : slotOf(pattern, row, columns[at] as number);
  }
  return {
    analysis: analyse(pattern),
    diagonal: Int32Array.from({ length: size }, (_, group) => slotOf(pattern, group, group)),
    fetSlots: slots.subarray(0, 8 * fets.length),
    resistorSlots: slots.subarray(8 * fets.length),
  };
}
