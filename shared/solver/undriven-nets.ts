import { emptyChannel, evaluateChannel } from '../device/channel';
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

const channel = emptyChannel();

function overdriveAt({ fet, moves }: BoundaryFet, v: Float64Array, shift: number): number {
  evaluateChannel(
    fet.model,
    (v[fet.drain] ?? 0) + shift * moves.drain,
    (v[fet.gate] ?? 0) + shift * moves.gate,
    (v[fet.source] ?? 0) + shift * moves.source,
    (v[fet.body] ?? 0) + shift * moves.body,
    channel,
  );
  return channel.law.vov;
}

function overdrive(fet: NetworkFet, v: Float64Array): number {
  evaluateChannel(fet.model, v[fet.drain] ?? 0, v[fet.gate] ?? 0, v[fet.source] ?? 0, v[fet.body] ?? 0, channel);
  return channel.law.vov;
}
