import { GRID, type GridPoint, type Place } from './place';

/** A thing with the point of it that is lined up: its origin, or one of its terminals. */
export type Standing<Id> = { readonly id: Id; readonly place: Place; readonly at: GridPoint };

export const ALIGNMENTS = ['left', 'centre', 'right', 'top', 'middle', 'bottom'] as const;
export type Alignment = (typeof ALIGNMENTS)[number];

/** Moves things so that their points stand in one line, on the grid. */
export function aligned<Id>(standings: readonly Standing<Id>[], to: Alignment): Map<Id, Place> {
  const axis = to === 'left' || to === 'centre' || to === 'right' ? 'x' : 'y';
  const along = standings.map(({ at }) => at[axis]);
  const least = Math.min(...along);
  const most = Math.max(...along);
  const line = to === 'left' || to === 'top' ? least : to === 'right' || to === 'bottom' ? most : (least + most) / 2;
  return moved(standings, axis, () => line);
}

export type Direction = 'across' | 'down';

/** Moves all but the outermost so that their points stand equally far apart, on the grid. */
export function spaced<Id>(standings: readonly Standing<Id>[], direction: Direction): Map<Id, Place> {
  const axis = direction === 'across' ? 'x' : 'y';
  const sorted = [...standings].sort((a, b) => a.at[axis] - b.at[axis]);
  const first = sorted[0]?.at[axis] ?? 0;
  const last = sorted.at(-1)?.at[axis] ?? 0;
  const step = (last - first) / Math.max(1, sorted.length - 1);
  return moved(sorted, axis, (index) => first + index * step);
}

function moved<Id>(
  standings: readonly Standing<Id>[],
  axis: 'x' | 'y',
  target: (index: number) => number,
): Map<Id, Place> {
  return new Map(
    standings.map(({ id, place, at }, index) => {
      const by = Math.round(target(index) / GRID) * GRID - at[axis];
      return [id, { ...place, [axis]: place[axis] + by }];
    }),
  );
}
