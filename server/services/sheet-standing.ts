import { leastSlackFirst } from '#shared/analyses/least-slack';
import { operatingPoint } from '#shared/analyses/operating-point';
import type { SheetStanding } from '#shared/api/sheets';
import { type Drawing, isComponent, isFet } from '#shared/circuit/drawing';
import { netlist } from '#shared/circuit/netlist';

/** What the operating point says of a sheet as a whole. */
export function sheetStanding(drawing: Drawing): SheetStanding {
  if (!drawing.parts.some(isComponent)) return { status: 'empty', fets: 0 };
  const fets = drawing.parts.filter(isFet).length;
  const { circuit } = netlist(drawing);
  const record = operatingPoint(circuit);
  if (record.status !== 'solved') {
    const reason = record.problems.find(({ severity }) => severity === 'error')?.message ?? '';
    return { status: record.status, fets, reason };
  }
  const devices = leastSlackFirst(circuit.parts, record);
  const verdicts = { met: 0, thin: 0, missed: 0 };
  for (const { verdict } of devices) verdicts[verdict] += 1;
  return { status: 'solved', fets, verdicts, worst: devices[0] ?? null };
}
