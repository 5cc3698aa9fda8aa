import type { DrawnPart } from '#shared/circuit/drawing';
import { noteLines } from '#shared/circuit/note-lines';
import { around, type Box } from '#shared/geometry/box';
import type { SymbolKind } from '#shared/geometry/pins';
import { GRID, type GridPoint, onSheet, type Place } from '#shared/geometry/place';

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
