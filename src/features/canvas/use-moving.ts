import { useMemo, useRef, useState } from 'react';
import type { Drawing, PartId } from '#shared/circuit/drawing';
import { enclosedJunctions } from '#shared/circuit/enclosed-junctions';
import { type Place, samePoint } from '#shared/geometry/place';
import type { SheetCommands } from '../../live/sheet-commands';
import { shortPart } from './part-text';
import { samePlace } from './sheet-geometry';
import { useLatest } from './use-latest';

export type Places = ReadonlyMap<PartId, Place>;

const NOWHERE_ELSE: Places = new Map();

export type MovingHands = {
  /** The hand has taken hold. */
  begin(): void;
  /** Shows parts elsewhere; the drawing learns of it only when they are dropped. */
  show(places: Places): void;
  /** Leaves the parts where they are shown, as one undo step. */
  drop(): void;
  /** Puts them back; whatever the hand still does until it lets go counts for nothing. */
  abort(): boolean;
};

export function useMoving(
  drawing: Drawing,
  commands: SheetCommands,
  announce: (message: string) => void,
): { elsewhere: Places; hands: MovingHands } {
  const [elsewhere, setElsewhere] = useState<Places>(NOWHERE_ELSE);
  const shown = useRef(elsewhere);
  const aborted = useRef(false);
  const latest = useLatest({ drawing, commands, announce });
  const hands = useMemo((): MovingHands => {
    const set = (places: Places) => {
      shown.current = places;
      setElsewhere(places);
    };
    return {
      begin() {
        aborted.current = false;
      },
      show(places) {
        if (!aborted.current) set(withJunctions(new Map([...shown.current, ...places]), latest.current.drawing));
      },
      drop() {
        const places = shown.current;
        aborted.current = false;
        if (places.size === 0) return;
        // A part that somebody else has deleted meanwhile is not among them.
        const moved = latest.current.drawing.parts.filter(({ id, place }) => {
          const to = places.get(id);
          return to !== undefined && !samePlace(to, place);
        });
        set(NOWHERE_ELSE);
        const [first] = moved;
        if (!first) return;
        latest.current.commands.placeParts(places);
        const { x, y } = places.get(first.id) ?? first.place;
        latest.current.announce(
          moved.length === 1 ? `Moved ${shortPart(first)} to ${x}, ${y}.` : `Moved ${moved.length} parts.`,
        );
      },
      abort() {
        if (shown.current.size === 0) return false;
        aborted.current = true;
        set(NOWHERE_ELSE);
        latest.current.announce('The move was dropped; nothing has changed.');
        return true;
      },
    };
  }, [latest]);
  return { elsewhere, hands };
}

/** Junctions that only join parts that go the same way go along, or the wires between those would be left behind. */
function withJunctions(places: Places, drawing: Drawing): Places {
  if (places.size < 2) return places;
  const shifts = drawing.parts.flatMap(({ id, place }) => {
    const to = places.get(id);
    return to ? [{ x: to.x - place.x, y: to.y - place.y }] : [];
  });
  const [by] = shifts;
  if (!by || !shifts.every((shift) => samePoint(shift, by))) return places;
  const junctions = enclosedJunctions(drawing, new Set(places.keys()));
  const along = drawing.parts
    .filter(({ id }) => junctions.has(id))
    .map(({ id, place }) => [id, { ...place, x: place.x + by.x, y: place.y + by.y }] as const);
  return new Map([...places, ...along]);
}
