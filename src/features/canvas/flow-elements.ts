import { useRef } from 'react';
import type { Edge, Node } from 'reactflow';
import { isDepletion } from '#shared/circuit/depletion';
import { type Drawing, type DrawnPart, isFet, type PartId, type Wire, type WireId } from '#shared/circuit/drawing';
import { type DrawnNets, terminalKey } from '#shared/circuit/nets';
import type { Anchor } from '#shared/geometry/box';
import { type GridPoint, samePoint } from '#shared/geometry/place';
import type { Selection } from '../../live/selection';
import { spokenTerminal } from './part-text';
import type { SheetGeometry } from './sheet-geometry';
import type { SheetTexts } from './sheet-texts';
import { partBox } from './symbol-box';

export type PartData = {
  readonly part: DrawnPart;
  readonly depletion: boolean;
  /** Its slip is open in the tag's place. */
  readonly slipOpen: boolean;
  /** A net name that stands on a wire, where the wire itself shows it. */
  readonly written: boolean;
  /** Where its label and its tag hang, from the part's own place. */
  readonly label: Anchor | undefined;
  readonly tag: Anchor | undefined;
};
export type PartNodeType = Node<PartData, 'part'>;

export type WireData = { readonly line: readonly GridPoint[] };
export type WireEdgeType = Edge<WireData>;

/**
 * React Flow's nodes and edges, derived from the drawing: it is never asked what the drawing is. One record keeps one
 * node for as long as it looks the same, because React Flow draws again whatever is a new object.
 */
export function useFlowElements(
  drawing: Drawing,
  geometry: SheetGeometry,
  { netOf }: DrawnNets,
  selection: Selection,
  slipPart: PartId | undefined,
  texts: SheetTexts,
): { nodes: PartNodeType[]; edges: WireEdgeType[] } {
  const lastNodes = useRef<ReadonlyMap<string, PartNodeType>>(new Map());
  const lastEdges = useRef<ReadonlyMap<string, WireEdgeType>>(new Map());

  const nodes = [...geometry.parts.values()].map((part) => {
    const data = {
      part,
      depletion: isFet(part) && isDepletion(part, drawing.settings),
      slipOpen: part.id === slipPart,
      written: texts.written.has(part.id),
      label: texts.labels.get(part.id),
      tag: texts.tags.get(part.id),
    };
    return sameNode(lastNodes.current.get(part.id), data, selection.parts.has(part.id));
  });
  const edges = drawing.wires.flatMap((wire) => {
    const line = geometry.routes.get(wire.id);
    if (!line) return [];
    const label = spokenWire(wire, geometry, netOf.get(terminalKey(wire.from)));
    return [sameEdge(lastEdges.current.get(wire.id), wire, line, label, selection.wires.has(wire.id))];
  });
  lastNodes.current = new Map(nodes.map((node) => [node.id, node]));
  lastEdges.current = new Map(edges.map((edge) => [edge.id, edge]));
  return { nodes, edges };
}

function sameNode(last: PartNodeType | undefined, next: PartData, selected: boolean): PartNodeType {
  const unchanged =
    last !== undefined &&
    last.data.part === next.part &&
    last.data.depletion === next.depletion &&
    last.data.slipOpen === next.slipOpen &&
    last.data.written === next.written &&
    sameAnchor(last.data.label, next.label) &&
    sameAnchor(last.data.tag, next.tag);
  if (unchanged && last.selected === selected) return last;
  const { part } = next;
  const box = partBox(part);
  return {
    id: part.id,
    type: 'part',
    position: { x: box.left, y: box.top },
    // Known, so always given: React Flow hides and measures for ever what has no size.
    width: box.right - box.left,
    height: box.bottom - box.top,
    data: unchanged ? last.data : next,
    selected,
  };
}

function sameAnchor(a: Anchor | undefined, b: Anchor | undefined): boolean {
  if (a === b) return true;
  return a !== undefined && b !== undefined && samePoint(a.at, b.at) && samePoint(a.grows, b.grows);
}

function sameEdge(
  last: WireEdgeType | undefined,
  wire: Wire,
  line: readonly GridPoint[],
  ariaLabel: string,
  selected: boolean,
): WireEdgeType {
  if (last && last.data?.line === line && last.ariaLabel === ariaLabel && last.selected === selected) return last;
  return {
    id: wire.id,
    type: 'wire',
    source: wire.from.part,
    sourceHandle: wire.from.pin,
    target: wire.to.part,
    targetHandle: wire.to.pin,
    data: last?.data?.line === line ? last.data : { line },
    ariaLabel,
    selected,
    focusable: false,
  };
}

function spokenWire(wire: Wire, geometry: SheetGeometry, net: string | undefined): string {
  const [from, to] = [wire.from, wire.to].map((end) => {
    const part = geometry.parts.get(end.part);
    return part ? spokenTerminal(part, end.pin) : end.pin;
  });
  return `Wire of net ${net ?? 'without name'}, ${from} to ${to}`;
}

/** Ids come back from React Flow as plain strings; these are the ones it was given. */
export const asPartId = (id: string) => id as PartId;
export const asWireId = (id: string) => id as WireId;
