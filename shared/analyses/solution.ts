import { emptyRecord } from '../circuit/record-by-name';
import { byReference } from '../circuit/reference-order';
import { emptyChannel, evaluateChannel } from '../device/channel';
import type { Equations } from '../solver/equations';
import type { Network, NetworkFet } from '../solver/network';
import { EDGE } from '../solver/undriven-nets';
import type { FetPoint, ResistorPoint, Solution, SourcePoint } from './operating-point-record';

/** Ends of a channel that differ by less than this share of their voltage (or of 1 V) differ by rounding alone. */
const ROUNDING = 1e-13;

/** V: a net nearer to ground than this is at ground, whatever the last step of a solution left. */
const NEGLIGIBLE = 1e-18;

/** Every figure of a solution, and the largest sum of currents at any net (A). */
export function describeSolution(
  equations: Equations,
  x: Float64Array,
  surelyUnstable: boolean,
): { solution: Solution; residual: number } {
  const { network } = equations;
  equations.spreadVoltages(x);
  const v = equations.netVoltages.map((voltage) => (Math.abs(voltage) < NEGLIGIBLE ? 0 : voltage));
  const at = (net: number): number => v[net] ?? 0;
  /** A, leaving each net through everything but voltage sources and inductors. */
  const leaving = new Float64Array(v.length);
  const flow = (from: number, to: number, current: number): void => {
    leaving[from] = (leaving[from] ?? 0) + current;
    leaving[to] = (leaving[to] ?? 0) - current;
  };

  const nets = emptyRecord<number>();
  for (const [net, name] of network.nets.entries()) nets[name] = tidy(at(net));

  const resistors = emptyRecord<ResistorPoint>();
  for (const { ref, a, b, conductance } of network.resistors) {
    const voltage = at(a) - at(b);
    const current = voltage * conductance;
    flow(a, b, current);
    resistors[ref] = { voltage: tidy(voltage), current: tidy(current), power: tidy(voltage * current) };
  }
  const fets = emptyRecord<FetPoint>();
  for (const fet of network.fets) {
    const point = describeFet(fet, v);
    const downward = fet.model.sign * point.id;
    flow(fet.drain, fet.source, downward);
    fets[fet.ref] = point;
  }
  const sources = emptyRecord<SourcePoint>();
  for (const { ref, from, to, current } of network.currents) {
    flow(from, to, current);
    const voltage = at(to) - at(from);
    sources[ref] = { voltage: tidy(voltage), current: tidy(current), power: tidy(voltage * current) };
  }
  describeBranches(network, leaving, sources);

  let residual = 0;
  for (const [net, sum] of leaving.entries()) if (net !== network.ground) residual = Math.max(residual, Math.abs(sum));
  const solution = {
    nets,
    fets: byRef(fets),
    sources: byRef(sources),
    resistors: byRef(resistors),
    surelyUnstable,
  };
  return { solution, residual };
}

/** A device's figures, signed as measured. Within the edge's tolerance it is on the side that the contract gives the edge to. */
function describeFet({ model, drain, gate, source, body }: NetworkFet, v: Float64Array): FetPoint {
  const channel = emptyChannel();
  const [vd, vg, vs, vb] = [v[drain] ?? 0, v[gate] ?? 0, v[source] ?? 0, v[body] ?? 0];
  const level = Math.abs(vd - vs) <= ROUNDING * Math.max(1, Math.abs(vd));
  evaluateChannel(model, level ? vs : vd, vg, vs, vb, channel);
  const { law, vds, reversed } = channel;
  const { sign } = model;
  const off = law.vov <= EDGE;
  const vov = Math.abs(law.vov) <= EDGE ? 0 : law.vov;
  const vdsSat = Math.max(vov, 0);
  const id = off ? 0 : law.id;
  return {
    region: off ? 'off' : vds < law.vov - EDGE ? 'triode' : 'saturated',
    id: tidy(reversed ? -id : id),
    vgs: tidy(sign * channel.vgs),
    vds: tidy(sign * vds),
    vsb: tidy(sign * channel.vsb),
    vt: tidy(sign * law.vt),
    vov: tidy(vov),
    vdsSat: tidy(vdsSat),
    saturationMargin: tidy(vds - vdsSat),
    gm: off ? 0 : tidy(law.gm),
    gds: off ? 0 : tidy(law.gds),
    gmb: off ? 0 : tidy(law.gmb),
    power: tidy(vds * id),
    reversed,
  };
}

/** Voltage sources carry what the parts on their far side draw: Kirchhoff's current law from the outermost nets inwards. */
function describeBranches(network: Network, leaving: Float64Array, sources: Record<string, SourcePoint>): void {
  for (const { ref, parent, child, childIsPlus, kind, voltage } of network.branches.toReversed()) {
    const drawn = leaving[child] ?? 0;
    leaving[parent] = (leaving[parent] ?? 0) + drawn;
    leaving[child] = 0;
    if (kind !== 'voltage') continue;
    const current = childIsPlus ? drawn : -drawn;
    sources[ref] = { voltage: tidy(voltage), current: tidy(current), power: tidy(voltage * current) };
  }
}

/** The same entries in the order of a parts list. */
function byRef<Value>(entries: Readonly<Record<string, Value>>): Record<string, Value> {
  const ordered = emptyRecord<Value>();
  for (const [ref, value] of Object.entries(entries).sort(([a], [b]) => byReference(a, b))) ordered[ref] = value;
  return ordered;
}

/** A figure fit to print: never −0. */
function tidy(value: number): number {
  return value + 0;
}
