import type { Drawing, Wire, WireEnd } from '#shared/circuit/drawing';
import { terminalKey } from '#shared/circuit/nets';
import { type GridPoint, samePoint, snap } from '#shared/geometry/place';
import type { SheetGeometry } from './sheet-geometry';

/** What the free end of a wire would be tied to. */
export type WireTarget =
  | { readonly kind: 'terminal'; readonly end: WireEnd }
  | { readonly kind: 'wire'; readonly wire: Wire; readonly at: GridPoint };

/** How near the pointer must come, in px of the sheet. */
const TERMINAL_REACH = 13;
const WIRE_REACH = 9;

/** The terminal nearest to a point, else the wire that passes it, other than where the new wire begins. */
export function targetAt(
  point: GridPoint,
  from: WireEnd,
  drawing: Drawing,
  geometry: SheetGeometry,
): WireTarget | undefined {
  let nearest: WireEnd | undefined;
  let least = TERMINAL_REACH;
  for (const { end, at } of geometry.terminals.values()) {
    const distance = Math.hypot(at.x - point.x, at.y - point.y);
    if (distance < least && !(end.part === from.part && end.pin === from.pin)) {
      nearest = end;
      least = distance;
    }
  }
  return nearest ? { kind: 'terminal', end: nearest } : wireAt(point, from, drawing, geometry);
}

function wireAt(point: GridPoint, from: WireEnd, drawing: Drawing, geometry: SheetGeometry): WireTarget | undefined {
  const start = geometry.terminals.get(terminalKey(from));
  let found: { wire: Wire; at: GridPoint } | undefined;
  let least = WIRE_REACH;
  for (const wire of drawing.wires) {
    const line = geometry.routes.get(wire.id) ?? [];
    for (let i = 1; i < line.length; i++) {
      const at = nearestOn(line[i - 1] as GridPoint, line[i] as GridPoint, point);
      const distance = Math.hypot(at.x - point.x, at.y - point.y);
      if (distance < least) {
        found = { wire, at: snap(at) };
        least = distance;
      }
    }
  }
  if (!found || (start && samePoint(found.at, start.at))) return undefined;
  // At a wire's end there is a terminal already.
  for (const end of [found.wire.from, found.wire.to]) {
    const terminal = geometry.terminals.get(terminalKey(end));
    if (terminal && samePoint(terminal.at, found.at)) return { kind: 'terminal', end };
  }
  return { kind: 'wire', ...found };
}

function nearestOn(a: GridPoint, b: GridPoint, point: GridPoint): GridPoint {
  return { x: between(a.x, b.x, point.x), y: between(a.y, b.y, point.y) };
}

function between(a: number, b: number, value: number): number {
  return Math.min(Math.max(a, b), Math.max(Math.min(a, b), value));
}
