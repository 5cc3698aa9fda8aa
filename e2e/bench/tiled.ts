import { type CircuitFile, circuitFileSchema } from '#shared/circuit/circuit-file';
import { type Drawing, type DrawnPart, drawnPartSchema, type Wire, wireSchema } from '#shared/circuit/drawing';
import { netlist } from '#shared/circuit/netlist';

/** Room of one copy of the differential pair, in px. */
const TILE = { x: 1240, y: 700 };
const COLUMNS = 4;

/** A drawing so many times beside and under itself, every part and net of each copy its own. */
export function tiled({ parts, wires, settings }: Drawing, copies: number): Drawing {
  const tiles = Array.from({ length: copies }, (_, copy) => {
    const by = { x: (copy % COLUMNS) * TILE.x, y: Math.floor(copy / COLUMNS) * TILE.y };
    return {
      parts: parts.map((part) => copied(part, copy, by)),
      wires: wires.map(
        ({ id, from, to, bends }): Wire =>
          wireSchema.parse({
            id: `${id}-${copy}`,
            from: { ...from, part: `${from.part}-${copy}` },
            to: { ...to, part: `${to.part}-${copy}` },
            bends: bends.map(({ x, y }) => ({ x: x + by.x, y: y + by.y })),
          }),
      ),
    };
  });
  return { parts: tiles.flatMap((tile) => tile.parts), wires: tiles.flatMap((tile) => tile.wires), settings };
}

function copied(part: DrawnPart, copy: number, by: { x: number; y: number }): DrawnPart {
  const named = part.kind === 'supply' || part.kind === 'net-name';
  return drawnPartSchema.parse({
    ...part,
    id: `${part.id}-${copy}`,
    place: { ...part.place, x: part.place.x + by.x, y: part.place.y + by.y },
    ...('ref' in part ? { ref: `${part.ref}${String(copy).padStart(2, '0')}` } : {}),
    ...(named ? { values: { net: `${part.values.net}${copy}` } } : {}),
  });
}

/** The circuit file of a drawing, the drawing in it. */
export function circuitOf(drawing: Drawing): CircuitFile {
  const { circuit } = netlist(drawing);
  return circuitFileSchema.parse({ ...circuit, drawing: { parts: drawing.parts, wires: drawing.wires } });
}
