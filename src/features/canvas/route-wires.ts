import { type Drawing, type DrawnPart, isFet, type Wire, type WireEnd, type WireId } from '#shared/circuit/drawing';
import { type DrawnNets, terminalKey } from '#shared/circuit/nets';
import { around, hungBox, widened } from '#shared/geometry/box';
import { type GridPoint, samePoint } from '#shared/geometry/place';
import { routeAround } from '#shared/geometry/route-around';
import { type RouteEnd, routeWire } from '#shared/geometry/route-wire';
import { RoutingField } from '#shared/geometry/routing-field';
import { cornersOf, inkOf, labelWish, TAG_HEIGHT, TAG_WIDTH, tagWish } from './text-blocks';

/** Room about the outermost part in which wires may still find a way, in px. */
const MARGIN = 200;

export type Line = readonly GridPoint[];

/**
 * The ways of all wires: those that are `kept` as they are, those with corners of somebody's choice through these, then
 * the others around symbols, other nets' wires and the places that tags and labels like best. Nothing but the drawing
 * decides, so everybody sees the same.
 */
export function routeWires(
  drawing: Drawing,
  parts: Iterable<DrawnPart>,
  ends: ReadonlyMap<string, RouteEnd>,
  { netOf }: DrawnNets,
  kept: ReadonlyMap<WireId, Line>,
  bendsOf: (wire: Wire) => Line,
): Map<WireId, Line> {
  const routes = new Map<WireId, Line>();
  const open: { wire: Wire; from: RouteEnd; to: RouteEnd; net: number }[] = [];
  const netNumbers = new Map<string, number>();
  const numberOf = (end: string) => {
    const net = netOf.get(end) ?? end;
    const number = netNumbers.get(net) ?? netNumbers.size + 1;
    netNumbers.set(net, number);
    return number;
  };
  const lines: { line: Line; net: number }[] = [];
  const all = [...parts];
  const written = new Set(all.filter((part) => standsOnWire(part, drawing, ends)).map(({ id }) => id));
  // A name in the middle of a wire has no lead that would say which way to go on.
  const endAt = ({ part, pin }: WireEnd) => {
    const end = ends.get(terminalKey({ part, pin }));
    return end && written.has(part) ? { at: end.at, leaves: { x: 0, y: 0 } } : end;
  };
  for (const wire of drawing.wires) {
    const [from, to] = [endAt(wire.from), endAt(wire.to)];
    if (!from || !to) continue;
    const net = numberOf(terminalKey(wire.from));
    const bends = bendsOf(wire);
    const line = kept.get(wire.id) ?? (bends.length > 0 ? routeWire(from, to, bends) : undefined);
    if (!line) open.push({ wire, from, to, net });
    else {
      routes.set(wire.id, line);
      lines.push({ line, net });
    }
  }
  if (open.length === 0) return routes;

  const marks = all.filter(({ id }) => !written.has(id));
  const field = fieldOf(marks, [...ends.values(), ...lines.flatMap(({ line }) => line).map((at) => ({ at }))]);
  for (const [key, { at }] of ends) field.addTerminal(at, numberOf(key));
  for (const { line, net } of lines) field.addWire(line, net);
  // Short ones first: they have the least choice.
  open.sort((a, b) => span(a) - span(b) || (a.wire.id < b.wire.id ? -1 : 1));
  for (const { wire, from, to, net } of open) {
    const line = routeAround(from, to, field, net);
    routes.set(wire.id, line);
    field.addWire(line, net);
  }
  return routes;
}

/** A net name that stands on a wire or another terminal is written into the wire and is in nobody's way. */
function standsOnWire({ id, kind }: DrawnPart, { wires }: Drawing, ends: ReadonlyMap<string, RouteEnd>): boolean {
  if (kind !== 'net-name') return false;
  const at = ends.get(terminalKey({ part: id, pin: 'net' }))?.at;
  if (wires.filter(({ from, to }) => from.part === id || to.part === id).length >= 2) return true;
  return at !== undefined && [...ends.values()].filter((end) => samePoint(end.at, at)).length >= 2;
}

function fieldOf(parts: readonly DrawnPart[], points: readonly { at: GridPoint }[]): RoutingField {
  const inks = parts.map(inkOf);
  const field = new RoutingField(widened(around([...points.map(({ at }) => at), ...cornersOf(inks.flat())]), MARGIN));
  for (const boxes of inks) for (const box of boxes) field.addInk(box);
  for (const part of parts) {
    if (isFet(part)) field.addWish(hungBox(tagWish(part), TAG_WIDTH, TAG_HEIGHT));
    const label = labelWish(part);
    if (label) field.addWish(label);
  }
  return field;
}

function span({ from, to }: { from: RouteEnd; to: RouteEnd }): number {
  return Math.abs(from.at.x - to.at.x) + Math.abs(from.at.y - to.at.y);
}
