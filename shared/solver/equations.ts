import { emptyChannel, evaluateChannel } from '../device/channel';
import type { FetModel } from '../device/fet-model';
import { SparseLu } from '../linalg/sparse-lu';
import type { Network } from './network';

/** What is added to a circuit's own equations while a point is looked for; `TRUE_CIRCUIT` adds nothing. */
export interface Conditions {
  /** S, from every net to ground. */
  readonly leakage: number;
  /** Share of every source's value, 0 to 1. */
  readonly supply: number;
  /** Capacitance over time step of pseudo-time, S on every net, and the voltages the step starts from. */
  readonly inertia?: { readonly conductance: number; readonly from: Float64Array } | undefined;
  /** Voltages that unknowns are held at in place of their current law; NaN where free. */
  readonly held?: Float64Array | undefined;
}

/** ID = gds·VDS + gm·VGS + offset, in the N frame of a model: S, S, A. */
export interface LinearFet {
  readonly gds: number;
  readonly gm: number;
  readonly offset: number;
}

export const TRUE_CIRCUIT: Conditions = { leakage: 0, supply: 1 };

/**
 * Modified nodal analysis (Ho, Ruehli and Brennan, IEEE Trans. CAS 22(6), 1975, from memory), with the extra unknowns
 * of voltage sources and inductors eliminated beforehand: such a branch fixes a difference, so the nets it joins move as
 * one group, and its current follows afterwards from Kirchhoff's law. Supplies then stand exactly at their voltages and
 * what is left to vanish is current alone. All arrays are by group.
 */
export class Equations {
  readonly network: Network;
  /** A, the sum of currents leaving each group. */
  readonly residual: Float64Array;
  /** A, the sum of their magnitudes: what `residual` is small against. */
  readonly throughput: Float64Array;
  /** ∂residual/∂voltage, in the slots of the network's pattern. */
  readonly jacobian: Float64Array;
  readonly lu: SparseLu;
  /** V, by net, of the last evaluation. */
  readonly netVoltages: Float64Array;
  readonly #channel = emptyChannel();

  constructor(network: Network) {
    this.network = network;
    const size = network.groups.length;
    this.residual = new Float64Array(size);
    this.throughput = new Float64Array(size);
    this.jacobian = new Float64Array(network.pattern.rows.length);
    this.netVoltages = new Float64Array(network.nets.length);
    this.lu = new SparseLu(network.pattern);
  }

  get size(): number {
    return this.residual.length;
  }

  /** Evaluates residual, throughput and Jacobian at the groups' voltages `x`. */
  evaluate(x: Float64Array, conditions: Conditions): void {
    this.residual.fill(0);
    this.throughput.fill(0);
    this.jacobian.fill(0);
    this.spreadVoltages(x, conditions.supply);
    this.#addResistors();
    this.#addCurrents(conditions.supply);
    this.#addFets();
    if (conditions.leakage > 0) this.#addLeakage(conditions.leakage);
    if (conditions.inertia) this.#addInertia(x, conditions.inertia);
    if (conditions.held) this.#hold(x, conditions.held);
  }

  /** As `evaluate`, with every FET replaced by the linear device given, so that the whole circuit is linear. */
  evaluateLinear(x: Float64Array, leakage: number, linearised: (model: FetModel) => LinearFet): void {
    this.residual.fill(0);
    this.throughput.fill(0);
    this.jacobian.fill(0);
    this.spreadVoltages(x);
    this.#addResistors();
    this.#addCurrents(1);
    const v = this.netVoltages;
    for (const { model, drain, gate, source, slots } of this.network.fets) {
      const { gm, gds, offset } = linearised(model);
      const across = gds * ((v[drain] ?? 0) - (v[source] ?? 0));
      const current = across + gm * ((v[gate] ?? 0) - (v[source] ?? 0)) + model.sign * offset;
      this.#leave(drain, current);
      this.#leave(source, -current);
      for (const [row, direction] of ROWS) {
        this.#add(slots[row] ?? -1, direction * gds);
        this.#add(slots[row + 1] ?? -1, direction * gm);
        this.#add(slots[row + 2] ?? -1, -direction * (gm + gds));
      }
    }
    this.#addLeakage(leakage);
  }

