import * as Y from 'yjs';
import type { Drawing } from '#shared/circuit/drawing';
import { writeDrawing } from '#shared/doc/write-drawing';

/** The update that a new sheet's log begins with. */
export function firstState(drawing: Drawing): Uint8Array {
  const doc = new Y.Doc();
  writeDrawing(doc, drawing);
  const state = Y.encodeStateAsUpdate(doc);
  doc.destroy();
  return state;
}
