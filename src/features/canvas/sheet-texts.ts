import type { Drawing, DrawnPart, PartId } from '#shared/circuit/drawing';
import { type DrawnNets, terminalKey } from '#shared/circuit/nets';
import { type Anchor, around, type Box, hungBox, widened } from '#shared/geometry/box';
import { BoxIndex } from '#shared/geometry/box-index';
import type { GridPoint } from '#shared/geometry/place';
import { placeTags } from '#shared/geometry/place-tags';
import { type NetBox, type NetSpot, netSpots, spotBox } from './net-spots';
import type { SheetGeometry } from './sheet-geometry';
import { fetsOf, inkOf, labelBlock, TAG_HEIGHT, TAG_WIDTH, tagBlock, tagWish } from './text-blocks';
import type { WireGraph } from './wire-graph';

/** Where the texts of a drawing stand; labels and tags from their part's own place, so that they go along with it. */
export type SheetTexts = {
  readonly labels: ReadonlyMap<PartId, Anchor>;
  readonly tags: ReadonlyMap<PartId, Anchor>;
  readonly spots: readonly NetSpot[];
  /** Net names that are written into their net's wire and need no symbol of their own. */
  readonly written: ReadonlySet<PartId>;
};

/** Half of what a wire takes, in px, the least distance to a text included. */
const WIRE = 3;

/**
 * Finds a place for every label, net name and tag, in this order: those with the fewest places to go come first. None
 * lies over a symbol, a wire or another where there is any room about its part.
 */
export function placeTexts(drawing: Drawing, geometry: SheetGeometry, graph: WireGraph, nets: DrawnNets): SheetTexts {
  const parts = [...geometry.parts.values()].sort((a, b) => (a.id < b.id ? -1 : 1));
  const wires = wireBoxes(drawing, geometry, nets);
  const wireIndex = new BoxIndex<NetBox>();
  for (const wire of wires) wireIndex.add(wire);
  const taken = new BoxIndex();
  for (const part of parts) if (!graph.namesOnWires.has(part.id)) for (const ink of inkOf(part)) taken.add(ink);
  const free = new BoxIndex();
  for (const part of parts) if (!graph.namesOnWires.has(part.id)) for (const ink of inkOf(part)) free.add(ink);
  for (const wire of wires) free.add(wire);

  const anchors = new Map<PartId, Anchor>();
  const label = (some: readonly DrawnPart[]) => {
    const blocks = new Map(some.map((part) => [part, labelBlock(part)]));
    const placed = placeTags(
      [...blocks.values()].filter((block) => block !== undefined),
      free,
    );
    for (const [part, block] of blocks) {
      const anchor = placed.get(part.id);
      if (!anchor || !block) continue;
      anchors.set(part.id, fromPart(anchor, part));
      taken.add(hungBox(anchor, block.width, block.height));
    }
  };
  label(parts.filter(({ id }) => !graph.namesOnWires.has(id)));

  const fets = fetsOf(parts);
  const wishes = new BoxIndex();
  for (const fet of fets) wishes.add(hungBox(tagWish(fet), TAG_WIDTH, TAG_HEIGHT));
  const spots = netSpots(graph, nets, drawing.settings.ground, wireIndex, taken, wishes);
  for (const spot of spots) free.add(spotBox(spot));

  // Where there is no room on the wires for a net's name, the name's own symbol has to show it.
  const shown = new Set(spots.filter(({ named }) => named).map(({ net }) => net));
  const onWires = parts.filter(({ id }) => graph.namesOnWires.has(id));
  const isWritten = (part: DrawnPart) => part.kind === 'net-name' && shown.has(part.values.net);
  const unwritten = onWires.filter((part) => !isWritten(part));
  for (const part of unwritten) for (const ink of inkOf(part)) free.add(ink);
  label(unwritten);

  const placed = placeTags(fets.map(tagBlock), free);
  const tags = new Map<PartId, Anchor>();
  for (const fet of fets) {
    const anchor = placed.get(fet.id);
    if (anchor) tags.set(fet.id, fromPart(anchor, fet));
  }
  return { labels: anchors, tags, spots, written: new Set(onWires.filter(isWritten).map(({ id }) => id)) };
}

/** The straight stretches of all wires, with a little air. */
export function wireBoxes(drawing: Drawing, geometry: SheetGeometry, { netOf }: DrawnNets): NetBox[] {
  const boxes: NetBox[] = [];
  for (const wire of drawing.wires) {
    const line = geometry.routes.get(wire.id) ?? [];
    const net = netOf.get(terminalKey(wire.from)) ?? '';
    for (let i = 1; i < line.length; i++) {
      const [from, to] = [line[i - 1] as GridPoint, line[i] as GridPoint];
      const box = { ...widened(around([from, to]), WIRE), net, upright: from.x === to.x };
      boxes.push(box);
    }
  }
  return boxes;
}

function fromPart({ at, grows }: Anchor, { place }: DrawnPart): Anchor {
  return { at: { x: at.x - place.x, y: at.y - place.y }, grows };
}

/** A text's place on the sheet, its part being where it is shown. */
export function onPart({ at, grows }: Anchor, { place }: DrawnPart): Anchor {
  return { at: { x: at.x + place.x, y: at.y + place.y }, grows };
}

/** The room of every tag, for what must be seen whole. */
export function tagBoxes({ tags }: SheetTexts, geometry: SheetGeometry): Box[] {
  return [...tags].flatMap(([id, anchor]) => {
    const part = geometry.parts.get(id);
    return part ? [hungBox(onPart(anchor, part), TAG_WIDTH, TAG_HEIGHT)] : [];
  });
}

/** The room of every label. */
export function labelBoxes({ labels }: SheetTexts, geometry: SheetGeometry): Box[] {
  return [...labels].flatMap(([id, anchor]) => {
    const part = geometry.parts.get(id);
    const block = part && labelBlock(part);
    return part && block ? [hungBox(onPart(anchor, part), block.width, block.height)] : [];
  });
}
