import { type Carry, mirroredAbout, shiftedBy } from '../geometry/carry';
import { pinPlaces } from '../geometry/pins';
import { GRID, type GridPoint, snap } from '../geometry/place';
import { bodyLedOut, type DrawnPart, isFet } from './drawing';

/** Free space between a copy and what it was copied from, in px: room for the tags between them. */
const GAP = { plain: 80, tagged: 160, facingTags: 280 };
/** How near nothing else may stand to a copy set beside its model, and how far to look for such a place, in px. */
const CLEARANCE = 20;
const FURTHEST_LOOK = 600;
const MOST_STEPS = 50;

/** To the right of the parts it was copied from, clear of others where there is room. */
export function besideModel(parts: readonly DrawnPart[], present: readonly DrawnPart[], mirror: boolean): Carry {
  const { left, right, top, bottom } = extent(parts);
  const gap = !parts.some(isFet) ? GAP.plain : mirror ? GAP.facingTags : GAP.tagged;
  const nearest = right - left + gap;
  const taken = present.flatMap(pointsOf).filter(({ y }) => y > top - CLEARANCE && y < bottom + CLEARANCE);
  const isClear = (by: number) => !taken.some(({ x }) => x > left + by - CLEARANCE && x < right + by + CLEARANCE);
  let by = nearest;
  while (!isClear(by) && by < nearest + FURTHEST_LOOK) by += 2 * GRID;
  const carry = (shift: number) => (mirror ? mirroredAbout(left + right + shift) : shiftedBy({ x: shift, y: 0 }));
  return isClear(by) ? carry(by) : untouched(parts, present, (step) => carry(nearest + step * GRID));
}

/** With its middle at a point, or a little further where its terminals would touch others and tie themselves to them. */
export function middleAt(parts: readonly DrawnPart[], present: readonly DrawnPart[], at: GridPoint): Carry {
  const { left, right, top, bottom } = extent(parts);
  const by = snap({ x: at.x - (left + right) / 2, y: at.y - (top + bottom) / 2 });
  return untouched(parts, present, (step) => shiftedBy({ x: by.x + step * 2 * GRID, y: by.y + step * 2 * GRID }));
}

function untouched(
  parts: readonly DrawnPart[],
  present: readonly DrawnPart[],
  carryAfter: (step: number) => Carry,
): Carry {
  const taken = new Set(present.flatMap(pointsOf).map(({ x, y }) => `${x} ${y}`));
  const points = parts.flatMap(pointsOf);
  for (let step = 0; step < MOST_STEPS; step++) {
    const carry = carryAfter(step);
    const touches = points.some((point) => {
      const { x, y } = carry.point(point);
      return taken.has(`${x} ${y}`);
    });
    if (!touches) return carry;
  }
  return carryAfter(0);
}

function extent(parts: readonly DrawnPart[]) {
  const points = parts.flatMap(pointsOf);
  const xs = points.map(({ x }) => x);
  const ys = points.map(({ y }) => y);
  return { left: Math.min(...xs), right: Math.max(...xs), top: Math.min(...ys), bottom: Math.max(...ys) };
}

/** A part's origin and terminals. */
function pointsOf(part: DrawnPart): GridPoint[] {
  const { x, y } = part.place;
  return [{ x, y }, ...pinPlaces(part.kind, part.place, bodyLedOut(part)).map(({ at }) => at)];
}
