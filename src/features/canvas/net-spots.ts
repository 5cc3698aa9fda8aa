import { isFet } from '#shared/circuit/drawing';
import type { DrawnNets } from '#shared/circuit/nets';
import type { GridPoint } from '#shared/geometry/place';
import { nameOf, valueText } from './part-text';
import type { SheetGeometry } from './sheet-geometry';
import { type Box, hungBox, labelAnchor, overlap, partBox, tagAnchor } from './symbol-box';
import type { Run, WireGraph } from './wire-graph';

/** Where a net's name and voltage stand on one of its wires, broken for them. */
export type NetSpot = { readonly net: string; readonly named: boolean; readonly at: GridPoint };

/** Advance of one character at 12 px, as the bundled face has it. */
const CHARACTER = 7.2;
const LINE = 16;
/** Of that, what the letters take above and below the middle. */
const CAP = 5;
/** Characters of a voltage such as `−0.425 V`, the space before it included. */
const VOLTAGE_CHARACTERS = 8;
/** A tag with its three lines. */
export const TAG_WIDTH = 124;
const TAG_HEIGHT = 58;

/** For each net with a wire long enough, but ground's, the best place for its name: on the longest free stretch. */
export function netSpots(
  graph: WireGraph,
  geometry: SheetGeometry,
  { nets }: DrawnNets,
  ground: string,
  voltages: boolean,
): NetSpot[] {
  const taken = obstacles(geometry);
  const spots: NetSpot[] = [];
  for (const [net, runs] of graph.runsOf) {
    const named = nets.get(net)?.named ?? false;
    if (net === ground || (!named && !voltages)) continue;
    const characters = (named ? net.length : 0) + (voltages ? VOLTAGE_CHARACTERS : 0);
    const width = characters * CHARACTER + 8;
    const spot = bestSpot(runs, width, taken);
    if (!spot) continue;
    taken.push(boxAbout(spot, width));
    spots.push({ net, named, at: spot });
  }
  return spots;
}

function bestSpot(runs: readonly Run[], width: number, taken: readonly Box[]): GridPoint | undefined {
  const longest = [...runs].sort(
    (a, b) =>
      Number(a.upright) - Number(b.upright) || lengthOf(b) - lengthOf(a) || a.from.y - b.from.y || a.from.x - b.from.x,
  );
  let crowded: GridPoint | undefined;
  for (const run of longest) {
    const needed = run.upright ? LINE + 24 : width + 12;
    const spare = (lengthOf(run) - needed) / 2;
    if (spare < 0) continue;
    const middle = { x: (run.from.x + run.to.x) / 2, y: (run.from.y + run.to.y) / 2 };
    for (const shift of [0, -spare, spare]) {
      const at = run.upright ? { x: middle.x, y: middle.y + shift } : { x: middle.x + shift, y: middle.y };
      if (!taken.some((box) => overlap(box, boxAbout(at, width)))) return at;
    }
    if (!run.upright) crowded ??= middle;
  }
  return crowded;
}

function obstacles(geometry: SheetGeometry): Box[] {
  const boxes: Box[] = [];
  for (const part of geometry.parts.values()) {
    if (part.kind !== 'junction') boxes.push(partBox(part));
    const anchor = labelAnchor(part);
    const lines = [nameOf(part), valueText(part)].filter((line) => line !== undefined);
    const longest = Math.max(0, ...lines.map((line) => line.length));
    if (anchor) boxes.push(hungBox(anchor, longest * CHARACTER, lines.length * LINE));
    if (isFet(part)) boxes.push(hungBox(tagAnchor(part), TAG_WIDTH, TAG_HEIGHT));
  }
  return boxes;
}

function boxAbout({ x, y }: GridPoint, width: number): Box {
  return { left: x - width / 2, top: y - CAP, right: x + width / 2, bottom: y + CAP };
}

function lengthOf({ from, to }: Run): number {
  return to.x - from.x + (to.y - from.y);
}
