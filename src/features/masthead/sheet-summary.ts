import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import { standingOf, type Verdict } from '#shared/analyses/verdict';
import { type CircuitFile, isFet } from '#shared/circuit/circuit-file';

export type VerdictTally = Readonly<Record<Verdict, number>>;

/** The devices with an intent by how they stand, and the power that all sources together deliver, in watts. */
export function sheetSummary(
  circuit: CircuitFile,
  record: OperatingPointRecord,
): { verdicts: VerdictTally; power: number } {
  const verdicts = { met: 0, thin: 0, missed: 0 };
  for (const part of circuit.parts) {
    if (!isFet(part) || !part.intent) continue;
    const point = Object.hasOwn(record.fets, part.ref) ? record.fets[part.ref] : undefined;
    if (point) verdicts[standingOf(point, part.intent).verdict] += 1;
  }
  const power = Object.values(record.sources).reduce((sum, source) => sum + source.power, 0);
  return { verdicts, power };
}
