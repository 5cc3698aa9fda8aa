import type { CircuitFile } from '#shared/circuit/circuit-file';
import { circuitWithDrawing } from '#shared/circuit/netlist';
import type { Context } from './context';
import { requireSheet } from './team-access';

/** The sheet as it is drawn now, as a circuit file that can be imported again. */
export function liveCircuit(ctx: Context, sheetId: string, askerId: string): CircuitFile {
  const { sheet } = requireSheet(ctx.db, sheetId, askerId, 'open-sheet');
  return circuitWithDrawing(ctx.rooms.drawing(sheetId), sheet.name);
}
