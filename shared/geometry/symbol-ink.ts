import { around, type Box } from './box';
import type { SymbolKind } from './pins';
import { onSheet, type Place } from './place';

type Edges = readonly [left: number, top: number, right: number, bottom: number];

/** What a symbol's strokes cover, in its own drawing: less than the area that can be pressed. */
const INK: Readonly<Record<SymbolKind, readonly Edges[]>> = {
  nfet: [
    [-24, -40, 1, 10],
    [-40, -1, -24, 1],
  ],
  pfet: [
    [-24, -10, 1, 40],
    [-40, -1, -24, 1],
  ],
  resistor: [
    [-9, -21, 9, 21],
    [-1, -30, 1, 30],
  ],
  capacitor: [
    [-12, -4, 12, 4],
    [-1, -20, 1, 20],
  ],
  inductor: [
    [-1, -21, 6, 21],
    [-1, -30, 1, 30],
  ],
  voltage: [
    [-19, -19, 19, 19],
    [-1, -30, 1, 30],
    [9, -32, 19, -22],
  ],
  current: [
    [-19, -19, 19, 19],
    [-1, -30, 1, 30],
  ],
  ground: [
    [-11, 9, 11, 21],
    [-1, 0, 1, 10],
  ],
  supply: [
    [-10, -11, 10, -9],
    [-1, -10, 1, 0],
  ],
  'net-name': [[-13, -4, 0, 4]],
  junction: [],
  note: [],
};

const BODY_LEADS: Partial<Record<SymbolKind, Edges>> = { nfet: [0, -21, 20, -14], pfet: [0, 14, 20, 21] };

/** The boxes that a symbol's strokes cover on the sheet. */
export function inkOnSheet(kind: SymbolKind, place: Place, bodyLedOut = false): Box[] {
  const lead = bodyLedOut ? BODY_LEADS[kind] : undefined;
  return [...INK[kind], ...(lead ? [lead] : [])].map(([left, top, right, bottom]) =>
    around([onSheet({ x: left, y: top }, place), onSheet({ x: right, y: bottom }, place)]),
  );
}
