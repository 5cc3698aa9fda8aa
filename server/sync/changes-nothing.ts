import * as Y from 'yjs';

/**
 * Whether a document has all of this update already. A client that may not write still answers the question what it
 * has that the server lacks; only if it is something must its owner be told that it was not taken.
 */
export function changesNothing(doc: Y.Doc, update: Uint8Array): boolean {
  const { structs, ds } = Y.decodeUpdate(update);
  if (structs.some((struct) => Y.getState(doc.store, struct.id.client) < struct.id.clock + struct.length)) return false;
  const deleted = Y.createDeleteSetFromStructStore(doc.store).clients;
  return [...ds.clients].every(([client, ranges]) =>
    ranges.every(({ clock, len }) =>
      deleted.get(client)?.some((range) => range.clock <= clock && clock + len <= range.clock + range.len),
    ),
  );
}
