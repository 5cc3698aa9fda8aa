import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import { netlist } from '#shared/circuit/netlist';
import type { Context } from './context';
import { requireSheet } from './team-access';

/** The record of the sheet as it is drawn now. */
export async function liveOperatingPoint(
  ctx: Context,
  sheetId: string,
  askerId: string,
): Promise<OperatingPointRecord> {
  const { sheet } = requireSheet(ctx.db, sheetId, askerId, 'open-sheet');
  return ctx.solving.operatingPoint(netlist(ctx.rooms.drawing(sheetId), sheet.name).circuit, askerId);
}
