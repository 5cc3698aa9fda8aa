import type { Drawing, DrawnComponent } from '#shared/circuit/drawing';
import type { DrawnNets } from '#shared/circuit/nets';
import { type Box, hungBox, widened } from '#shared/geometry/box';
import { BoxIndex } from '#shared/geometry/box-index';
import { GRID, type GridPoint } from '#shared/geometry/place';
import { type Branch, branches } from './branches';
import { spotBox } from './net-spots';
import type { SheetGeometry } from './sheet-geometry';
import { labelBoxes, type SheetTexts, tagBoxes, wireBoxes } from './sheet-texts';
import { CHARACTER, inkOf, LINE } from './text-blocks';
import type { WireGraph } from './wire-graph';

/** An arrowhead on a branch and its figure beside it. */
export type CurrentSpot = {
  readonly part: DrawnComponent;
  readonly pin: string;
  readonly net: string;
  readonly at: GridPoint;
  /** The way along the wire from the terminal. */
  readonly outwards: GridPoint;
  /** The side of the wire on which the figure stands. */
  readonly side: GridPoint;
};

/** From the wire to the figure beside it, in px. */
const ASIDE = 10;
/** Half an arrowhead, and the wire to be seen on either side. */
const ARROW = 14;
/** Room of a figure such as `0.123 µA`. */
const FIGURE_WIDTH = Math.ceil(8 * CHARACTER);

const RIGHT: GridPoint = { x: 1, y: 0 };
const LEFT: GridPoint = { x: -1, y: 0 };
const ABOVE: GridPoint = { x: 0, y: -1 };
const BELOW: GridPoint = { x: 0, y: 1 };

/** For each part with a free branch, where arrowhead and figure stand: over no symbol, text or other wire. */
export function currentSpots(
  drawing: Drawing,
  geometry: SheetGeometry,
  graph: WireGraph,
  nets: DrawnNets,
  texts: SheetTexts,
): CurrentSpot[] {
  const taken = new BoxIndex();
  for (const part of geometry.parts.values()) {
    if (!texts.written.has(part.id)) for (const ink of inkOf(part)) taken.add(ink);
  }
  for (const box of [...tagBoxes(texts, geometry), ...labelBoxes(texts, geometry)]) taken.add(box);
  const gaps = new BoxIndex();
  for (const spot of texts.spots) {
    taken.add(spotBox(spot));
    gaps.add(spotBox(spot));
  }
  for (const wire of wireBoxes(drawing, geometry, nets)) taken.add(wire);
  const found: CurrentSpot[] = [];
  const told = new Set<DrawnComponent>();
  const roomiest = branches(drawing, geometry, graph, nets).sort((a, b) => lengthOf(b.line) - lengthOf(a.line));
  for (const branch of roomiest) {
    // What flows into a part flows out of it: one figure tells both its wires, and both parts of a wire between two.
    const ends = branch.to ? [branch.part, branch.to] : [branch.part];
    if (ends.every((part) => told.has(part))) continue;
    const spot = best(branch, taken, gaps);
    if (!spot) continue;
    for (const part of ends) told.add(part);
    found.push(spot);
    taken.add(figureBox(spot));
    gaps.add(arrowBox(spot.at));
  }
  return found;
}

function lengthOf(line: readonly GridPoint[]): number {
  return line.slice(1).reduce((sum, { x, y }, i) => {
    const from = line[i] as GridPoint;
    return sum + Math.abs(x - from.x) + Math.abs(y - from.y);
  }, 0);
}

function best({ part, pin, net, line }: Branch, taken: BoxIndex, gaps: BoxIndex): CurrentSpot | undefined {
  let found: CurrentSpot | undefined;
  let least = Number.POSITIVE_INFINITY;
  for (let i = 1; i < line.length; i++) {
    const [from, to] = [line[i - 1] as GridPoint, line[i] as GridPoint];
    const outwards = { x: Math.sign(to.x - from.x), y: Math.sign(to.y - from.y) };
    const length = Math.abs(to.x - from.x) + Math.abs(to.y - from.y);
    const sides = outwards.x === 0 ? [RIGHT, LEFT] : [ABOVE, BELOW];
    for (let along = ARROW; along <= length - ARROW; along += GRID / 2) {
      const at = { x: from.x + along * outwards.x, y: from.y + along * outwards.y };
      for (const [rank, side] of sides.entries()) {
        const cost = Math.abs(along - length / 2) - Math.min(length, 120) / 2 + 10 * rank;
        if (cost >= least || !gaps.isFree(arrowBox(at))) continue;
        const spot = { part, pin, net, at, outwards, side };
        if (!taken.isFree(widened(figureBox(spot), 1))) continue;
        least = cost;
        found = spot;
      }
    }
  }
  return found;
}

/** The room of a figure on the sheet. */
export function figureBox({ at, side }: Pick<CurrentSpot, 'at' | 'side'>): Box {
  const aside = { x: at.x + ASIDE * side.x, y: at.y + (side.y === 0 ? 0 : ASIDE - 2) * side.y };
  return hungBox({ at: aside, grows: side }, FIGURE_WIDTH, side.y === 0 ? LINE : LINE - 2);
}

function arrowBox({ x, y }: GridPoint): Box {
  return { left: x - 7, top: y - 7, right: x + 7, bottom: y + 7 };
}
