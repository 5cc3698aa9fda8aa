import { overdriveOf } from '../device/channel';
import type { Equations } from './equations';
import type { Network, NetworkFet } from './network';

/** Overdrives within this many volts of zero are at the edge: nothing that is computed from a solution is finer. */
export const EDGE = 1e-9;
/** The share of its capacity that a device keeps at least, if it conducts, when the leakage falls a hundredfold. */
const FALLING = 0.3;
/** V, the change of an overdrive that is rounding. */
const ROUNDING = 1e-12;
/** V, by which no piece moves any more. */
const AT_REST = 1e-14;
const MOST_SWEEPS = 60;
const QUIETING_SWEEPS = 3;
/** V, the first and the last distance that is tried to turn devices off. */
const FIRST_QUIETING = 1e-3;
const LAST_QUIETING = 1e4;
const MOST_HALVINGS = 200;
const MOST_DOUBLINGS = 50;

/** Groups that leakage alone holds, moving as one because something that conducts joins them. */
export interface UndrivenPiece {
  readonly groups: readonly number[];
  /** A, net current that current sources force into the piece, and the sum of the magnitudes. */
  readonly forced: number;
  readonly forcedThroughput: number;
}

/** A device that could carry this many times all the leakage there is does not carry leakage alone. */
const BEYOND_LEAKAGE = 10;

/** Whether resistors and devices that clearly conduct join every group to ground, so that nothing needs a closer look. */
export function isDrivenThroughout(equations: Equations, x: Float64Array, leakage: number, off?: Uint8Array): boolean {
  const { network, netVoltages: v } = equations;
  equations.spreadVoltages(x);
  const pieces = new Pieces(network);
  for (const { a, b } of network.resistors) pieces.join(a, b);
  let leaked = 0;
  for (const voltage of v) leaked += leakage * Math.abs(voltage);
  for (const [index, fet] of network.fets.entries()) {
    if (off?.[index]) continue;
    const vov = overdrive(fet, v);
    if (vov > 0 && (fet.model.kn / 2) * vov * vov > BEYOND_LEAKAGE * leaked) pieces.join(fet.drain, fet.source);
  }
  for (let group = 0; group < equations.size; group++) if (!pieces.isGrounded(group)) return false;
  return true;
}

/**
 * Pieces that nothing which conducts joins to ground. `coarse` and `fine` solve the circuit with a larger and a much
 * smaller leakage: a FET is off when what it could carry at its overdrive falls with the leakage, since then it only
 * carries what the leaks draw through it. FETs in `off` are off in any case.
 */
export function findUndrivenPieces(
  equations: Equations,
  coarse: Float64Array,
  fine: Float64Array,
  off?: Uint8Array,
): UndrivenPiece[] {
  const { network } = equations;
  equations.spreadVoltages(coarse);
  const before = network.fets.map((fet) => Math.max(0, overdrive(fet, equations.netVoltages)) ** 2);
  equations.spreadVoltages(fine);
  const v = equations.netVoltages;
  const joined = new Pieces(network);
  for (const { a, b } of network.resistors) joined.join(a, b);
  for (const [index, fet] of network.fets.entries()) {
    if (off?.[index]) continue;
    const vov = overdrive(fet, v);
    if (vov > EDGE && vov * vov > FALLING * (before[index] ?? 0)) joined.join(fet.drain, fet.source);
  }

  const pieces = new Map<number, number[]>();
  for (let group = 0; group < equations.size; group++) {
    if (joined.isGrounded(group)) continue;
    const root = joined.find(group);
    const piece = pieces.get(root);
    if (piece) piece.push(group);
    else pieces.set(root, [group]);
  }
  return [...pieces].map(([root, groups]) => {
    let forced = 0;
    let forcedThroughput = 0;
    for (const { from, to, current } of network.currents) {
      const leaves = joined.find(joined.nodeOf(from)) === root;
      const enters = joined.find(joined.nodeOf(to)) === root;
      if (leaves === enters) continue;
      forced += enters ? current : -current;
      forcedThroughput += Math.abs(current);
    }
    return { groups, forced, forcedThroughput };
  });
}

/**
 * Moves each undriven piece to the voltage nearest to 0 at which every device that is off and has its drain or source
 * on it stays off: where an ever smaller leakage would leave it. `x` receives the voltages; the value is what the
 * piece's first group is to be held at.
 */
export function restUndrivenPieces(equations: Equations, x: Float64Array, pieces: readonly UndrivenPiece[]): void {
  const { network, netVoltages } = equations;
  const boundaries = pieces.map(({ groups }) => boundaryOf(network, groups));
  for (let sweep = 0; sweep < MOST_SWEEPS; sweep++) {
    let moved = 0;
    equations.spreadVoltages(x);
    for (const [index, { groups }] of pieces.entries()) {
      const from = x[groups[0] ?? 0] ?? 0;
      const shift = nearestToZero(boundaries[index] ?? [], netVoltages, from) - from;
      for (const group of groups) {
        x[group] = (x[group] ?? 0) + shift;
        for (const net of network.groups[group] ?? []) netVoltages[net] = (netVoltages[net] ?? 0) + shift;
      }
      moved = Math.max(moved, Math.abs(shift));
    }
    if (moved <= AT_REST) return;
  }
}

