import type { GridPoint } from '#shared/geometry/place';

/**
 * The thing one comes to when going from a point in a direction: near, and not far aside. Undefined where nothing lies
 * that way.
 */
export function nextInDirection<T>(
  from: GridPoint,
  direction: GridPoint,
  things: Iterable<T>,
  placeOf: (thing: T) => GridPoint,
): T | undefined {
  let next: T | undefined;
  let least = Number.POSITIVE_INFINITY;
  for (const thing of things) {
    const at = placeOf(thing);
    const along = (at.x - from.x) * direction.x + (at.y - from.y) * direction.y;
    const aside = Math.abs((at.x - from.x) * direction.y) + Math.abs((at.y - from.y) * direction.x);
    const cost = along + 2 * aside;
    // Within 63° of the direction, so that each of the four ways has its own things.
    if (along <= 0 || aside > 2 * along || cost >= least) continue;
    next = thing;
    least = cost;
  }
  return next;
}

/** The thing after (or before) one in a ring; the first when there is none yet. */
export function nextInRing<T>(things: readonly T[], isNow: (thing: T) => boolean, step: 1 | -1): T | undefined {
  const now = things.findIndex(isNow);
  return things[now === -1 ? 0 : (now + step + things.length) % things.length];
}
