import { type Problem, problem } from '../circuit/problem';
import type { Network } from '../solver/network';
import { formatValue } from '../units/format-value';

/** V from ground, or between two nets, above which bare metal is hazardous to touch (IEC 61140, from memory). */
const HAZARDOUS = 60;
/** A net counts as outside or above only by more than the accuracy of a solution: 1 µV + 1 ppm. */
const ACCURACY = 1e-6;

/** What is to be said about the nets of a solution; `v` is by net. */
export function remarkOnNets(network: Network, v: Float64Array, undriven: readonly number[]): Problem[] {
  return [...remarkOnUndriven(network, undriven), ...remarkBeyondSupplies(network, v), ...remarkOnHazard(network, v)];
}

function remarkOnUndriven(network: Network, undriven: readonly number[]): Problem[] {
  return undriven.map((net) => {
    const name = network.nets[net] ?? '';
    const message = `Net ${name} is held by leakage alone: every device that could drive it is off. Its voltage is not to be relied on; give it a path to ground or a supply.`;
    return problem('undriven-net', message, { nets: [name] });
  });
}

/** Only an ideal current source can pull a net outside the supplies, so without one there is nothing to say. */
function remarkBeyondSupplies(network: Network, v: Float64Array): Problem[] {
  const pulling = network.currents.filter(({ current }) => current !== 0).map(({ ref }) => ref);
  const supplied = network.branches.some(({ kind }) => kind === 'voltage');
  if (pulling.length === 0 || !supplied) return [];
  let low = 0;
  let high = 0;
  for (const [net, voltage] of v.entries()) {
    if (network.groupOf[net] !== -1) continue;
    low = Math.min(low, voltage);
    high = Math.max(high, voltage);
  }
  return [...v].flatMap((voltage, net) => {
    const tolerance = ACCURACY * (1 + Math.abs(voltage));
    if (voltage <= high + tolerance && voltage >= low - tolerance) return [];
    const name = network.nets[net] ?? '';
    const message = `Net ${name} lies at ${volts(voltage)}, outside the supplies (${volts(low)} to ${volts(high)}): an ideal current source pulled it where a real one could not.`;
    return [problem('beyond-supplies', message, { nets: [name] })];
  });
}

function remarkOnHazard(network: Network, v: Float64Array): Problem[] {
  const isHazardous = (voltage: number): boolean => voltage > HAZARDOUS + ACCURACY * (1 + voltage);
  const fromGround = [...v].flatMap((voltage, net) => {
    if (!isHazardous(Math.abs(voltage))) return [];
    const name = network.nets[net] ?? '';
    const message = `Net ${name} is at ${volts(voltage)}, more than 60 V from ground: hazardous to touch.`;
    return [problem('high-voltage', message, { nets: [name] })];
  });
  const highest = extreme(network, v, 1);
  const lowest = extreme(network, v, -1);
  const apart = (v[highest] ?? 0) - (v[lowest] ?? 0);
  // When ground is one of the pair, the other net is named already.
  if (!isHazardous(apart) || !((v[highest] ?? 0) > ACCURACY && (v[lowest] ?? 0) < -ACCURACY)) return fromGround;
  const names = [network.nets[highest] ?? '', network.nets[lowest] ?? ''];
  const message = `Nets ${names.join(' and ')} are ${volts(apart)} apart, more than 60 V: hazardous to touch.`;
  return [...fromGround, problem('high-voltage', message, { nets: names })];
}

/** The highest (or lowest) net; of several within the accuracy one that a voltage source holds, then the first by name. */
function extreme(network: Network, v: Float64Array, direction: 1 | -1): number {
  const most = v.reduce((peak, voltage) => Math.max(peak, direction * voltage), Number.NEGATIVE_INFINITY);
  const equal = [...v.keys()].filter((net) => direction * (v[net] ?? 0) >= most - ACCURACY * (1 + Math.abs(most)));
  return equal.find((net) => network.groupOf[net] === -1) ?? equal[0] ?? network.ground;
}

function volts(value: number): string {
  return formatValue(value, 'V');
}
