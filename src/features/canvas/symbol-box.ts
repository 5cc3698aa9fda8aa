import { bodyLedOut, type DrawnPart } from '#shared/circuit/drawing';
import { noteLines } from '#shared/circuit/note-lines';
import type { SymbolKind } from '#shared/geometry/pins';
import { GRID, type GridPoint, onSheet, orient, type Place } from '#shared/geometry/place';

/** An upright rectangle, in px of the sheet or of a symbol's own drawing. */
export type Box = { readonly left: number; readonly top: number; readonly right: number; readonly bottom: number };

/** A corner or side at which a block of text hangs, and the direction into which it grows (0: centred). */
export type Anchor = { readonly at: GridPoint; readonly grows: GridPoint };

/** The area of a symbol that can be pressed; its corners lie on the grid, so that snapping it snaps the symbol. */
const SYMBOL_BOXES: Readonly<Record<SymbolKind, Box>> = {
  nfet: { left: -40, top: -40, right: 10, bottom: 10 },
  pfet: { left: -40, top: -10, right: 10, bottom: 40 },
  resistor: { left: -20, top: -30, right: 20, bottom: 30 },
  capacitor: { left: -20, top: -20, right: 20, bottom: 20 },
  inductor: { left: -20, top: -30, right: 20, bottom: 30 },
  voltage: { left: -20, top: -30, right: 20, bottom: 30 },
  current: { left: -20, top: -30, right: 20, bottom: 30 },
  ground: { left: -20, top: 0, right: 20, bottom: 30 },
  supply: { left: -20, top: -30, right: 20, bottom: 0 },
  'net-name': { left: -30, top: -10, right: 0, bottom: 10 },
  junction: { left: -10, top: -10, right: 10, bottom: 10 },
  note: { left: 0, top: 0, right: 30, bottom: 20 },
};

/** The room of one character of a note, in px. */
const CHARACTER: GridPoint = { x: 7.2, y: 16 };

/** What stands in place of a note without text, so that it can be found. */
export const EMPTY_NOTE = 'note';

/** Across a terminal's pressing area, in px: smaller where a large one would leave nothing of the symbol to take hold of. */
const TERMINAL_REACH: Partial<Record<SymbolKind, number>> = { capacitor: 18, junction: 10 };

export function terminalReach(kind: SymbolKind): number {
  return TERMINAL_REACH[kind] ?? 24;
}

export function ownBox(kind: SymbolKind): Box {
  return SYMBOL_BOXES[kind];
}

/** Where a symbol lies on the sheet. */
export function boxOnSheet(kind: SymbolKind, place: Place): Box {
  const { left, top, right, bottom } = SYMBOL_BOXES[kind];
  return around([onSheet({ x: left, y: top }, place), onSheet({ x: right, y: bottom }, place)]);
}

/** Where a part lies on the sheet; a note is as large as its text, and upright whatever its turn. */
export function partBox(part: DrawnPart): Box {
  const { kind, place } = part;
  if (kind !== 'note') return boxOnSheet(kind, place);
  const lines = noteLines(part.values.text);
  const width = Math.max(...lines.map((line) => line.length), EMPTY_NOTE.length) * CHARACTER.x;
  const height = lines.length * CHARACTER.y;
  return { left: place.x, top: place.y, right: place.x + upToGrid(width), bottom: place.y + upToGrid(height) };
}

function upToGrid(length: number): number {
  return Math.ceil(length / GRID) * GRID;
}

export function around(points: readonly GridPoint[]): Box {
  const xs = points.map(({ x }) => x);
  const ys = points.map(({ y }) => y);
  return { left: Math.min(...xs), top: Math.min(...ys), right: Math.max(...xs), bottom: Math.max(...ys) };
}

export function overlap(a: Box, b: Box): boolean {
  return a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;
}

/** Where a part's reference and value stand: on the gate's side of a FET, right of an upright two-terminal part. */
export function labelAnchor(part: DrawnPart): Anchor | undefined {
  switch (part.kind) {
    case 'nfet':
      return placed(part.place, { x: -29, y: -6 }, { x: -1, y: -1 });
    case 'pfet':
      return placed(part.place, { x: -29, y: 6 }, { x: -1, y: 1 });
    case 'resistor':
    case 'inductor':
      return placed(part.place, { x: 16, y: 0 }, { x: 1, y: 0 });
    case 'capacitor':
      return placed(part.place, { x: 20, y: 0 }, { x: 1, y: 0 });
    case 'voltage':
    case 'current':
      return placed(part.place, { x: 26, y: 0 }, { x: 1, y: 0 });
    case 'supply':
      return placed(part.place, { x: 0, y: -14 }, { x: 0, y: -1 });
    case 'net-name':
      return placed(part.place, { x: -16, y: 0 }, { x: -1, y: 0 });
    case 'ground':
    case 'junction':
    case 'note':
      return undefined;
  }
}

/** Where a FET's tag stands: across the channel from its gate, below a body lead that would run through it. */
export function tagAnchor(part: DrawnPart): Anchor {
  const away = bodyLedOut(part) ? 12 : 42;
  return part.kind === 'pfet'
    ? placed(part.place, { x: 24, y: away }, { x: 1, y: -1 })
    : placed(part.place, { x: 24, y: -away }, { x: 1, y: 1 });
}

/** The box of a block of this size hung at an anchor. */
export function hungBox({ at, grows }: Anchor, width: number, height: number): Box {
  const left = at.x + (width * (grows.x - 1)) / 2;
  const top = at.y + (height * (grows.y - 1)) / 2;
  return { left, top, right: left + width, bottom: top + height };
}

function placed(place: Place, at: GridPoint, grows: GridPoint): Anchor {
  return { at: onSheet(at, place), grows: orient(grows, place) };
}
