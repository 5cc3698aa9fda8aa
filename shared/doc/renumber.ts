import type * as Y from 'yjs';
import { type DrawnComponent, isComponent, type PartId } from '../circuit/drawing';
import { nextReference } from './next-reference';
import { readDrawing } from './read-drawing';
import { edit, sheetMaps } from './sheet-maps';

/** Parts whose origins differ by less than this, in px, stand in one column or row. */
const SAME_LINE = 50;

export type ReadingOrder = 'columns' | 'rows';

/**
 * Numbers parts by where they stand: column by column from the left, or row by row from the top, each letter for itself.
 * `chosen` parts only, with numbers that no other part has, or all. Says how many have another reference now.
 */
export function renumber(doc: Y.Doc, order: ReadingOrder, chosen?: ReadonlySet<PartId>): number {
  const components = readDrawing(doc).drawing.parts.filter(isComponent);
  const isChosen = ({ id }: DrawnComponent) => chosen === undefined || chosen.has(id);
  const taken = new Set(components.filter((part) => !isChosen(part)).map(({ ref }) => ref));
  const renames = new Map<string, string>();
  const writes: [id: PartId, ref: string][] = [];
  for (const part of inReadingOrder(components.filter(isChosen), order)) {
    const ref = nextReference(taken, part.ref.replace(/\d+$/, ''));
    taken.add(ref);
    if (ref === part.ref) continue;
    renames.set(part.ref, ref);
    writes.push([part.id, ref]);
  }
  if (writes.length === 0) return 0;
  edit(doc, () => {
    const { params } = sheetMaps(doc);
    for (const [id, ref] of writes) params.set(`${id}/ref`, ref);
    renameInSpread(doc, renames);
  });
  return writes.length;
}

/** The spread names supplies by their references, so it must follow when those change. Within an edit. */
export function renameInSpread(doc: Y.Doc, renames: ReadonlyMap<string, string>): void {
  const { spread } = readDrawing(doc).drawing.settings;
  if (!spread?.supplies || !Object.keys(spread.supplies).some((ref) => renames.has(ref))) return;
  const supplies = Object.entries(spread.supplies).map(([ref, share]) => [renames.get(ref) ?? ref, share]);
  sheetMaps(doc).sheet.set('spread', { ...spread, supplies: Object.fromEntries(supplies) });
}

function inReadingOrder(parts: readonly DrawnComponent[], order: ReadingOrder): DrawnComponent[] {
  const [across, along] = order === 'columns' ? (['x', 'y'] as const) : (['y', 'x'] as const);
  const sorted = [...parts].sort((a, b) => a.place[across] - b.place[across]);
  const lines: DrawnComponent[][] = [];
  for (const part of sorted) {
    const line = lines.at(-1);
    const start = line?.[0]?.place[across];
    if (line && start !== undefined && part.place[across] - start < SAME_LINE) line.push(part);
    else lines.push([part]);
  }
  return lines.flatMap((line) =>
    line.sort((a, b) => a.place[along] - b.place[along] || a.place[across] - b.place[across]),
  );
}
