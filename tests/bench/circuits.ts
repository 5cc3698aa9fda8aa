import type { CircuitFile, CircuitPart, FetPart } from '#shared/circuit/circuit-file';
import { seededRandom } from '../shared/solver/random-circuit';

/** The shapes that are timed, of about `fets` FETs, with every value drawn anew from `round`. */
export type Shape = (fets: number, round: number) => CircuitFile;

export const SHAPES: Readonly<Record<string, Shape>> = {
  'chains of mirrors': mirrorChain,
  'stacked pairs': stackedPairs,
  grid,
};

class Sketch {
  readonly parts: CircuitPart[] = [];
  readonly #random: () => number;

  constructor(round: number) {
    this.#random = seededRandom(round);
  }

  /** A value within ±2 %. */
  about(value: number): number {
    return value * (0.98 + 0.04 * this.#random());
  }

  #ref(letter: string): string {
    return `${letter}${this.parts.length}`;
  }

  fet(kind: FetPart['kind'], drain: string, gate: string, source: string, k: number): void {
    const body = kind === 'nfet' ? 'gnd' : 'vdd';
    const threshold = (kind === 'nfet' ? 1 : -1) * this.about(0.45);
    const overrides = { threshold, lambda: this.about(0.08), gamma: this.about(0.4) };
    this.parts.push({ ref: this.#ref('Q'), kind, drain, gate, source, body, k: this.about(k), overrides });
  }

  resistor(a: string, b: string, resistance: number): void {
    this.parts.push({ ref: this.#ref('R'), kind: 'resistor', a, b, resistance: this.about(resistance) });
  }

  supply(plus: string, voltage: number): void {
    this.parts.push({ ref: this.#ref('V'), kind: 'voltage', plus, minus: 'gnd', voltage: this.about(voltage) });
  }

  file(): CircuitFile {
    return { format: 'stillpoint.circuit', version: 1, ground: 'gnd', parts: this.parts };
  }
}

/** Each current goes through an N mirror and back through a P mirror into the next; a resistor sheds what has grown. */
function mirrorChain(fets: number, round: number): CircuitFile {
  const sketch = new Sketch(round);
  sketch.supply('vdd', 1.8);
  sketch.resistor('vdd', 'n0', 5e4);
  for (let stage = 0; 4 * stage < fets; stage++) {
    sketch.fet('nfet', `n${stage}`, `n${stage}`, 'gnd', 1e-3);
    sketch.fet('nfet', `p${stage}`, `n${stage}`, 'gnd', 1e-3);
    sketch.fet('pfet', `p${stage}`, `p${stage}`, 'vdd', 1e-3);
    sketch.fet('pfet', `n${stage + 1}`, `p${stage}`, 'vdd', 1e-3);
    sketch.resistor(`n${stage + 1}`, 'gnd', 5e5);
  }
  sketch.resistor(`n${Math.ceil(fets / 4)}`, 'gnd', 2e4);
  return sketch.file();
}

/** Five-device stages, each the next one's input, closed upon themselves as followers so that every device stays on. */
function stackedPairs(fets: number, round: number): CircuitFile {
  const sketch = new Sketch(round);
  sketch.supply('vdd', 1.8);
  sketch.supply('o0', 1);
  sketch.resistor('vdd', 'bias', 6e4);
  sketch.fet('nfet', 'bias', 'bias', 'gnd', 1e-3);
  for (let stage = 0; 5 * stage < fets; stage++) {
    const [tail, load, out] = [`t${stage}`, `m${stage}`, `o${stage + 1}`];
    sketch.fet('nfet', tail, 'bias', 'gnd', 1e-3);
    sketch.fet('nfet', load, `o${stage}`, tail, 2e-3);
    sketch.fet('nfet', out, out, tail, 2e-3);
    sketch.fet('pfet', load, load, 'vdd', 1e-3);
    sketch.fet('pfet', out, load, 'vdd', 1e-3);
  }
  return sketch.file();
}

/** A square mesh of resistors with a diode-connected device at every crossing, fed along one side: one block, much fill-in. */
function grid(fets: number, round: number): CircuitFile {
  const sketch = new Sketch(round);
  const side = Math.max(2, Math.round(Math.sqrt(fets)));
  sketch.supply('vdd', 3);
  for (let row = 0; row < side; row++) {
    sketch.resistor('vdd', `x${row}y0`, 2e3);
    for (let column = 0; column < side; column++) {
      const net = `x${row}y${column}`;
      sketch.fet('nfet', net, net, 'gnd', 1e-5);
      if (column + 1 < side) sketch.resistor(net, `x${row}y${column + 1}`, 1e3);
      if (row + 1 < side) sketch.resistor(net, `x${row + 1}y${column}`, 1e3);
    }
  }
  return sketch.file();
}
