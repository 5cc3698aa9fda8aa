import { GRID, type GridPoint, samePoint } from './place';
import { tidy } from './route-wire';

/** The corners that each half of a line keeps when it is cut at a point on it: those before the cut, those after. */
export function cutLine(line: readonly GridPoint[], at: GridPoint): [before: GridPoint[], after: GridPoint[]] {
  for (let i = 1; i < line.length; i++) {
    const [from, to] = [line[i - 1] as GridPoint, line[i] as GridPoint];
    if (!liesBetween(at, from, to)) continue;
    const keep = (corner: GridPoint) => !samePoint(corner, at);
    return [line.slice(1, i).filter(keep), line.slice(i, -1).filter(keep)];
  }
  return [[], []];
}

/** A straight stretch of a line, counted from its beginning. */
export type Stretch = { readonly index: number; readonly upright: boolean; readonly length: number };

export function stretchesOf(line: readonly GridPoint[]): Stretch[] {
  return line.slice(1).map((to, index) => {
    const from = line[index] as GridPoint;
    return { index, upright: from.x === to.x, length: Math.abs(to.x - from.x) + Math.abs(to.y - from.y) };
  });
}

/** The longest stretch that lies this way; of equal ones the first. */
export function longestStretch(line: readonly GridPoint[], upright: boolean): Stretch | undefined {
  return stretchesOf(line)
    .filter((stretch) => stretch.upright === upright && stretch.length > 0)
    .reduce<Stretch | undefined>(
      (longest, next) => (longest && longest.length >= next.length ? longest : next),
      undefined,
    );
}

/** The stretch of a line nearest to a point. */
export function nearestStretch(line: readonly GridPoint[], point: GridPoint): Stretch | undefined {
  const distance = ({ index }: Stretch) => {
    const [a, b] = [line[index] as GridPoint, line[index + 1] as GridPoint];
    const x = Math.min(Math.max(point.x, Math.min(a.x, b.x)), Math.max(a.x, b.x));
    const y = Math.min(Math.max(point.y, Math.min(a.y, b.y)), Math.max(a.y, b.y));
    return Math.hypot(point.x - x, point.y - y);
  };
  let nearest: Stretch | undefined;
  for (const stretch of stretchesOf(line)) if (!nearest || distance(stretch) < distance(nearest)) nearest = stretch;
  return nearest;
}

/**
 * The corners of a line whose stretch was pushed `by` px across itself. A stretch that ends on a terminal leaves a grid
 * step of its lead behind, so that the wire still leaves its symbol as before; on a junction (`loose`) it need not.
 */
export function pushStretch(
  line: readonly GridPoint[],
  { index, upright, length }: Stretch,
  by: number,
  loose: { readonly from: boolean; readonly to: boolean },
): GridPoint[] {
  const [from, to] = [line[index] as GridPoint, line[index + 1] as GridPoint];
  const pushed = ({ x, y }: GridPoint): GridPoint => (upright ? { x: x + by, y } : { x, y: y + by });
  const way = { x: Math.sign(to.x - from.x) * GRID, y: Math.sign(to.y - from.y) * GRID };
  const first = index === 0;
  const last = index === line.length - 2;
  const room = length > 2 * GRID;
  const start = first && room && !loose.from ? { x: from.x + way.x, y: from.y + way.y } : from;
  const end = last && room && !loose.to ? { x: to.x - way.x, y: to.y - way.y } : to;
  const whole = [
    ...line.slice(0, first ? 1 : index),
    ...(first ? [start] : []),
    pushed(start),
    pushed(end),
    ...(last ? [end] : []),
    ...line.slice(last ? line.length - 1 : index + 2),
  ];
  return tidy(whole).slice(1, -1);
}

function liesBetween(at: GridPoint, a: GridPoint, b: GridPoint): boolean {
  return (
    Math.min(a.x, b.x) <= at.x && at.x <= Math.max(a.x, b.x) && Math.min(a.y, b.y) <= at.y && at.y <= Math.max(a.y, b.y)
  );
}
