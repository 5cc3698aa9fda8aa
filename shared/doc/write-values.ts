import { equalityDeep } from 'lib0/function';
import type * as Y from 'yjs';
import type { DrawnPart, PartId } from '../circuit/drawing';
import { sheetMaps } from './sheet-maps';

/** Values by name, in SI base units; null takes one away. */
export type ValueChanges = Readonly<Record<string, unknown>>;

/** Writes the values of parts that are not so already. Within an edit. */
export function writeValues(doc: Y.Doc, parts: readonly DrawnPart[], changes: ReadonlyMap<PartId, ValueChanges>): void {
  const { params } = sheetMaps(doc);
  for (const part of parts) {
    const present = new Map<string, unknown>(Object.entries(part.values));
    for (const [name, value] of Object.entries(changes.get(part.id) ?? {})) {
      if (!equalityDeep(present.get(name) ?? null, value)) params.set(`${part.id}/${name}`, value);
    }
  }
}