  /** Writes every net's voltage into `netVoltages`. */
  spreadVoltages(x: Float64Array, supply = 1): void {
    const { groupOf, offset } = this.network;
    for (let net = 0; net < groupOf.length; net++) {
      const group = groupOf[net] ?? -1;
      this.netVoltages[net] = (group < 0 ? 0 : (x[group] ?? 0)) + supply * (offset[net] ?? 0);
    }
  }

  /** S, each current law's sum of slopes, from the Jacobian as it stands. */
  conductances(into = new Float64Array(this.size)): Float64Array {
    const { rows } = this.network.pattern;
    into.fill(0);
    for (let slot = 0; slot < rows.length; slot++) {
      const row = rows[slot] ?? 0;
      into[row] = (into[row] ?? 0) + Math.abs(this.jacobian[slot] ?? 0);
    }
    return into;
  }

  #leave(net: number, current: number): void {
    const group = this.network.groupOf[net] ?? -1;
    if (group < 0) return;
    this.residual[group] = (this.residual[group] ?? 0) + current;
    this.throughput[group] = (this.throughput[group] ?? 0) + Math.abs(current);
  }

  #add(slot: number, slope: number): void {
    if (slot >= 0) this.jacobian[slot] = (this.jacobian[slot] ?? 0) + slope;
  }

  #addResistors(): void {
    const v = this.netVoltages;
    for (const { a, b, conductance, slots } of this.network.resistors) {
      const current = conductance * ((v[a] ?? 0) - (v[b] ?? 0));
      this.#leave(a, current);
      this.#leave(b, -current);
      this.#add(slots[0] ?? -1, conductance);
      this.#add(slots[1] ?? -1, -conductance);
      this.#add(slots[2] ?? -1, -conductance);
      this.#add(slots[3] ?? -1, conductance);
    }
  }

  #addCurrents(supply: number): void {
    for (const { from, to, current } of this.network.currents) {
      this.#leave(from, supply * current);
      this.#leave(to, -supply * current);
    }
  }

  #addFets(): void {
    const v = this.netVoltages;
    const channel = this.#channel;
    for (const { model, drain, gate, source, body, slots } of this.network.fets) {
      evaluateChannel(model, v[drain] ?? 0, v[gate] ?? 0, v[source] ?? 0, v[body] ?? 0, channel);
      if (channel.law.vov <= 0) continue;
      this.#leave(drain, channel.current);
      this.#leave(source, -channel.current);
      for (const [row, direction] of ROWS) {
        this.#add(slots[row] ?? -1, direction * channel.byDrain);
        this.#add(slots[row + 1] ?? -1, direction * channel.byGate);
        this.#add(slots[row + 2] ?? -1, direction * channel.bySource);
        this.#add(slots[row + 3] ?? -1, direction * channel.byBody);
      }
    }
  }

  #addLeakage(leakage: number): void {
    for (const [group, nets] of this.network.groups.entries()) {
      for (const net of nets) {
        this.#leave(net, leakage * (this.netVoltages[net] ?? 0));
        this.#add(this.network.diagonal[group] ?? -1, leakage);
      }
    }
  }

  #addInertia(x: Float64Array, inertia: { conductance: number; from: Float64Array }): void {
    for (const [group, nets] of this.network.groups.entries()) {
      const conductance = inertia.conductance * nets.length;
      this.residual[group] = (this.residual[group] ?? 0) + conductance * ((x[group] ?? 0) - (inertia.from[group] ?? 0));
      this.#add(this.network.diagonal[group] ?? -1, conductance);
    }
  }

  #hold(x: Float64Array, held: Float64Array): void {
    const { rows } = this.network.pattern;
    for (let slot = 0; slot < rows.length; slot++) if (!Number.isNaN(held[rows[slot] ?? 0])) this.jacobian[slot] = 0;
    for (let group = 0; group < held.length; group++) {
      const voltage = held[group] ?? Number.NaN;
      if (Number.isNaN(voltage)) continue;
      this.residual[group] = (x[group] ?? 0) - voltage;
      this.jacobian[this.network.diagonal[group] ?? 0] = 1;
    }
  }
}

/** First slot of a FET's row and the direction in which its current leaves there. */
const ROWS: readonly (readonly [number, 1 | -1])[] = [
  [0, 1],
  [4, -1],
];
