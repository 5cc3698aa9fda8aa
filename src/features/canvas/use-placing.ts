import { useMemo, useRef, useState } from 'react';
import { catalogueEntry } from '#shared/circuit/catalogue';
import type { DrawnKind, PartId } from '#shared/circuit/drawing';
import { type GridPoint, mirrored, type Place, snap, turned } from '#shared/geometry/place';
import type { SheetCommands } from '../../live/sheet-commands';
import { samePlace } from './sheet-geometry';
import { useLatest } from './use-latest';

/** A part in the hand, not yet on the sheet. */
export type Placing = { readonly kind: DrawnKind; readonly place: Place };

export type PlacingHands = {
  now(): Placing | undefined;
  /** Takes a part in the hand; the turn of the one before is kept for the same kind. */
  begin(kind: DrawnKind, at: GridPoint): void;
  follow(at: GridPoint): void;
  shift(by: GridPoint): void;
  turn(quarters: number): void;
  mirror(): void;
  /** Places it; the hand keeps another of its kind. */
  put(): void;
  end(): boolean;
};

export function usePlacing(
  commands: SheetCommands,
  announce: (message: string) => void,
  onPlaced: (part: PartId) => void,
): { placing: Placing | undefined; hands: PlacingHands } {
  const [placing, setPlacing] = useState<Placing>();
  const inHand = useRef<Placing>(undefined);
  const latest = useLatest({ commands, announce, onPlaced });
  const hands = useMemo((): PlacingHands => {
    const set = (next: Placing | undefined) => {
      inHand.current = next;
      setPlacing(next);
    };
    const change = (to: (place: Place) => Place) => {
      const now = inHand.current;
      if (!now) return;
      const place = to(now.place);
      if (!samePlace(place, now.place)) set({ ...now, place });
    };
    return {
      now: () => inHand.current,
      begin(kind, at) {
        if (!latest.current.commands.canEdit) return;
        set({ kind, place: { ...snap(at), turn: 0, flip: false } });
        const { label } = catalogueEntry(kind);
        latest.current.announce(`Placing: ${label}. Arrows move it, Enter places it, Escape ends.`);
      },
      follow: (at) => change((place) => ({ ...place, ...snap(at) })),
      shift(by) {
        change((place) => ({ ...place, x: place.x + by.x, y: place.y + by.y }));
        const now = inHand.current;
        if (now) latest.current.announce(`${now.place.x}, ${now.place.y}`);
      },
      turn: (quarters) => change((place) => turned(place, quarters)),
      mirror: () => change(mirrored),
      put() {
        const now = inHand.current;
        if (!now) return;
        const id = latest.current.commands.addPart(now.kind, now.place);
        if (id !== undefined) latest.current.onPlaced(id);
      },
      end() {
        if (!inHand.current) return false;
        set(undefined);
        return true;
      },
    };
  }, [latest]);
  return { placing, hands };
}
