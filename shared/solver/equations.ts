import { emptyChannel, evaluateChannel } from '../device/channel';
import type { FetModel } from '../device/fet-model';
import { SparseLu } from '../linalg/sparse-lu';
import type { Network, NetworkFet, NetworkResistor } from './network';

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
  /** FETs, by index, that are taken to be off whatever their voltages. */
  readonly off?: Uint8Array | undefined;
}

/** ID = gds·VDS + gm·VGS + offset, in the N frame of a model: S, S, A. */
export interface LinearFet {
  readonly gds: number;
  readonly gm: number;
  readonly offset: number;
}

/** What Newton's method asks of a factorisation. */
export type LinearSolver = Pick<SparseLu, 'factor' | 'solve' | 'determinantSign'>;

export const TRUE_CIRCUIT: Conditions = { leakage: 0, supply: 1 };

/**
 * Modified nodal analysis (Ho, Ruehli and Brennan, IEEE Trans. CAS 22(6), 1975, from memory), with the extra unknowns
 * of voltage sources and inductors eliminated beforehand: such a branch fixes a difference, so the nets it joins move as
 * one group, and its current follows afterwards from Kirchhoff's law. Supplies then stand exactly at their voltages and
 * what is left to vanish is current alone. All arrays are by group unless said otherwise, and made once: nothing is
 * allocated between two evaluations.
 */
export class Equations {
  readonly network: Network;
  /** A, the sum of currents leaving each group. */
  readonly residual: Float64Array;
  /** A, the sum of their magnitudes: what `residual` is small against. */
  readonly throughput: Float64Array;
  /** ∂residual/∂voltage, in the slots of the network's pattern; one more past the last takes what ground would. */
  readonly jacobian: Float64Array;
  readonly lu: LinearSolver;
  /** V, by net, of the last evaluation. */
  readonly netVoltages: Float64Array;
  /** V, by FET, of the last evaluation. */
  readonly overdrives: Float64Array;
  /** What Newton's method works in. */
  readonly step: Float64Array;
  readonly trial: Float64Array;
  readonly weight: Float64Array;
  readonly #channel = emptyChannel();
  /** Row of each net; ground's group has the one past the last, as it has no current law. */
  readonly #rowOf: Int32Array;
  readonly #leaving: Float64Array;
  readonly #passing: Float64Array;

  constructor(network: Network, lu: LinearSolver = new SparseLu(network.pattern, network.topology.analysis)) {
    this.network = network;
    this.lu = lu;
    const size = network.groups.length;
    this.#rowOf = network.groupOf.map((group) => (group < 0 ? size : group));
    this.#leaving = new Float64Array(size + 1);
    this.#passing = new Float64Array(size + 1);
    this.residual = this.#leaving.subarray(0, size);
    this.throughput = this.#passing.subarray(0, size);
    this.jacobian = new Float64Array(network.pattern.rows.length + 1);
    this.netVoltages = new Float64Array(network.nets.length);
    this.overdrives = new Float64Array(network.fets.length);
    this.step = new Float64Array(size);
    this.trial = new Float64Array(size);
    this.weight = new Float64Array(size);
  }

  get size(): number {
    return this.residual.length;
  }

  /** Evaluates residual, throughput and Jacobian at the groups' voltages `x`. */
  evaluate(x: Float64Array, conditions: Conditions): void {
    this.#clear();
    this.spreadVoltages(x, conditions.supply);
    this.#addResistors();
    this.#addCurrents(conditions.supply);
    this.#addFets(conditions.off);
    if (conditions.leakage > 0) this.#addLeakage(conditions.leakage);
    if (conditions.inertia) this.#addInertia(x, conditions.inertia);
    if (conditions.held) this.#hold(x, conditions.held);
  }

  /** As `evaluate`, with every FET replaced by the linear device given, so that the whole circuit is linear. */
  evaluateLinear(x: Float64Array, leakage: number, linearised: (model: FetModel) => LinearFet): void {
    this.#clear();
    this.spreadVoltages(x);
    this.#addResistors();
    this.#addCurrents(1);
    const v = this.netVoltages;
    for (const { model, drain, gate, source, slotsAt } of this.network.fets) {
      const { gm, gds, offset } = linearised(model);
      const across = gds * ((v[drain] as number) - (v[source] as number));
      const current = across + gm * ((v[gate] as number) - (v[source] as number)) + model.sign * offset;
      this.#flow(drain, source, current);
      this.#addSlopes(slotsAt, gds, gm, -(gm + gds), 0);
    }
    this.#addLeakage(leakage);
  }

  /** Writes every net's voltage into `netVoltages`. */
  spreadVoltages(x: Float64Array, supply = 1): void {
    const { groupOf, offset } = this.network;
    const v = this.netVoltages;
    for (let net = 0; net < groupOf.length; net++) {
      const group = groupOf[net] as number;
      v[net] = (group < 0 ? 0 : (x[group] as number)) + supply * (offset[net] as number);
    }
  }

