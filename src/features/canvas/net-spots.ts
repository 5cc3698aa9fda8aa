import type { DrawnNets } from '#shared/circuit/nets';
import { type Box, widened } from '#shared/geometry/box';
import type { BoxIndex } from '#shared/geometry/box-index';
import { GRID, type GridPoint } from '#shared/geometry/place';
import { CHARACTER } from './text-blocks';
import type { Run, WireGraph } from './wire-graph';

/** Where a net's name and voltage stand on one of its wires, broken for them. */
export type NetSpot = { readonly net: string; readonly named: boolean; readonly at: GridPoint };

/** A stretch of a net's wires, and what else may not be written over. */
export type NetBox = Box & { readonly net: string; readonly upright: boolean };

/** What the letters take above and below the middle of their line, in px. */
const HALF_LINE = 8;
/** Characters of a voltage such as `−0.425 V`, the space before it included. */
const VOLTAGE_CHARACTERS = 8;
/** Wire that must be seen on either side of the gap, in px: a dot and a little more. */
const STUB = 8;
/** What it costs to stand where a tag would like to. */
const WISHED = 90;
/** Beyond this length a wire is no better a place. */
const LONG = 240;

/**
 * For each net with a free stretch of wire, but ground's, the best place for its name and voltage: clear of what is in
 * `taken` and of all other wires; if it can be of `wishes` too, where tags would like to stand. Room is kept for
 * voltages whether they are shown or not, so that showing them moves nothing. `taken` then holds the places.
 */
export function netSpots(
  graph: WireGraph,
  { nets }: DrawnNets,
  ground: string,
  wires: BoxIndex<NetBox>,
  taken: BoxIndex,
  wishes: BoxIndex,
): NetSpot[] {
  const spots: NetSpot[] = [];
  for (const [net, runs] of [...graph.runsOf].sort(([a], [b]) => (a < b ? -1 : 1))) {
    if (net === ground) continue;
    const named = nets.get(net)?.named ?? false;
    const width = spotWidth(net, named);
    let best: GridPoint | undefined;
    let least = Number.POSITIVE_INFINITY;
    for (const run of runs) {
      for (const [at, cost] of places(run, width)) {
        if (cost >= least) continue;
        const box = boxAbout(at, width);
        const wished = cost + (wishes.isFree(box) ? 0 : WISHED);
        if (wished >= least || !taken.isFree(widened(box, 2)) || !clearOfWires(box, net, run, wires)) continue;
        best = at;
        least = wished;
      }
    }
    if (!best) continue;
    taken.add(boxAbout(best, width));
    spots.push({ net, named, at: best });
  }
  return spots;
}

/** The width of a net's name and voltage in px. */
function spotWidth(net: string, named: boolean): number {
  return Math.ceil(((named ? net.length : 0) + VOLTAGE_CHARACTERS) * CHARACTER) + 8;
}

/** The room of a spot on the sheet. */
export function spotBox({ net, named, at }: NetSpot): Box {
  return boxAbout(at, spotWidth(net, named));
}

/** Grid points of a run at which a text of this width leaves wire to be seen on either side; the middle first of all. */
function* places(run: Run, width: number): Generator<[at: GridPoint, cost: number]> {
  const length = run.to.x - run.from.x + (run.to.y - run.from.y);
  const needed = (run.upright ? 2 * HALF_LINE : width) + 2 * STUB;
  if (length < needed) return;
  const cost = (run.upright ? 60 : 0) + (LONG - Math.min(LONG, length)) / 4;
  const middle = length / 2;
  const at = (along: number): GridPoint =>
    run.upright ? { x: run.from.x, y: run.from.y + along } : { x: run.from.x + along, y: run.from.y };
  yield [at(Math.round(middle)), cost];
  for (let aside = GRID; middle - aside >= needed / 2; aside += GRID) {
    yield [at(Math.round(middle - aside)), cost + 4 + aside / 8];
    yield [at(Math.round(middle + aside)), cost + 5 + aside / 8];
  }
}

/** Whether no wire but the stretch itself runs through a text. */
function clearOfWires(box: Box, net: string, run: Run, wires: BoxIndex<NetBox>): boolean {
  return wires.meeting(widened(box, 2)).every((wire) => {
    if (wire.net !== net || wire.upright !== run.upright) return false;
    const across = run.upright ? (wire.left + wire.right) / 2 : (wire.top + wire.bottom) / 2;
    return across === (run.upright ? run.from.x : run.from.y);
  });
}

function boxAbout({ x, y }: GridPoint, width: number): Box {
  return { left: x - width / 2, top: y - HALF_LINE, right: x + width / 2, bottom: y + HALF_LINE };
}

/** Whether a net's name still stands on one of its stretches. */
export function stillOnWire({ net, at }: NetSpot, graph: WireGraph): boolean {
  return (graph.runsOf.get(net) ?? []).some(
    ({ from, to }) => from.x <= at.x && at.x <= to.x && from.y <= at.y && at.y <= to.y,
  );
}
