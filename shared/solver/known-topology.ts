import type { Circuit } from '../circuit/read-circuit';
import { isWiredAs, type Topology, topologyOf } from './topology';

/**
 * The topology of the circuit that its keeper solved last, made anew only when the wiring has changed. It saves work and
 * never changes an answer: a topology holds nothing that solving leaves behind.
 */
export class KnownTopology {
  #last: Topology | undefined;

  of(circuit: Circuit): Topology {
    if (!this.#last || !isWiredAs(this.#last, circuit)) this.#last = topologyOf(circuit);
    return this.#last;
  }
}
