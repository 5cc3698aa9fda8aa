import type { PointerEvent as ReactPointerEvent } from 'react';
import { useEffect, useMemo, useRef, useState } from 'react';
import type { Drawing, WireEnd } from '#shared/circuit/drawing';
import { type DrawnNets, terminalKey } from '#shared/circuit/nets';
import type { GridPoint } from '#shared/geometry/place';
import type { SheetCommands } from '../../live/sheet-commands';
import { spokenTerminal } from './part-text';
import type { SheetGeometry } from './sheet-geometry';
import { useLatest } from './use-latest';
import { targetAt, type WireTarget } from './wire-target';

/** A wire that has one end: it follows the pointer or the keys until it is tied or dropped. */
export type Wiring = {
  readonly from: WireEnd;
  readonly at: GridPoint;
  readonly target: WireTarget | undefined;
  /** Held: the button is down, and letting go ties the wire. */
  readonly held: boolean;
};

type Sheet = {
  readonly drawing: Drawing;
  readonly geometry: SheetGeometry;
  readonly nets: DrawnNets;
  readonly commands: SheetCommands;
  announce(message: string): void;
  /** A place in the window as a point of the sheet. */
  toSheet(point: GridPoint): GridPoint;
};

export type WiringHands = {
  now(): Wiring | undefined;
  /** A terminal was pressed by a pointer: drag to the other end, or let go and click it. */
  press(end: WireEnd, event: ReactPointerEvent): void;
  begin(end: WireEnd): void;
  follow(at: GridPoint): void;
  aim(end: WireEnd): void;
  /** Ties the free end to what it points at; without a target it stays in the hand. */
  tie(): void;
  abort(): boolean;
  /** The pointer goes down anew: clicks are its own from here. */
  newPress(): void;
  /** What a click is to the wire in the hand; the one that ends the press that began it ties nothing. */
  meaningOfClick(): 'ties' | 'nothing' | 'not-ours';
};

/** A press that moved less than this, in px of the window, was a click. */
const CLICK_SLOP = 4;

export function useWiring(sheet: Sheet): { wiring: Wiring | undefined; hands: WiringHands } {
  const [wiring, setWiring] = useState<Wiring>();
  const inHand = useRef<Wiring>(undefined);
  const pressed = useRef<GridPoint>(undefined);
  const latest = useLatest(sheet);

  const hands = useMemo((): WiringHands => {
    const set = (next: Wiring | undefined) => {
      inHand.current = next;
      setWiring(next);
    };
    const begin = (from: WireEnd, held: boolean) => {
      const { geometry, commands, announce } = latest.current;
      const start = geometry.terminals.get(terminalKey(from));
      if (!start || !commands.canEdit) return;
      set({ from, at: start.at, target: undefined, held });
      announce(`A wire begins at ${spokenTerminal(start.part, from.pin)}: choose its other end.`);
    };
    const follow = (at: GridPoint) => {
      const now = inHand.current;
      if (!now) return;
      const { drawing, geometry } = latest.current;
      set({ ...now, at, target: targetAt(at, now.from, drawing, geometry) });
    };
    const tie = () => {
      const now = inHand.current;
      if (!now) return;
      const { geometry, nets, commands, announce } = latest.current;
      const spoken = (end: WireEnd) => {
        const part = geometry.parts.get(end.part);
        return part ? spokenTerminal(part, end.pin) : end.pin;
      };
      const { from, target } = now;
      if (!target) {
        announce('There is nothing to tie the wire to here: choose a terminal or a wire, or press Escape.');
        return;
      }
      set(undefined);
      if (target.kind === 'terminal') {
        commands.connect(from, target.end);
        announce(`Tied ${spoken(from)} to ${spoken(target.end)}.`);
      } else {
        // The way it found for itself is the one that its halves keep.
        const line = geometry.routes.get(target.wire.id) ?? [];
        commands.connectToWire(from, { ...target.wire, bends: line.slice(1, -1) }, target.at);
        announce(`Tied ${spoken(from)} to the wire of net ${nets.netOf.get(terminalKey(target.wire.from)) ?? ''}.`);
      }
    };
    return {
      now: () => inHand.current,
      begin: (end) => begin(end, false),
      follow,
      tie,
      press(end, event) {
        if (event.button !== 0 || inHand.current || !latest.current.commands.canEdit) return;
        event.stopPropagation();
        // A touch stays with the terminal otherwise, and the drawing would not hear of its way.
        if (event.currentTarget.hasPointerCapture(event.pointerId))
          event.currentTarget.releasePointerCapture(event.pointerId);
        pressed.current = { x: event.clientX, y: event.clientY };
        begin(end, true);
      },
      aim(end) {
        const now = inHand.current;
        const terminal = latest.current.geometry.terminals.get(terminalKey(end));
        if (!now || !terminal) return;
        const same = end.part === now.from.part && end.pin === now.from.pin;
        set({ ...now, at: terminal.at, target: same ? undefined : { kind: 'terminal', end } });
      },
      abort() {
        if (!inHand.current) return false;
        set(undefined);
        latest.current.announce('The wire was dropped; nothing has changed.');
        return true;
      },
      newPress() {
        pressed.current = undefined;
      },
      meaningOfClick() {
        if (pressed.current) {
          pressed.current = undefined;
          return 'nothing';
        }
        return inHand.current ? 'ties' : 'not-ours';
      },
    };
  }, [latest]);

  const held = wiring?.held ?? false;
  useEffect(() => {
    if (!held) return;
    const place = (event: PointerEvent) => latest.current.toSheet({ x: event.clientX, y: event.clientY });
    const onMove = (event: PointerEvent) => hands.follow(place(event));
    const onUp = (event: PointerEvent) => {
      const start = pressed.current ?? { x: 0, y: 0 };
      const now = inHand.current;
      if (!now) return;
      if (Math.hypot(event.clientX - start.x, event.clientY - start.y) < CLICK_SLOP) {
        const next = { ...now, held: false };
        inHand.current = next;
        setWiring(next);
        return;
      }
      hands.follow(place(event));
      if (inHand.current?.target) hands.tie();
      else hands.abort();
    };
    const onCancel = () => hands.abort();
    window.addEventListener('pointermove', onMove);
    window.addEventListener('pointerup', onUp);
    window.addEventListener('pointercancel', onCancel);
    return () => {
      window.removeEventListener('pointermove', onMove);
      window.removeEventListener('pointerup', onUp);
      window.removeEventListener('pointercancel', onCancel);
    };
  }, [held, hands, latest]);

  return { wiring, hands };
}
