import { type Drawing, type DrawnComponent, isComponent } from '#shared/circuit/drawing';
import { type DrawnNets, terminalKey } from '#shared/circuit/nets';
import { GRID, type GridPoint, samePoint } from '#shared/geometry/place';
import type { SheetGeometry } from './sheet-geometry';
import { type Directions, DOWN, LEFT, pointKey, RIGHT, UP, type WireGraph, wayOf } from './wire-graph';

/** A stretch of wire that carries the current of one terminal and no other, from the terminal to where it parts. */
export type Branch = {
  readonly part: DrawnComponent;
  readonly pin: string;
  readonly net: string;
  readonly line: readonly GridPoint[];
  /** The part on whose terminal the branch ends, if it ends on one alone: its current is the same. */
  readonly to: DrawnComponent | undefined;
};

type Way = { readonly bit: number; readonly back: number; readonly step: GridPoint };

const WAYS: readonly Way[] = [
  { bit: RIGHT, back: LEFT, step: { x: GRID, y: 0 } },
  { bit: DOWN, back: UP, step: { x: 0, y: GRID } },
  { bit: LEFT, back: RIGHT, step: { x: -GRID, y: 0 } },
  { bit: UP, back: DOWN, step: { x: 0, y: -GRID } },
];

/** The branches that leave the terminals of resistors, sources and FETs (never gates and bodies), each once. */
export function branches(drawing: Drawing, geometry: SheetGeometry, graph: WireGraph, nets: DrawnNets): Branch[] {
  const ends = namePoints(drawing, geometry, nets);
  const walked = new Set<string>();
  const found: Branch[] = [];
  for (const [key, { part, end, at, leaves }] of geometry.terminals) {
    const net = nets.netOf.get(key);
    if (net === undefined || !isComponent(part) || !carries(part, end.pin)) continue;
    const points = graph.pointsOf.get(net);
    const here = points?.get(pointKey(at));
    // A terminal that others touch, or from which two wires leave, has no branch of its own.
    if (!points || !here || here.terminals > 1 || here.leads !== wayOf({ x: -leaves.x, y: -leaves.y })) continue;
    const line = walk(at, here, points, ends, walked);
    if (line) found.push({ part, pin: end.pin, net, line, to: endOf(line, points, geometry, nets, net) });
  }
  return found;
}

function endOf(
  line: readonly GridPoint[],
  points: ReadonlyMap<number, Directions>,
  geometry: SheetGeometry,
  { netOf }: DrawnNets,
  net: string,
): DrawnComponent | undefined {
  const at = line[line.length - 1] as GridPoint;
  const here = points.get(pointKey(at));
  if (here?.terminals !== 1 || onlyWay(here.wires) === undefined) return undefined;
  for (const [key, terminal] of geometry.terminals) {
    const { part, end } = terminal;
    if (netOf.get(key) !== net || !samePoint(terminal.at, at) || !isComponent(part)) continue;
    return carries(part, end.pin) ? part : undefined;
  }
  return undefined;
}

function carries({ kind }: DrawnComponent, pin: string): boolean {
  if (kind === 'capacitor' || kind === 'inductor') return false;
  return pin !== 'gate' && pin !== 'body';
}

function walk(
  start: GridPoint,
  { wires }: Directions,
  points: ReadonlyMap<number, Directions>,
  ends: ReadonlySet<number>,
  walked: Set<string>,
): GridPoint[] | undefined {
  const first = onlyWay(wires);
  if (!first || ends.has(pointKey(start))) return undefined;
  let way = first;
  const line = [start];
  let at = start;
  for (;;) {
    const next = { x: at.x + way.step.x, y: at.y + way.step.y };
    const edge = `${Math.min(at.x, next.x)} ${Math.min(at.y, next.y)} ${way.step.x !== 0}`;
    if (walked.has(edge)) return undefined;
    walked.add(edge);
    at = next;
    const here = points.get(pointKey(at));
    const onwards: Way | undefined = here && onlyWay(here.wires & ~way.back);
    if (!here || !onwards || here.leads !== 0 || ends.has(pointKey(at))) return [...line, at];
    if (onwards !== way) line.push(at);
    way = onwards;
  }
}

function onlyWay(bits: number): Way | undefined {
  return WAYS.find(({ bit }) => bit === bits);
}

/** Where names stand that their net bears elsewhere too: current may go on there, out of sight. */
function namePoints(drawing: Drawing, geometry: SheetGeometry, { netOf }: DrawnNets): Set<number> {
  const byNet = new Map<string, number[]>();
  for (const { id, kind } of drawing.parts) {
    if (kind !== 'net-name' && kind !== 'supply' && kind !== 'ground') continue;
    const key = terminalKey({ part: id, pin: 'net' });
    const terminal = geometry.terminals.get(key);
    const net = netOf.get(key);
    if (!terminal || net === undefined) continue;
    byNet.set(net, [...(byNet.get(net) ?? []), pointKey(terminal.at)]);
  }
  return new Set([...byNet.values()].filter((points) => points.length > 1).flat());
}
