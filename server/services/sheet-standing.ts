import { leastSlackFirst } from '#shared/analyses/least-slack';
import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import { Refusal } from '#shared/api/refusal';
import type { SheetStanding } from '#shared/api/sheets';
import type { CircuitFile } from '#shared/circuit/circuit-file';
import { type Drawing, isComponent, isFet } from '#shared/circuit/drawing';
import { netlist } from '#shared/circuit/netlist';

/** What the operating point says of a sheet as a whole; one that takes too long to solve says that. */
export async function sheetStanding(
  drawing: Drawing,
  operatingPoint: (circuit: CircuitFile) => Promise<OperatingPointRecord>,
): Promise<SheetStanding> {
  if (!drawing.parts.some(isComponent)) return { status: 'empty', fets: 0 };
  const fets = drawing.parts.filter(isFet).length;
  const { circuit } = netlist(drawing);
  const record = await operatingPoint(circuit).catch((error: unknown) => {
    if (error instanceof Refusal && error.code === 'took-too-long') return error;
    throw error;
  });
  if (record instanceof Refusal) return { status: 'unsolved', fets, reason: record.message };
  if (record.status !== 'solved') {
    const reason = record.problems.find(({ severity }) => severity === 'error')?.message ?? '';
    return { status: record.status, fets, reason };
  }
  const devices = leastSlackFirst(circuit.parts, record);
  const verdicts = { met: 0, thin: 0, missed: 0 };
  for (const { verdict } of devices) verdicts[verdict] += 1;
  return { status: 'solved', fets, verdicts, worst: devices[0] ?? null };
}
