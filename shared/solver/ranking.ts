import { emptyChannel, evaluateChannel } from '../device/channel';
import type { Equations } from './equations';
import { EDGE, type UndrivenPiece } from './undriven-nets';

/** What decides which of several points is listed first. */
export interface Ranked {
  /** V by group. */
  readonly x: Float64Array;
  readonly surelyUnstable: boolean;
}

/** Shares and volts within which two points are equal. */
const SAME_POWER = 1e-9;
const SAME_VOLTAGE = 1e-6;

/** Not surely unstable first, then most FETs on, then greatest power; where all that is equal, the higher net that is first by name. */
export function rank<Candidate extends Ranked>(equations: Equations, points: readonly Candidate[]): Candidate[] {
  const measured = points.map((point) => ({ point, ...measure(equations, point.x) }));
  measured.sort((a, b) => {
    if (a.point.surelyUnstable !== b.point.surelyUnstable) return a.point.surelyUnstable ? 1 : -1;
    if (a.on !== b.on) return b.on - a.on;
    if (Math.abs(a.power - b.power) > SAME_POWER * Math.max(a.power, b.power)) return b.power - a.power;
    const differing = a.voltages.findIndex((voltage, net) => !isSameVoltage(voltage, b.voltages[net] as number));
    return differing < 0 ? 0 : (b.voltages[differing] ?? 0) - (a.voltages[differing] ?? 0);
  });
  return measured.map(({ point }) => point);
}

/** Whether two solutions are one: alike at every net that is driven, and with the same nets undriven. */
export function isSamePoint(
  a: { readonly x: Float64Array; readonly undriven: readonly UndrivenPiece[] },
  b: { readonly x: Float64Array; readonly undriven: readonly UndrivenPiece[] },
): boolean {
  const undriven = new Set(a.undriven.flatMap(({ groups }) => groups));
  const others = b.undriven.flatMap(({ groups }) => groups);
  if (others.length !== undriven.size || others.some((group) => !undriven.has(group))) return false;
  return a.x.every((voltage, group) => undriven.has(group) || isSameVoltage(voltage, b.x[group] as number));
}

function isSameVoltage(a: number, b: number): boolean {
  return Math.abs(a - b) <= SAME_VOLTAGE * (1 + Math.abs(a));
}

/** Net voltages, FETs on, and the watts turned to heat, which by Tellegen's theorem are what the sources deliver. */
export function measure(equations: Equations, x: Float64Array): { voltages: Float64Array; on: number; power: number } {
  equations.spreadVoltages(x);
  const v = equations.netVoltages.slice();
  const channel = emptyChannel();
  let on = 0;
  let power = 0;
  for (const { model, drain, gate, source, body } of equations.network.fets) {
    evaluateChannel(model, v[drain] ?? 0, v[gate] ?? 0, v[source] ?? 0, v[body] ?? 0, channel);
    if (channel.law.vov > EDGE) on++;
    power += channel.vds * channel.law.id;
  }
  for (const { a, b, conductance } of equations.network.resistors)
    power += conductance * ((v[a] ?? 0) - (v[b] ?? 0)) ** 2;
  return { voltages: v, on, power };
}
