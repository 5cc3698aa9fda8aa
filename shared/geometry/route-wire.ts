import { type GridPoint, samePoint } from './place';

/** One end of a wire: where it is and which way the lead leaves ((0, 0): any way). */
export type RouteEnd = { readonly at: GridPoint; readonly leaves: GridPoint };

/**
 * The orthogonal line from one terminal to another: its corners, ends included.
 * With `bends` the line visits them in order; without, the shape with the least backtracking and the fewest corners is taken.
 */
export function routeWire(from: RouteEnd, to: RouteEnd, bends: readonly GridPoint[] = []): GridPoint[] {
  if (bends.length > 0) return tidy(throughBends(from, to, bends));
  const candidates = routeShapes(from, to);
  let best = candidates[0] ?? [from.at, to.at];
  let least = Number.POSITIVE_INFINITY;
  for (const line of candidates) {
    const cost = routeCost(line, from, to);
    if (cost < least) {
      least = cost;
      best = line;
    }
  }
  return best;
}

/** The plain shapes that a line from one end to another may have: with one corner, with two, and around. */
export function routeShapes(from: RouteEnd, to: RouteEnd): GridPoint[][] {
  return shapes(from.at, to.at).map(tidy);
}

function shapes(a: GridPoint, b: GridPoint): GridPoint[][] {
  const middleX = Math.round((a.x + b.x) / 20) * 10;
  const middleY = Math.round((a.y + b.y) / 20) * 10;
  const list: GridPoint[][] = [
    [a, { x: a.x, y: b.y }, b],
    [a, { x: b.x, y: a.y }, b],
    [a, { x: a.x, y: middleY }, { x: b.x, y: middleY }, b],
    [a, { x: middleX, y: a.y }, { x: middleX, y: b.y }, b],
  ];
  // Detours for ends that face away from each other.
  for (const y of [Math.min(a.y, b.y) - 20, Math.max(a.y, b.y) + 20]) list.push([a, { x: a.x, y }, { x: b.x, y }, b]);
  for (const x of [Math.min(a.x, b.x) - 20, Math.max(a.x, b.x) + 20]) list.push([a, { x, y: a.y }, { x, y: b.y }, b]);
  return list;
}

/** Length in px, plus a charge per corner, plus a heavy one for an end that runs back through its own symbol. */
function routeCost(line: readonly GridPoint[], from: RouteEnd, to: RouteEnd): number {
  let cost = 0;
  for (let i = 1; i < line.length; i++) cost += distance(line[i - 1] as GridPoint, line[i] as GridPoint);
  cost += 15 * Math.max(0, line.length - 2);
  if (line.length > 1) {
    cost += facing(from, line[1] as GridPoint) + facing(to, line[line.length - 2] as GridPoint);
  }
  return cost;
}

function facing(end: RouteEnd, next: GridPoint): number {
  const along = (next.x - end.at.x) * end.leaves.x + (next.y - end.at.y) * end.leaves.y;
  if (end.leaves.x === 0 && end.leaves.y === 0) return 0;
  if (along > 0) return 0;
  return along < 0 ? 1000 : 30;
}

function distance(a: GridPoint, b: GridPoint): number {
  return Math.abs(a.x - b.x) + Math.abs(a.y - b.y);
}

function throughBends(from: RouteEnd, to: RouteEnd, bends: readonly GridPoint[]): GridPoint[] {
  const line: GridPoint[] = [from.at];
  for (const next of [...bends, to.at]) {
    const last = line[line.length - 1] as GridPoint;
    if (last.x !== next.x && last.y !== next.y) {
      const leavesUpright = line.length === 1 ? from.leaves.y !== 0 : (line[line.length - 2] as GridPoint).y === last.y;
      line.push(leavesUpright ? { x: last.x, y: next.y } : { x: next.x, y: last.y });
    }
    line.push(next);
  }
  return line;
}

/** Without doubled points and without corners that are none. */
export function tidy(line: readonly GridPoint[]): GridPoint[] {
  const kept: GridPoint[] = [];
  for (const point of line) {
    const last = kept[kept.length - 1];
    if (last && samePoint(last, point)) continue;
    const before = kept[kept.length - 2];
    if (
      before &&
      last &&
      ((before.x === last.x && last.x === point.x) || (before.y === last.y && last.y === point.y))
    ) {
      kept.pop();
      const turnedBack = kept[kept.length - 1];
      if (turnedBack && samePoint(turnedBack, point)) continue;
    }
    kept.push(point);
  }
  return kept.length > 1 ? kept : [...line.slice(0, 1), ...line.slice(-1)];
}
