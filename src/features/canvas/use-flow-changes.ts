import { type MouseEvent, type RefObject, useMemo, useRef } from 'react';
import type { EdgeChange, NodeChange } from 'reactflow';
import type { PartId } from '#shared/circuit/drawing';
import type { Place } from '#shared/geometry/place';
import type { Selection } from '../../live/selection';
import type { Desk } from './desk';
import { asPartId, asWireId } from './flow-elements';
import { partBox } from './symbol-box';

/** React Flow's wishes, each sent where that kind of state lives: selection to the page, drags to the hand. */
export function useFlowChanges(desk: RefObject<Desk>) {
  // Nodes and edges tell of one click in two calls; the second must build on the first.
  const pending = useRef<{ basis: Selection; next: Selection }>(undefined);
  return useMemo(() => {
    const select = (change: (parts: Set<string>, wires: Set<string>) => void) => {
      const { selection } = desk.current;
      const now = pending.current?.basis === selection ? pending.current.next : selection;
      const parts = new Set<string>(now.parts);
      const wires = new Set<string>(now.wires);
      change(parts, wires);
      const next = { parts: new Set([...parts].map(asPartId)), wires: new Set([...wires].map(asWireId)) };
      pending.current = { basis: selection, next };
      desk.current.select(next);
    };
    const apply = (ids: Set<string>, changes: readonly { id: string; selected: boolean }[]) => {
      for (const { id, selected } of changes) {
        if (selected) ids.add(id);
        else ids.delete(id);
      }
    };
    return {
      onNodesChange(changes: NodeChange[]) {
        const selects = changes.filter((change) => change.type === 'select');
        // Without a key to hold, the click decides, once: React Flow reads a touch twice on a slow machine.
        if (selects.length > 0 && !desk.current.several) select((parts) => apply(parts, selects));
        const places = new Map<PartId, Place>();
        for (const change of changes) {
          if (change.type !== 'position' || !change.dragging || !change.position) continue;
          const part = desk.current.geometry.parts.get(asPartId(change.id));
          if (!part) continue;
          const { left, top } = partBox(part);
          const { place } = part;
          places.set(part.id, {
            ...place,
            x: place.x + change.position.x - left,
            y: place.y + change.position.y - top,
          });
        }
        if (places.size > 0) desk.current.moving.show(places);
      },
      onEdgesChange(changes: EdgeChange[]) {
        const selects = changes.filter((change) => change.type === 'select');
        const taken = desk.current.several ? selects.filter(({ selected }) => selected) : selects;
        if (taken.length > 0) select((_parts, wires) => apply(wires, taken));
      },
      /** The first click selects; one on the part already selected opens its slip, on one of many selects it alone. */
      onPartClick(id: string, event: MouseEvent) {
        const { selectedAtPress, several, select, openSlip } = desk.current;
        const part = asPartId(id);
        if (event.shiftKey || event.ctrlKey || event.metaKey) return;
        if (several) {
          select(toggled(selectedAtPress, part));
          return;
        }
        if (!selectedAtPress.parts.has(part)) return;
        if (selectedAtPress.parts.size + selectedAtPress.wires.size === 1) openSlip(part);
        else select({ parts: new Set([part]), wires: new Set() });
      },
    };
  }, [desk]);
}

function toggled({ parts, wires }: Selection, part: PartId): Selection {
  const next = new Set(parts);
  if (!next.delete(part)) next.add(part);
  return { parts: next, wires };
}
