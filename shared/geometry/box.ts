import type { GridPoint } from './place';

/** An upright rectangle in px, of the sheet or of a symbol's own drawing. */
export type Box = { readonly left: number; readonly top: number; readonly right: number; readonly bottom: number };

/** A corner or side at which a block of text hangs, and the direction into which it grows (0: centred). */
export type Anchor = { readonly at: GridPoint; readonly grows: GridPoint };

/** The least box that holds all points. */
export function around(points: readonly GridPoint[]): Box {
  const box = { left: Infinity, top: Infinity, right: -Infinity, bottom: -Infinity };
  for (const { x, y } of points) {
    if (x < box.left) box.left = x;
    if (x > box.right) box.right = x;
    if (y < box.top) box.top = y;
    if (y > box.bottom) box.bottom = y;
  }
  return box;
}

/** Whether two boxes share more than an edge. */
export function overlap(a: Box, b: Box): boolean {
  return a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;
}

/** The area that two boxes share, in px². */
export function sharedArea(a: Box, b: Box): number {
  const width = Math.min(a.right, b.right) - Math.max(a.left, b.left);
  const height = Math.min(a.bottom, b.bottom) - Math.max(a.top, b.top);
  return width > 0 && height > 0 ? width * height : 0;
}

/** The box with `by` px more on every side. */
export function widened({ left, top, right, bottom }: Box, by: number): Box {
  return { left: left - by, top: top - by, right: right + by, bottom: bottom + by };
}

/** The box of a block of this size hung at an anchor. */
export function hungBox({ at, grows }: Anchor, width: number, height: number): Box {
  const left = at.x + (width * (grows.x - 1)) / 2;
  const top = at.y + (height * (grows.y - 1)) / 2;
  return { left, top, right: left + width, bottom: top + height };
}

/** The boxes of the straight stretches of a line drawn `thickness` px thick. */
export function stretchBoxes(line: readonly GridPoint[], thickness: number): Box[] {
  return line.slice(1).map((to, i) => widened(around([line[i] as GridPoint, to]), thickness / 2));
}
