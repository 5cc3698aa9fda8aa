import { type Drawing, type DrawnPart, drawnPartSchema, type Wire, wireSchema } from '#shared/circuit/drawing';
import { BLANK_DRAWING } from '#shared/starters/starters';

/** A part at a place; whatever a test does not name is upright and unmirrored. */
export function drawn(id: string, kind: DrawnPart['kind'], x: number, y: number, rest: object = {}): DrawnPart {
  return drawnPartSchema.parse({ id, kind, place: { x, y, turn: 0, flip: false }, values: {}, ...rest });
}

/** A wire between terminals written `part.pin`. */
export function wired(id: string, from: string, to: string): Wire {
  const end = (text: string) => {
    const [part, pin] = text.split('.');
    return { part, pin };
  };
  return wireSchema.parse({ id, from: end(from), to: end(to), bends: [] });
}

export function drawingWith(parts: readonly DrawnPart[], wires: readonly Wire[] = []): Drawing {
  return { ...BLANK_DRAWING, parts, wires };
}
