import { emptyChannel, evaluateChannel } from '../device/channel';
import type { Equations } from './equations';
import type { NetworkFet } from './network';

/** Overdrives within this many volts of zero are at the edge: nothing that is computed from a solution is finer. */
export const EDGE = 1e-9;
/** The share of its capacity that a device keeps at least, if it conducts, when the leakage falls a hundredfold. */
const FALLING = 0.3;
/** V, the change of an overdrive that is rounding. */
const ROUNDING = 1e-12;
const MOST_SWEEPS = 60;
const MOST_HALVINGS = 200;
const MOST_DOUBLINGS = 50;

/** Groups that leakage alone holds, moving as one because something that conducts joins them. */
export interface UndrivenPiece {
  readonly groups: readonly number[];
  /** A, net current that current sources force into the piece, and the sum of the magnitudes. */
  readonly forced: number;
  readonly forcedThroughput: number;
}

/**
 * Pieces that nothing which conducts joins to ground. `coarse` and `fine` solve the circuit with a larger and a much
 * smaller leakage: a FET is off when what it could carry at its overdrive falls with the leakage, since then it only
 * carries what the leaks draw through it.
 */
export function findUndrivenPieces(equations: Equations, coarse: Float64Array, fine: Float64Array): UndrivenPiece[] {
  const { network } = equations;
  equations.spreadVoltages(coarse);
  const before = network.fets.map((fet) => Math.max(0, overdrive(fet, equations.netVoltages)) ** 2);
  equations.spreadVoltages(fine);
  const v = equations.netVoltages;
  const ground = equations.size;
  const parent = Int32Array.from({ length: ground + 1 }, (_, index) => index);
  const find = (group: number): number => {
    let at = group;
    while (parent[at] !== at) at = parent[at] ?? at;
    return at;
  };
  const nodeOf = (net: number): number => {
    const group = network.groupOf[net] ?? -1;
    return group < 0 ? ground : group;
  };
  const join = (a: number, b: number): void => {
    const [low, high] = [find(nodeOf(a)), find(nodeOf(b))].sort((one, other) => one - other);
    if (low !== undefined && high !== undefined) parent[low] = high;
  };
  for (const { a, b } of network.resistors) join(a, b);
  for (const [index, fet] of network.fets.entries()) {
    const vov = overdrive(fet, v);
    if (vov > EDGE && vov * vov > FALLING * (before[index] ?? 0)) join(fet.drain, fet.source);
  }

  const pieces = new Map<number, number[]>();
  for (let group = 0; group < ground; group++) {
    const root = find(group);
    if (root === find(ground)) continue;
    pieces.set(root, [...(pieces.get(root) ?? []), group]);
  }
  return [...pieces].map(([root, groups]) => {
    let forced = 0;
    let forcedThroughput = 0;
    for (const { from, to, current } of network.currents) {
      const leaves = find(nodeOf(from)) === root;
      const enters = find(nodeOf(to)) === root;
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
  for (let sweep = 0; sweep < MOST_SWEEPS; sweep++) {
    let moved = 0;
    for (const piece of pieces) {
      const anchor = piece.groups[0] ?? 0;
      const from = x[anchor] ?? 0;
      const to = nearestToZero(equations, x, piece.groups, from);
      for (const group of piece.groups) x[group] = group === anchor ? to : (x[group] ?? 0) + to - from;
      moved = Math.max(moved, Math.abs(to - from));
    }
    if (moved <= 1e-14) return;
  }
}

function nearestToZero(equations: Equations, x: Float64Array, groups: readonly number[], from: number): number {
  const { network } = equations;
  equations.spreadVoltages(x);
  const start = equations.netVoltages.slice();
  const inside = new Set(groups);
  const isInside = (net: number): boolean => inside.has(network.groupOf[net] ?? -1);
  const at = (voltage: number): Float64Array => start.map((v, net) => (isInside(net) ? v + voltage - from : v));
  const atZero = at(0);
  // Devices that going to 0 would turn on; others stand as they are, and get their own turn if they hold another piece.
  const restricting = network.fets.filter(
    (fet) =>
      isInside(fet.drain) !== isInside(fet.source) &&
      overdrive(fet, atZero) > Math.max(0, overdrive(fet, start) + ROUNDING),
  );
  const isOff = (voltage: number): boolean => {
    const v = at(voltage);
    return restricting.every((fet) => overdrive(fet, v) <= 0);
  };
  if (isOff(0)) return 0;

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

const channel = emptyChannel();

function overdrive(fet: NetworkFet, v: Float64Array): number {
  evaluateChannel(fet.model, v[fet.drain] ?? 0, v[fet.gate] ?? 0, v[fet.source] ?? 0, v[fet.body] ?? 0, channel);
  return channel.law.vov;
}