  /** S, each current law's sum of slopes, from the Jacobian as it stands. */
  conductances(into: Float64Array = new Float64Array(this.size)): Float64Array {
    const { rows } = this.network.pattern;
    into.fill(0);
    for (let slot = 0; slot < rows.length; slot++) {
      const row = rows[slot] as number;
      into[row] = (into[row] as number) + Math.abs(this.jacobian[slot] as number);
    }
    return into;
  }

  #clear(): void {
    this.#leaving.fill(0);
    this.#passing.fill(0);
    this.jacobian.fill(0);
  }

  #flow(from: number, to: number, current: number): void {
    const leaving = this.#leaving;
    const passing = this.#passing;
    const out = this.#rowOf[from] as number;
    const into = this.#rowOf[to] as number;
    const size = Math.abs(current);
    leaving[out] = (leaving[out] as number) + current;
    leaving[into] = (leaving[into] as number) - current;
    passing[out] = (passing[out] as number) + size;
    passing[into] = (passing[into] as number) + size;
  }

  #add(slot: number, slope: number): void {
    this.jacobian[slot] = (this.jacobian[slot] as number) + slope;
  }

  /** A channel's slopes into its drain's row and, the other way, into its source's. */
  #addSlopes(slotsAt: number, byDrain: number, byGate: number, bySource: number, byBody: number): void {
    const slots = this.network.topology.fetSlots;
    this.#add(slots[slotsAt] as number, byDrain);
    this.#add(slots[slotsAt + 1] as number, byGate);
    this.#add(slots[slotsAt + 2] as number, bySource);
    this.#add(slots[slotsAt + 3] as number, byBody);
    this.#add(slots[slotsAt + 4] as number, -byDrain);
    this.#add(slots[slotsAt + 5] as number, -byGate);
    this.#add(slots[slotsAt + 6] as number, -bySource);
    this.#add(slots[slotsAt + 7] as number, -byBody);
  }

  #addResistors(): void {
    const v = this.netVoltages;
    const { resistors, topology } = this.network;
    const slots = topology.resistorSlots;
    for (let index = 0; index < resistors.length; index++) {
      const { a, b, conductance, slotsAt } = resistors[index] as NetworkResistor;
      this.#flow(a, b, conductance * ((v[a] as number) - (v[b] as number)));
      this.#add(slots[slotsAt] as number, conductance);
      this.#add(slots[slotsAt + 1] as number, -conductance);
      this.#add(slots[slotsAt + 2] as number, -conductance);
      this.#add(slots[slotsAt + 3] as number, conductance);
    }
  }

  #addCurrents(supply: number): void {
    for (const { from, to, current } of this.network.currents) this.#flow(from, to, supply * current);
  }

  #addFets(off: Uint8Array | undefined): void {
    const v = this.netVoltages;
    const channel = this.#channel;
    const { fets } = this.network;
    for (let index = 0; index < fets.length; index++) {
      const { model, drain, gate, source, body, slotsAt } = fets[index] as NetworkFet;
      evaluateChannel(model, v[drain] as number, v[gate] as number, v[source] as number, v[body] as number, channel);
      this.overdrives[index] = channel.law.vov;
      if (channel.law.vov <= 0 || off?.[index]) continue;
      this.#flow(drain, source, channel.current);
      this.#addSlopes(slotsAt, channel.byDrain, channel.byGate, channel.bySource, channel.byBody);
    }
  }

  #addLeakage(leakage: number): void {
    const { groups, diagonal } = this.network;
    for (let group = 0; group < groups.length; group++) {
      for (const net of groups[group] as readonly number[]) {
        const current = leakage * (this.netVoltages[net] as number);
        this.#leaving[group] = (this.#leaving[group] as number) + current;
        this.#passing[group] = (this.#passing[group] as number) + Math.abs(current);
        this.#add(diagonal[group] as number, leakage);
      }
    }
  }

  #addInertia(x: Float64Array, inertia: { conductance: number; from: Float64Array }): void {
    const { groups, diagonal } = this.network;
    for (let group = 0; group < groups.length; group++) {
      const conductance = inertia.conductance * (groups[group] as readonly number[]).length;
      const moved = (x[group] as number) - (inertia.from[group] as number);
      this.#leaving[group] = (this.#leaving[group] as number) + conductance * moved;
      this.#add(diagonal[group] as number, conductance);
    }
  }

  #hold(x: Float64Array, held: Float64Array): void {
    const { rows } = this.network.pattern;
    for (let slot = 0; slot < rows.length; slot++) {
      if (!Number.isNaN(held[rows[slot] as number] as number)) this.jacobian[slot] = 0;
    }
    for (let group = 0; group < held.length; group++) {
      const voltage = held[group] as number;
      if (Number.isNaN(voltage)) continue;
      this.residual[group] = (x[group] as number) - voltage;
      this.jacobian[this.network.diagonal[group] as number] = 1;
    }
  }
}
