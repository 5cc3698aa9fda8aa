import { pinPlaces, SYMBOL_PINS } from '../geometry/pins';
import { type GridPoint, orient, type Place, type Turn } from '../geometry/place';
import type { CircuitFile, CircuitPart } from './circuit-file';
import {
  bodyLedOut,
  type Drawing,
  type DrawnComponent,
  type DrawnPart,
  partIdSchema,
  type Wire,
  wireIdSchema,
} from './drawing';
import { byReference } from './reference-order';

/** Room for one part with its net names and its tag, in px. */
const CELL: GridPoint = { x: 280, y: 200 };
const COLUMNS = 5;
/** Length of the wire from a terminal to its net's name. */
const STUB = 20;

/**
 * A drawing of a circuit that brought none: parts in rows by reference, every terminal with its net's name or a ground
 * symbol on a short wire. Plain, but everything can be read and moved from there.
 */
export function layOut(circuit: CircuitFile): Drawing {
  const parts: DrawnPart[] = [];
  const wires: Wire[] = [];
  const ordered = [...circuit.parts].sort((a, b) => byReference(a.ref, b.ref));
  ordered.forEach((part, index) => {
    const at = { x: (index % COLUMNS) * CELL.x, y: Math.floor(index / COLUMNS) * CELL.y };
    const component = drawComponent(part, { ...at, turn: 0, flip: false });
    parts.push(component);
    for (const { pin, at, leaves } of pinPlaces(component.kind, component.place, bodyLedOut(component))) {
      const net = netAt(part, pin);
      const end = { x: at.x + STUB * leaves.x, y: at.y + STUB * leaves.y };
      const mark = drawNetMark(`${part.ref}-${pin}`, net, net === circuit.ground, end, leaves);
      parts.push(mark);
      wires.push({
        id: wireIdSchema.parse(`w-${part.ref}-${pin}`),
        from: { part: component.id, pin },
        to: { part: mark.id, pin: 'net' },
        bends: [],
      });
    }
  });
  const { ground, temperature, processes, spread } = circuit;
  return {
    parts,
    wires,
    settings: { ground, temperature: temperature ?? 27, processes: processes ?? {}, ...(spread ? { spread } : {}) },
  };
}

function drawNetMark(id: string, net: string, isGround: boolean, at: GridPoint, leaves: GridPoint): DrawnPart {
  const kind = isGround ? 'ground' : 'net-name';
  const towards = { x: 0 - leaves.x, y: 0 - leaves.y };
  const place = { ...at, ...facing(SYMBOL_PINS[kind].net.leaves, towards) };
  return isGround
    ? { id: partIdSchema.parse(id), kind: 'ground', place, values: {} }
    : { id: partIdSchema.parse(id), kind: 'net-name', place, values: { net } };
}

/** How a symbol must be turned for its lead to leave in a direction; names to the right are mirrored, not upside down. */
function facing(own: GridPoint, wanted: GridPoint): Pick<Place, 'turn' | 'flip'> {
  for (const flip of [false, true]) {
    for (const turn of [0, 1, 2, 3] satisfies Turn[]) {
      const leaves = orient(own, { turn, flip });
      if (leaves.x === wanted.x && leaves.y === wanted.y && turn !== 2) return { turn, flip };
    }
  }
  return { turn: 2, flip: false };
}

function netAt(part: CircuitPart, pin: string): string {
  const net = Object.entries(part).find(([name]) => name === pin)?.[1];
  if (typeof net !== 'string') throw new Error(`${part.ref} has no net at ${pin}`);
  return net;
}

function drawComponent(part: CircuitPart, place: Place): DrawnComponent {
  const id = partIdSchema.parse(part.ref);
  switch (part.kind) {
    case 'resistor':
      return { id, kind: part.kind, ref: part.ref, place, values: { resistance: part.resistance } };
    case 'capacitor':
      return { id, kind: part.kind, ref: part.ref, place, values: { capacitance: part.capacitance } };
    case 'inductor':
      return { id, kind: part.kind, ref: part.ref, place, values: { inductance: part.inductance } };
    case 'voltage':
      return { id, kind: part.kind, ref: part.ref, place, values: { voltage: part.voltage } };
    case 'current':
      return { id, kind: part.kind, ref: part.ref, place, values: { current: part.current } };
    case 'nfet':
    case 'pfet': {
      const { ref, kind, drain: _drain, gate: _gate, source: _source, body, ...values } = part;
      return { id, kind, ref, place, values: body === undefined ? values : { ...values, bodyLedOut: true } };
    }
  }
}
