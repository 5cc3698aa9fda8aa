import { operatingPoint } from '#shared/analyses/operating-point';
import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import { netlist } from '#shared/circuit/netlist';
import type { Context } from './context';
import { requireSheet } from './team-access';

/** The record of the sheet as it is drawn now. */
export function liveOperatingPoint(ctx: Context, sheetId: string, askerId: string): OperatingPointRecord {
  const { sheet } = requireSheet(ctx.db, sheetId, askerId, 'open-sheet');
  return operatingPoint(netlist(ctx.rooms.drawing(sheetId), sheet.name).circuit);
}
