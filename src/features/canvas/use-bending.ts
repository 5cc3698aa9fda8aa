import { type RefObject, useMemo, useRef, useState } from 'react';
import type { Drawing, WireId } from '#shared/circuit/drawing';
import { longestStretch, nearestStretch, pushStretch, type Stretch } from '#shared/geometry/bend-wire';
import { GRID, type GridPoint } from '#shared/geometry/place';
import type { SheetCommands } from '../../live/sheet-commands';
import type { SheetGeometry } from './sheet-geometry';
import { useLatest } from './use-latest';

type Line = readonly GridPoint[];
export type Bent = ReadonlyMap<WireId, Line>;

const NOTHING_BENT: Bent = new Map();

/** A wire whose stretch is under the hand. */
type Held = { readonly wire: WireId; readonly line: Line; readonly stretch: Stretch; readonly by: number };

export type BendingHands = {
  /** Takes hold of the stretch of a wire nearest to a point. */
  hold(wire: WireId, at: GridPoint): void;
  /** Pushes it across itself until it runs by a point. */
  follow(at: GridPoint): void;
  /** Pushes the longest stretch that lies across a direction by one grid step that way. */
  step(wire: WireId, way: GridPoint): boolean;
  /** Leaves it where it is shown, as one undo step. */
  drop(): void;
  abort(): boolean;
};

type Sheet = {
  readonly drawing: Drawing;
  readonly geometry: RefObject<SheetGeometry | undefined>;
  readonly commands: SheetCommands;
  announce(message: string): void;
};

/** Pushing a wire by one of its stretches, by hand or by keys. */
export function useBending(sheet: Sheet): { bent: Bent; hands: BendingHands } {
  const [bent, setBent] = useState<Bent>(NOTHING_BENT);
  const held = useRef<Held>(undefined);
  const latest = useLatest(sheet);
  const hands = useMemo((): BendingHands => {
    const show = (next: Held | undefined) => {
      held.current = next;
      if (!next || next.by === 0) {
        setBent(NOTHING_BENT);
        return;
      }
      setBent(new Map([[next.wire, bendsOf(next)]]));
    };
    const bendsOf = ({ wire: id, line, stretch, by }: Held) => {
      const { drawing } = latest.current;
      const wire = drawing.wires.find((candidate) => candidate.id === id);
      const isJunction = (part: string | undefined) =>
        drawing.parts.some(({ id, kind }) => id === part && kind === 'junction');
      return pushStretch(line, stretch, by, { from: isJunction(wire?.from.part), to: isJunction(wire?.to.part) });
    };
    const lineOf = (wire: WireId) => latest.current.geometry.current?.routes.get(wire);
    const drop = () => {
      const now = held.current;
      if (!now) return;
      if (now.by !== 0) {
        latest.current.commands.setBends(now.wire, bendsOf(now));
        const way = now.stretch.upright ? (now.by > 0 ? 'right' : 'left') : now.by > 0 ? 'down' : 'up';
        latest.current.announce(`Moved a stretch of the wire ${Math.abs(now.by)} px ${way}.`);
      }
      show(undefined);
    };
    return {
      drop,
      hold(wire, at) {
        const line = lineOf(wire);
        const stretch = line && nearestStretch(line, at);
        if (line && stretch && latest.current.commands.canEdit) show({ wire, line, stretch, by: 0 });
      },
      follow(at) {
        const now = held.current;
        const start = now?.line[now.stretch.index];
        if (!now || !start) return;
        const aside = now.stretch.upright ? at.x - start.x : at.y - start.y;
        const by = Math.round(aside / GRID) * GRID;
        if (by !== now.by) show({ ...now, by });
      },
      step(wire, way) {
        const upright = way.x !== 0;
        const by = (upright ? way.x : way.y) * GRID;
        const now = held.current;
        if (now?.wire === wire && now.stretch.upright === upright) {
          show({ ...now, by: now.by + by });
          return true;
        }
        drop();
        const line = lineOf(wire);
        const stretch = line && longestStretch(line, upright);
        if (!line || !stretch || !latest.current.commands.canEdit) return false;
        show({ wire, line, stretch, by });
        return true;
      },
      abort() {
        const now = held.current;
        if (!now || now.by === 0) return false;
        show(undefined);
        latest.current.announce('The wire was let go; nothing has changed.');
        return true;
      },
    };
  }, [latest]);
  return { bent, hands };
}
