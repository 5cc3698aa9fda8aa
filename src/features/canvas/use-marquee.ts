import { type PointerEvent as ReactPointerEvent, useEffect, useMemo, useRef, useState } from 'react';
import { around, type Box } from '#shared/geometry/box';
import type { GridPoint } from '#shared/geometry/place';
import type { Selection } from '../../live/selection';
import type { SheetGeometry } from './sheet-geometry';
import { partBox } from './symbol-box';
import { useLatest } from './use-latest';

/** The frame that is being drawn about parts, and what is in it. */
export type Marquee = { readonly box: Box; readonly selection: Selection };

type Sheet = {
  readonly geometry: SheetGeometry;
  readonly selection: Selection;
  select(selection: Selection): void;
  announce(message: string): void;
  toSheet(point: GridPoint): GridPoint;
};

export type MarqueeHands = {
  /** The pointer goes down anew: the click to come is its own from here. */
  newPress(): void;
  /** It went down on the empty sheet. */
  press(event: ReactPointerEvent): void;
  abort(): boolean;
  /** Whether the click that follows belongs to the frame just drawn. */
  tookClick(): boolean;
};

/** A press that moved less than this, in px of the window, was a click. */
const SLOP = 4;

export function useMarquee(sheet: Sheet): { marquee: Marquee | undefined; hands: MarqueeHands } {
  const [marquee, setMarquee] = useState<Marquee>();
  const latest = useLatest(sheet);
  const pressed = useRef<{ stop: () => void }>(undefined);
  const drawn = useRef<Marquee>(undefined);
  const tookClick = useRef(false);

  const hands = useMemo((): MarqueeHands => {
    const set = (next: Marquee | undefined) => {
      drawn.current = next;
      setMarquee(next);
    };
    const letGo = () => {
      pressed.current?.stop();
      pressed.current = undefined;
      set(undefined);
    };
    return {
      newPress() {
        tookClick.current = false;
      },
      press(down) {
        letGo();
        const { pointerId } = down;
        const at = { x: down.clientX, y: down.clientY };
        const adds = down.shiftKey || down.ctrlKey || down.metaKey;
        const basis = adds ? latest.current.selection : { parts: new Set<never>(), wires: new Set<never>() };
        const onMove = (event: PointerEvent) => {
          if (event.pointerId !== pointerId) return;
          if (!drawn.current && Math.hypot(event.clientX - at.x, event.clientY - at.y) < SLOP) return;
          const { geometry, toSheet } = latest.current;
          const box = around([toSheet(at), toSheet({ x: event.clientX, y: event.clientY })]);
          set({ box, selection: inside(box, geometry, basis) });
        };
        const onUp = (event: PointerEvent) => {
          if (event.pointerId !== pointerId) return;
          const { select, announce } = latest.current;
          const done = drawn.current;
          letGo();
          if (!done) return;
          tookClick.current = true;
          select(done.selection);
          const { size } = done.selection.parts;
          announce(size === 1 ? 'Selected 1 part.' : `Selected ${size} parts.`);
        };
        window.addEventListener('pointermove', onMove);
        window.addEventListener('pointerup', onUp);
        window.addEventListener('pointercancel', letGo);
        pressed.current = {
          stop() {
            window.removeEventListener('pointermove', onMove);
            window.removeEventListener('pointerup', onUp);
            window.removeEventListener('pointercancel', letGo);
          },
        };
      },
      abort() {
        if (!drawn.current) return false;
        letGo();
        // The button is still down: the click to come is about nothing.
        tookClick.current = true;
        latest.current.announce('Nothing was selected.');
        return true;
      },
      tookClick() {
        const took = tookClick.current;
        tookClick.current = false;
        return took;
      },
    };
  }, [latest]);
  useEffect(() => () => pressed.current?.stop(), []);
  return { marquee, hands };
}

/** Whatever lies wholly within a box, with what was selected before. */
function inside(box: Box, geometry: SheetGeometry, basis: Selection): Selection {
  const holds = ({ left, top, right, bottom }: Box) =>
    box.left <= left && box.top <= top && right <= box.right && bottom <= box.bottom;
  const parts = new Set(basis.parts);
  const wires = new Set(basis.wires);
  for (const part of geometry.parts.values()) if (holds(partBox(part))) parts.add(part.id);
  for (const [id, line] of geometry.routes) if (holds(around(line))) wires.add(id);
  return { parts, wires };
}
