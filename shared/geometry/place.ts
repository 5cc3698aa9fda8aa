/** A point of the drawing in px; drawn things snap to the 10 px grid. y grows downwards. */
export type GridPoint = { readonly x: number; readonly y: number };

/** Quarter turns, clockwise as seen on the sheet. */
export type Turn = 0 | 1 | 2 | 3;

/** Where a symbol stands: mirrored left for right first (`flip`), then turned, then moved to (x, y). */
export type Place = GridPoint & { readonly turn: Turn; readonly flip: boolean };

/** Grid pitch in px. */
export const GRID = 10;

export function snap(point: GridPoint): GridPoint {
  return { x: Math.round(point.x / GRID) * GRID, y: Math.round(point.y / GRID) * GRID };
}

export function samePoint(a: GridPoint, b: GridPoint): boolean {
  return a.x === b.x && a.y === b.y;
}

/** A vector of the symbol's own drawing as it lies after mirroring and turning. */
export function orient(vector: GridPoint, { turn, flip }: Pick<Place, 'turn' | 'flip'>): GridPoint {
  const x = flip ? -vector.x : vector.x;
  const { y } = vector;
  switch (turn) {
    case 0:
      return { x: x + 0, y: y + 0 };
    case 1:
      return { x: 0 - y, y: x + 0 };
    case 2:
      return { x: 0 - x, y: 0 - y };
    case 3:
      return { x: y + 0, y: 0 - x };
  }
}

/** A point of the symbol's own drawing, on the sheet. */
export function onSheet(point: GridPoint, place: Place): GridPoint {
  const turned = orient(point, place);
  return { x: place.x + turned.x, y: place.y + turned.y };
}

/** `place` turned by a number of quarter turns, clockwise when positive. */
export function turned(place: Place, quarters: number): Place {
  return { ...place, turn: ((((place.turn + quarters) % 4) + 4) % 4) as Turn };
}

/** `place` mirrored left for right as seen on the sheet, whatever its turn. */
export function mirrored(place: Place): Place {
  // Mirroring after a turn equals mirroring before the opposite turn.
  return { ...place, turn: ((4 - place.turn) % 4) as Turn, flip: !place.flip };
}
