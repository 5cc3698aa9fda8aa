import { BUILT_IN_PROCESSES } from '../circuit/built-in-process';
import {
  type Drawing,
  type DrawnComponent,
  type DrawnPart,
  drawnPartSchema,
  partIdSchema,
  type Wire,
  type WireEnd,
  wireIdSchema,
} from '../circuit/drawing';
import type { GridPoint, Turn } from '../geometry/place';

type ComponentKind = DrawnComponent['kind'];
type ValuesOf<K extends ComponentKind> = Extract<DrawnComponent, { kind: K }>['values'];

/** Draws a starter part by part, in px on the grid. */
export class Sketch {
  readonly #parts: DrawnPart[] = [];
  readonly #wires: Wire[] = [];

  /** Places a part; returns its terminals by name. `flip` mirrors it left for right, before it is turned. */
  part<K extends ComponentKind>(
    kind: K,
    ref: string,
    x: number,
    y: number,
    values: ValuesOf<K>,
    flip = false,
    turn: Turn = 0,
  ) {
    const part = this.#add({ kind, ref, place: { x, y, turn, flip }, values }, ref);
    return (pin: string): WireEnd => ({ part: part.id, pin });
  }

  ground(x: number, y: number): WireEnd {
    return this.#mark({ kind: 'ground', values: {} }, x, y);
  }

  junction(x: number, y: number): WireEnd {
    return this.#mark({ kind: 'junction', values: {} }, x, y);
  }

  supply(net: string, x: number, y: number): WireEnd {
    return this.#mark({ kind: 'supply', values: { net } }, x, y);
  }

  /** A net's name; its wire leaves to the right, or to the left when `flip`. */
  netName(net: string, x: number, y: number, flip = false): WireEnd {
    return this.#mark({ kind: 'net-name', values: { net } }, x, y, flip);
  }

  /** A wire through corners of one's choice; without any it finds its own way. */
  wire(from: WireEnd, to: WireEnd, ...bends: readonly [x: number, y: number][]): void {
    const id = wireIdSchema.parse(`w${this.#wires.length + 1}`);
    this.#wires.push({ id, from, to, bends: bends.map(([x, y]): GridPoint => ({ x, y })) });
  }

  /** The finished drawing, with the processes that come with the program. */
  drawing(): Drawing {
    return {
      parts: this.#parts,
      wires: this.#wires,
      settings: { ground: 'gnd', temperature: 27, processes: BUILT_IN_PROCESSES },
    };
  }

  #mark(mark: { kind: DrawnPart['kind']; values: DrawnPart['values'] }, x: number, y: number, flip = false): WireEnd {
    const part = this.#add({ ...mark, place: { x, y, turn: 0, flip } }, `m${this.#parts.length + 1}`);
    return { part: part.id, pin: 'net' };
  }

  #add(record: object, id: string): DrawnPart {
    const part = drawnPartSchema.parse({ ...record, id: partIdSchema.parse(id) });
    this.#parts.push(part);
    return part;
  }
}
