import { setImmediate as nextTurn } from 'node:timers/promises';
import type { SheetStanding } from '#shared/api/sheets';
import type { Solving } from '../solving/solving';
import type { Rooms } from '../sync/rooms';
import { sheetStanding } from './sheet-standing';

/**
 * How each sheet stands. A sheet is solved when a list asks, once for each state of its log, and never on the way of an
 * edit. Kept in memory only: after a restart, which may bring another solver, everything is solved anew.
 */
export interface Standings {
  /** Of the sheet as it is stored now, where that is known. */
  of(sheetId: string): SheetStanding | undefined;
  /** Solves these sheets of a team, one after the other so that edits come between; tells how many of them could be. */
  solve(teamId: string, sheetIds: readonly string[]): Promise<number>;
}

interface StandingsDeps {
  readonly rooms: Rooms;
  readonly solving: Solving;
  readonly endOfLog: (sheetId: string) => number | undefined;
  readonly onError: (error: unknown, about: { sheetId: string }) => void;
}

export function createStandings({ rooms, solving, endOfLog, onError }: StandingsDeps): Standings {
  const known = new Map<string, { end: number; standing: SheetStanding }>();
  const underWay = new Map<string, Promise<boolean>>();

  const of = (sheetId: string) => {
    const found = known.get(sheetId);
    return found !== undefined && found.end === endOfLog(sheetId) ? found.standing : undefined;
  };

  const solve = async (teamId: string, sheetId: string): Promise<boolean> => {
    await nextTurn();
    try {
      if (of(sheetId)) return true;
      const drawing = rooms.drawing(sheetId);
      // Nothing is stored between the two, for nothing here waits.
      const end = endOfLog(sheetId);
      if (end === undefined) {
        known.delete(sheetId);
        return false;
      }
      const standing = await sheetStanding(drawing, (circuit) => solving.operatingPoint(circuit, teamId));
      known.set(sheetId, { end, standing });
      return true;
    } catch (error) {
      onError(error, { sheetId });
      return false;
    }
  };

  const solveOnce = (teamId: string, sheetId: string): Promise<boolean> => {
    const already = underWay.get(sheetId);
    if (already) return already;
    const solved = solve(teamId, sheetId).finally(() => underWay.delete(sheetId));
    underWay.set(sheetId, solved);
    return solved;
  };

  return {
    of,
    async solve(teamId, sheetIds) {
      let solved = 0;
      for (const sheetId of sheetIds) if (await solveOnce(teamId, sheetId)) solved += 1;
      return solved;
    },
  };
}
