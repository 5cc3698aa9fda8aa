import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import type { CircuitFile } from '#shared/circuit/circuit-file';
import type { Problem } from '#shared/circuit/problem';
import { terminalsOf } from '#shared/circuit/terminals';

/**
 * The problems to be told beside a part: those that name it, and those that name no part but a net it is on. A hazardous
 * voltage is told once for the whole sheet, or every part at a supply would carry it.
 */
export function problemsAbout(ref: string, record: OperatingPointRecord, circuit: CircuitFile | undefined): Problem[] {
  const part = circuit?.parts.find((candidate) => candidate.ref === ref);
  const nets = new Set(part ? terminalsOf(part).map(({ net }) => net) : []);
  return record.problems.filter(
    ({ code, refs, nets: named }) =>
      refs.includes(ref) || (code !== 'high-voltage' && refs.length === 0 && named.some((net) => nets.has(net))),
  );
}
