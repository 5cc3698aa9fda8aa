import * as Y from 'yjs';

/**
 * Whether a document has all of this update already. A client that may not write still answers the question what it
 * has that the server lacks; only if it is something must its owner be told that it was not taken.
 */
export function changesNothing(doc: Y.Doc, update: Uint8Array): boolean {
  const { structs, ds } = Y.decodeUpdate(update);
  if (structs.some((struct) => Y.getState(doc.store, struct.id.client) < struct.id.clock + struct.length)) return false;
  const deleted = Y.createDeleteSetFromStructStore(doc.store);
  for (const [client, ranges] of ds.clients) {
    for (const { clock, len } of ranges) {
      // Deleted ranges only grow together, so one that is deleted at both ends was deleted here already.
      const ends = [clock, clock + len - 1];
      if (!ends.every((end) => Y.isDeleted(deleted, Y.createID(client, end)))) return false;
    }
  }
  return true;
}
