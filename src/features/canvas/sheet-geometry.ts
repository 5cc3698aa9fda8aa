import {
  bodyLedOut,
  type Drawing,
  type DrawnPart,
  isComponent,
  type PartId,
  type Wire,
  type WireEnd,
  type WireId,
} from '#shared/circuit/drawing';
import { type DrawnNets, terminalKey } from '#shared/circuit/nets';
import { pinPlaces } from '#shared/geometry/pins';
import { type GridPoint, type Place, samePoint } from '#shared/geometry/place';
import type { RouteEnd } from '#shared/geometry/route-wire';
import { routeWires } from './route-wires';

/** A terminal as it is shown: whose it is, where, and which way its lead leaves. */
export type ShownTerminal = RouteEnd & { readonly end: WireEnd; readonly part: DrawnPart };

/** The drawing as it is shown now, parts under the hand included. */
export type SheetGeometry = {
  readonly parts: ReadonlyMap<PartId, DrawnPart>;
  readonly terminals: ReadonlyMap<string, ShownTerminal>;
  readonly routes: ReadonlyMap<WireId, readonly GridPoint[]>;
  /** What it shows, and whether nothing was in the hand. */
  readonly drawing: Drawing;
  readonly settled: boolean;
};

/** What is under the hand and not yet in the drawing: parts elsewhere, wires with other corners. */
export type InHand = {
  readonly elsewhere: ReadonlyMap<PartId, Place>;
  readonly bent: ReadonlyMap<WireId, readonly GridPoint[]>;
};

export const NOTHING_IN_HAND: InHand = { elsewhere: new Map(), bent: new Map() };

/**
 * Lays the drawing out as it is shown. What lies as it did `before` keeps its objects, so that only what moves is drawn
 * again; while something is in the hand no wire but those that end on it looks for another way.
 */
export function layOut(
  drawing: Drawing,
  nets: DrawnNets,
  { elsewhere, bent }: InHand,
  before: SheetGeometry | undefined,
): SheetGeometry {
  const parts = new Map<PartId, DrawnPart>();
  const terminals = new Map<string, ShownTerminal>();
  for (const part of drawing.parts) {
    const place = elsewhere.get(part.id);
    const earlier = before?.parts.get(part.id);
    const moved = place !== undefined && !samePlace(place, part.place);
    const shown = !moved ? part : earlier && isCarried(earlier, part, place) ? earlier : { ...part, place };
    parts.set(part.id, shown);
    for (const { pin, at, leaves } of pinPlaces(shown.kind, shown.place, bodyLedOut(shown))) {
      const end = { part: part.id, pin };
      const key = terminalKey(end);
      const old = before?.terminals.get(key);
      terminals.set(key, old?.part === shown ? old : { end, part: shown, at, leaves });
    }
  }
  const drawn = new Map(drawing.parts.map((part) => [part.id, part]));
  const atRest = elsewhere.size + bent.size === 0;
  const unmoved = before !== undefined && (!atRest || (before.settled && sameLayout(before.drawing, drawing)));
  const kept = new Map<WireId, readonly GridPoint[]>();
  for (const wire of unmoved ? drawing.wires : []) {
    const line = before?.routes.get(wire.id);
    const still =
      line &&
      !bent.has(wire.id) &&
      isAt(terminals.get(terminalKey(wire.from)), line[0]) &&
      isAt(terminals.get(terminalKey(wire.to)), line[line.length - 1]);
    if (line && still) kept.set(wire.id, line);
  }
  const bendsOf = (wire: Wire) => bent.get(wire.id) ?? bendsShown(wire, parts, drawn);
  const routes = routeWires(drawing, parts.values(), terminals, nets, kept, bendsOf);
  for (const [id, line] of routes) {
    const old = before?.routes.get(id);
    if (old && sameLine(old, line)) routes.set(id, old);
  }
  return { parts, terminals, routes, drawing, settled: atRest };
}

/** Whether two drawings are alike in all that decides where wires run: a value that changed is not of it. */
export function sameLayout(a: Drawing, b: Drawing): boolean {
  if (a.parts === b.parts && a.wires === b.wires) return true;
  return (
    a.wires.length === b.wires.length &&
    a.parts.length === b.parts.length &&
    a.wires.every((wire, i) => wire === b.wires[i]) &&
    a.parts.every((part, i) => samePosture(part, b.parts[i] as DrawnPart))
  );
}

function samePosture(a: DrawnPart, b: DrawnPart): boolean {
  if (a === b) return true;
  const alike = a.id === b.id && a.kind === b.kind && samePlace(a.place, b.place);
  return alike && isComponent(a) && bodyLedOut(a) === bodyLedOut(b);
}

function isAt(terminal: ShownTerminal | undefined, point: GridPoint | undefined): boolean {
  return terminal !== undefined && point !== undefined && samePoint(terminal.at, point);
}

/** Whether a part under the hand is shown as it was a moment ago. */
function isCarried(earlier: DrawnPart, part: DrawnPart, place: Place): boolean {
  return samePlace(earlier.place, place) && earlier.kind === part.kind && earlier.values === part.values;
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
