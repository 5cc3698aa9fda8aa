import {
  bodyLedOut,
  type Drawing,
  type DrawnPart,
  type PartId,
  type Wire,
  type WireEnd,
  type WireId,
} from '#shared/circuit/drawing';
import { terminalKey } from '#shared/circuit/nets';
import { pinPlaces } from '#shared/geometry/pins';
import { type GridPoint, type Place, samePoint } from '#shared/geometry/place';
import { type RouteEnd, routeWire } from '#shared/geometry/route-wire';

/** A terminal as it is shown: whose it is, where, and which way its lead leaves. */
export type ShownTerminal = RouteEnd & { readonly end: WireEnd; readonly part: DrawnPart };

/** The drawing as it is shown now, parts under the hand included. */
export type SheetGeometry = {
  readonly parts: ReadonlyMap<PartId, DrawnPart>;
  readonly terminals: ReadonlyMap<string, ShownTerminal>;
  readonly routes: ReadonlyMap<WireId, readonly GridPoint[]>;
};

/**
 * Lays the drawing out with some parts elsewhere (while they are dragged). What lies as it did `before` keeps its
 * objects, so that only what moves is drawn again.
 */
export function layOut(
  drawing: Drawing,
  elsewhere: ReadonlyMap<PartId, Place>,
  before: SheetGeometry | undefined,
): SheetGeometry {
  const parts = new Map<PartId, DrawnPart>();
  const terminals = new Map<string, ShownTerminal>();
  for (const part of drawing.parts) {
    const place = elsewhere.get(part.id);
    const shown = place === undefined || samePlace(place, part.place) ? part : { ...part, place };
    parts.set(part.id, shown);
    for (const { pin, at, leaves } of pinPlaces(shown.kind, shown.place, bodyLedOut(shown))) {
      const end = { part: part.id, pin };
      terminals.set(terminalKey(end), { end, part: shown, at, leaves });
    }
  }
  const drawn = new Map(drawing.parts.map((part) => [part.id, part]));
  const routes = new Map<WireId, readonly GridPoint[]>();
  for (const wire of drawing.wires) {
    const from = terminals.get(terminalKey(wire.from));
    const to = terminals.get(terminalKey(wire.to));
    if (!from || !to) continue;
    const line = routeWire(from, to, bendsShown(wire, parts, drawn));
    const old = before?.routes.get(wire.id);
    routes.set(wire.id, old && sameLine(old, line) ? old : line);
  }
  return { parts, terminals, routes };
}

/** As the move will leave them: corners go along when both ends moved alike, and are given up otherwise. */
function bendsShown(
  wire: Wire,
  shown: ReadonlyMap<PartId, DrawnPart>,
  drawn: ReadonlyMap<PartId, DrawnPart>,
): readonly GridPoint[] {
  if (wire.bends.length === 0) return wire.bends;
  const [from, to] = [wire.from, wire.to].map(({ part }) => {
    const now = shown.get(part)?.place;
    const was = drawn.get(part)?.place;
    return now && was && { x: now.x - was.x, y: now.y - was.y };
  });
  if (!from || !to || !samePoint(from, to)) return [];
  return from.x === 0 && from.y === 0 ? wire.bends : wire.bends.map(({ x, y }) => ({ x: x + from.x, y: y + from.y }));
}

export function samePlace(a: Place, b: Place): boolean {
  return samePoint(a, b) && a.turn === b.turn && a.flip === b.flip;
}

function sameLine(a: readonly GridPoint[], b: readonly GridPoint[]): boolean {
  return a.length === b.length && a.every((point, i) => samePoint(point, b[i] as GridPoint));
}

/** Terminals of one part, in the order in which they are listed to a person. */
export function terminalsOf(geometry: SheetGeometry, part: PartId): ShownTerminal[] {
  return [...geometry.terminals.values()].filter(({ end }) => end.part === part);
}
