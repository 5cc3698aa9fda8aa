import { around, widened } from './box';
import { GRID, type GridPoint } from './place';
import { type RouteEnd, routeShapes, tidy } from './route-wire';
import { BEND_COST, type RoutingField, SIDEWAYS_COST } from './routing-field';

/** How far beyond its two ends a wire may go to find a way, in px. */
const DETOUR = 160;
/** Steps looked at before the plain shape is taken, so that a hand never waits. */
const MOST_STEPS = 40_000;

const WAYS: readonly GridPoint[] = [
  { x: 1, y: 0 },
  { x: 0, y: 1 },
  { x: -1, y: 0 },
  { x: 0, y: -1 },
];

/**
 * The orthogonal line from one terminal to another around what lies on the field: the plain shape where its way is
 * clear, else the cheapest way over the grid, by A* over (point, direction) with a charge for each bend (Hart, Nilsson,
 * Raphael 1968, on Lee's grid, 1961; bends as in Wybrow, Marriott, Stuckey, "Orthogonal Connector Routing", 2009).
 */
export function routeAround(from: RouteEnd, to: RouteEnd, field: RoutingField, net: number): GridPoint[] {
  let best: GridPoint[] = [from.at, to.at];
  let least = Number.POSITIVE_INFINITY;
  let clear = false;
  for (const line of routeShapes(from, to)) {
    const now = field.lineCost(line, net);
    const cost = now.cost + facingCost(from, line[1] ?? to.at) + facingCost(to, line[line.length - 2] ?? from.at);
    if (cost >= least) continue;
    least = cost;
    best = line;
    clear = now.clear;
  }
  if (clear) return best;
  return search(from, to, field, net, least) ?? best;
}

function facingCost({ at, leaves }: RouteEnd, next: GridPoint): number {
  if (leaves.x === 0 && leaves.y === 0) return 0;
  const along = (next.x - at.x) * leaves.x + (next.y - at.y) * leaves.y;
  return along > 0 ? 0 : along < 0 ? 1000 : SIDEWAYS_COST;
}

/** The cheapest way that costs less than `bound`, if there is one. */
function search(
  from: RouteEnd,
  to: RouteEnd,
  field: RoutingField,
  net: number,
  bound: number,
): GridPoint[] | undefined {
  const start = field.cellAt(from.at);
  const goal = field.cellAt(to.at);
  if (start === undefined || goal === undefined || start === goal) return undefined;
  const reach = widened(around([from.at, to.at]), DETOUR);
  const rest = (cell: number) => {
    const at = field.pointOf(cell);
    return Math.abs(at.x - to.at.x) + Math.abs(at.y - to.at.y);
  };
  const costs = new Map<number, number>();
  const cameFrom = new Map<number, number>();
  const open = new Heap();
  const enter = (state: number, before: number, cost: number) => {
    if (cost >= (costs.get(state) ?? Number.POSITIVE_INFINITY)) return;
    const whole = cost + rest(state >> 2);
    if (whole >= bound) return;
    costs.set(state, cost);
    cameFrom.set(state, before);
    open.push(state, whole);
  };
  const stepTo = (cell: number, way: number): number | undefined => {
    const { x, y } = field.pointOf(cell);
    const by = WAYS[way] as GridPoint;
    const next = { x: x + by.x * GRID, y: y + by.y * GRID };
    const outside = next.x < reach.left || next.x > reach.right || next.y < reach.top || next.y > reach.bottom;
    return outside ? undefined : field.cellAt(next);
  };
  const arrive = (cell: number, way: number, before: number, cost: number) => {
    const next = stepTo(cell, way);
    if (next === undefined) return;
    const by = WAYS[way] as GridPoint;
    const there =
      next === goal ? facingCost(to, { x: to.at.x - by.x, y: to.at.y - by.y }) : field.stepCost(next, by.y === 0, net);
    enter(next * 4 + way, before, cost + GRID + there);
  };
  WAYS.forEach((by, way) => {
    arrive(start, way, -1, facingCost(from, { x: from.at.x + by.x, y: from.at.y + by.y }));
  });
  const done = new Set<number>();
  for (let steps = 0; steps < MOST_STEPS; steps++) {
    const state = open.pop();
    if (state === undefined) return undefined;
    if (done.has(state)) continue;
    done.add(state);
    const cell = state >> 2;
    if (cell === goal) return retrace(state, cameFrom, field, from.at);
    const way = state & 3;
    const cost = costs.get(state) ?? 0;
    for (const [next, bend] of [
      [way, 0],
      [(way + 1) & 3, BEND_COST],
      [(way + 3) & 3, BEND_COST],
    ] as const) {
      arrive(cell, next, state, cost + bend);
    }
  }
  return undefined;
}

function retrace(
  end: number,
  cameFrom: ReadonlyMap<number, number>,
  field: RoutingField,
  start: GridPoint,
): GridPoint[] {
  const line: GridPoint[] = [];
  for (let state = end; state >= 0; state = cameFrom.get(state) ?? -1) line.push(field.pointOf(state >> 2));
  line.push(start);
  return tidy(line.reverse());
}

/** A binary heap of states by their cost; of equal ones the first in, so that the way found is always the same. */
class Heap {
  readonly #states: number[] = [];
  readonly #costs: number[] = [];
  readonly #turns: number[] = [];
  #turn = 0;

  push(state: number, cost: number): void {
    this.#states.push(state);
    this.#costs.push(cost);
    this.#turns.push(this.#turn++);
    let at = this.#states.length - 1;
    while (at > 0) {
      const parent = (at - 1) >> 1;
      if (!this.#before(at, parent)) break;
      this.#swap(at, parent);
      at = parent;
    }
  }

  pop(): number | undefined {
    const top = this.#states[0];
    const last = this.#states.length - 1;
    if (last < 0) return undefined;
    this.#swap(0, last);
    this.#states.pop();
    this.#costs.pop();
    this.#turns.pop();
    for (let at = 0; ; ) {
      const left = 2 * at + 1;
      let least = at;
      if (left < last && this.#before(left, least)) least = left;
      if (left + 1 < last && this.#before(left + 1, least)) least = left + 1;
      if (least === at) return top;
      this.#swap(at, least);
      at = least;
    }
  }

  #before(a: number, b: number): boolean {
    const [costA = 0, costB = 0] = [this.#costs[a], this.#costs[b]];
    return costA === costB ? (this.#turns[a] ?? 0) < (this.#turns[b] ?? 0) : costA < costB;
  }

  #swap(a: number, b: number): void {
    for (const list of [this.#states, this.#costs, this.#turns]) {
      const held = list[a] as number;
      list[a] = list[b] as number;
      list[b] = held;
    }
  }
}
