import { type Box, widened } from './box';
import { GRID, type GridPoint } from './place';

/** Costs in px of detour that a wire takes rather than … */
const COST = {
  bend: 15,
  /** … run through a symbol, for each grid step. */
  ink: 400,
  /** … pass a symbol within a grid step. */
  near: 6,
  /** … run where a tag or a label would like to stand. */
  wished: 30,
  /** … run along a wire of another net, which would look like one with it. */
  along: 250,
  /** … cross a wire of another net. */
  across: 12,
  /** … touch another net's terminal. */
  terminal: 400,
  /** … leave a terminal sideways. */
  sideways: 20,
} as const;

const BODY = 1;
const NEAR = 2;
const WISHED = 4;

/** Steps beside a symbol that leaving two terminals takes anyway. */
const STEPS_OUT = 4;

/** What lies on the grid and what it costs a wire to go there. Nets are numbers from 1. */
export class RoutingField {
  readonly columns: number;
  readonly rows: number;
  readonly #left: number;
  readonly #top: number;
  readonly #marks: Uint8Array;
  /** The net of a wire that runs level (upright) through a point, and of a terminal there; 0 where none does. */
  readonly #level: Uint16Array;
  readonly #upright: Uint16Array;
  readonly #terminals: Uint16Array;

  constructor({ left, top, right, bottom }: Box) {
    this.#left = Math.floor(left / GRID) * GRID;
    this.#top = Math.floor(top / GRID) * GRID;
    this.columns = Math.ceil((right - this.#left) / GRID) + 1;
    this.rows = Math.ceil((bottom - this.#top) / GRID) + 1;
    const cells = this.columns * this.rows;
    this.#marks = new Uint8Array(cells);
    this.#level = new Uint16Array(cells);
    this.#upright = new Uint16Array(cells);
    this.#terminals = new Uint16Array(cells);
  }

  addInk(box: Box): void {
    this.#mark(widened(box, 1), BODY);
    this.#mark(widened(box, GRID), NEAR);
  }

  addWish(box: Box): void {
    this.#mark(box, WISHED);
  }

  addTerminal(at: GridPoint, net: number): void {
    const cell = this.cellAt(at);
    if (cell !== undefined) this.#terminals[cell] = net;
  }

  addWire(line: readonly GridPoint[], net: number): void {
    for (let i = 1; i < line.length; i++) {
      const [from, to] = [line[i - 1] as GridPoint, line[i] as GridPoint];
      const field = from.y === to.y ? this.#level : this.#upright;
      for (const cell of this.#between(from, to)) field[cell] = net;
    }
  }

  cellAt({ x, y }: GridPoint): number | undefined {
    const column = (x - this.#left) / GRID;
    const row = (y - this.#top) / GRID;
    return column >= 0 && column < this.columns && row >= 0 && row < this.rows
      ? row * this.columns + column
      : undefined;
  }

  pointOf(cell: number): GridPoint {
    return {
      x: this.#left + (cell % this.columns) * GRID,
      y: this.#top + Math.floor(cell / this.columns) * GRID,
    };
  }

  /** What a step into a cell costs a wire of `net` beyond its length. */
  stepCost(cell: number, level: boolean, net: number): number {
    const marks = this.#marks[cell] ?? 0;
    let cost = 0;
    if (marks !== 0) {
      if (marks & BODY) cost += COST.ink;
      else if (marks & NEAR) cost += COST.near;
      if (marks & WISHED) cost += COST.wished;
    }
    const levelNet = this.#level[cell] ?? 0;
    const uprightNet = this.#upright[cell] ?? 0;
    if (levelNet !== 0 && levelNet !== net) cost += level ? COST.along : COST.across;
    if (uprightNet !== 0 && uprightNet !== net) cost += level ? COST.across : COST.along;
    const terminal = this.#terminals[cell] ?? 0;
    if (terminal !== 0 && terminal !== net) cost += COST.terminal;
    return cost;
  }

  /** The cost of a whole line, and whether it goes anywhere that it might better go around. */
  lineCost(line: readonly GridPoint[], net: number): { cost: number; clear: boolean } {
    let cost = COST.bend * Math.max(0, line.length - 2);
    let clear = true;
    let near = 0;
    const end = this.cellAt(line[line.length - 1] as GridPoint);
    for (let i = 1; i < line.length; i++) {
      const [from, to] = [line[i - 1] as GridPoint, line[i] as GridPoint];
      const level = from.y === to.y;
      cost += Math.abs(to.x - from.x) + Math.abs(to.y - from.y);
      let first = true;
      for (const cell of this.#between(from, to)) {
        if (first || cell === end) {
          first = false;
          continue;
        }
        const step = this.stepCost(cell, level, net);
        cost += step;
        if (step === COST.near) near += 1;
        else if (step > 0) clear = false;
      }
    }
    return { cost, clear: clear && near <= STEPS_OUT };
  }

  #mark({ left, top, right, bottom }: Box, mark: number): void {
    const firstColumn = Math.max(0, Math.ceil((left - this.#left) / GRID));
    const lastColumn = Math.min(this.columns - 1, Math.floor((right - this.#left) / GRID));
    const lastRow = Math.min(this.rows - 1, Math.floor((bottom - this.#top) / GRID));
    for (let row = Math.max(0, Math.ceil((top - this.#top) / GRID)); row <= lastRow; row++) {
      for (let column = firstColumn; column <= lastColumn; column++) {
        const cell = row * this.columns + column;
        this.#marks[cell] = (this.#marks[cell] ?? 0) | mark;
      }
    }
  }

  /** The cells from one point to another on the same row or column; those beyond the field left out. */
  *#between(from: GridPoint, to: GridPoint): Generator<number> {
    const steps = Math.round(Math.max(Math.abs(to.x - from.x), Math.abs(to.y - from.y)) / GRID);
    const by = { x: Math.sign(to.x - from.x) * GRID, y: Math.sign(to.y - from.y) * GRID };
    for (let i = 0; i <= steps; i++) {
      const cell = this.cellAt({ x: from.x + i * by.x, y: from.y + i * by.y });
      if (cell !== undefined) yield cell;
    }
  }
}

export const BEND_COST = COST.bend;
export const SIDEWAYS_COST = COST.sideways;
