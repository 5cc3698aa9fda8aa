import { useMemo, useRef } from 'react';
import type { Drawing } from '#shared/circuit/drawing';
import type { DrawnNets } from '#shared/circuit/nets';
import { type CurrentSpot, currentSpots } from './current-spots';
import { stillOnWire } from './net-spots';
import { type InHand, layOut, type SheetGeometry } from './sheet-geometry';
import { placeTexts, type SheetTexts } from './sheet-texts';
import { type WireGraph, wireGraph } from './wire-graph';

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
  const settled = useRef<SheetTexts>(undefined);
  const picture = useMemo(() => {
    const geometry = layOut(drawing, nets, inHand, last.current);
    last.current = geometry;
    const graph = wireGraph(drawing, geometry, nets);
    if (geometry.settled || !settled.current) {
      settled.current = placeTexts(drawing, geometry, graph, nets);
      return { geometry, graph, texts: settled.current };
    }
    const spots = settled.current.spots.filter((spot) => stillOnWire(spot, graph));
    return { geometry, graph, texts: { ...settled.current, spots } };
  }, [drawing, nets, inHand]);
  const { geometry, graph, texts } = picture;
  const currents = useMemo(
    // An arrowhead has no place of its own while its wire is under way.
    () => (withCurrents && geometry.settled ? currentSpots(drawing, geometry, graph, nets, texts) : NO_CURRENTS),
    [withCurrents, drawing, geometry, graph, nets, texts],
  );
  return { geometry, graph, texts, currents };
}