/** Groups joined by what conducts, as disjoint sets; the node past the last group is ground. */
class Pieces {
  readonly #network: Network;
  readonly #ground: number;
  readonly #parent: Int32Array;

  constructor(network: Network) {
    this.#network = network;
    this.#ground = network.groups.length;
    this.#parent = Int32Array.from({ length: this.#ground + 1 }, (_, node) => node);
  }

  nodeOf(net: number): number {
    const group = this.#network.groupOf[net] as number;
    return group < 0 ? this.#ground : group;
  }

  /** The node that stands for a set, its highest: path halving as in `UnionFind`. */
  find(node: number): number {
    const parent = this.#parent;
    let at = node;
    while (parent[at] !== at) {
      parent[at] = parent[parent[at] as number] as number;
      at = parent[at] as number;
    }
    return at;
  }

  join(a: number, b: number): void {
    const one = this.find(this.nodeOf(a));
    const other = this.find(this.nodeOf(b));
    this.#parent[Math.min(one, other)] = Math.max(one, other);
  }

  isGrounded(group: number): boolean {
    return this.find(group) === this.#ground;
  }
}

/** Moves each undriven piece, where it can, to the nearest voltage at which every device with its drain or source on it is off. */
export function quietUndrivenPieces(equations: Equations, x: Float64Array, pieces: readonly UndrivenPiece[]): void {
  const boundaries = pieces.map(({ groups }) => boundaryOf(equations.network, groups));
  for (let sweep = 0; sweep < QUIETING_SWEEPS; sweep++) {
    for (const [index, { groups }] of pieces.entries()) {
      equations.spreadVoltages(x);
      const shift = shiftToOff(boundaries[index] ?? [], equations.netVoltages);
      for (const group of groups) x[group] = (x[group] as number) + shift;
    }
  }
}

/** The least shift by doublings to either side that turns every device off; 0 where none does. */
function shiftToOff(boundary: readonly BoundaryFet[], v: Float64Array): number {
  const isOff = (shift: number): boolean => boundary.every((device) => overdriveAt(device, v, shift) <= 0);
  if (isOff(0)) return 0;
  for (let distance = FIRST_QUIETING; distance < LAST_QUIETING; distance *= 2) {
    if (isOff(distance)) return distance;
    if (isOff(-distance)) return -distance;
  }
  return 0;
}

/** A device between a piece and the rest, with which of its terminals move with the piece. */
interface BoundaryFet {
  readonly fet: NetworkFet;
  readonly moves: { readonly drain: number; readonly gate: number; readonly source: number; readonly body: number };
}

function boundaryOf(network: Network, groups: readonly number[]): BoundaryFet[] {
  const inside = new Set(groups);
  const share = (net: number): number => (inside.has(network.groupOf[net] ?? -1) ? 1 : 0);
  return network.fets.flatMap((fet) => {
    const moves = { drain: share(fet.drain), gate: share(fet.gate), source: share(fet.source), body: share(fet.body) };
    return moves.drain === moves.source ? [] : [{ fet, moves }];
  });
}

/** The voltage for a piece that is at `from` now, the nets being at `v`. */
function nearestToZero(boundary: readonly BoundaryFet[], v: Float64Array, from: number): number {
  // Devices that going to 0 would turn on; others stand as they are, and get their own turn if they hold another piece.
  const restricting = boundary.filter(
    (device) => overdriveAt(device, v, -from) > Math.max(0, overdriveAt(device, v, 0) + ROUNDING),
  );
  const isOff = (voltage: number): boolean =>
    restricting.every((device) => overdriveAt(device, v, voltage - from) <= 0);
  if (restricting.length === 0) return 0;

  let off = from;
  let on = 0;
  const outward = from < 0 ? -1 : 1;
  for (let doubling = 0; !isOff(off); doubling++) {
    if (doubling === MOST_DOUBLINGS) return from;
    on = off;
    off = from + outward * EDGE * 2 ** doubling;
  }
  for (let halving = 0; halving < MOST_HALVINGS; halving++) {
    const middle = on + (off - on) / 2;
    if (middle === on || middle === off) break;
    if (isOff(middle)) off = middle;
    else on = middle;
  }
  return off;
}

function overdriveAt({ fet, moves }: BoundaryFet, v: Float64Array, shift: number): number {
  return overdriveOf(
    fet.model,
    (v[fet.drain] as number) + shift * moves.drain,
    (v[fet.gate] as number) + shift * moves.gate,
    (v[fet.source] as number) + shift * moves.source,
    (v[fet.body] as number) + shift * moves.body,
  );
}

function overdrive({ model, drain, gate, source, body }: NetworkFet, v: Float64Array): number {
  return overdriveOf(model, v[drain] as number, v[gate] as number, v[source] as number, v[body] as number);
}
