import type * as Y from 'yjs';

/**
 * The live document's top-level maps, keyed by random ids (`places`, `routes` by the id of their part or wire,
 * `params` by `id/name`). Parts are born with a complete record that is never rewritten; the other maps lie over it, so
 * that a move and an edit made at once both survive, and a part deleted and brought back is whole.
 */
export function sheetMaps(doc: Y.Doc) {
  return {
    /** id → birth record: kind, reference, place, values. */
    parts: doc.getMap<unknown>('parts'),
    /** id → { x, y, turn, flip } as one value. */
    places: doc.getMap<unknown>('places'),
    /** `id/name` → value of one field, null where it was taken away; the name `ref` holds the reference. */
    params: doc.getMap<unknown>('params'),
    /** id → the two ends, fixed. */
    wires: doc.getMap<unknown>('wires'),
    /** id → the corners that somebody chose. */
    routes: doc.getMap<unknown>('routes'),
    /** `ground`, `temperature`, `spread`, and `process/NAME` for each process in use. */
    sheet: doc.getMap<unknown>('sheet'),
  };
}

/** Origin of a change that this person made here; only such changes are theirs to undo. */
export const OWN_EDIT = 'own-edit';

/** One gesture: one transaction, one undo step. */
export function edit<T>(doc: Y.Doc, change: () => T): T {
  return doc.transact(change, OWN_EDIT);
}

const PROCESS_PREFIX = 'process/';

export function processKey(name: string): string {
  return PROCESS_PREFIX + name;
}

export function processNameOf(key: string): string | undefined {
  return key.startsWith(PROCESS_PREFIX) ? key.slice(PROCESS_PREFIX.length) : undefined;
}
