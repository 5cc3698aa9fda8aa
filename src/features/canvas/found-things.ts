import type { Drawing, DrawnPart } from '#shared/circuit/drawing';
import { type DrawnNets, terminalKey } from '#shared/circuit/nets';
import { around, type Box } from '#shared/geometry/box';
import type { GridPoint } from '#shared/geometry/place';
import type { Selection } from '../../live/selection';
import type { SheetGeometry } from './sheet-geometry';
import { partBox } from './symbol-box';

/** A part or a net that somebody looked for. */
export type Found =
  | { readonly kind: 'part'; readonly part: DrawnPart }
  | { readonly kind: 'net'; readonly net: string };

/** What is selected when it was found: the part; a net's wires, or where parts touch without any, the parts. */
export function selectionOf(found: Found, drawing: Drawing, { nets, netOf }: DrawnNets): Selection {
  if (found.kind === 'part') return { parts: new Set([found.part.id]), wires: new Set() };
  const wires = drawing.wires.filter(({ from }) => netOf.get(terminalKey(from)) === found.net).map(({ id }) => id);
  const touching = wires.length > 0 ? [] : (nets.get(found.net)?.terminals ?? []);
  return { parts: new Set(touching.map(({ part }) => part)), wires: new Set(wires) };
}

export function boxOf(selection: Selection, geometry: SheetGeometry): Box | undefined {
  const corners = [...selection.parts].flatMap((id): GridPoint[] => {
    const part = geometry.parts.get(id);
    const box = part && partBox(part);
    return box
      ? [
          { x: box.left, y: box.top },
          { x: box.right, y: box.bottom },
        ]
      : [];
  });
  for (const id of selection.wires) corners.push(...(geometry.routes.get(id) ?? []));
  return corners.length > 0 ? around(corners) : undefined;
}
