import { setImmediate as nextTurn } from 'node:timers/promises';
import type { SheetStanding } from '#shared/api/sheets';
import type { Rooms } from '../sync/rooms';
import { sheetStanding } from './sheet-standing';

/**
 * How each sheet stands. A sheet is solved when a list asks, once for each state of its log, and never on the way of an
 * edit. Kept in memory only: after a restart, which may bring another solver, everything is solved anew.
 */
export interface Standings {
  /** Of the sheet as it is stored now, where that is known. */
  of(sheetId: string): SheetStanding | undefined;
  /** Solves these, one in a turn so that edits come between; tells how many of them could be. */
  solve(sheetIds: readonly string[]): Promise<number>;
}

interface StandingsDeps {
  readonly rooms: Rooms;
  readonly endOfLog: (sheetId: string) => number | undefined;
  readonly onError: (error: unknown, about: { sheetId: string }) => void;
}

export function createStandings({ rooms, endOfLog, onError }: StandingsDeps): Standings {
  const known = new Map<string, { end: number; standing: SheetStanding }>();
  const waiting = new Map<string, Promise<boolean>>();
  let last: Promise<unknown> = Promise.resolve();

  const of = (sheetId: string) => {
    const found = known.get(sheetId);
    return found !== undefined && found.end === endOfLog(sheetId) ? found.standing : undefined;
  };

  const solveOne = async (sheetId: string): Promise<boolean> => {
    await nextTurn();
    waiting.delete(sheetId);
    try {
      const drawing = rooms.drawing(sheetId);
      // Nothing is stored between the two, for nothing here waits.
      const end = endOfLog(sheetId);
      if (end === undefined) known.delete(sheetId);
      else known.set(sheetId, { end, standing: sheetStanding(drawing) });
      return end !== undefined;
    } catch (error) {
      onError(error, { sheetId });
      return false;
    }
  };

  const enqueue = (sheetId: string): Promise<boolean> => {
    const already = waiting.get(sheetId);
    if (already) return already;
    const solved = last.then(() => solveOne(sheetId));
    last = solved;
    waiting.set(sheetId, solved);
    return solved;
  };

  return {
    of,
    solve: async (sheetIds) => (await Promise.all(sheetIds.map(enqueue))).filter(Boolean).length,
  };
}
