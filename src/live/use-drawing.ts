import { equalityDeep } from 'lib0/function';
import { useCallback, useMemo, useRef, useSyncExternalStore } from 'react';
import type { CircuitFile } from '#shared/circuit/circuit-file';
import type { Drawing } from '#shared/circuit/drawing';
import { netlist } from '#shared/circuit/netlist';
import type { DrawnNets } from '#shared/circuit/nets';
import { readDrawing, type SetAside } from '#shared/doc/read-drawing';
import type { Room } from './room';

export type SheetReading = {
  readonly drawing: Drawing;
  readonly setAside: readonly SetAside[];
  readonly nets: DrawnNets;
  readonly circuit: CircuitFile;
};

/** What the room's document says now. Whatever did not change is the same object from one reading to the next. */
export function useDrawing(room: Room): SheetReading {
  const version = useRef(0);
  const subscribe = useCallback(
    (listener: () => void) => {
      const changed = () => {
        version.current += 1;
        listener();
      };
      room.doc.on('afterTransaction', changed);
      return () => room.doc.off('afterTransaction', changed);
    },
    [room],
  );
  const now = useSyncExternalStore(subscribe, () => version.current);
  const last = useRef<SheetReading>(undefined);
  return useMemo(() => {
    // `now` stands for the document's content, which React cannot see.
    void now;
    const { drawing, setAside } = readDrawing(room.doc);
    const before = last.current;
    const kept: Drawing = before
      ? {
          parts: keepUnchanged(before.drawing.parts, drawing.parts),
          wires: keepUnchanged(before.drawing.wires, drawing.wires),
          settings: keepEqual(before.drawing.settings, drawing.settings),
        }
      : drawing;
    const { circuit, nets } = netlist(kept);
    // Moving a part changes no circuit, so it must not cause another solve.
    const reading = { drawing: kept, setAside, nets, circuit: before ? keepEqual(before.circuit, circuit) : circuit };
    last.current = reading;
    return reading;
  }, [room, now]);
}

function keepUnchanged<T extends { id: string }>(before: readonly T[], after: readonly T[]): readonly T[] {
  const byId = new Map(before.map((item) => [item.id, item]));
  const kept = after.map((item) => {
    const old = byId.get(item.id);
    return old ? keepEqual(old, item) : item;
  });
  return kept.length === before.length && kept.every((item, index) => item === before[index]) ? before : kept;
}

function keepEqual<T>(before: T, after: T): T {
  return equalityDeep(before, after) ? before : after;
}
