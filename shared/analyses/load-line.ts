import { type FetPart, isFet, type VoltagePart } from '../circuit/circuit-file';
import type { Circuit } from '../circuit/read-circuit';
import { Equations } from '../solver/equations';
import { buildNetwork, type Network } from '../solver/network';
import { settleFrom } from '../solver/settle';
import { topologyOf } from '../solver/topology';
import type { OperatingPointRecord } from './operating-point-record';
import { describeSolution } from './solution';

/** V and A as magnitudes seen from the end of the channel that is its source; a negative current would have to flow back. */
export type LoadPoint = { readonly vds: number; readonly id: number };

/** What the rest of a circuit presents to a device's channel. */
export type LoadLine =
  | { readonly kind: 'swept'; readonly points: readonly LoadPoint[] }
  /** Ideal sources hold both ends of the channel: whatever flows, VDS is this. */
  | { readonly kind: 'fixed'; readonly vds: number };

/**
 * The load seen by a FET of a solved circuit: its channel is replaced by an ideal voltage source, which takes each of
 * `voltages` (V, as magnitudes) in turn, and the current through it is read. From the operating point the circuit is followed
 * outwards to either side, each point from the one before; a voltage at which it has no solution is left out. Works
 * between two `yield`s for one point's time, so that a caller can stop in between. Undefined without such a FET or solution.
 */
export function* traceLoadLine(
  circuit: Circuit,
  record: OperatingPointRecord,
  ref: string,
  voltages: readonly number[],
): Generator<undefined, LoadLine | undefined> {
  const part = circuit.parts.filter(isFet).find((fet) => fet.ref === ref);
  const at = record.fets[ref];
  if (!part || !at || record.status !== 'solved') return undefined;
  if (areHeld(circuit, part)) return { kind: 'fixed', vds: Math.abs(at.vds) };

  const start = Math.abs(at.vds);
  const points: LoadPoint[] = [];
  const topology = topologyOf(sweepTo(circuit, part, at.reversed, start));
  const upwards = voltages.filter((vds) => vds >= start).toSorted((a, b) => a - b);
  const downwards = voltages.filter((vds) => vds < start).toSorted((a, b) => b - a);
  for (const sweep of [upwards, downwards]) {
    let x: Float64Array | undefined;
    for (const vds of sweep) {
      yield undefined;
      const network = buildNetwork(sweepTo(circuit, part, at.reversed, vds), topology);
      const equations = new Equations(network);
      // Only voltages differ from one point to the next, so nets are grouped alike and the last answer starts the next.
      const settled = settleFrom(equations, x ?? voltagesOf(network, record));
      if (settled.kind !== 'point') continue;
      x = settled.x;
      const current = describeSolution(equations, x, false).solution.sources[ref]?.current ?? 0;
      points.push({ vds, id: -signOf(part) * current + 0 });
    }
  }
  return { kind: 'swept', points: points.sort((a, b) => a.vds - b.vds) };
}

/** As `traceLoadLine`, at one go. */
export function loadLine(
  circuit: Circuit,
  record: OperatingPointRecord,
  ref: string,
  voltages: readonly number[],
): LoadLine | undefined {
  const trace = traceLoadLine(circuit, record, ref, voltages);
  for (;;) {
    const step = trace.next();
    if (step.done) return step.value;
  }
}

function signOf({ kind }: FetPart): 1 | -1 {
  return kind === 'nfet' ? 1 : -1;
}

/** The circuit with a source in the channel's place. The gate and the body draw no current, so nothing else changes. */
function sweepTo(circuit: Circuit, part: FetPart, reversed: boolean, vds: number): Circuit {
  const [plus, minus] = reversed ? [part.source, part.drain] : [part.drain, part.source];
  const source: VoltagePart = { kind: 'voltage', ref: part.ref, plus, minus, voltage: signOf(part) * vds };
  return { ...circuit, parts: circuit.parts.map((one) => (one === part ? source : one)) };
}

/** Whether voltage sources and inductors alone join the channel's ends, so that another source would close a loop. */
function areHeld(circuit: Circuit, part: FetPart): boolean {
  if (part.drain === part.source) return true;
  const { nets, groupOf } = topologyOf({ ...circuit, parts: circuit.parts.filter((one) => one !== part) });
  const [drain, source] = [nets.indexOf(part.drain), nets.indexOf(part.source)];
  return drain >= 0 && source >= 0 && groupOf[drain] === groupOf[source];
}

/** V by group: what the record says of each group's root. */
function voltagesOf({ groups, nets, offset }: Network, record: OperatingPointRecord): Float64Array {
  return Float64Array.from(groups, ([root = 0]) => (record.nets[nets[root] ?? ''] ?? 0) - (offset[root] ?? 0));
}
