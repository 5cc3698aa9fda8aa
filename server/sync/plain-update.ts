import * as Y from 'yjs';
import { DEEPEST, isDeeperThan } from '#shared/api/nesting';

/**
 * Throws unless all that an update brings are plain values in moderate nesting, as the sheet's maps hold. Yjs reads nested
 * values and deletes nested types by recursion: one that is just not too deep when it comes can be too deep when it is
 * loaded, and then the sheet would be lost to everybody.
 */
export function requirePlain(update: Uint8Array): void {
  for (const struct of Y.decodeUpdate(update).structs) {
    if (!(struct instanceof Y.Item) || struct.content instanceof Y.ContentDeleted) continue;
    if (!(struct.content instanceof Y.ContentAny)) throw new Error(`a change with ${struct.content.constructor.name}`);
    if (isDeeperThan(DEEPEST, struct.content.arr)) throw new Error('a change with values nested too deep');
  }
}
