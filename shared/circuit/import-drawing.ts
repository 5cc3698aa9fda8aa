import { z } from 'zod';
import type { CircuitFile } from './circuit-file';
import { type Drawing, drawnPartSchema, wireSchema } from './drawing';
import { layOut } from './lay-out';
import { netlist } from './netlist';

const drawingFieldSchema = z.strictObject({ parts: z.array(drawnPartSchema), wires: z.array(wireSchema) });

/**
 * The drawing of a checked circuit file: as it was drawn where the file carries a drawing that shows the very same
 * circuit, else laid out afresh, for then the parts and nets of the file are what counts.
 */
export function drawingOf(circuit: CircuitFile): Drawing {
  const laidOut = layOut(circuit);
  const carried = drawingFieldSchema.safeParse(circuit.drawing);
  if (!carried.success) return laidOut;
  const drawing: Drawing = { ...carried.data, settings: laidOut.settings };
  const ids = [...drawing.parts, ...drawing.wires].map(({ id }) => id);
  if (new Set(ids).size !== ids.length) return laidOut;
  const present = new Set<string>(drawing.parts.map(({ id }) => id));
  if (!drawing.wires.every(({ from, to }) => present.has(from.part) && present.has(to.part))) return laidOut;
  return sameParts(netlist(drawing).circuit, netlist(laidOut).circuit) ? drawing : laidOut;
}

function sameParts(a: CircuitFile, b: CircuitFile): boolean {
  return canonical(a) === canonical(b);
}

/** The parts as text in which the order of fields and absent ones make no difference. */
function canonical({ parts }: CircuitFile): string {
  return JSON.stringify(parts, (_key, value: unknown) =>
    typeof value === 'object' && value !== null && !Array.isArray(value)
      ? Object.fromEntries(Object.entries(value).sort(([x], [y]) => (x < y ? -1 : 1)))
      : value,
  );
}
