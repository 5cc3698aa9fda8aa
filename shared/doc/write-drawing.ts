import type * as Y from 'yjs';
import type { Drawing } from '../circuit/drawing';
import { processKey, sheetMaps } from './sheet-maps';

/** Fills an empty document with a drawing, ids kept. For the first state of a new sheet only: it merges with nothing. */
export function writeDrawing(doc: Y.Doc, drawing: Drawing): void {
  const { parts, wires, routes, sheet } = sheetMaps(doc);
  doc.transact(() => {
    for (const { id, ...birth } of drawing.parts) parts.set(id, birth);
    for (const { id, bends, ...ends } of drawing.wires) {
      wires.set(id, ends);
      if (bends.length > 0) routes.set(id, bends);
    }
    const { processes, ...settings } = drawing.settings;
    for (const [key, value] of Object.entries(settings)) if (value !== undefined) sheet.set(key, value);
    for (const [name, process] of Object.entries(processes)) sheet.set(processKey(name), process);
  });
}
