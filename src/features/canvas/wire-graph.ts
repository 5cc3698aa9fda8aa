import type { Drawing, PartId } from '#shared/circuit/drawing';
import { type DrawnNets, terminalKey } from '#shared/circuit/nets';
import { GRID, type GridPoint } from '#shared/geometry/place';
import type { SheetGeometry } from './sheet-geometry';

/** A straight stretch of a net's wires with no corner, dot or crossing within. */
export type Run = { readonly from: GridPoint; readonly to: GridPoint; readonly upright: boolean };

export type WireGraph = {
  /** Where three or more ends meet, and junctions that nothing holds any more. */
  readonly dots: readonly GridPoint[];
  readonly runsOf: ReadonlyMap<string, readonly Run[]>;
  /** Net names that stand on a wire or a terminal pair, not at a free end. */
  readonly namesOnWires: ReadonlySet<PartId>;
  /** Per net, the grid points that its wires and leads go through, by `pointKey`. */
  readonly pointsOf: ReadonlyMap<string, NetPoints>;
};

export type NetPoints = ReadonlyMap<number, Directions>;

/** Ways from a point, as bits. */
export const RIGHT = 1;
export const DOWN = 2;
export const LEFT = 4;
export const UP = 8;

/**
 * Directions into which a net leads from a grid point: along its wires, and along the leads of its terminals, of which
 * there may be several.
 */
export type Directions = { wires: number; leads: number; terminals: number };

/**
 * What the wires of each net look like once they lie on the grid together: where they part they make a dot, wherever
 * the ends of the single wires are.
 */
export function wireGraph(drawing: Drawing, geometry: SheetGeometry, { netOf }: DrawnNets): WireGraph {
  const nets = new Map<string, Map<number, Directions>>();
  const at = (net: string, point: GridPoint): Directions => {
    let points = nets.get(net);
    if (!points) {
      points = new Map();
      nets.set(net, points);
    }
    const key = pointKey(point);
    let directions = points.get(key);
    if (!directions) {
      directions = { wires: 0, leads: 0, terminals: 0 };
      points.set(key, directions);
    }
    return directions;
  };
  for (const wire of drawing.wires) {
    const net = netOf.get(terminalKey(wire.from));
    const line = geometry.routes.get(wire.id);
    if (net === undefined || !line) continue;
    for (let i = 1; i < line.length; i++) {
      for (const [point, ways] of stretch(line[i - 1] as GridPoint, line[i] as GridPoint)) {
        at(net, point).wires |= ways;
      }
    }
  }
  const names: { part: PartId; directions: Directions; way: number }[] = [];
  for (const [key, { part, at: point, leaves }] of geometry.terminals) {
    const net = netOf.get(key);
    if (net === undefined) continue;
    const directions = at(net, point);
    const way = wayOf({ x: -leaves.x, y: -leaves.y });
    if (part.kind === 'net-name') names.push({ part: part.id, directions, way });
    else {
      directions.leads |= way;
      if (part.kind !== 'junction') directions.terminals += 1;
    }
  }
  const namesOnWires = new Set<PartId>();
  for (const { part, directions, way } of names) {
    // A name set on a wire is written into it, so its lead is not drawn and makes no dot.
    if (endsAt(directions) >= 2) namesOnWires.add(part);
    else directions.leads |= way;
  }

  const crossed = new Map<number, number>();
  for (const points of nets.values()) for (const key of points.keys()) crossed.set(key, (crossed.get(key) ?? 0) + 1);

  const dots = new Map<number, GridPoint>();
  const runsOf = new Map<string, Run[]>();
  for (const [net, points] of nets) {
    for (const [key, here] of points) if (endsAt(here) >= 3) dots.set(key, pointOf(key));
    runsOf.set(net, [...runs(points, crossed, RIGHT), ...runs(points, crossed, DOWN)]);
  }
  for (const { part, at: point, end } of geometry.terminals.values()) {
    if (part.kind !== 'junction') continue;
    const directions = nets.get(netOf.get(terminalKey(end)) ?? '')?.get(pointKey(point));
    if (!directions || endsAt(directions) < 2) dots.set(pointKey(point), point);
  }
  return { dots: [...dots.values()], runsOf, namesOnWires, pointsOf: nets };
}

function runs(points: ReadonlyMap<number, Directions>, crossed: ReadonlyMap<number, number>, way: number): Run[] {
  const upright = way === DOWN;
  const through = upright ? UP | DOWN : LEFT | RIGHT;
  const plain = (key: number) => {
    const here = points.get(key);
    return here?.wires === through && here.leads === 0 && crossed.get(key) === 1;
  };
  const found: Run[] = [];
  for (const [key, { wires }] of points) {
    if ((wires & way) === 0 || plain(key)) continue;
    const from = pointOf(key);
    let to = from;
    do to = upright ? { x: to.x, y: to.y + GRID } : { x: to.x + GRID, y: to.y };
    while (plain(pointKey(to)));
    found.push({ from, to, upright });
  }
  return found;
}

/** The grid points of a straight stretch, each with the ways along the stretch that lead from it. */
function* stretch(a: GridPoint, b: GridPoint): Generator<[point: GridPoint, ways: number]> {
  const step = { x: Math.sign(b.x - a.x), y: Math.sign(b.y - a.y) };
  const steps = Math.max(Math.abs(b.x - a.x), Math.abs(b.y - a.y)) / GRID;
  for (let i = 0; i <= steps; i++) {
    const ahead = i < steps ? wayOf(step) : 0;
    const back = i > 0 ? wayOf({ x: -step.x, y: -step.y }) : 0;
    yield [{ x: a.x + step.x * i * GRID, y: a.y + step.y * i * GRID }, ahead | back];
  }
}

export function wayOf({ x, y }: GridPoint): number {
  if (x > 0) return RIGHT;
  if (x < 0) return LEFT;
  if (y > 0) return DOWN;
  return y < 0 ? UP : 0;
}

/** A wire that runs over a lead still ends there. */
function endsAt({ wires, leads }: Directions): number {
  return [RIGHT, DOWN, LEFT, UP].reduce(
    (ends, way) => ends + Number((wires & way) !== 0) + Number((leads & way) !== 0),
    0,
  );
}

/** A grid point as one number; good for 327 680 px either way. */
export function pointKey({ x, y }: GridPoint): number {
  return (x / GRID + HALF) * 2 * HALF + (y / GRID + HALF);
}

const HALF = 2 ** 15;

export function pointOf(key: number): GridPoint {
  return { x: (Math.floor(key / (2 * HALF)) - HALF) * GRID, y: ((key % (2 * HALF)) - HALF) * GRID };
}
