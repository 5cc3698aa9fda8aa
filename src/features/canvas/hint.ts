import { catalogueEntry } from '#shared/circuit/catalogue';
import { spokenTerminal } from './part-text';
import type { SheetGeometry } from './sheet-geometry';
import type { Placing } from './use-placing';
import type { Wiring } from './use-wiring';

/** What is in the hand and how to let go of it, in a few words. */
export function hintFor(
  placing: Placing | undefined,
  wiring: Wiring | undefined,
  geometry: SheetGeometry,
  said: string,
): string {
  if (placing) {
    const { x, y } = placing.place;
    return `${catalogueEntry(placing.kind).label} at ${x}, ${y} · Enter places, Escape ends`;
  }
  const part = wiring && geometry.parts.get(wiring.from.part);
  return part ? `wire from ${spokenTerminal(part, wiring.from.pin)} · Escape drops it` : said;
}
