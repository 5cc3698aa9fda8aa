import { useMemo, useRef } from 'react';
import type { Drawing, DrawnPart } from '#shared/circuit/drawing';
import type { DrawnNets } from '#shared/circuit/nets';
import { type CurrentSpot, currentSpots } from './current-spots';
import { stillOnWire } from './net-spots';
import { nameOf } from './part-text';
import { type InHand, layOut, type SheetGeometry, sameLayout } from './sheet-geometry';
import { placeTexts, type SheetTexts } from './sheet-texts';
import { labelBlock } from './text-blocks';
import { type WireGraph, wireGraph } from './wire-graph';

type Settled = { readonly geometry: SheetGeometry; readonly graph: WireGraph; readonly texts: SheetTexts };

export type SheetPicture = {
  readonly geometry: SheetGeometry;
  readonly graph: WireGraph;
  readonly texts: SheetTexts;
  readonly currents: readonly CurrentSpot[];
};

const NO_CURRENTS: readonly CurrentSpot[] = [];

/**
 * Where everything stands. While something is under the hand, texts go along with their parts and keep the places that
 * they had; only when all lies still do they look for better ones.
 */
export function useSheetPicture(
  drawing: Drawing,
  nets: DrawnNets,
  inHand: InHand,
  withCurrents: boolean,
): SheetPicture {
  const last = useRef<SheetGeometry>(undefined);
  const settled = useRef<Settled>(undefined);
  const picture = useMemo(() => {
    const geometry = layOut(drawing, nets, inHand, last.current);
    last.current = geometry;
    const before = settled.current;
    if (geometry.settled && before && looksAlike(before.geometry, geometry)) {
      const { graph, texts } = before;
      return { geometry, graph, texts };
    }
    const graph = wireGraph(drawing, geometry, nets);
    if (geometry.settled || !before) {
      const texts = placeTexts(drawing, geometry, graph, nets);
      settled.current = { geometry, graph, texts };
      return settled.current;
    }
    const spots = before.texts.spots.filter((spot) => stillOnWire(spot, graph));
    return { geometry, graph, texts: { ...before.texts, spots } };
  }, [drawing, nets, inHand]);
  const { geometry, graph, texts } = picture;
  const currents = useMemo(
    // An arrowhead has no place of its own while its wire is under way.
    () => (withCurrents && geometry.settled ? currentSpots(drawing, geometry, graph, nets, texts) : NO_CURRENTS),
    [withCurrents, drawing, geometry, graph, nets, texts],
  );
  return { geometry, graph, texts, currents };
}

/**
 * Whether two geometries at rest differ in nothing that a text's place depends on: all wires and symbols are where they
 * were, and labels take the room that they took. Values change far more often than that.
 */
function looksAlike(a: SheetGeometry, b: SheetGeometry): boolean {
  if (a === b) return true;
  if (a.routes.size !== b.routes.size || a.drawing.settings.ground !== b.drawing.settings.ground) return false;
  for (const [id, line] of b.routes) if (a.routes.get(id) !== line) return false;
  return sameLayout(a.drawing, b.drawing) && a.drawing.parts.every((part, i) => sameRoom(part, b.drawing.parts[i]));
}

function sameRoom(a: DrawnPart, b: DrawnPart | undefined): boolean {
  if (a === b) return true;
  if (!b || nameOf(a) !== nameOf(b)) return false;
  const [before, after] = [labelBlock(a), labelBlock(b)];
  return before?.width === after?.width && before?.height === after?.height;
}
