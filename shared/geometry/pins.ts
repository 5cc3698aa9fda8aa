import { type GridPoint, onSheet, orient, type Place } from './place';

/** A terminal of a symbol: its place and the direction in which its lead leaves, in the symbol's own drawing. */
type Pin = GridPoint & { readonly leaves: GridPoint };

const UP: GridPoint = { x: 0, y: -1 };
const DOWN: GridPoint = { x: 0, y: 1 };
const LEFT: GridPoint = { x: -1, y: 0 };
const RIGHT: GridPoint = { x: 1, y: 0 };
/** A terminal that takes a wire from any side. */
const ANY: GridPoint = { x: 0, y: 0 };

/** Terminals of every symbol on the 10 px grid, in the order in which they are listed to a person. */
export const SYMBOL_PINS = {
  nfet: {
    gate: { x: -40, y: 0, leaves: LEFT },
    drain: { x: 0, y: -40, leaves: UP },
    source: { x: 0, y: 10, leaves: DOWN },
    body: { x: 20, y: -20, leaves: RIGHT },
  },
  pfet: {
    gate: { x: -40, y: 0, leaves: LEFT },
    drain: { x: 0, y: 40, leaves: DOWN },
    source: { x: 0, y: -10, leaves: UP },
    body: { x: 20, y: 20, leaves: RIGHT },
  },
  resistor: { a: { x: 0, y: -30, leaves: UP }, b: { x: 0, y: 30, leaves: DOWN } },
  capacitor: { a: { x: 0, y: -20, leaves: UP }, b: { x: 0, y: 20, leaves: DOWN } },
  inductor: { a: { x: 0, y: -30, leaves: UP }, b: { x: 0, y: 30, leaves: DOWN } },
  voltage: { plus: { x: 0, y: -30, leaves: UP }, minus: { x: 0, y: 30, leaves: DOWN } },
  current: { to: { x: 0, y: -30, leaves: UP }, from: { x: 0, y: 30, leaves: DOWN } },
  ground: { net: { x: 0, y: 0, leaves: UP } },
  supply: { net: { x: 0, y: 0, leaves: DOWN } },
  'net-name': { net: { x: 0, y: 0, leaves: RIGHT } },
  junction: { net: { x: 0, y: 0, leaves: ANY } },
  note: {},
} as const satisfies Record<string, Record<string, Pin>>;

export type SymbolKind = keyof typeof SYMBOL_PINS;

/** A terminal as it lies on the sheet. */
export type PinPlace = { readonly pin: string; readonly at: GridPoint; readonly leaves: GridPoint };

/** The terminals of a symbol on the sheet; a FET's body only where it is led out. */
export function pinPlaces(kind: SymbolKind, place: Place, bodyLedOut = false): PinPlace[] {
  return Object.entries<Pin>(SYMBOL_PINS[kind])
    .filter(([pin]) => pin !== 'body' || bodyLedOut)
    .map(([pin, own]) => ({ pin, at: onSheet(own, place), leaves: orient(own.leaves, place) }));
}
