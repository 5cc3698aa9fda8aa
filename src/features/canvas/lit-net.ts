import type { Drawing, WireId } from '#shared/circuit/drawing';
import { type DrawnNets, terminalKey } from '#shared/circuit/nets';
import type { GridPoint } from '#shared/geometry/place';
import type { SheetGeometry } from './sheet-geometry';

/** A net as it is lit: its wires, and its terminals wherever on the sheet they are, for a name may join far places. */
export type LitNet = {
  readonly net: string;
  readonly lines: readonly (readonly GridPoint[])[];
  readonly terminals: readonly GridPoint[];
};

export function litNet(
  wire: WireId | undefined,
  drawing: Drawing,
  geometry: SheetGeometry,
  { netOf }: DrawnNets,
): LitNet | undefined {
  const hovered = drawing.wires.find(({ id }) => id === wire);
  const net = hovered && netOf.get(terminalKey(hovered.from));
  if (net === undefined) return undefined;
  const wires = drawing.wires.filter(({ from }) => netOf.get(terminalKey(from)) === net);
  const terminals = [...geometry.terminals].filter(
    ([key, { part }]) => part.kind !== 'junction' && netOf.get(key) === net,
  );
  return {
    net,
    lines: wires.flatMap(({ id }) => {
      const line = geometry.routes.get(id);
      return line ? [line] : [];
    }),
    terminals: terminals.map(([, { at }]) => at),
  };
}
