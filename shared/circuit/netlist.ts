import type { CircuitFile, CircuitPart } from './circuit-file';
import { type Drawing, type DrawnComponent, isComponent } from './drawing';
import { type DrawnNets, findNets } from './nets';
import { byReference } from './reference-order';

/** A drawing as the circuit that is solved, and the nets by which its terminals are found again. */
export type Netlist = { readonly circuit: CircuitFile; readonly nets: DrawnNets };

/** The circuit that a drawing shows; parts in order of reference, positions left out. */
export function netlist(drawing: Drawing, title?: string): Netlist {
  const nets = findNets(drawing);
  const { ground, temperature, processes, spread } = drawing.settings;
  const parts = drawing.parts
    .filter(isComponent)
    .map((part) => circuitPart(part, nets))
    .sort((a, b) => byReference(a.ref, b.ref));
  const circuit: CircuitFile = {
    format: 'stillpoint.circuit',
    version: 1,
    ...(title === undefined ? {} : { title }),
    ground,
    temperature,
    processes,
    parts,
    ...(spread === undefined ? {} : { spread }),
  };
  return { circuit, nets };
}

/** The same with its positions, turns and wires, for an export that can be imported as it was drawn. */
export function circuitWithDrawing(drawing: Drawing, title: string): CircuitFile {
  return { ...netlist(drawing, title).circuit, drawing: { parts: drawing.parts, wires: drawing.wires } };
}

function circuitPart(part: DrawnComponent, nets: DrawnNets): CircuitPart {
  const net = (pin: string): string => {
    const name = nets.netOf.get(`${part.id}/${pin}`);
    if (name === undefined) throw new Error(`${part.ref} has no terminal ${pin}`);
    return name;
  };
  const { ref } = part;
  switch (part.kind) {
    case 'resistor':
      return { ref, kind: 'resistor', a: net('a'), b: net('b'), resistance: part.values.resistance };
    case 'capacitor':
      return { ref, kind: 'capacitor', a: net('a'), b: net('b'), capacitance: part.values.capacitance };
    case 'inductor':
      return { ref, kind: 'inductor', a: net('a'), b: net('b'), inductance: part.values.inductance };
    case 'voltage':
      return { ref, kind: 'voltage', plus: net('plus'), minus: net('minus'), voltage: part.values.voltage };
    case 'current':
      return { ref, kind: 'current', from: net('from'), to: net('to'), current: part.values.current };
    case 'nfet':
    case 'pfet': {
      const { bodyLedOut, match: _match, ...values } = part.values;
      const terminals = { drain: net('drain'), gate: net('gate'), source: net('source') };
      return { ref, kind: part.kind, ...terminals, ...(bodyLedOut ? { body: net('body') } : {}), ...values };
    }
  }
}
